import { useMemo } from 'react';
import { roofFirst, type Table } from '../../core/report/table.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import type { System } from '../../core/units/quantities.ts';
import { useDocument } from '../../state/document.ts';
import { letterOf } from '../controls/letters.ts';
import { EnergyKey } from '../strip/EnergyKey.tsx';
import { Plot } from './Plot.tsx';
import { plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import { hasEnergy, storeyEnergyPlot } from './storeyEnergyPlot.ts';
import type { Tokens } from './tokens.ts';
import type { ShownRun } from './useShownRun.ts';

export interface StoreyEnergyProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
  readonly shown: ShownRun | null;
}

/** What each storey took out under the chosen motion: its law, and its damper beyond that. */
export function StoreyEnergy({ layout, tokens, system, old, shown }: StoreyEnergyProps) {
  const motions = useDocument((state) => state.project.motions);
  const { width, height } = plotSize(layout);
  const any = shown !== null && hasEnergy(shown.run);
  const spec = useMemo(
    () => (shown === null || !any ? null : () => storeyEnergyPlot(shown, { width, height }, tokens, system)),
    [shown, any, width, height, tokens, system],
  );
  const at = motions.findIndex(({ name }) => name === shown?.motion);
  const largest = shown === null ? 0 : Math.max(...totals(shown));
  const unit = axisUnitOf('energy', system, largest).unit;
  const words =
    shown === null
      ? 'no run yet'
      : `under ${letterOf(Math.max(0, at))}; level in ${axisUnitOf('length', system, 0).unit} against ${unit}`;
  const damped = shown?.run.storeys.damperWork.some((work) => work > 0) ?? false;
  return (
    <SquareFrame
      layout={layout}
      old={old}
      kind="storey-energy"
      words={words}
      legend={
        any && (
          <>
            <span>
              <EnergyKey part="hysteretic" />
              hysteretic
            </span>
            {damped && (
              <span>
                <EnergyKey part="dampers" />
                damper
              </span>
            )}
          </>
        )
      }
      table={shown === null ? null : () => energyTable(shown)}
    >
      {spec !== null && shown !== null && <Plot spec={spec} label={sentence(shown, system)} old={old} />}
      {spec === null && (
        <p className="nothing quiet small">
          {shown === null ? 'No run yet.' : 'No storey yields and none has a damper: none of them takes out energy.'}
        </p>
      )}
    </SquareFrame>
  );
}

function totals({ run: { storeys } }: ShownRun): number[] {
  return Array.from(storeys.dissipated, (value, i) => value + storeys.damperWork[i]);
}

function energyTable({ motion, run, heights }: ShownRun): Table {
  const n = heights.length;
  const column = (key: string, name: string, values: ArrayLike<number>) => ({
    key,
    name,
    quantity: 'energy' as const,
    decimals: 1,
    values: roofFirst(values, n),
  });
  return {
    id: 'storey-energy',
    title: `Energy by storey, under ${motion}`,
    columns: [
      { key: 'storey', name: 'Storey', quantity: 'count', values: Array.from({ length: n }, (_, row) => n - row) },
      column('dissipated', 'Hysteretic', run.storeys.dissipated),
      column('damper', 'Damper', run.storeys.damperWork),
    ],
  };
}

function sentence(shown: ShownRun, system: System): string {
  const all = totals(shown);
  const at = all.indexOf(Math.max(...all));
  const unit = axisUnitOf('energy', system, all[at]);
  return `Energy taken out by storey: most in storey ${at + 1}, ${unit.print(all[at], unit.decimals)} ${unit.unit}`;
}
