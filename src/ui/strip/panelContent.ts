import type { Run } from '../../core/dynamics/run.ts';
import type { Quantity } from '../../core/units/quantities.ts';

/** What a time panel can show. */
export type TimePanelKind = 'drift' | 'displacement' | 'acceleration' | 'base-shear' | 'storey-shear' | 'energy';

export const TIME_PANELS: readonly { readonly kind: TimePanelKind; readonly name: string }[] = [
  { kind: 'drift', name: 'Drift ratio' },
  { kind: 'displacement', name: 'Floor displacement' },
  { kind: 'acceleration', name: 'Floor acceleration' },
  { kind: 'base-shear', name: 'Base shear' },
  { kind: 'storey-shear', name: 'Storey shear' },
  { kind: 'energy', name: 'Energy' },
];

/** One history of a run, in SI. */
export interface PanelContent {
  readonly kind: TimePanelKind;
  readonly name: string;
  /** Which storey or floor; null where there is nothing to choose. */
  readonly place: string | null;
  readonly quantity: Quantity;
  /** Entry j belongs to j x interval. */
  readonly values: Float64Array;
  /** [s] */
  readonly interval: number;
  /** Largest magnitude and when it came [s]. */
  readonly peak: { readonly value: number; readonly time: number };
  /** Energies stacked from below: each entry is the sum up to and with its part. Only for `energy`. */
  readonly stack: readonly { readonly part: EnergyPart; readonly sum: Float64Array }[];
  /**
   * How far the strain energy goes below zero, over the largest input [-]: with P-Delta it holds the potential that gravity
   * loses as a storey leans. What is stacked then stands above the input.
   */
  readonly strainBelowZero: number;
}

export const ENERGY_PARTS = ['hysteretic', 'damping', 'dampers', 'strain', 'kinetic'] as const;
export type EnergyPart = (typeof ENERGY_PARTS)[number];

/**
 * What a panel shows of a run with histories; null where it kept none or has no such storey.
 *
 * @param storey   from 0
 * @param heights  of the storeys [m]
 * @param isolated  the first storey is an isolator: its displacement is shown, and no ratio
 */
export function contentOf(
  kind: TimePanelKind,
  run: Run,
  storey: number,
  heights: readonly number[],
  isolated = false,
): PanelContent | null {
  const { histories } = run;
  if (histories === null || storey < 0 || storey >= heights.length) return null;
  if (histories.displacement.length !== heights.length * histories.count) return null;
  const { count } = histories;
  const interval = run.step * histories.every;
  const name = TIME_PANELS.find((panel) => panel.kind === kind)?.name ?? '';
  const row = (rows: Float64Array, at: number) => rows.subarray(at * count, (at + 1) * count);
  const of = (quantity: Quantity, place: string | null, values: Float64Array, peak: PanelContent['peak']) => ({
    kind,
    name,
    place,
    quantity,
    values,
    interval,
    peak,
    stack: [],
    strainBelowZero: 0,
  });
  const found = (values: Float64Array, value: number) => ({ value, time: interval * largestAt(values) });
  const here = `storey ${storey + 1}`;
  const floor = `floor ${storey + 1}`;
  switch (kind) {
    case 'drift': {
      if (isolated && storey === 0) {
        const values = row(histories.displacement, 0);
        const peak = { value: run.storeys.peakDrift[0], time: run.storeys.peakTime[0] };
        return { ...of('displacement', null, values, peak), name: 'Isolator displacement' };
      }
      const values = driftRatio(row(histories.displacement, storey), storey, histories.displacement, heights[storey]);
      const { peakDriftRatio, peakTime } = run.storeys;
      return of('percent', here, values, { value: peakDriftRatio[storey], time: peakTime[storey] });
    }
    case 'displacement': {
      const values = row(histories.displacement, storey);
      return of('displacement', floor, values, found(values, run.floors.peakDisplacement[storey]));
    }
    case 'acceleration': {
      const values = row(histories.acceleration, storey);
      return of('acceleration', `${floor}, total`, values, found(values, run.floors.peakAcceleration[storey]));
    }
    case 'base-shear': {
      const values = row(histories.shear, 0);
      return of('force', null, values, found(values, run.storeys.peakShear[0]));
    }
    case 'storey-shear': {
      const values = row(histories.shear, storey);
      return of('force', here, values, found(values, run.storeys.peakShear[storey]));
    }
    case 'energy': {
      const { energy } = histories;
      const peak = { value: energy.input[largestAt(energy.input)], time: interval * largestAt(energy.input) };
      return {
        ...of('energy', null, energy.input, peak),
        stack: stacked(energy),
        strainBelowZero: belowZero(energy.strain, Math.abs(peak.value)),
      };
    }
  }
}

/** A strain energy below zero by so much of the largest input is rounding. */
const ROUNDING = 1e-6;

function belowZero(strain: Float64Array, input: number): number {
  const lowest = strain.reduce((least, value) => Math.min(least, value), 0);
  return input > 0 && -lowest > ROUNDING * input ? -lowest / input : 0;
}

/** Storey drift over height [-], entry by entry. */
function driftRatio(own: Float64Array, storey: number, displacement: Float64Array, height: number): Float64Array {
  if (storey === 0) return own.map((value) => value / height);
  const below = displacement.subarray((storey - 1) * own.length, storey * own.length);
  return own.map((value, j) => (value - below[j]) / height);
}

/** Sums from below; a part that stays at nothing takes no layer. */
function stacked(energy: Readonly<Record<EnergyPart, Float64Array>>): PanelContent['stack'] {
  const layers: { part: EnergyPart; sum: Float64Array }[] = [];
  let below: Float64Array | null = null;
  for (const part of ENERGY_PARTS) {
    const own = energy[part];
    if (!own.some((value) => value !== 0)) continue;
    const under: Float64Array | null = below;
    const sum: Float64Array = under === null ? own : own.map((value, j) => value + under[j]);
    layers.push({ part, sum });
    below = sum;
  }
  return layers;
}

/** Where the magnitude is largest (the first of equals). */
export function largestAt(values: Float64Array): number {
  let at = 0;
  for (let j = 1; j < values.length; j++) if (Math.abs(values[j]) > Math.abs(values[at])) at = j;
  return at;
}

/** When a history ends [s]: a run that collapsed has nothing after it. */
export function endOf({ values, interval }: Pick<PanelContent, 'values' | 'interval'>): number {
  return Math.max(0, values.length - 1) * interval;
}

/** A history at a time, straight between its entries; its end value beyond them. */
export function valueAt(values: Float64Array, interval: number, time: number): number {
  if (values.length === 0) return Number.NaN;
  const place = Math.min(values.length - 1, Math.max(0, time / interval));
  const before = Math.floor(place);
  const from = values[before];
  const to = values[Math.min(values.length - 1, before + 1)];
  return from + (place - before) * (to - from);
}
