import type { PlotData } from 'plotly.js-basic-dist-min';
import type { Run } from '../../core/dynamics/run.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import type { System } from '../../core/units/quantities.ts';
import { ENERGY_FILLS, ENERGY_NAMES, hatchOf } from '../strip/energyLook.ts';
import { levelsOf } from './levels.ts';
import type { PlotSpec } from './plotly.ts';
import { axis, baseLayout, type Size } from './template.ts';
import { risingAxis, ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';
import type { ShownRun } from './useShownRun.ts';

/** Height of a bar over that of its storey. */
const BAR = 0.56;

export function hasEnergy({ storeys }: Run): boolean {
  return storeys.dissipated.some((work) => work > 0) || storeys.damperWork.some((work) => work > 0);
}

/** A bar a storey, as high up as the storey stands: hysteretic from zero, its damper beyond that. */
export function storeyEnergyPlot(
  { run, heights }: ShownRun,
  size: Size,
  tokens: Tokens,
  system: System,
): PlotSpec | null {
  const levels = levelsOf(heights);
  if (levels === null) return null;
  const { dissipated, damperWork } = run.storeys;
  const length = axisUnitOf('length', system, 0);
  const upward = levels.map(length.onAxis);
  const largest = heights.reduce((most, _, i) => Math.max(most, dissipated[i] + damperWork[i]), 0);
  const energy = axisUnitOf('energy', system, largest);
  const { end, ticks: along } = risingAxis(energy.onAxis(largest), Math.max(3, size.width / 56));
  const ticks = ticksBetween(0, upward[upward.length - 1], 6);
  const bars = (part: 'hysteretic' | 'dampers', values: Float64Array): Partial<PlotData> => {
    const pattern = hatchOf(part, tokens);
    return {
      type: 'bar',
      orientation: 'h',
      x: Array.from(values, energy.onAxis),
      y: heights.map((_, i) => (upward[i] + upward[i + 1]) / 2),
      width: heights.map((height) => BAR * length.onAxis(height)),
      marker: { color: tokens[ENERGY_FILLS[part]], line: { width: 0 }, ...(pattern === null ? {} : { pattern }) },
      text: Array.from(
        values,
        (value, i) => `storey ${i + 1}, ${ENERGY_NAMES[part]}: ${energy.print(value, energy.decimals)} ${energy.unit}`,
      ),
      textposition: 'none',
      hovertemplate: '%{text}<extra></extra>',
    };
  };
  return {
    data: [
      bars('hysteretic', dissipated),
      ...(damperWork.some((work) => work > 0) ? [bars('dampers', damperWork)] : []),
    ],
    layout: {
      ...baseLayout(tokens, size),
      barmode: 'stack',
      xaxis: axis(tokens, [0, end], along, tickWords(energy, along)),
      yaxis: axis(tokens, [0, 1.01 * upward[upward.length - 1]], ticks, tickWords(length, ticks)),
    },
  };
}
