import { useState } from 'react';
import { type System, unitOf } from '../../core/units/quantities.ts';
import { readQuantity } from '../../core/units/read.ts';
import { makeEqualStoreys } from '../../document/edits.ts';
import { MAX_STOREYS } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { choose, ensureStorey } from './commands.ts';

export interface EmptyStartProps {
  readonly system: System;
  readonly onOpen: () => void;
  readonly onExample: () => void;
  readonly width: number;
}

/** Four ways to begin, where the building will stand. */
export function EmptyStart({ system, onOpen, onExample, width }: EmptyStartProps) {
  const [count, setCount] = useState('8');
  const [height, setHeight] = useState(system === 'si' ? '3.60' : '12.0');
  const storeys = Number(count);
  const countFits = Number.isInteger(storeys) && storeys >= 1 && storeys <= MAX_STOREYS;
  const reading = readQuantity(height, 'length', system);
  const fits = countFits && reading.kind === 'value' && reading.value > 0;
  const make = () => {
    if (!fits || reading.kind !== 'value') return;
    edit(`${storeys} equal storeys made`, (project) => makeEqualStoreys(project, storeys, reading.value));
    choose(storeys - 1, 'mass');
  };
  return (
    <ul className="begin" style={{ width }}>
      <li>
        <p>
          <b>Type the first storey</b>
          <span>from the ground up; the storey above starts as its copy</span>
        </p>
        <Button
          size="medium"
          onClick={() => {
            ensureStorey();
            choose(0, 'height');
          }}
        >
          Begin
        </Button>
        <span className="keycap">Alt</span>
        <span className="keycap">↑</span>
      </li>
      <li>
        <p>
          <b>Make equal storeys</b>
          <span>
            {countFits
              ? 'heights, weights and stiffness can be changed after'
              : `1 to ${MAX_STOREYS} storeys make a frame`}
          </span>
        </p>
        <input
          className="field number"
          style={{ width: 44 }}
          aria-label="Number of storeys"
          aria-invalid={!countFits}
          value={count}
          onChange={(event) => setCount(event.target.value)}
          onKeyDown={(event) => event.key === 'Enter' && make()}
        />
        <span className="quiet">of</span>
        <input
          className="field number"
          style={{ width: 60 }}
          aria-label={`Storey height, ${unitOf('length', system)}`}
          aria-invalid={reading.kind !== 'value'}
          value={height}
          onChange={(event) => setHeight(event.target.value)}
          onKeyDown={(event) => event.key === 'Enter' && make()}
        />
        <span className="unit">{unitOf('length', system)}</span>
        <Button size="medium" disabled={!fits} onClick={make}>
          Make
        </Button>
      </li>
      <li>
        <p>
          <b>Paste rows from a spreadsheet</b>
          <span>height, weight, stiffness; top row is the roof</span>
        </p>
        <span className="keycap">Ctrl</span>
        <span className="keycap">V</span>
      </li>
      <li>
        <p>
          <b>Open a project or the example clinic</b>
          <span>a Swaybook project file can be dropped anywhere</span>
        </p>
        <Button size="medium" onClick={onOpen}>
          Open
        </Button>
        <Button size="medium" onClick={onExample}>
          Example
        </Button>
      </li>
    </ul>
  );
}
