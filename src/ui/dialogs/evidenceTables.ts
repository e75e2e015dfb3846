import type { Evidence } from '../../core/dynamics/evidence.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { type Column, decimalsOf, type Table } from '../../core/report/table.ts';
import type { Answers } from '../../state/results.ts';
import { letterOf } from '../controls/letters.ts';

/** The steps that the runs of an answer took, each with the motions that took it, finest first. */
export interface StepGroup {
  /** [s] */
  readonly step: number;
  readonly letters: readonly string[];
  readonly evidence: Evidence;
}

/** @param names  of all motions of the document, in its order: their letters come from it */
export function stepGroups({ evidence }: Pick<Answers, 'evidence'>, names: readonly string[]): readonly StepGroup[] {
  const groups = new Map<string, StepGroup>();
  for (const [i, name] of names.entries()) {
    const one = evidence[name];
    if (one === undefined) continue;
    const key = one.step.toPrecision(9);
    const known = groups.get(key);
    const letters = [...(known?.letters ?? []), letterOf(i)];
    groups.set(key, { step: one.step, letters, evidence: known?.evidence ?? one });
  }
  return [...groups.values()].sort((a, b) => a.step - b.step);
}

/** Step, step error, energy balance and cost of each run. */
export function motionEvidence({ runs, evidence }: Answers, names: readonly string[]): Table {
  const rows = runs.flatMap(({ motion, run }) => {
    const one = evidence[motion];
    return one === undefined ? [] : [{ motion, run, one }];
  });
  const column = (
    key: string,
    name: string,
    quantity: Column['quantity'],
    of: (one: Evidence) => number | string | null,
    decimals?: number,
  ): Column => ({
    key,
    name,
    quantity,
    values: rows.map(({ one }) => of(one)),
    ...(decimals === undefined ? {} : { decimals }),
  });
  return {
    id: 'evidence-by-motion',
    title: 'Evidence by motion',
    columns: [
      {
        key: 'motion',
        name: 'Motion',
        quantity: 'text',
        values: rows.map(({ motion }) => `${letterOf(Math.max(0, names.indexOf(motion)))}  ${motion}`),
      },
      column('step', 'Step', 'time', ({ step }) => step, decimalsOf(rows.map(({ one }) => one.step))),
      column('parts', 'Parts of the interval', 'count', ({ parts }) => parts),
      column('stepError', 'Step error of drifts', 'percent', ({ stepError }) => stepError, 2),
      column('shearError', 'Of shears', 'percent', ({ peakErrors }) => peakErrors?.shear ?? null, 2),
      column(
        'accelerationError',
        'Of accelerations',
        'percent',
        ({ peakErrors }) => peakErrors?.acceleration ?? null,
        2,
      ),
      column('imbalance', 'Energy imbalance', 'percent', ({ imbalance }) => imbalance, 3),
      column('solves', 'Solves a step', 'count', ({ solvesAStep }) => solvesAStep, 2),
      column('mostSolves', 'Most of one step', 'count', ({ mostSolves }) => mostSolves),
      column('halvings', 'Steps halved', 'count', ({ halvings }) => halvings),
      column('stepsInShortest', 'Steps in the shortest period', 'count', ({ stepsInShortest }) => stepsInShortest, 1),
      ...(rows.some(({ one }) => one.auto !== null)
        ? [column('why', 'Why this step', 'text', ({ auto }) => auto?.why ?? null)]
        : []),
    ],
  };
}

/** What scheme and step make of each mode. */
export function modeEvidence(modes: readonly Mode[], { modes: accuracy }: Evidence): Table {
  const column = (
    key: string,
    name: string,
    quantity: Column['quantity'],
    values: Column['values'],
    decimals: number,
  ) => ({
    key,
    name,
    quantity,
    values,
    decimals,
  });
  return {
    id: 'evidence-by-mode',
    title: 'What scheme and step make of each mode',
    columns: [
      { key: 'mode', name: 'Mode', quantity: 'count', values: modes.map((_, i) => i + 1) },
      column(
        'period',
        'Period',
        'time',
        modes.map(({ period }) => period),
        3,
      ),
      column(
        'mass',
        'Effective mass',
        'percent',
        modes.map(({ effectiveMassRatio }) => effectiveMassRatio),
        1,
      ),
      column(
        'stepsAPeriod',
        'Steps a period',
        'count',
        accuracy.map((one) => one.stepsAPeriod),
        1,
      ),
      column(
        'elongation',
        'Period longer by',
        'percent',
        accuracy.map((one) => one.periodElongation),
        2,
      ),
      column(
        'decay',
        'Amplitude lost a cycle',
        'percent',
        accuracy.map((one) => one.amplitudeDecay),
        2,
      ),
      column(
        'added',
        'Damping of the scheme',
        'percent',
        accuracy.map((one) => one.addedDamping),
        3,
      ),
    ],
  };
}
