import type { Shape } from 'plotly.js-basic-dist-min';
import { dampingCurve, wantedRatios } from '../../core/frame/dampingCurve.ts';
import type { Damping } from '../../core/frame/frame.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { PlotSpec } from './plotly.ts';
import { axis, baseLayout, type Size } from './template.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';

/** What is drawn: the description, the modes it is for, and the ratio that each of them comes out with [-]. */
export interface DampingPicture {
  readonly damping: Damping;
  readonly modes: readonly Mode[];
  readonly ratios: ArrayLike<number>;
}

/** Points of the curve. */
const POINTS = 121;
/** The axis reaches so far past the periods of the frame, as a factor. */
const BEYOND = 1.6;
/** Modes whose name stands beside their mark. */
const NAMED = 3;
/** Places of the numbers of a period axis [s]. Source: the look. */
const PERIODS = [0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 4, 8, 16];
/** Higher than so many times the largest ratio that is wanted or comes out in the named modes, the axis is cut. */
const TALLEST = 1.6;

/** Under so much of the axis there is no room for a name below a mark. */
const LOW = 0.2;

/** Ratio of critical damping against period: the curve of the description, this frame's modes on it, the ratios that were asked for. */
export function dampingPlot({ damping, modes, ratios }: DampingPicture, size: Size, tokens: Tokens): PlotSpec {
  const percent = axisUnitOf('percent', 'si', 0);
  const [from, to] = [modes[modes.length - 1].period / BEYOND, modes[0].period * BEYOND];
  const periods = Float64Array.from({ length: POINTS }, (_, i) => from * (to / from) ** (i / (POINTS - 1)));
  const curve = dampingCurve(damping, modes, periods);
  const wanted = wantedRatios(damping);
  const marks = modes.map((_, i) => percent.onAxis(ratios[i]));
  const near = Math.max(...marks.slice(0, NAMED), ...wanted.map(percent.onAxis));
  const end = TALLEST * Math.max(near, Math.min(Math.max(...marks), 2 * near)) || 1;
  const upward = ticksBetween(0, end, Math.max(3, size.height / 48));
  const along = PERIODS.filter((period) => period >= from && period <= to);
  const word = (period: number) =>
    printQuantity(period, 'time', 'si', period < 0.095 ? (period < 0.0095 ? 3 : 2) : period < 0.95 ? 1 : 0);
  return {
    data: [
      ...wanted.map((ratio) => ({
        type: 'scatter' as const,
        mode: 'lines' as const,
        hoverinfo: 'skip' as const,
        x: [from, to],
        y: [percent.onAxis(ratio), percent.onAxis(ratio)],
        line: { color: tokens.accent, width: 1, dash: 'dot' as const },
      })),
      ...(curve === null
        ? []
        : [
            {
              type: 'scatter' as const,
              mode: 'lines' as const,
              hoverinfo: 'skip' as const,
              x: periods,
              y: curve.map(percent.onAxis),
              line: { color: tokens.ink, width: 1.3 },
            },
          ]),
      {
        type: 'scatter',
        mode: 'markers',
        x: modes.map(({ period }) => period),
        y: marks,
        text: modes.map(
          ({ period, effectiveMassRatio }, i) =>
            `mode ${i + 1}, ${printQuantity(period, 'time', 'si', 3)} s: ${printQuantity(ratios[i], 'percent', 'si', 2)} %, ${printQuantity(effectiveMassRatio, 'percent', 'si', 1)} % of the mass`,
        ),
        hovertemplate: '%{text}<extra></extra>',
        marker: { size: modes.length > 30 ? 4 : 6, color: tokens.ink },
        cliponaxis: true,
      },
    ],
    layout: {
      ...baseLayout(tokens, size),
      xaxis: {
        ...axis(tokens, [Math.log10(from), Math.log10(to)], { at: along, decimals: 0 }, word),
        type: 'log',
        zeroline: false,
      },
      yaxis: axis(tokens, [0, end], upward, tickWords(percent, upward)),
      shapes: damping.kind === 'modal' ? [] : band(wanted, percent.onAxis, tokens),
      annotations: modes.slice(0, NAMED).map(({ period }, i) => ({
        x: Math.log10(period),
        y: marks[i],
        // Clear of the line of the ratio that was asked for, and of the numbers of the axis.
        ...(marks[i] < percent.onAxis(wanted[0] ?? 0) && marks[i] > LOW * end
          ? { yanchor: 'top' as const, yshift: -4 }
          : { yanchor: 'bottom' as const, yshift: 4 }),
        text: `T<sub>${i + 1}</sub>`,
        showarrow: false,
        font: { family: tokens.sans, size: 11, color: tokens.ink2 },
      })),
    },
  };
}

/** From half of the least ratio asked for to twice the largest: outside of it a mode that matters is cautioned (modal damping gives each mode its own). */
function band(wanted: readonly number[], onAxis: (ratio: number) => number, tokens: Tokens): Partial<Shape>[] {
  if (wanted.length === 0) return [];
  return [
    {
      type: 'rect',
      layer: 'below',
      xref: 'paper',
      x0: 0,
      x1: 1,
      y0: onAxis(Math.min(...wanted) / 2),
      y1: onAxis(2 * Math.max(...wanted)),
      fillcolor: tokens.shade,
      opacity: 0.7,
      line: { width: 0 },
    },
  ];
}
