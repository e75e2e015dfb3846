import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { march, startMarch } from '../../../src/core/dynamics/march.ts';
import { problemOf } from '../../../src/core/dynamics/problem.ts';
import { FIELD } from '../../../src/core/dynamics/record.ts';
import type { MethodChoice, Run, RunCase } from '../../../src/core/dynamics/run.ts';
import { workspace } from '../../../src/core/dynamics/workspace.ts';
import type { Damper, Damping, Frame, Law } from '../../../src/core/frame/frame.ts';
import { AVERAGE, anyFrame, LINEAR, noise, prepared, run, shearFrame } from '../../support/frames.ts';

const METHODS: readonly MethodChoice[] = [
  AVERAGE,
  LINEAR,
  { kind: 'generalized-alpha', spectralRadius: 0.6 },
  { kind: 'hht', alpha: -0.1 },
];
const BILINEAR: Law = { kind: 'bilinear', strength: 1.2e6, hardening: 0.03 };
const LAWS: readonly Law[] = [
  BILINEAR,
  { kind: 'peak-oriented', strength: 1.2e6, hardening: 0.03 },
  { kind: 'flag', strength: 1.2e6, hardening: 0.03, ratio: 0.4 },
  { kind: 'bouc-wen', strength: 1.2e6, hardening: 0.03, exponent: 2, beta: 0.7, gamma: 0.3 },
];
const RAYLEIGH: Damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] };

/** Four storeys that yield, each with the law given. */
function yielding(law: Law, { damping = RAYLEIGH, damper, pDelta = true }: Extra = {}): Frame {
  const frame = shearFrame([2e5, 2e5, 2e5, 1.5e5], [2e8, 1.8e8, 1.5e8, 1e8], damping, 3, pDelta);
  const storeys = frame.storeys.map((storey) => ({ ...storey, law, ...(damper ? { damper } : {}) }));
  return { ...frame, storeys };
}
interface Extra {
  readonly damping?: Damping;
  readonly damper?: Damper;
  readonly pDelta?: boolean;
}
const GROUND = noise(7, 800);
const shake = (frame: Frame, method: MethodChoice = AVERAGE, scale = 2, parts = 2): Run =>
  run(frame, GROUND, 0.02, { method, scale, step: { parts }, tail: 2, stopDrift: 1 });

function problemFor(frame: Frame, method: MethodChoice = AVERAGE) {
  const runCase: RunCase = {
    frame,
    analysis: { method, step: { parts: 2 }, tail: 2, stopDrift: 1 },
    motion: { interval: 0.02, acceleration: GROUND, scale: 2 },
  };
  return problemOf(prepared(frame), runCase);
}

/** Every number of a run but its histories, in one list. */
function numbersOf({ storeys, floors, energy }: Run): number[] {
  const lists = [...Object.values(storeys), ...Object.values(floors)].map((x) => Array.from(x));
  return [...lists.flat(), ...Object.values(energy)].filter((x) => !Number.isNaN(x));
}

function expectClose(found: readonly number[], wanted: readonly number[], relative: number): void {
  expect(found.length).toBe(wanted.length);
  const largest = Math.max(...wanted.map(Math.abs));
  for (const [i, x] of found.entries()) expect(Math.abs(x - wanted[i])).toBeLessThanOrEqual(relative * largest);
}

