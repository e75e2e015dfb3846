import { useMemo } from 'react';
import type { Table } from '../../core/report/table.ts';
import type { System } from '../../core/units/quantities.ts';
import { type DampingPicture, dampingPlot } from './dampingPlot.ts';
import { dampingSentence } from './dampingWords.ts';
import { Plot } from './Plot.tsx';
import { KeyLine, plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import type { Tokens } from './tokens.ts';
import { useDamping } from './useDamping.ts';

export interface DampingByPeriodProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
}

/** Which ratio of critical damping each mode of this frame comes out with, and how it runs between them. */
export function DampingByPeriod({ layout, tokens, old }: DampingByPeriodProps) {
  const { width, height } = plotSize(layout);
  const picture = useDamping();
  const spec = useMemo(
    () => (picture === null ? null : () => dampingPlot(picture, { width, height }, tokens)),
    [picture, width, height, tokens],
  );
  const kind = picture?.damping.kind;
  return (
    <SquareFrame
      layout={layout}
      old={old}
      kind="damping"
      words="% of critical against s"
      legend={
        <>
          {kind !== 'modal' && (
            <span>
              <KeyLine stroke="ink" width={1.3} />
              as described
            </span>
          )}
          <span>
            <KeyDot />
            modes
          </span>
          {kind !== 'none' && (
            <span>
              <KeyLine stroke="accent" dash="1.5 2" />
              asked for
            </span>
          )}
          {kind !== 'none' && kind !== 'modal' && (
            <span>
              <i className="key-shade" />
              half to twice
            </span>
          )}
        </>
      }
      table={picture === null ? null : () => dampingTable(picture)}
    >
      {spec !== null && picture !== null && <Plot spec={spec} label={dampingSentence(picture)} old={old} />}
      {spec === null && <p className="nothing quiet small">No run yet.</p>}
    </SquareFrame>
  );
}

function KeyDot() {
  return (
    <svg width="9" height="11" viewBox="0 0 9 11" aria-hidden="true">
      <circle cx="4.5" cy="6" r="3" fill="var(--ink)" />
    </svg>
  );
}

function dampingTable({ modes, ratios }: DampingPicture): Table {
  return {
    id: 'damping-by-period',
    title: 'Damping ratio of each mode',
    columns: [
      { key: 'mode', name: 'Mode', quantity: 'count', values: modes.map((_, i) => i + 1) },
      { key: 'period', name: 'Period', quantity: 'time', decimals: 3, values: modes.map(({ period }) => period) },
      { key: 'ratio', name: 'Damping ratio', quantity: 'percent', values: Array.from(ratios) },
      {
        key: 'mass',
        name: 'Effective mass',
        quantity: 'percent',
        decimals: 1,
        values: modes.map(({ effectiveMassRatio }) => effectiveMassRatio),
      },
    ],
  };
}
