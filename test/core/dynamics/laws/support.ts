import fc from 'fast-check';
import { commitOf, LAWS, numberOf, setLaw, trialOf } from '../../../../src/core/dynamics/laws/laws.ts';
import { FIELD } from '../../../../src/core/dynamics/record.ts';
import type { Law } from '../../../../src/core/frame/frame.ts';

const { STRIDE, DRIFT, FORCE, WORK, TRIAL_DRIFT, TRIAL_FORCE, TANGENT, LAW_A } = FIELD;

/** A storey on a real record, the second of three; what a law writes beside its own record shows in the others. */
export class Walker {
  readonly w = new Float64Array(3 * STRIDE).fill(Number.NaN);
  readonly law: Law;
  readonly stiffness: number;

  constructor(law: Law, stiffness = 1) {
    this.law = law;
    this.stiffness = stiffness;
    setLaw(this.w, STRIDE, law, stiffness);
  }

  /** Takes the storey straight to a drift; the force there. */
  to(drift: number): number {
    this.try(drift);
    commitOf(this.w, STRIDE);
    return this.force;
  }

  /** Takes it there in equal parts. */
  inParts(drift: number, parts: number): number {
    const from = this.drift;
    for (let i = 1; i <= parts; i++) this.to(i === parts ? drift : from + ((drift - from) * i) / parts);
    return this.force;
  }

  /** Force and tangent that a trial says; the state stays. */
  try(drift: number): { force: number; tangent: number } {
    this.w[STRIDE + TRIAL_DRIFT] = drift;
    trialOf(this.w, STRIDE);
    return { force: this.w[STRIDE + TRIAL_FORCE], tangent: this.w[STRIDE + TANGENT] };
  }

  get drift(): number {
    return this.w[STRIDE + DRIFT];
  }
  get force(): number {
    return this.w[STRIDE + FORCE];
  }
  get work(): number {
    return this.w[STRIDE + WORK];
  }
  /** Bouc-Wen only. */
  get z(): number {
    return this.w[STRIDE + LAW_A];
  }
  get recoverable(): number {
    const out = new Float64Array(this.w);
    LAWS[numberOf(this.law)].recoverable(out, STRIDE, 0);
    return out[0];
  }

  /**
   * The energy stored in the state: the recoverable one, but where a hardening spring lies beside a perfectly plastic part (bilinear,
   * Bouc-Wen) that of the two, because unloading then leaves energy locked between them.
   */
  get stored(): number {
    const { law } = this;
    if (law.kind !== 'bilinear' && law.kind !== 'bouc-wen') return this.recoverable;
    const spring = law.hardening * this.stiffness;
    const rest = this.force - spring * this.drift;
    return 0.5 * spring * this.drift ** 2 + (0.5 * rest ** 2) / (this.stiffness - spring);
  }
}

export const yieldDriftOf = (law: Law, stiffness: number): number =>
  law.kind === 'elastic' ? 1 : law.strength / stiffness;

/** Fy + h k (|x| - xy). */
export function envelope(law: Law, stiffness: number, drift: number): number {
  if (law.kind === 'elastic') return stiffness * Math.abs(drift);
  return law.strength + law.hardening * (stiffness * Math.abs(drift) - law.strength);
}

/** Spread evenly: fc.double() draws every power of two alike, so that nearly all of its values are next to zero. */
export const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 2 ** 30 }).map((i) => min + ((max - min) * (i + 0.5)) / (2 ** 30 + 1));
const strength = between(1e4, 1e7);
const hardening = fc.oneof(fc.constantFrom(0, 0.02, 0.1), between(0.01, 0.9));

export const anyStiffness = between(1e6, 1e9);
export const anyBilinear = fc.record({ kind: fc.constant('bilinear' as const), strength, hardening });
export const anyPeakOriented = fc.record({ kind: fc.constant('peak-oriented' as const), strength, hardening });
export const anyFlag = fc
  .record({ strength, hardening, share: fc.oneof(fc.constantFrom(0, 0.5, 1), between(0.02, 1)) })
  .map(({ share, ...rest }) => ({ kind: 'flag' as const, ...rest, ratio: share * (1 - rest.hardening) }));
export const anyBoucWen = fc
  .record({
    strength,
    hardening,
    exponent: fc.oneof(fc.integer({ min: 1, max: 10 }), between(1, 10)),
    beta: fc.oneof(fc.constantFrom(0.5, 0.7, 1), between(0.5, 3)),
  })
  .map((law) => ({ kind: 'bouc-wen' as const, ...law, gamma: 1 - law.beta }));

const anyElastic = fc.constant({ kind: 'elastic' as const });
/** Their forces run in straight pieces. */
export const anyPiecewise: fc.Arbitrary<Law> = fc.oneof(anyElastic, anyBilinear, anyPeakOriented, anyFlag);
export const anyLaw: fc.Arbitrary<Law> = fc.oneof(anyPiecewise, anyBoucWen);

/** Drifts in yield drifts: far and near ones, so that small loops lie within large ones. */
export const anyPath = fc.array(fc.oneof(between(-9, 9), between(-1.6, 1.6)), { minLength: 2, maxLength: 25 });

/** Runs a property and insists that its cases were really run. */
export function holds<T>(arbitrary: fc.Arbitrary<T>, property: (value: T) => void, numRuns = 200): void {
  let cases = 0;
  fc.assert(
    fc.property(arbitrary, (value) => {
      cases++;
      property(value);
    }),
    { numRuns },
  );
  if (cases < numRuns) throw new Error(`${cases} cases run, ${numRuns} expected`);
}
