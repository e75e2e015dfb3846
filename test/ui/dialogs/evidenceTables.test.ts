import { describe, expect, it } from 'vitest';
import { evidenceOf } from '../../../src/core/dynamics/evidence.ts';
import type { Answers } from '../../../src/state/answers.ts';
import { modeEvidence, motionEvidence, stepGroups } from '../../../src/ui/dialogs/evidenceTables.ts';
import { noise, prepared, run, shearFrame } from '../../support/frames.ts';

const frame = shearFrame([2e5, 2e5], [2e8, 1.6e8], { kind: 'modal', ratios: [0.05] });
const made = prepared(frame);
const NAMES = ['East', 'Left out', 'North', 'West'];
const PARTS: Readonly<Record<string, number>> = { East: 1, North: 2, West: 4 };
const runs = Object.entries(PARTS).map(([motion, parts]) => ({
  motion,
  run: run(frame, noise(9, 300), motion === 'West' ? 0.02 : 0.01, { step: { parts } }),
}));
const evidence = Object.fromEntries(
  runs.map(({ motion, run: one }) => [
    motion,
    evidenceOf(
      made,
      one,
      motion === 'West' ? 0.02 : 0.01,
      0.004,
      motion === 'East' ? { why: 'because', converged: true } : null,
    ),
  ]),
);
const answers = { runs, evidence } as unknown as Answers;

describe('stepGroups', () => {
  it('gathers motions of one step under their letters in the document, finest step first', () => {
    expect(stepGroups(answers, NAMES).map(({ step, letters }) => [step, letters])).toEqual([
      [0.005, ['C', 'D']],
      [0.01, ['A']],
    ]);
  });
});

describe('motionEvidence', () => {
  it('has a row a run, columns of equal length, and steps with the decimals they need', () => {
    const { columns } = motionEvidence(answers, NAMES);
    for (const { values } of columns) expect(values).toHaveLength(3);
    const of = (key: string) => columns.find((column) => column.key === key);
    expect(of('motion')?.values).toEqual(['A  East', 'C  North', 'D  West']);
    expect(of('parts')?.values).toEqual([1, 2, 4]);
    expect(of('step')?.decimals).toBe(3);
    expect(of('stepError')?.values).toEqual([0.004, 0.004, 0.004]);
    expect(of('solves')?.values).toEqual([1, 1, 1]);
    expect(of('why')?.values).toEqual(['because', null, null]);
  });

  it('says why only where halving chose a step', () => {
    const { North, West } = evidence;
    const table = motionEvidence({ ...answers, evidence: { North, West } }, NAMES);
    expect(table.columns.map(({ key }) => key)).not.toContain('why');
    expect(table.columns[0].values).toHaveLength(2);
  });
});

describe('modeEvidence', () => {
  it('has a row a mode, with what the scheme makes of it', () => {
    const table = modeEvidence(made.modes, evidence.East);
    const of = (key: string) => table.columns.find((column) => column.key === key)?.values ?? [];
    expect(of('mode')).toEqual([1, 2]);
    expect(Number(of('stepsAPeriod')[0])).toBeCloseTo(made.modes[0].period / 0.01, 9);
    // Average acceleration lengthens periods, the shorter one more.
    expect(Number(of('elongation')[0])).toBeGreaterThan(0);
    expect(Number(of('elongation')[1])).toBeGreaterThan(Number(of('elongation')[0]));
  });
});
