import { useCallback, useMemo, useState } from 'react';
import type { Table } from '../../core/report/table.ts';
import type { System } from '../../core/units/quantities.ts';
import { useDocument } from '../../state/document.ts';
import { letterOf } from '../controls/letters.ts';
import type { MenuItem } from '../controls/Menu.tsx';
import { chooseForce, type LoopForce, showBackbone, usePanelChoice } from './choice.ts';
import { LoopCursor } from './LoopCursor.tsx';
import { forceOf, type Loop, loopOf } from './loop.ts';
import { type LoopAxes, loopAxes } from './loopAxes.ts';
import { loopPlot } from './loopPlot.ts';
import { loopWords } from './loopWords.ts';
import { Plot } from './Plot.tsx';
import { KeyLine, KeyTick, plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import type { Tokens } from './tokens.ts';
import type { ShownRun } from './useShownRun.ts';

export interface ForceDriftProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
  readonly shown: ShownRun | null;
}

const FORCES: readonly { readonly force: LoopForce; readonly label: string }[] = [
  { force: 'law', label: 'Force of the storey alone' },
  { force: 'shear', label: 'With damper force' },
  { force: 'damper', label: 'Damper force alone' },
];

/** A force against the drift of the chosen storey: what has been by the cursor in ink, what comes in grey. */
export function ForceDrift({ layout, tokens, system, old, shown }: ForceDriftProps) {
  const motions = useDocument((state) => state.project.motions);
  const force = usePanelChoice((choice) => choice.force);
  const withBackbone = usePanelChoice((choice) => choice.backbone);
  const { width, height } = plotSize(layout);
  const loop = useMemo(() => (shown === null ? null : loopOf(shown, force)), [shown, force]);
  const axes = useMemo(
    () => (loop === null ? null : loopAxes(loop, { width, height }, system)),
    [loop, width, height, system],
  );
  const spec = useMemo(
    () => (loop === null || axes === null ? null : () => loopPlot(loop, axes, tokens, withBackbone)),
    [loop, axes, tokens, withBackbone],
  );
  const of = shown === null || loop === null ? '' : `${shown.storey} ${loop.which} ${shown.motion}`;
  // The cursor goes over the loop that is drawn: the one that is shown next may still wait for its turn.
  const [drawn, setDrawn] = useState<{ readonly of: string; readonly loop: Loop; readonly axes: LoopAxes } | null>(
    null,
  );
  const onDrawn = useCallback(
    () => setDrawn(loop === null || axes === null ? null : { of, loop, axes }),
    [of, loop, axes],
  );
  const letter = letterOf(
    Math.max(
      0,
      motions.findIndex(({ name }) => name === shown?.motion),
    ),
  );
  const words =
    shown === null || loop === null || axes === null ? 'no run yet' : loopWords(loop, axes, shown.storey, letter);
  const backbone = withBackbone && loop?.which === 'law' && loop.storey.law.kind !== 'elastic';
  return (
    <SquareFrame
      layout={layout}
      old={old}
      kind="force"
      words={words}
      legend={
        <>
          <span>
            <KeyLine stroke="ink" width={1.6} />
            up to the cursor
          </span>
          <span>
            <KeyLine stroke="suite" />
            after it
          </span>
          {loop !== null && loop.firstYield !== null && (
            <span>
              <KeyTick />
              first yield
            </span>
          )}
          {backbone && (
            <span>
              <KeyLine stroke="ink3" width={1.4} dash="1.5 2" />
              backbone
            </span>
          )}
        </>
      }
      options={loop === null ? [] : optionsOf(loop, withBackbone)}
      table={loop === null || shown === null ? null : () => loopTable(loop, shown)}
    >
      <Plot spec={spec} label={`Force and drift, ${words}`} old={old} of={of} onDrawn={onDrawn} />
      {spec !== null && drawn?.of === of && <LoopCursor loop={drawn.loop} axes={drawn.axes} />}
    </SquareFrame>
  );
}

/** Only what this storey has is offered. */
function optionsOf({ which, storey }: Loop, backbone: boolean): MenuItem[] {
  const options: MenuItem[] = [];
  if (storey.damper !== undefined) {
    for (const { force, label } of FORCES) {
      options.push({ id: force, label, checked: force === which, run: () => chooseForce(force) });
    }
  }
  if (storey.law.kind !== 'elastic' && which === 'law') {
    options.push({ id: 'backbone', label: 'Backbone', checked: backbone, run: () => showBackbone(!backbone) });
  }
  return options;
}

function loopTable({ drift, force, interval, storey }: Loop, { motion, storey: at, run }: ShownRun): Table {
  const { histories } = run;
  const column = (key: string, name: string, values: Float64Array) => ({
    key,
    name,
    quantity: 'force' as const,
    decimals: 1,
    values: Array.from(values),
  });
  return {
    id: 'force-drift',
    title: `Force and drift, storey ${at + 1}, under ${motion}`,
    columns: [
      {
        key: 'time',
        name: 'Time',
        quantity: 'time',
        decimals: 3,
        values: Array.from(drift, (_, j) => j * interval),
      },
      { key: 'drift', name: 'Drift', quantity: 'drift', decimals: 2, values: Array.from(drift) },
      ...(storey.damper === undefined || histories === null
        ? [column('shear', 'Storey shear', force)]
        : [
            column('law', 'Force of the storey', forceOf(histories, at, 'law')),
            column('damper', 'Damper force', forceOf(histories, at, 'damper')),
            column('shear', 'Storey shear', forceOf(histories, at, 'shear')),
          ]),
    ],
  };
}
