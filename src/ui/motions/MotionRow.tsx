import { memo, useRef } from 'react';
import type { Fault } from '../../core/fault.ts';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { moveMotion, removeMotion, useMotion } from '../../document/edits.ts';
import type { MotionEntry } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { setSession } from '../../state/session.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { Icon } from '../controls/Icon.tsx';
import { letterOf } from '../controls/letters.ts';
import { Menu } from '../controls/Menu.tsx';
import { NumberField } from '../controls/NumberField.tsx';
import { TextField } from '../dialogs/TextField.tsx';
import type { Axis } from '../sheet/axis.ts';
import { RowTrace } from './RowTrace.tsx';

/** A pure edit of the document, under a name that is no hook's. */
const withUse = useMotion;

export interface MotionRowProps {
  readonly at: number;
  readonly of: number;
  readonly entry: MotionEntry;
  readonly measures: MotionMeasures | null;
  readonly seconds: Axis;
  /** Acceleration at the edge of the trace [m/s2]. */
  readonly reach: number;
  readonly faults: readonly Fault[];
  readonly system: System;
  readonly shown: boolean;
}

/** One record of the suite. */
export const MotionRow = memo(function MotionRow(props: MotionRowProps) {
  const { at, of, entry, measures, seconds, reach, faults, system, shown } = props;
  const reason = useRef<HTMLTableRowElement>(null);
  const letter = letterOf(at);
  const place = `motions[${at}]`;
  const fault = (key: string) => faults.find(({ where }) => where === `${place}.${key}`);
  const print = (value: number | undefined, quantity: 'acceleration' | 'velocity' | 'time', decimals?: number) =>
    value === undefined ? '' : printQuantity(value, quantity, system, decimals);
  const use = (used: boolean) => {
    commitOpenDraft();
    edit(`${used ? 'bring back' : 'leave out'} ${entry.name}`, (project) => withUse(project, at, used));
    // A motion is left out for a reason: the question stands there at once.
    if (!used) requestAnimationFrame(() => reason.current?.querySelector('input')?.focus());
  };
  const move = (to: number) => {
    commitOpenDraft();
    edit(`move ${entry.name}`, (project) => moveMotion(project, at, to));
  };
  const remove = () => {
    commitOpenDraft();
    edit(`remove ${entry.name}`, (project) => removeMotion(project, at));
    setSession({ toast: `${entry.name} is removed; undo brings it back` });
  };
  const scaled = typeof entry.scale === 'number' && measures ? Math.abs(entry.scale) * measures.peakAcceleration : null;
  return (
    <>
      <tr className={`motion-row ${shown ? 'shown' : ''} ${entry.used ? '' : 'left-out'}`}>
        <td className="words">
          <input
            type="checkbox"
            className="check"
            aria-label={`Use ${entry.name}`}
            checked={entry.used}
            onChange={(event) => use(event.target.checked)}
          />
        </td>
        <td className="words">
          <button
            type="button"
            className="letter"
            aria-pressed={shown}
            aria-label={`${letter}, show ${entry.name}`}
            onClick={() => setSession({ motion: entry.name })}
          >
            {letter}
          </button>
        </td>
        <th scope="row" className="words record">
          <TextField
            path={`${place}.name`}
            label={`Name of ${letter}`}
            className="bare"
            invalid={fault('name') !== undefined}
          />
          <span className="unit">{entry.origin?.file ?? 'no file kept'}</span>
        </th>
        <td>{print(entry.interval, 'time', 3)}</td>
        <td>{printQuantity(entry.count, 'count', system)}</td>
        <td>{print(measures?.peakAcceleration, 'acceleration')}</td>
        <td>{print(measures?.peakVelocity, 'velocity')}</td>
        <td>{print(measures?.duration5to95, 'time', 1)}</td>
        <td className="trace">
          <RowTrace entry={entry} measures={measures} seconds={seconds} reach={reach} shown={shown} />
        </td>
        <td className="factor">
          <NumberField
            path={`${place}.scale`}
            label={`Factor on ${entry.name}`}
            unit={false}
            words={false}
            width={62}
            className="bare"
          />
        </td>
        <td>{scaled === null ? <span className="unit">none</span> : print(scaled, 'acceleration')}</td>
        <td>
          <Menu
            label={`More for ${entry.name}`}
            className="icon-button low"
            align="right"
            items={[
              { id: 'up', label: 'Move up', disabled: at === 0, run: () => move(at - 1) },
              { id: 'down', label: 'Move down', disabled: at === of - 1, run: () => move(at + 1) },
              { id: 'remove', label: 'Remove', run: remove },
            ]}
          >
            <Icon name="more" />
          </Menu>
        </td>
      </tr>
      {!entry.used && (
        <tr ref={reason} className="reason-row">
          <td colSpan={2} />
          <td colSpan={10} className="words">
            <span className="reason-line">
              <span className="quiet small">Left out, because</span>
              <TextField
                path={`${place}.reason`}
                label={`Why ${entry.name} is left out`}
                placeholder="why is it left out? the note prints it"
                invalid={fault('reason') !== undefined}
              />
            </span>
          </td>
        </tr>
      )}
      {(['scale', 'name'] as const).map((key) => {
        const found = fault(key);
        return found === undefined ? null : (
          <tr key={key} className="fault-row">
            <td colSpan={2} />
            <td colSpan={10} className="words">
              {found.message}. {found.mend}.
            </td>
          </tr>
        );
      })}
    </>
  );
});