describe('[DYN-9] the march of yielding frames', () => {
  it('gives elastic frames the answer of the linear march, by every scheme and damping', () => {
    fc.assert(
      fc.property(anyFrame, fc.constantFrom(...METHODS), (frame, method) => {
        const problem = problemFor(frame, method);
        expect(problem.linear).toBe(true);
        const linear = march(problem, method, { histories: false });
        const other = march({ ...problem, linear: false }, method, { histories: false });
        expectClose(Array.from(other.storeys.peakDrift), Array.from(linear.storeys.peakDrift), 1e-10);
        expectClose(Array.from(other.storeys.peakShear), Array.from(linear.storeys.peakShear), 1e-10);
        expectClose(Array.from(other.storeys.residualDrift), Array.from(linear.storeys.residualDrift), 1e-9);
        expectClose(Array.from(other.floors.peakAcceleration), Array.from(linear.floors.peakAcceleration), 1e-9);
        const { imbalance: _, ...energies } = linear.energy;
        const { imbalance: __, ...others } = other.energy;
        expectClose(Object.values(others), Object.values(energies), 1e-9);
      }),
      { numRuns: 60 },
    );
  });

  it('gives a strength that is never reached the answer of the elastic frame, whatever the law', () => {
    const elastic = shake(yielding({ kind: 'elastic' }));
    for (const law of LAWS) {
      const strong = shake(yielding({ ...law, strength: 1e12 } as Law));
      expectClose(Array.from(strong.storeys.peakDrift), Array.from(elastic.storeys.peakDrift), 1e-4);
      if (law.kind !== 'bouc-wen')
        expectClose(Array.from(strong.storeys.peakDrift), Array.from(elastic.storeys.peakDrift), 1e-10);
    }
  });

  it('satisfies the equations of motion at every step: equilibrium gives the acceleration of the scheme', () => {
    for (const law of LAWS) {
      for (const damper of [undefined, { coefficient: 5e5, exponent: 0.4 }]) {
        for (const damping of [RAYLEIGH, { kind: 'modal', ratios: [0.05] } as const]) {
          const problem = problemFor(yielding(law, { damping, ...(damper ? { damper } : {}) }));
          const { records, advance } = workspace(problem);
          let [off, largest] = [0, 0];
          for (let j = 1; j <= problem.steps; j++) {
            advance(j - 1, j);
            for (let i = 0, p = 0; i < 4; i++, p += FIELD.STRIDE) {
              const [total, relative] = [records[p + FIELD.TOTAL], records[p + FIELD.A]];
              off = Math.max(off, Math.abs(total - relative - problem.ground[j]));
              largest = Math.max(largest, Math.abs(total));
            }
          }
          expect(off).toBeLessThan(1e-8 * largest);
        }
      }
    }
  });

  it('gives the same bits in slices as in one piece', () => {
    for (const law of LAWS) {
      const frame = yielding(law, { damper: { coefficient: 4e5, exponent: 0.5 } });
      const whole = march(problemFor(frame), AVERAGE, { histories: true });
      const sliced = startMarch(problemFor(frame), AVERAGE, { histories: true });
      for (let k = 1; !sliced.advance(k); k = (k * 7) % 31);
      expect(sliced.finish()).toEqual(whole);
    }
  });

  it('takes modal damping that equals stiffness-proportional damping to the same answer: full and banded agree', () => {
    for (const law of LAWS) {
      const banded = yielding(law, { damping: { kind: 'stiffness-proportional', mode: 1, ratio: 0.03 } });
      const { dampingRatios } = prepared(banded);
      const full = yielding(law, { damping: { kind: 'modal', ratios: Array.from(dampingRatios) } });
      for (const method of METHODS) expectClose(numbersOf(shake(full, method)), numbersOf(shake(banded, method)), 1e-8);
    }
  });

  it('takes a linear damper as a dashpot: the same as stiffness-proportional damping', () => {
    const a1 = 0.004;
    const frame = yielding(BILINEAR, { damping: { kind: 'none' }, pDelta: false });
    const { frequency } = prepared(frame).modes[0];
    const dashpots = {
      ...frame,
      damping: { kind: 'stiffness-proportional', mode: 1, ratio: 0.5 * a1 * frequency } as const,
    };
    const storeys = frame.storeys.map((s) => ({ ...s, damper: { coefficient: a1 * s.stiffness, exponent: 1 } }));
    const [dampers, damping] = [shake({ ...frame, storeys }), shake(dashpots)];
    expectClose(Array.from(dampers.storeys.peakDrift), Array.from(damping.storeys.peakDrift), 1e-9);
    expectClose([dampers.energy.dampers], [damping.energy.damping], 1e-9);
    expect(dampers.energy.damping).toBe(0);
  });

  it('damps by the tangent as by the initial stiffness while nothing yields, and by less after', () => {
    const damping = (stiffness: 'initial' | 'tangent'): Damping => ({ ...RAYLEIGH, stiffness }) as Damping;
    const tame = (stiffness: 'initial' | 'tangent') =>
      shake(yielding(BILINEAR, { damping: damping(stiffness) }), AVERAGE, 0.05);
    expect(tame('tangent').storeys.ductility.every((mu) => mu < 1)).toBe(true);
    expectClose(numbersOf(tame('tangent')), numbersOf(tame('initial')), 1e-12);
    const wild = (stiffness: 'initial' | 'tangent') => shake(yielding(BILINEAR, { damping: damping(stiffness) }));
    expect(wild('tangent').energy.damping).toBeLessThan(wild('initial').energy.damping);
    expect(wild('tangent').base.peakDampingForce).toBeLessThan(wild('initial').base.peakDampingForce);
  });

  it('holds with power-law dampers of every exponent, from a near-stick 0.15 to 2', () => {
    for (const exponent of [0.15, 0.3, 0.5, 1, 1.5, 2]) {
      for (const damping of [RAYLEIGH, { kind: 'modal', ratios: [0.02] } as const]) {
        const frame = yielding(BILINEAR, { damping, damper: { coefficient: 4e5, exponent } });
        const coarse = shake(frame, AVERAGE, 2, 2);
        const fine = shake(frame, AVERAGE, 2, 16);
        expect(coarse.ending).toBeNull();
        expect(fine.ending).toBeNull();
        expectClose(Array.from(coarse.storeys.peakDrift), Array.from(fine.storeys.peakDrift), 0.03);
        expect(coarse.energy.dampers).toBeGreaterThan(0);
      }
    }
  });

  it('holds with dampers that hardly flow where a record begins quietly', () => {
    const quiet = GROUND.map((a, i) => a * (i < 200 ? 1e-9 * (i % 7) : 1));
    for (const exponent of [0.15, 0.3]) {
      const frame = yielding(BILINEAR, { damper: { coefficient: 4e5, exponent } });
      const result = run(frame, quiet, 0.02, { scale: 2, tail: 2, stopDrift: 1 });
      expect(result.ending).toBeNull();
      // The ground grows a thousand million times within a step there.
      expect(result.marching.halvings).toBeLessThan(3);
    }
  });

  it('leaves an isolator out of Rayleigh damping: a stiff building on it moves as one undamped mass', () => {
    const frame = shearFrame([2e5, 2e5, 2e5], [4e6, 4e9, 4e9], {
      kind: 'rayleigh',
      modes: [2, 3],
      ratios: [0.05, 0.05],
    });
    const [first, ...rest] = frame.storeys;
    const isolated: Frame = { ...frame, storeys: [{ ...first, role: 'isolator' }, ...rest] };
    const one: Frame = shearFrame([6e5], [4e6]);
    const [found, wanted] = [shake(isolated), shake(one)];
    expect(found.storeys.peakDrift[0] / wanted.storeys.peakDrift[0]).toBeCloseTo(1, 2);
    expect(prepared(isolated).dampingRatios[0]).toBeLessThan(1e-4);
    expect(prepared(isolated).dampingRatios[1]).toBeGreaterThan(0.02);
  });
});

