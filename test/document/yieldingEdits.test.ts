import { describe, expect, it } from 'vitest';
import { cellFaults } from '../../src/document/cells.ts';
import { demoProject } from '../../src/document/demo.ts';
import { halvedStep, setLaw } from '../../src/document/edits.ts';
import { readAt, writeAt } from '../../src/document/fields.ts';
import { lawLike } from '../../src/document/lawLike.ts';
import type { Project } from '../../src/document/project.ts';

const demo = demoProject().project;
const law = (project: Project, storey: number) => project.frame.storeys[storey]?.law;

describe('[DOC-5] the law of one storey for others', () => {
  it('gives kind and shape, and leaves each its own strength and hardening', () => {
    const before = [
      ['law.exponent', 3],
      ['law.beta', 0.7],
      ['law.hardening', 0.1],
    ].reduce(
      (project, [key, value]) => writeAt(project, `frame.storeys[1].${key}`, Number(value)),
      setLaw(demo, [1], 'bouc-wen'),
    );
    const after = lawLike(before, 1, [0, 2]);
    const own = law(demo, 2);
    if (own === undefined || own.kind === 'elastic') throw new Error('the example has no yielding storey 3');
    expect(law(after, 2)).toEqual({
      kind: 'bouc-wen',
      strength: own.strength,
      hardening: own.hardening,
      exponent: 3,
      beta: 0.7,
      gamma: 0.3,
    });
    expect(law(after, 3)).toBe(law(before, 3));
  });

  it('gives an elastic storey the hardening too, and a strength of its own to start from', () => {
    const before = writeAt(setLaw(setLaw(demo, [2], 'elastic'), [1], 'flag'), 'frame.storeys[1].law.hardening', 0.05);
    const after = law(lawLike(before, 1, [2]), 2);
    expect(after).toMatchObject({ kind: 'flag', hardening: 0.05 });
    expect(after?.kind === 'flag' && typeof after.strength).toBe('number');
  });

  it('makes storeys elastic like an elastic one', () => {
    expect(law(lawLike(setLaw(demo, [1], 'elastic'), 1, [0, 2]), 2)).toEqual({ kind: 'elastic' });
  });
});

describe('[DOC-5] half the step', () => {
  const withStep = (step: Project['analysis']['step']) => ({ ...demo, analysis: { ...demo.analysis, step } });

  it('halves seconds and doubles parts', () => {
    expect(halvedStep(withStep(0.005)).analysis.step).toBe(0.0025);
    expect(halvedStep(withStep({ parts: 2 })).analysis.step).toEqual({ parts: 4 });
  });

  it('leaves alone what is no number', () => {
    for (const step of ['auto', null, 'a hundredth'] as const) {
      expect(halvedStep(withStep(step)).analysis.step).toBe(step);
    }
  });
});

describe('[DOC-5] beta and gamma of Bouc-Wen make 1', () => {
  const smooth = setLaw(demo, [0], 'bouc-wen');
  const read = (project: Project, key: string) => readAt(project, `frame.storeys[0].law.${key}`);

  it('either typed settles the other', () => {
    const beta = writeAt(smooth, 'frame.storeys[0].law.beta', 0.9);
    expect([read(beta, 'beta'), read(beta, 'gamma')]).toEqual([0.9, 0.1]);
    const gamma = writeAt(smooth, 'frame.storeys[0].law.gamma', 0.2);
    expect([read(gamma, 'beta'), read(gamma, 'gamma')]).toEqual([0.8, 0.2]);
  });

  it('a gamma that no beta goes with is at fault where it was typed', () => {
    const typed = writeAt(smooth, 'frame.storeys[0].law.gamma', 0.7);
    expect([read(typed, 'beta'), read(typed, 'gamma')]).toEqual([0.5, 0.7]);
    const faults = cellFaults(typed).map(({ where, message, mend }) => `${where} ${message}: ${mend}`);
    expect(faults).toEqual([
      'frame.storeys[0].law.gamma is 0.7, must be at most 0.5: beta is 1 - gamma, and 0.5 or more: Type a gamma of at most 0.5',
    ]);
    expect(cellFaults(writeAt(typed, 'frame.storeys[0].law.gamma', 0.3))).toEqual([]);
  });

  it('a text that cannot be read leaves the other alone', () => {
    const typed = writeAt(smooth, 'frame.storeys[0].law.beta', 'half');
    expect([read(typed, 'beta'), read(typed, 'gamma')]).toEqual(['half', 0.5]);
  });
});
