import { describe, expect, test } from 'vitest';
import type { Fault } from '../../src/core/fault.ts';
import { fromDisplay, type System } from '../../src/core/units/quantities.ts';
import { cellFaults } from '../../src/document/cells.ts';
import { demoProject } from '../../src/document/demo.ts';
import { setDamper, setLaw, setRole } from '../../src/document/edits.ts';
import { faultSentence, faultWords, placeWords } from '../../src/document/faultWords.ts';
import { type Field, fieldOf, writeAt } from '../../src/document/fields.ts';
import type { Project } from '../../src/document/project.ts';

const demo = (): Project => setDamper(setLaw(demoProject().project, [0], 'bilinear'), [0]);

/** The one fault of a cell whose value is typed in the units shown. */
function faultAt(path: string, typed: number, system: System): Fault {
  const quantity = fieldOf(path).quantity as Exclude<Field['quantity'], 'text'>;
  const faults = cellFaults(writeAt(demo(), path, fromDisplay(typed, quantity, system)));
  expect(faults.map(({ where }) => where)).toEqual([path]);
  return faults[0];
}

describe('[DOC-4] a fault speaks in the units of its cell', () => {
  test.each<[string, number, System, string, string]>([
    ['frame.storeys[0].law.hardening', 100, 'si', 'is 100 %, must be below 100 %', 'Type a number below 100 %'],
    ['frame.storeys[0].law.strength', -5, 'si', 'is −5 kN, must be above 0', 'Type a number above 0'],
    ['frame.storeys[0].law.strength', -5, 'us', 'is −5 kip, must be above 0', 'Type a number above 0'],
    ['frame.storeys[0].mass', -2000, 'si', 'is −2\u202f000 kN, must be above 0', 'Type a number above 0'],
    ['limits.isolator', -4, 'si', 'is −4 mm, must be above 0', 'Type a number above 0'],
    ['limits.isolator', -4, 'us', 'is −4 in, must be above 0', 'Type a number above 0'],
    ['frame.damping.ratios[0]', 200, 'si', 'is 200 %, must be below 100 %', 'Type a number below 100 %'],
    ['frame.storeys[0].damper.exponent', 3, 'us', 'is 3, must be at most 2', 'Type a number of at most 2'],
    ['frame.storeys[0].height', 1e25, 'us', `is ${`1${'0'.repeat(25)}`} ft`, 'Check its figures and unit'],
  ])('%s: %d in %s', (path, typed, system, message, mend) => {
    const words = faultWords(faultAt(path, typed, system), system);
    expect(words.message.replace(/1e\+25/, `1${'0'.repeat(25)}`)).toContain(message);
    expect(words.mend).toBe(mend);
  });
  test('a value just past its bound is said in full', () => {
    const fault = faultAt('frame.storeys[0].law.hardening', 100.00000001, 'si');
    expect(faultWords(fault, 'si').message).toBe('is 100.00000001 %, must be below 100 %');
  });
  test('the fault itself keeps the units of the file', () => {
    expect(faultAt('frame.storeys[0].law.strength', -5, 'us').message).toMatch(/^is -22241\.1, must be above 0$/);
  });
});

describe('[DOC-4] the sentence of a fault names its place once and in words', () => {
  test('what goes on from the place, and what names it by itself', () => {
    const at = (where: string, message: string) =>
      faultSentence(demo(), { code: 'any', where, message, mend: '' }, 'si');
    expect(at('frame.storeys[1].stiffness', 'is not typed yet')).toBe('storey 2, stiffness is not typed yet');
    expect(at('frame.storeys[1].stiffness', 'storey 2 is unstable')).toBe('storey 2 is unstable');
    expect(at('analysis.step', 'a step of 0.3 s is no part')).toBe('a step of 0.3 s is no part');
    expect(at('frame.storeys[1].law.gamma', 'beta + gamma is 2, must be 1')).toBe(
      'storey 2, Bouc-Wen gamma: beta + gamma is 2, must be 1',
    );
    expect(at('analysis.method.beta', 'is −1, must be above 0')).toBe('Newmark beta is −1, must be above 0');
  });
  test('no path of the file is shown, wherever the fault stands', () => {
    const isolated = setRole(demo(), 2, 'isolator');
    for (const fault of cellFaults(isolated)) {
      expect(faultSentence(isolated, fault, 'si')).toMatch(/^storey 3: only the first storey/);
    }
    expect(cellFaults(isolated).length).toBe(1);
    const [first, ...rest] = demo().motions;
    const twice = { ...demo(), motions: [first, { ...rest[0], name: first.name }, ...rest.slice(1)] };
    expect(cellFaults(twice).map((fault) => faultSentence(twice, fault, 'si'))).toEqual([
      expect.stringMatching(/^Motion 2, name: ".*" is also the name of motion 1: names are unique in a project$/),
    ]);
    const places = [
      'frame.storeys[1]',
      'frame.storeys[1].law.kind',
      'frame.damping',
      'motions[0].file',
      'limits',
      'x.y',
    ];
    for (const where of places) expect(placeWords(demo(), where)).not.toMatch(/[[\]]|\w\.\w/);
  });
});
