import { type Problem, problemOf } from '../../src/core/dynamics/problem.ts';
import { FIELD } from '../../src/core/dynamics/record.ts';
import type { MethodChoice, RunCase } from '../../src/core/dynamics/run.ts';
import { linearWorkspace, workspace } from '../../src/core/dynamics/workspace.ts';
import type { Damping, Law } from '../../src/core/frame/frame.ts';
import { prepareFrame } from '../../src/core/frame/prepare.ts';

/** One line of the kernel bench: a frame, a damping, a scheme; 4,000 steps of seeded noise. */
export interface KernelCase {
  readonly name: string;
  readonly storeys: number;
  readonly damping: Damping;
  readonly method: MethodChoice;
  /** Absent: elastic. */
  readonly law?: Law;
}

const RAYLEIGH: Damping = { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] };
const AVERAGE: MethodChoice = { kind: 'newmark', beta: 0.25, gamma: 0.5 };

export const KERNEL_CASES: readonly KernelCase[] = [
  ...[10, 20, 50].map((storeys) => ({
    name: `average acceleration, Rayleigh, ${storeys} storeys`,
    storeys,
    damping: RAYLEIGH,
    method: AVERAGE,
  })),
  {
    name: 'linear acceleration, Rayleigh, 20 storeys',
    storeys: 20,
    damping: RAYLEIGH,
    method: { kind: 'newmark', beta: 1 / 6, gamma: 0.5 },
  },
  {
    name: 'central difference, Rayleigh, 20 storeys',
    storeys: 20,
    damping: RAYLEIGH,
    method: { kind: 'central-difference' },
  },
  { name: 'HHT -0.1, Rayleigh, 20 storeys', storeys: 20, damping: RAYLEIGH, method: { kind: 'hht', alpha: -0.1 } },
  {
    name: 'generalized-alpha 0.8, Rayleigh, 20 storeys',
    storeys: 20,
    damping: RAYLEIGH,
    method: { kind: 'generalized-alpha', spectralRadius: 0.8 },
  },
  {
    name: 'average acceleration, modal (full matrix), 20 storeys',
    storeys: 20,
    damping: { kind: 'modal', ratios: [0.05] },
    method: AVERAGE,
  },
];

/** Yielding frames: most storeys yield many times under this ground. */
export const YIELDING_CASES: readonly KernelCase[] = [
  {
    name: 'bilinear, Rayleigh, 20 storeys',
    storeys: 20,
    damping: RAYLEIGH,
    method: AVERAGE,
    law: { kind: 'bilinear', strength: 1.2e6, hardening: 0.03 },
  },
  {
    name: 'Bouc-Wen (n = 2), Rayleigh, 20 storeys',
    storeys: 20,
    damping: RAYLEIGH,
    method: AVERAGE,
    law: { kind: 'bouc-wen', strength: 1.2e6, hardening: 0.03, exponent: 2, beta: 0.5, gamma: 0.5 },
  },
];

export function kernelProblem({ storeys: n, damping, method, law = { kind: 'elastic' } }: KernelCase): {
  problem: Problem;
  runCase: RunCase;
} {
  const storeys = Array.from({ length: n }, (_, i) => ({
    name: '',
    height: 3.5,
    mass: 4e5,
    stiffness: 3e8 * (1 - (0.5 * i) / n),
    law: 'strength' in law ? { ...law, strength: law.strength * (1 - (0.5 * i) / n) } : law,
  }));
  const frame = { storeys, damping, pDelta: false };
  const prepared = prepareFrame(frame);
  if (!prepared.ok) throw new Error(prepared.faults[0].message);
  let state = 12345;
  const acceleration = Float64Array.from({ length: 4001 }, (_, i) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state / 2 ** 31 - 1) * 3 * Math.exp(-i / 1500);
  });
  const runCase: RunCase = {
    frame,
    analysis: { method, step: { parts: 1 }, tail: 0, stopDrift: 1 },
    motion: { interval: 0.01, acceleration, scale: 1 },
  };
  return { problem: problemOf(prepared.value, runCase), runCase };
}

/** The same case as the C twin reads it. */
export function twinInput(problem: Problem, repeats: number): string {
  const { prepared, method, step, steps, ground } = problem;
  const { records, matrix } = linearWorkspace(problem);
  const { n } = prepared.arrays;
  const column = (field: number) => Array.from({ length: n }, (_, i) => records[i * FIELD.STRIDE + field]).join(' ');
  const fields = [
    FIELD.MASS,
    FIELD.STIFFNESS,
    FIELD.LEVER,
    FIELD.FLOOR_DASHPOT,
    FIELD.STOREY_DASHPOT,
    FIELD.MULTIPLIER,
    FIELD.PER_PIVOT,
    FIELD.DAMPING_RATE,
  ];
  const { am, af, beta, gamma } = method;
  return [
    [matrix ? 1 : 0, n, steps, repeats, step, am, af, beta, gamma].join(' '),
    ...fields.map(column),
    matrix ? Array.from(matrix.inverse).join(' ') : '',
    Array.from(ground).join(' '),
  ].join('\n');
}

/** A yielding case as its C twin reads it: with our own iteration, or with full Newton. */
export function yieldingInput(which: KernelCase, newton: boolean, repeats: number): string {
  const { problem } = kernelProblem(which);
  const { records } = workspace(problem);
  const { prepared, method, step, steps, ground } = problem;
  const { n } = prepared.arrays;
  const column = (field: number) => Array.from({ length: n }, (_, i) => records[i * FIELD.STRIDE + field]).join(' ');
  const { MASS, K, HEIGHT, FLOOR_DASHPOT, STOREY_DASHPOT, STRENGTH, K_YIELD, FORCE_TOLERANCE } = FIELD;
  const { am, af, beta, gamma } = method;
  const law = which.law?.kind === 'bouc-wen' ? 1 : 0;
  const exponent = which.law?.kind === 'bouc-wen' ? which.law.exponent : 1;
  return [
    [law, newton ? 1 : 0, n, steps, repeats, step, am, af, beta, gamma, exponent, records[FORCE_TOLERANCE]].join(' '),
    ...[MASS, K, HEIGHT, FLOOR_DASHPOT, STOREY_DASHPOT, STRENGTH, K_YIELD].map(column),
    Array.from(ground).join(' '),
  ].join('\n');
}

/** Times the march where it runs (Node or the browser): microseconds a run, median and least, and one answer to compare. */
export function timeKernel(
  which: KernelCase,
  now: () => number,
): { median: number; least: number; peakDrift: number[] } {
  const { problem } = kernelProblem(which);
  const work = workspace(problem);
  const fresh = work.records.slice();
  const sums = work.sums;
  const { n } = problem.prepared.arrays;
  const once = () => {
    work.records.set(fresh);
    sums.fill(0);
    work.advance(0, problem.steps);
  };
  for (let i = 0; i < 40; i++) once();
  const batch = 3;
  const times: number[] = [];
  for (let i = 0; i < 41; i++) {
    const start = now();
    for (let k = 0; k < batch; k++) once();
    times.push(((now() - start) * 1000) / batch);
  }
  times.sort((a, b) => a - b);
  const peakDrift = Array.from({ length: n }, (_, i) => work.records[i * FIELD.STRIDE + FIELD.PEAK_DRIFT]);
  return { median: times[times.length >> 1], least: times[0], peakDrift };
}
