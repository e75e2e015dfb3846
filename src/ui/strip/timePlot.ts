import type { Annotations, PlotData, Shape } from 'plotly.js-basic-dist-min';
import { type AxisUnit, axisUnitOf } from '../../core/units/axisUnit.ts';
import type { System } from '../../core/units/quantities.ts';
import type { PlotSpec } from '../plots/plotly.ts';
import { axis, baseLayout, LIMIT_DASHES } from '../plots/template.ts';
import { thinned } from '../plots/thin.ts';
import { evenAxis, risingAxis, tickWords } from '../plots/ticks.ts';
import type { Tokens } from '../plots/tokens.ts';
import { ENERGY_NAMES, layerFill } from './energyLook.ts';
import { type EnergyPart, endOf, type PanelContent, valueAt } from './panelContent.ts';
import type { TimeScale } from './scale.ts';

/** A layer thinner than this carries no name [px]. */
const NAMED_FROM = 15;

/** Room that the name of the input takes [px]. */
const ROOM = 36;

/** A limit further out than so many times the peak is not drawn: the history would be a flat line. */
const FAR = 3;

export interface TimePlotProps {
  readonly content: PanelContent;
  readonly scale: TimeScale;
  /** Of the axes alone [px]. */
  readonly height: number;
  readonly tokens: Tokens;
  readonly system: System;
  /** Allowable value on both sides of zero [SI]; null where there is none. */
  readonly limit: number | null;
}

export function unitOfContent(content: PanelContent, system: System): AxisUnit {
  return axisUnitOf(content.quantity, system, content.peak.value);
}

/** Room of a time panel around its axes [px]: the numbers at the left, half a number above and below. */
export const AROUND = { left: 44, right: 8, above: 6, below: 6 } as const;

/** A history, or the energies, as a plot. */
export function timePlot(props: TimePlotProps): PlotSpec {
  const { content, scale, height, tokens } = props;
  const unit = unitOfContent(content, props.system);
  const layout = baseLayout(
    tokens,
    { width: scale.width + AROUND.left + AROUND.right, height: height + AROUND.above + AROUND.below },
    { l: AROUND.left, r: AROUND.right, t: AROUND.above, b: AROUND.below },
  );
  const xaxis = { ...axis(tokens, scale.range, scale.ticks, null), zeroline: false };
  if (content.kind === 'energy') {
    const tops = [content.values, ...content.stack.slice(-1).map(({ sum }) => sum)];
    const largest = Math.max(...tops.map((values) => values.reduce((most, value) => Math.max(most, value), 0)));
    const { end, ticks } = risingAxis(unit.onAxis(largest), 3);
    const yaxis = axis(tokens, [0, end], ticks, tickWords(unit, ticks));
    const { data, named } = layers(props, unit, height / end);
    return { still: true, data, layout: { ...layout, xaxis, yaxis, annotations: [...named, inputWord(props, unit)] } };
  }
  const peak = unit.onAxis(content.peak.value);
  const limit = props.limit === null ? null : unit.onAxis(props.limit);
  const drawn = limit !== null && limit <= FAR * peak ? limit : null;
  const { end, ticks } = evenAxis(Math.max(peak, drawn ?? 0));
  const yaxis = axis(tokens, [-end, end], ticks, tickWords(unit, ticks));
  const line = trace(content.values, content.interval, scale, unit, {
    line: { color: tokens.ink, width: 1.2, simplify: false },
  });
  return {
    still: true,
    data: [line],
    layout: {
      ...layout,
      xaxis,
      yaxis,
      shapes: drawn === null ? [] : [limitLine(drawn, tokens), limitLine(-drawn, tokens)],
      annotations: drawn === null ? [] : [limitWord(drawn, tokens)],
    },
  };
}

