import { backbone } from '../../core/dynamics/laws/path.ts';
import type { Histories } from '../../core/dynamics/run.ts';
import type { Storey } from '../../core/frame/frame.ts';
import { yieldDrift } from '../../core/frame/storeyFacts.ts';
import type { LoopForce } from './choice.ts';
import type { ShownRun } from './useShownRun.ts';

/** Drift and one force of a storey over time, in SI; entry j belongs to j x interval. */
export interface Loop {
  /** Asked of a storey that has no damper, each of them is its law's. */
  readonly which: LoopForce;
  readonly drift: Float64Array;
  readonly force: Float64Array;
  readonly interval: number;
  readonly peakDrift: number;
  readonly peakForce: number;
  /** Drift at the limit, of an isolator at its own [m]; Infinity where there is none. */
  readonly limit: number;
  /** Where the storey first passed its yield drift; null where it never did, and for a damper alone. */
  readonly firstYield: { readonly drift: number; readonly force: number } | null;
  readonly storey: Storey;
}

/** Null where the run kept no histories or there is no storey. */
export function loopOf({ run, storey, heights, answers }: ShownRun, which: LoopForce): Loop | null {
  const { histories } = run;
  const own = answers.case.frame.storeys[storey];
  if (histories === null || own === undefined) return null;
  const shown = own.damper === undefined ? 'law' : which;
  const drift = storeyDrift(histories, storey);
  const force = forceOf(histories, storey, shown);
  const { envelope } = answers;
  const isolator = storey === 0 ? envelope.isolator : null;
  const interval = run.step * histories.every;
  return {
    which: shown,
    drift,
    force,
    interval,
    peakDrift: run.storeys.peakDrift[storey],
    peakForce: force.reduce((most, value) => Math.max(most, Math.abs(value)), 0),
    limit:
      isolator === null
        ? (envelope.limit / envelope.factor) * heights[storey]
        : (isolator.limit ?? Number.POSITIVE_INFINITY),
    firstYield:
      shown === 'damper' || own.law.kind === 'elastic'
        ? null
        : yieldPlace(
            drift,
            force,
            interval,
            run.storeys.firstYield[storey],
            yieldDrift(own.law.strength, own.stiffness),
          ),
    storey: own,
  };
}

/** Drift of a storey [m], from 0; a view where it stands on the ground. */
function storeyDrift({ displacement, count }: Histories, storey: number): Float64Array {
  const row = (at: number) => displacement.subarray(at * count, (at + 1) * count);
  if (storey === 0) return row(0);
  const below = row(storey - 1);
  return row(storey).map((value, j) => value - below[j]);
}

/** Storey shear is what law and damper carry together; the damper's part is kept beside it. */
export function forceOf({ shear, nonlinear, count }: Histories, storey: number, which: LoopForce): Float64Array {
  const both = shear.subarray(storey * count, (storey + 1) * count);
  if (nonlinear === null || which === 'shear') return both;
  const damper = nonlinear.damper.subarray(storey * count, (storey + 1) * count);
  return which === 'damper' ? damper : both.map((value, j) => value - damper[j]);
}

/** The loop where it first passes the yield drift: straight between the entries about it. */
function yieldPlace(
  drift: Float64Array,
  force: Float64Array,
  interval: number,
  time: number | undefined,
  yields: number,
): Loop['firstYield'] {
  if (time === undefined || !Number.isFinite(time)) return null;
  const after = Math.min(drift.length - 1, Math.max(1, Math.ceil(time / interval - 1e-6)));
  const side = Math.sign(drift[after]);
  const [from, to] = [drift[after - 1], drift[after]];
  const share = to === from ? 1 : Math.min(1, Math.max(0, (side * yields - from) / (to - from)));
  return { drift: from + share * (to - from), force: force[after - 1] + share * (force[after] - force[after - 1]) };
}

/** First loading both ways up to a drift [m], for an end that lies past yield; null for an elastic law. */
export function backboneTo(
  { law, stiffness }: Storey,
  end: number,
): { drift: Float64Array; force: Float64Array } | null {
  if (law.kind === 'elastic') return null;
  const { drift, force } = backbone(law, stiffness, Math.max(1, end / yieldDrift(law.strength, stiffness)));
  const mirrored = (values: Float64Array) =>
    Float64Array.from([...Array.from(values, (value) => -value).reverse(), ...values]);
  return { drift: mirrored(drift), force: mirrored(force) };
}
