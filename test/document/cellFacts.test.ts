import { describe, expect, it } from 'vitest';
import { cellFacts } from '../../src/document/cellFacts.ts';
import { demoProject } from '../../src/document/demo.ts';
import { setDamper, setLaw } from '../../src/document/edits.ts';
import { writeAt } from '../../src/document/fields.ts';
import type { Project } from '../../src/document/project.ts';

const at = (storey: number, key: string) => `frame.storeys[${storey}].${key}`;
const given = (values: Readonly<Record<string, number | null>>): Project =>
  Object.entries(values).reduce(
    (project, [key, value]) => writeAt(project, at(1, key), value),
    setLaw(demoProject().project, [0, 1, 2], 'bilinear'),
  );

describe('what follows from a cell', () => {
  const project = given({
    height: 4.2,
    stiffness: 4.55e8,
    'law.strength': 9.03e6,
    'law.hardening': 0.03,
    'damper.coefficient': 4e6,
    'damper.exponent': 0.5,
  });

  it('says where a storey yields, in length and share of its height', () => {
    expect(cellFacts(project, at(1, 'law.strength'), 'si')).toContain(
      'yields at 19.8 mm, 0.47 %; 13.7 kN/mm after yield',
    );
    expect(cellFacts(project, at(1, 'law'), 'si')).toBe('yields at 19.8 mm, 0.47 %; 13.7 kN/mm after yield');
    expect(cellFacts(project, at(1, 'stiffness'), 'si')).toBe('0.99 of the storey above; yields at 19.8 mm, 0.47 %');
    expect(cellFacts(project, at(1, 'law.strength'), 'us')).toContain('yields at 0.78 in, 0.47 %');
  });

  it('says what is left after yield', () => {
    expect(cellFacts(project, at(1, 'law.hardening'), 'si')).toBe('13.7 kN/mm after yield');
    expect(cellFacts(project, at(1, 'law.hardening'), 'us')).toBe('77.9 kip/in after yield');
    expect(cellFacts(given({ 'law.hardening': 0 }), at(1, 'law.hardening'), 'si')).toBe('no stiffness after yield');
  });

  it('says the force of a damper at a velocity', () => {
    // 4000 kN x 0.1^0.5
    expect(cellFacts(project, at(1, 'damper.coefficient'), 'si')).toBe('1\u202f265 kN at 0.1 m/s');
    expect(cellFacts(project, at(1, 'damper.exponent'), 'si')).toBe('1\u202f265 kN at 0.1 m/s');
  });

  it('says nothing of what is not there or cannot be', () => {
    const elastic = setLaw(project, [1], 'elastic');
    expect(cellFacts(elastic, at(1, 'law'), 'si')).toBe('');
    expect(cellFacts(elastic, at(1, 'stiffness'), 'si')).toBe('0.99 of the storey above');
    expect(cellFacts(given({ stiffness: null }), at(1, 'law.strength'), 'si')).not.toContain('yields');
    expect(cellFacts(given({ 'law.hardening': 2 }), at(1, 'law.hardening'), 'si')).toBe('');
    expect(cellFacts(setDamper(project, [1], { coefficient: 0, exponent: 1 }), at(1, 'damper.coefficient'), 'si')).toBe(
      '',
    );
    expect(cellFacts(project, at(99, 'height'), 'si')).toBe('');
    expect(cellFacts(project, 'limits.drift', 'si')).toBe('');
  });

  it('an isolator yields at a displacement, its height is no measure for it', () => {
    const storeys = project.frame.storeys.map((row, i) => (i === 1 ? { ...row, role: 'isolator' as const } : row));
    const isolated = { ...project, frame: { ...project.frame, storeys } };
    expect(cellFacts(isolated, at(1, 'law'), 'si')).toMatch(/^yields at 19.8 mm; /);
  });
});
