import { describe, expect, it } from 'vitest';
import type { Evidence } from '../../../src/core/dynamics/evidence.ts';
import type { StepChoice } from '../../../src/core/dynamics/run.ts';
import { demoProject } from '../../../src/document/demo.ts';
import { stepFacts } from '../../../src/ui/dialogs/stepFacts.ts';
import { prepared, shearFrame } from '../../support/frames.ts';

const { project: demo } = demoProject();
const project = (step: StepChoice) => ({
  ...demo,
  motions: demo.motions.slice(0, 3).map((motion, i) => ({ ...motion, interval: [0.01, 0.02, 0.01][i], used: i < 3 })),
  analysis: { ...demo.analysis, step },
});
const { modes } = prepared(shearFrame([2e5], [2e8]));

describe('stepFacts', () => {
  it('says the size by motion, and the share of the shortest period', () => {
    const facts = new Map(stepFacts(project({ parts: 2 }), modes, null));
    expect(facts.get('Steps taken')).toBe('0.005 s (A, C); 0.01 s (B)');
    expect(facts.get('Step over shortest period')).toMatch(/^0\.05\d: 0\.01 s in 0\.199 s, 20 steps a period$/);
    expect(new Map(stepFacts(project(0.005), modes, null)).get('Steps taken')).toBe('0.005 s');
  });

  it('says what halving came to and why, motions with the same reason together', () => {
    const one = (step: number, why: string) => ({ step, auto: { why, converged: true } }) as unknown as Evidence;
    const names = demo.motions.map(({ name }) => name);
    const evidence = { [names[0]]: one(0.005, 'fine'), [names[1]]: one(0.02, 'whole'), [names[2]]: one(0.005, 'fine') };
    const facts = new Map(stepFacts(project('auto'), modes, evidence));
    expect(facts.get('Steps taken')).toBe('0.005 s (A, C); 0.02 s (B)');
    expect(facts.get('Why, A, C')).toBe('fine');
    expect(facts.get('Why, B')).toBe('whole');
    expect(stepFacts(project('auto'), modes, null)).toEqual([]);
  });
});