describe('[DYN-10] invariants of yielding runs', () => {
  const law = fc.constantFrom(...LAWS);
  const exponent = fc.constantFrom(0.3, 0.5, 1, 1.6);
  const damped = (kind: Law, a: number) => yielding(kind, { damper: { coefficient: 3e5, exponent: a } });

  it('a motion turned round turns the answer round: peaks are the same bits', () => {
    fc.assert(
      fc.property(law, exponent, (kind, a) => {
        const frame = damped(kind, a);
        const [one, other] = [shake(frame, AVERAGE, 2), shake(frame, AVERAGE, -2)];
        expect(other.storeys.peakDrift).toEqual(one.storeys.peakDrift);
        expect(other.storeys.residualDrift.map((x) => -x)).toEqual(one.storeys.residualDrift);
        expect(other.energy).toEqual(one.energy);
      }),
      { numRuns: 12 },
    );
  });

  it('strengths and motion times s: drifts times s, energies times s squared, damper coefficients times s^(1-a)', () => {
    fc.assert(
      fc.property(law, exponent, fc.double({ min: 0.2, max: 5, noNaN: true }), (kind, a, s) => {
        const frame = damped(kind, a);
        const storeys = frame.storeys.map((storey) => ({
          ...storey,
          law: { ...kind, strength: s * 1.2e6 } as Law,
          damper: { coefficient: 3e5 * s ** (1 - a), exponent: a },
        }));
        const [one, other] = [shake(frame, AVERAGE, 1.5), shake({ ...frame, storeys }, AVERAGE, 1.5 * s)];
        expectClose(
          Array.from(other.storeys.peakDrift),
          Array.from(one.storeys.peakDrift, (d) => s * d),
          1e-8,
        );
        expectClose(
          [other.energy.input, other.energy.hysteretic],
          [s * s * one.energy.input, s * s * one.energy.hysteretic],
          1e-8,
        );
      }),
      { numRuns: 12 },
    );
  });

  it('masses, stiffnesses, strengths, gravity and dampers times s: the same drifts, forces times s', () => {
    fc.assert(
      fc.property(law, exponent, fc.double({ min: 0.01, max: 100, noNaN: true }), (kind, a, s) => {
        const frame = damped(kind, a);
        const storeys = frame.storeys.map((storey) => ({
          ...storey,
          mass: s * storey.mass,
          stiffness: s * storey.stiffness,
          law: { ...kind, strength: s * 1.2e6 } as Law,
          damper: { coefficient: s * 3e5, exponent: a },
        }));
        const [one, other] = [shake(frame), shake({ ...frame, storeys })];
        expectClose(Array.from(other.storeys.peakDrift), Array.from(one.storeys.peakDrift), 1e-8);
        expectClose(
          Array.from(other.storeys.peakShear),
          Array.from(one.storeys.peakShear, (v) => s * v),
          1e-8,
        );
      }),
      { numRuns: 12 },
    );
  });

  it('energies: none of what is lost is negative, the storeys add up to the frame, and the balance closes', () => {
    for (const kind of LAWS) {
      for (const a of [0.3, 1, 1.6]) {
        const { energy, storeys } = shake(damped(kind, a));
        for (const lost of [
          energy.damping,
          energy.dampers,
          energy.hysteretic,
          ...storeys.dissipated,
          ...storeys.damperWork,
        ])
          expect(lost).toBeGreaterThanOrEqual(-1e-12 * energy.input);
        const sum = (x: Float64Array) => x.reduce((total, one) => total + one, 0);
        expectClose([sum(storeys.dissipated), sum(storeys.damperWork)], [energy.hysteretic, energy.dampers], 1e-12);
        const { input, kinetic, strain, damping, dampers, hysteretic, imbalance } = energy;
        expect(Math.abs(input - kinetic - strain - damping - dampers - hysteretic)).toBeLessThanOrEqual(
          1.01 * imbalance * input,
        );
        expect(imbalance).toBeLessThan(0.01);
      }
    }
  });

  it('ductility, first yield and the yielding history agree with one another', () => {
    for (const kind of LAWS) {
      const result = run(yielding(kind), GROUND, 0.02, { scale: 2, tail: 2, stopDrift: 1, histories: true });
      const { histories, storeys } = result;
      expect(histories?.nonlinear).not.toBeNull();
      if (!histories?.nonlinear) continue;
      for (let i = 0; i < 4; i++) {
        const row = histories.nonlinear.yielding.subarray(i * histories.count, (i + 1) * histories.count);
        const first = row.indexOf(1);
        const yielded = storeys.ductility[i] > 1;
        expect(Number.isNaN(storeys.firstYield[i])).toBe(!yielded);
        if (kind.kind !== 'bouc-wen') expect(first >= 0).toBe(yielded);
        if (yielded && kind.kind !== 'bouc-wen') expect(first * result.step).toBeCloseTo(storeys.firstYield[i], 9);
        expect(storeys.ductility[i]).toBeCloseTo(
          (storeys.peakDrift[i] * prepared(yielding(kind)).arrays.stiffness[i]) / 1.2e6,
          9,
        );
      }
    }
  });
});

