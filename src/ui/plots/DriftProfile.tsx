import { useMemo } from 'react';
import type { Table } from '../../core/report/table.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { type Answers, useResults } from '../../state/results.ts';
import { useChosenMotion } from '../../state/selectors.ts';
import { useSession } from '../../state/session.ts';
import { levelsOf } from './levels.ts';
import { Plot } from './Plot.tsx';
import type { PlotSpec } from './plotly.ts';
import { KeyLine, plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import { axis, baseLayout, LIMIT_DASHES, type Size } from './template.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';

export interface DriftProfileProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
}

/** Peak drift ratio over the height: each motion, the suite, the limit. */
export function DriftProfile({ layout, tokens, system, old }: DriftProfileProps) {
  const answers = useResults((state) => state.answers);
  const chosen = useChosenMotion();
  const lit = useSession((state) => state.lit);
  const { width, height } = plotSize(layout);
  const spec = useMemo(
    () => (answers === null ? null : () => profilePlot(answers, lit ?? chosen, { width, height }, tokens, system)),
    [answers, lit, chosen, width, height, tokens, system],
  );
  const unit = axisUnitOf('length', system, 0).unit;
  const measure = answers?.envelope.measure === 'max' ? 'largest' : (answers?.envelope.measure ?? 'mean');
  return (
    <SquareFrame
      layout={layout}
      kind="profile"
      words={`level in ${unit} against peak drift ratio in %`}
      legend={
        <>
          <span>
            <KeyLine stroke="ink" width={2} />
            {measure}
          </span>
          <span>
            <KeyLine stroke="accent" width={1.3} />
            chosen
          </span>
          <span>
            <KeyLine stroke="suite" />
            each motion
          </span>
          <span>
            <KeyLine stroke="signal" dash="5 2" />
            limit
          </span>
        </>
      }
      table={answers === null ? null : () => profileTable(answers)}
    >
      <Plot spec={spec} label={sentence(answers)} old={old} />
      {spec === null && <p className="nothing quiet small">No run yet.</p>}
    </SquareFrame>
  );
}

/** Each storey's value as an upright line between its floors. */
function steps(values: ArrayLike<number>, levels: readonly number[]): { x: number[]; y: number[] } {
  const x: number[] = [];
  const y: number[] = [];
  for (let i = 0; i < values.length; i++) {
    x.push(values[i], values[i]);
    y.push(levels[i], levels[i + 1]);
  }
  return { x, y };
}

function profilePlot(
  { envelope, runs, case: from }: Answers,
  chosen: string | null,
  size: Size,
  tokens: Tokens,
  system: System,
): PlotSpec | null {
  const levels = levelsOf(from.frame.storeys.map(({ height }) => height));
  if (levels === null) return null;
  const length = axisUnitOf('length', system, 0);
  const ratio = axisUnitOf('percent', system, 0);
  const upward = levels.map(length.onAxis);
  const { factor, drift, measure } = envelope;
  const shown = (values: Float64Array) => Array.from(values, (value) => ratio.onAxis(factor * value));
  const limit = ratio.onAxis(envelope.limit);
  const suite = drift === null ? null : shown(drift[measure]);
  const lines = [...runs].sort((a, b) => Number(a.motion === chosen) - Number(b.motion === chosen));
  const data: PlotSpec['data'][number][] = lines.map(({ motion, run }) => ({
    type: 'scatter',
    mode: 'lines',
    ...steps(shown(run.storeys.peakDriftRatio), upward),
    text: Array.from(run.storeys.peakDriftRatio).flatMap((value, i) => {
      const words = `storey ${i + 1}, ${motion}: ${printQuantity(factor * value, 'percent', system)} %`;
      return [words, words];
    }),
    hovertemplate: '%{text}<extra></extra>',
    opacity: motion === chosen ? 1 : 0.7,
    line: { color: motion === chosen ? tokens.accent : tokens.suite, width: motion === chosen ? 1.3 : 0.8 },
  }));
  if (suite !== null) {
    data.push({
      type: 'scatter',
      mode: 'lines',
      ...steps(suite, upward),
      hoverinfo: 'skip',
      line: { color: tokens.ink, width: 2 },
    });
  }
  const largest = Math.max(limit, ...runs.flatMap(({ run }) => shown(run.storeys.peakDriftRatio)));
  const end = 1.06 * largest;
  const along = ticksBetween(0, end, Math.max(3, size.width / 56));
  const ticks = ticksBetween(0, upward[upward.length - 1], 6);
  return {
    data,
    layout: {
      ...baseLayout(tokens, size),
      xaxis: axis(tokens, [0, end], along, tickWords(ratio, along)),
      yaxis: axis(tokens, [0, 1.01 * upward[upward.length - 1]], ticks, tickWords(length, ticks)),
      shapes: [
        {
          type: 'line',
          yref: 'paper',
          y0: 0,
          y1: 1,
          x0: limit,
          x1: limit,
          line: { color: tokens.signal, width: 1, dash: LIMIT_DASHES },
        },
      ],
    },
  };
}

function profileTable({ envelope, runs, case: from }: Answers): Table {
  const n = from.frame.storeys.length;
  const down = Array.from({ length: n }, (_, row) => n - 1 - row);
  const { drift, measure, factor } = envelope;
  const column = (key: string, name: string, values: Float64Array | null) => ({
    key,
    name,
    quantity: 'percent' as const,
    values: down.map((storey) => (values === null ? null : factor * values[storey])),
  });
  return {
    id: 'drift-profile',
    title: 'Peak drift ratio over the height',
    columns: [
      { key: 'storey', name: 'Storey', quantity: 'count', values: down.map((storey) => storey + 1) },
      column(
        'suite',
        measure === 'max' ? 'Largest' : measure === 'median' ? 'Median' : 'Mean',
        drift?.[measure] ?? null,
      ),
      ...runs.map(({ motion, run }, i) => column(`motion${i + 1}`, motion, run.storeys.peakDriftRatio)),
    ],
  };
}

function sentence(answers: Answers | null): string {
  const storey = answers?.envelope.governingStorey ?? -1;
  if (answers === null || storey < 0) return 'Drift profile: no suite yet';
  return `Peak drift ratio over the height: storey ${storey + 1} is nearest to the limit of ${printQuantity(answers.envelope.limit, 'percent', 'si')} percent`;
}
