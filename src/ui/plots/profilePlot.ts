import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type System, unitOf } from '../../core/units/quantities.ts';
import type { Answers } from '../../state/results.ts';
import { levelsOf } from './levels.ts';
import type { PlotSpec } from './plotly.ts';
import type { Profile } from './profile.ts';
import { axis, baseLayout, LIMIT_DASHES, type Size } from './template.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';

/** Each storey's value as an upright line between its floors; a storey without one leaves a gap. */
function steps(
  values: ArrayLike<number>,
  levels: readonly number[],
): { readonly x: (number | null)[]; readonly y: (number | null)[] } {
  const x: (number | null)[] = [];
  const y: (number | null)[] = [];
  for (let i = 0; i < values.length; i++) {
    const value = Number.isFinite(values[i]) ? values[i] : null;
    x.push(value, value);
    y.push(value === null ? null : levels[i], value === null ? null : levels[i + 1]);
  }
  return { x, y };
}

export function profilePlot(
  profile: Profile,
  { runs, case: from }: Answers,
  chosen: string | null,
  size: Size,
  tokens: Tokens,
  system: System,
): PlotSpec | null {
  const levels = levelsOf(from.frame.storeys.map(({ height }) => height));
  if (levels === null) return null;
  const { quantity, decimals } = profile;
  const length = axisUnitOf('length', system, 0);
  const across = axisUnitOf(quantity, system, 0);
  const unit = quantity === 'ratio' ? '' : ` ${unitOf(quantity, system)}`;
  const upward = levels.map(length.onAxis);
  const shown = (values: ArrayLike<number>) => Array.from(values, across.onAxis);
  const lines = [...runs].sort((a, b) => Number(a.motion === chosen) - Number(b.motion === chosen));
  const data: PlotSpec['data'][number][] = lines.map(({ motion, run }) => {
    const values = profile.of(run);
    return {
      type: 'scatter',
      mode: 'lines',
      ...steps(shown(values), upward),
      text: Array.from(values).flatMap((value, i) => {
        const words = `storey ${i + 1}, ${motion}: ${printQuantity(value, quantity, system, decimals)}${unit}`;
        return [words, words];
      }),
      hovertemplate: '%{text}<extra></extra>',
      opacity: motion === chosen ? 1 : 0.7,
      line: { color: motion === chosen ? tokens.accent : tokens.suite, width: motion === chosen ? 1.3 : 0.8 },
    };
  });
  if (profile.suite !== null) {
    data.push({
      type: 'scatter',
      mode: 'lines',
      ...steps(shown(profile.suite), upward),
      hoverinfo: 'skip',
      line: { color: tokens.ink, width: 2 },
    });
  }
  const limit = profile.limit === null ? null : across.onAxis(profile.limit);
  const mark = profile.mark === null ? null : across.onAxis(profile.mark.at);
  const largest = Math.max(
    limit ?? 0,
    mark ?? 0,
    ...runs.flatMap(({ run }) => shown(profile.of(run)).filter(Number.isFinite)),
  );
  const end = 1.06 * largest || 1;
  const along = ticksBetween(0, end, Math.max(3, size.width / 56));
  const ticks = ticksBetween(0, upward[upward.length - 1], 6);
  const upright = (at: number, color: string, dash: typeof LIMIT_DASHES | 'dot') => ({
    type: 'line' as const,
    yref: 'paper' as const,
    y0: 0,
    y1: 1,
    x0: at,
    x1: at,
    line: { color, width: 1, dash },
  });
  return {
    data,
    layout: {
      ...baseLayout(tokens, size),
      xaxis: axis(tokens, [0, end], along, tickWords(across, along)),
      yaxis: axis(tokens, [0, 1.01 * upward[upward.length - 1]], ticks, tickWords(length, ticks)),
      shapes: [
        ...(limit === null ? [] : [upright(limit, tokens.signal, LIMIT_DASHES)]),
        ...(mark === null ? [] : [upright(mark, tokens.ink3, 'dot')]),
      ],
      annotations:
        mark === null || profile.mark === null
          ? []
          : [
              {
                x: mark,
                xanchor: 'left',
                xshift: 3,
                yref: 'paper',
                y: 0,
                yanchor: 'bottom',
                text: profile.mark.words,
                showarrow: false,
                font: { family: tokens.sans, size: 11, color: tokens.ink3 },
              },
            ],
    },
  };
}