describe('[DYN-11] a step that does not converge', () => {
  /** Steps of two periods, strengths a hundredth of what the motion asks for, no hardening: drifts of hundreds of yield drifts a step. */
  const soft: Law = { kind: 'bouc-wen', strength: 1e5, hardening: 0, exponent: 2, beta: 1, gamma: 0 };
  const hard = yielding(soft, { damping: { kind: 'none' }, pDelta: false });

  it('is halved, counted, and the run goes on to its end', () => {
    const result = run(hard, noise(3, 400), 0.2, { scale: 3, stopDrift: 1e9 });
    expect(result.ending).toBeNull();
    expect(result.marching.halvings).toBeGreaterThan(50);
    expect(result.marching.solves).toBeGreaterThan(5 * result.steps);
    expect(result.marching.mostSolves).toBeGreaterThan(25);
    expect(numbersOf(result).every(Number.isFinite)).toBe(true);
  });

  it('is a result with storey and time where no halving helps, and what came before stays', () => {
    // No motion of finite numbers was found that gets here: one that is no number in the middle stands for it.
    const broken = GROUND.map((a, i) => (i === 400 ? Number.NaN : a));
    const result = run(yielding(BILINEAR), broken, 0.02, { scale: 2, tail: 2, stopDrift: 1, histories: true });
    const whole = run(yielding(BILINEAR), GROUND, 0.02, { scale: 2, tail: 2, stopDrift: 1, histories: true });
    expect(result.ending).toEqual({ status: 'not-converged', storey: 0, time: 398 * 0.02 });
    const before = result.histories?.displacement.subarray(0, 300);
    expect(before).toEqual(whole.histories?.displacement.subarray(0, 300));
  });
});