/** One history, thinned to the pixels it is drawn into. */
function trace(
  values: Float64Array,
  interval: number,
  { range, width }: TimeScale,
  unit: AxisUnit,
  look: Partial<PlotData>,
): Partial<PlotData> {
  const from = Math.floor(range[0] / interval) - 1;
  const to = Math.ceil(range[1] / interval) + 2;
  const kept = thinned(values, from, to, Math.ceil(width));
  return {
    type: 'scatter',
    mode: 'lines',
    hoverinfo: 'skip',
    x: Float64Array.from(kept, (i) => i * interval),
    y: Float64Array.from(kept, (i) => unit.onAxis(values[i])),
    ...look,
  };
}

/** The stacked sums as layers, from the top one down, under the line of the input; names where a layer is thick enough. */
function layers(
  { content, scale, tokens }: TimePlotProps,
  unit: AxisUnit,
  pixels: number,
): { readonly data: Partial<PlotData>[]; readonly named: readonly Partial<Annotations>[] } {
  const data = [...content.stack].reverse().map(({ part, sum }) =>
    trace(sum, content.interval, scale, unit, {
      fill: 'tozeroy',
      ...layerFill(part, tokens),
      line: { width: 0, simplify: false },
    }),
  );
  data.push(
    trace(content.values, content.interval, scale, unit, { line: { color: tokens.ink, width: 1.4, simplify: false } }),
  );
  const time = scale.time(0.57 * scale.width);
  const at = Math.round(time / content.interval);
  // A run that ended before has no layers there: they are named beside the plot.
  if (at >= content.values.length) return { data, named: [] };
  const named = content.stack.flatMap(({ part, sum }, i): Partial<Annotations>[] => {
    const below = i === 0 ? 0 : content.stack[i - 1].sum[at];
    if (unit.onAxis(sum[at] - below) * pixels < NAMED_FROM) return [];
    const color = part === 'hysteretic' ? tokens.sheet : tokens.ink;
    return [word(ENERGY_NAMES[part], time, unit.onAxis((sum[at] + below) / 2), color, tokens)];
  });
  return { data, named };
}

/** Layers whose name stands in the plot; the others are named beside it. */
export function namedLayers(props: TimePlotProps): ReadonlySet<EnergyPart> {
  const unit = unitOfContent(props.content, props.system);
  const { end } = risingAxis(unit.onAxis(props.content.peak.value), 3);
  const { named } = layers(props, unit, props.height / end);
  return new Set(
    props.content.stack
      .map(({ part }) => part)
      .filter((part) => named.some(({ text }) => text?.includes(ENERGY_NAMES[part]))),
  );
}

function word(text: string, x: number, y: number, color: string, tokens: Tokens): Partial<Annotations> {
  return { x, y, text, showarrow: false, font: { family: tokens.sans, size: 11, color, weight: 600 } };
}

/** The input is named where its line ends: before it at the end of the axis, behind it where the run ended early. */
function inputWord({ content, scale, tokens }: TimePlotProps, unit: AxisUnit): Partial<Annotations> {
  const end = endOf(content);
  const early = end < scale.time(scale.width - ROOM);
  const at = early ? end : scale.range[1];
  const value = valueAt(content.values, content.interval, at);
  return {
    ...word('input', at, unit.onAxis(value), tokens.ink, tokens),
    xanchor: early ? 'left' : 'right',
    xshift: early ? 4 : -4,
    yanchor: early ? 'middle' : 'bottom',
  };
}

function limitLine(at: number, tokens: Tokens): Partial<Shape> {
  return {
    type: 'line',
    xref: 'paper',
    x0: 0,
    x1: 1,
    y0: at,
    y1: at,
    line: { color: tokens.signal, width: 1, dash: LIMIT_DASHES },
  };
}

function limitWord(at: number, tokens: Tokens): Partial<Annotations> {
  return {
    xref: 'paper',
    x: 1,
    xanchor: 'right',
    y: at,
    yanchor: 'bottom',
    yshift: -2,
    text: 'limit',
    showarrow: false,
    font: { family: tokens.sans, size: 11, color: tokens.signal },
  };
}
