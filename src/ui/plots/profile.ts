import { residualRatios } from '../../core/checks/residualRatio.ts';
import type { Measure } from '../../core/checks/statistic.ts';
import type { Run } from '../../core/dynamics/run.ts';
import type { Quantity } from '../../core/units/quantities.ts';
import type { Answers } from '../../state/results.ts';

/** What a profile can show over the height. */
export type ProfileKind = 'profile' | 'ductility' | 'residual';

/** One answer of every storey: of each motion, of the suite, and its limit. */
export interface Profile {
  readonly id: string;
  /** "Peak drift ratio" */
  readonly name: string;
  /** What stands across, behind "level in m". */
  readonly across: string;
  readonly quantity: Extract<Quantity, 'percent' | 'ratio'>;
  readonly decimals: number;
  /** Ground up [SI]; NaN where a storey has none; null while the suite has no statistic. */
  readonly suite: ArrayLike<number> | null;
  readonly of: (run: Run) => ArrayLike<number>;
  /** [SI]; null where there is none. */
  readonly limit: number | null;
  /** Where an answer begins to mean something else; null where there is no such place. */
  readonly mark: { readonly at: number; readonly words: string } | null;
}

export const MEASURE_WORDS: Readonly<Record<Measure, string>> = { mean: 'mean', median: 'median', max: 'largest' };

export function profileOf(kind: ProfileKind, { envelope, case: from }: Answers): Profile {
  const { measure, factor, drift, ductility, isolator } = envelope;
  const { storeys } = from.frame;
  // An isolator moves by itself: its displacement is no storey drift and has a limit of its own.
  const storeysOnly = (values: ArrayLike<number>) =>
    isolator === null ? values : Array.from(values, (value, i) => (i === 0 ? Number.NaN : value));
  switch (kind) {
    case 'profile':
      return {
        id: 'drift-profile',
        name: 'Peak drift ratio',
        across: ' against peak drift ratio in %',
        quantity: 'percent',
        decimals: 2,
        suite: drift && storeysOnly(drift[measure].map((value) => factor * value)),
        of: (run) => storeysOnly(run.storeys.peakDriftRatio.map((value) => factor * value)),
        limit: envelope.limit,
        mark: null,
      };
    case 'ductility':
      return {
        id: 'ductility-profile',
        name: 'Ductility',
        across: '; peak drift over yield drift',
        quantity: 'ratio',
        decimals: 1,
        suite: ductility?.[measure] ?? null,
        of: (run) => run.storeys.ductility,
        limit: null,
        mark: { at: 1, words: 'yield' },
      };
    case 'residual': {
      const suite = residualRatios(envelope, from.frame);
      return {
        id: 'residual-profile',
        name: 'Residual drift ratio',
        across: ' against ratio in %',
        quantity: 'percent',
        decimals: 2,
        suite: suite && storeysOnly(suite),
        of: (run) => storeysOnly(run.storeys.residualDrift.map((value, i) => Math.abs(value) / storeys[i].height)),
        limit: null,
        mark: null,
      };
    }
  }
}