describe('[DYN-13] a frame that P-Delta brings down', () => {
  it('an isolator that runs away is stopped where no force of its law can bring it back, and named', () => {
    const ground = Float64Array.from(
      { length: 300 },
      (_, i) => 3 * Math.sin(i * 0.044) * Math.exp(-(((i - 500) / 300) ** 2)),
    );
    const law: Law = { kind: 'bilinear', strength: 5.9e5, hardening: 0.1 };
    const frame: Frame = {
      storeys: [
        { name: 'isolator', height: 0.5, mass: 9e5, stiffness: 3e7, role: 'isolator', law },
        { name: 'storey', height: 3, mass: 3e5, stiffness: 3e11, law: { kind: 'elastic' } },
      ],
      damping: { kind: 'none' },
      pDelta: true,
    };
    const { ending, storeys } = run(frame, ground, 0.01, { stopDrift: 0.1 });
    expect(ending).toMatchObject({ status: 'collapsed', storey: 0 });
    // (P/h) x = (1 - r) Fy + r k x
    const critical = (0.9 * 5.9e5) / ((1.2e6 * 9.80665) / 0.5 - 3e6);
    expect(storeys.peakDrift[0]).toBeGreaterThan(critical);
    expect(storeys.peakDrift[0]).toBeLessThan(1.2 * critical);
    // Where hardening gives more than P-Delta takes, an isolator may go as far as it likes.
    const tall = { ...frame, storeys: frame.storeys.map((storey, i) => (i === 0 ? { ...storey, height: 6 } : storey)) };
    expect(run(tall, ground, 0.01, { stopDrift: 0.1 }).ending).toBeNull();
  });

  it('never takes a step with a matrix that is not positive definite: it is halved instead', () => {
    const law: Law = { kind: 'bilinear', strength: 2e5, hardening: 0 };
    const storey = { name: '', height: 3, mass: 1e3, gravity: 2e7, stiffness: 5e7, law };
    const ground = Float64Array.from({ length: 4 }, (_, i) => 10 * Math.sin(i));
    for (const damping of [
      { kind: 'modal', ratios: [0.05] },
      { kind: 'stiffness-proportional', mode: 1, ratio: 0.05 },
    ] as const) {
      const frame: Frame = { storeys: [storey], damping, pDelta: true };
      for (const parts of [1, 2, 4, 64]) {
        const result = run(frame, ground, 0.04, { step: { parts }, scale: 20 });
        expect(result.energy.imbalance).toBeLessThan(0.5);
        expect(result.storeys.peakDrift[0]).toBeLessThan(1);
      }
    }
  });
});

describe('[DYN-12] a step allocates nothing', () => {
  it('in any law, with dampers, with full damping: the heap stays as it is over 20 000 steps', () => {
    for (const law of [{ kind: 'elastic' } as const, ...LAWS]) {
      for (const damping of [RAYLEIGH, { kind: 'modal', ratios: [0.05] } as const]) {
        const problem = problemFor(yielding(law, { damping, damper: { coefficient: 3e5, exponent: 0.5 } }));
        const { records, sums, advance } = workspace(problem);
        const [fresh, zero] = [records.slice(), sums.slice()];
        const once = () => {
          records.set(fresh);
          sums.set(zero);
          advance(0, problem.steps);
        };
        for (let i = 0; i < 8; i++) once();
        const rounds = Math.ceil(20_000 / problem.steps);
        // Other work of the process may allocate meanwhile, and a collection may run: the least of some tries counts.
        let least = Number.POSITIVE_INFINITY;
        for (let tries = 0; tries < 4; tries++) {
          const before = process.memoryUsage().heapUsed;
          for (let i = 0; i < rounds; i++) once();
          const grown = process.memoryUsage().heapUsed - before;
          if (grown >= 0) least = Math.min(least, grown);
        }
        // One boxed number a step would be 320 kB.
        expect(least).toBeLessThan(150_000);
      }
    }
  });
});
