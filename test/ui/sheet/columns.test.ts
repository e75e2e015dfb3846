import { describe, expect, it } from 'vitest';
import type { Fault } from '../../../src/core/fault.ts';
import { demoProject } from '../../../src/document/demo.ts';
import { setDamper, setLaw } from '../../../src/document/edits.ts';
import { fieldOf, readAt, writeAt } from '../../../src/document/fields.ts';
import { cellText, fullText, isNone } from '../../../src/ui/sheet/cellText.ts';
import { COLUMN_QUANTITIES, cellOf, cellPath, inputColumns, isTyped, takes } from '../../../src/ui/sheet/columns.ts';
import { lawNamed } from '../../../src/ui/sheet/lawWords.ts';
import { shownOf } from '../../../src/ui/sheet/shown.ts';

const demo = demoProject().project;
const all = inputColumns({ hardening: true, gravity: true, damper: true });
const row = (project: typeof demo, storey: number) => {
  const found = project.frame.storeys[storey];
  if (found === undefined) throw new Error(`no storey ${storey}`);
  return found;
};

describe('columns and fields', () => {
  it('every column that is typed is a field of the project file and back, with its quantity', () => {
    for (const column of all.filter(isTyped)) {
      expect(cellOf(cellPath(3, column))).toEqual({ storey: 3, column });
      expect(fieldOf(cellPath(3, column)).quantity).toBe(COLUMN_QUANTITIES[column] ?? 'text');
    }
  });

  it('a fault of a number that has no cell of its own stands at the law', () => {
    for (const key of ['law', 'law.beta', 'law.gamma', 'law.exponent', 'law.ratio', 'role']) {
      expect(cellOf(`frame.storeys[0].${key}`)).toEqual({ storey: 0, column: 'law' });
    }
    expect(cellOf('frame.storeys[0].law.strength')).toEqual({ storey: 0, column: 'strength' });
    expect(cellOf('frame.storeys[0].strength')).toBeNull();
    expect(cellOf('frame.storeys[0].damper')).toEqual({ storey: 0, column: 'coefficient' });
  });

  it('an elastic storey takes a strength and no hardening, one without a damper no exponent', () => {
    const elastic = row(setLaw(demo, [1], 'elastic'), 1);
    expect(all.filter((column) => takes(elastic, column))).toEqual([
      'name',
      'height',
      'mass',
      'stiffness',
      'strength',
      'gravity',
      'coefficient',
    ]);
    const damped = row(setDamper(setLaw(demo, [1], 'bilinear'), [1]), 1);
    expect(all.filter((column) => !takes(damped, column))).toEqual(['law']);
  });

  it('a strength typed into an elastic storey makes it bilinear, and its cell reads it', () => {
    const elastic = setLaw(demo, [1], 'elastic');
    expect(isNone(row(elastic, 1), 'strength')).toBe(true);
    const typed = writeAt(elastic, cellPath(1, 'strength'), 9.03e6);
    expect(row(typed, 1).law).toMatchObject({ kind: 'bilinear', strength: 9.03e6 });
    expect(cellText(row(typed, 1), 'strength', 'si')).toBe('9\u202f030');
    expect(readAt(typed, cellPath(1, 'hardening'))).not.toBeNull();
  });
});

describe('what stands in a cell', () => {
  const typed = writeAt(setLaw(demo, [0], 'bilinear'), cellPath(0, 'strength'), 9_400_123);

  it('hardening is a figure or two', () => {
    expect(fullText(row(writeAt(typed, cellPath(0, 'hardening'), 0.03), 0), 'hardening', 'si')).toBe('3');
    expect(fullText(row(writeAt(typed, cellPath(0, 'hardening'), 0.025), 0), 'hardening', 'si')).toBe('2.5');
  });

  it('is rounded to the room there is, never cut off', () => {
    const strength = (signs: number) => cellText(row(typed, 0), 'strength', 'si', signs);
    expect(strength(9)).toBe('9\u202f400.123');
    expect(strength(8)).toBe('9\u202f400.12');
    expect(strength(7)).toBe('9\u202f400.1');
    expect(strength(5)).toBe('9\u202f400');
    expect(strength(4)).toBe('9e3');
    const gravity = (signs: number) =>
      cellText(row(writeAt(demo, cellPath(0, 'gravity'), 3e9), 0), 'gravity', 'si', signs);
    expect([gravity(9), gravity(8), gravity(5)]).toEqual(['3\u202f000\u202f000', '3.00e6', '3.0e6']);
    expect(fullText(row(typed, 0), 'strength', 'si')).toBe('9\u202f400.123');
  });
});

describe('a law by its name', () => {
  it('is read however it is written', () => {
    expect(['Elastic', 'BILINEAR', 'peak oriented', 'Bouc–Wen', 'flag'].map(lawNamed)).toEqual([
      'elastic',
      'bilinear',
      'peak-oriented',
      'bouc-wen',
      'flag',
    ]);
    expect(lawNamed('plastic')).toBeNull();
  });
});

describe('which columns are shown', () => {
  const yielding = setLaw(demo, [0], 'bilinear');
  const elastic = setLaw(demo, [...demo.frame.storeys.keys()], 'elastic');

  it('what fits and is typed; what is folded away is counted', () => {
    expect(shownOf(yielding, [], {}, false, true)).toMatchObject({
      hardening: true,
      answers: true,
      damper: false,
      hidden: 0,
    });
    expect(shownOf(yielding, [], {}, true, false)).toMatchObject({ hardening: false, answers: false, hidden: 2 });
    expect(shownOf(elastic, [], {}, true, false).hidden).toBe(0);
    expect(shownOf(setDamper(elastic, [2]), [], {}, true, false)).toMatchObject({ damper: true, hidden: 0 });
    expect(shownOf(setDamper(elastic, [2]), [], { damper: false }, false, true)).toMatchObject({
      damper: false,
      hidden: 1,
    });
  });

  it('ductility where a storey yields only', () => {
    expect(shownOf(elastic, [], { answers: true }, false, true).answers).toBe(false);
    expect(shownOf(yielding, [], { answers: true }, true, false).answers).toBe(true);
  });

  it('a fault is never folded away', () => {
    const fault = (where: string): Fault => ({ code: 'out-of-range', where, message: '', mend: '' });
    const choice = { hardening: false, damper: false };
    expect(shownOf(yielding, [fault(cellPath(0, 'hardening'))], choice, true, false).hardening).toBe(true);
    expect(shownOf(yielding, [fault(cellPath(0, 'exponent'))], choice, true, false).damper).toBe(true);
  });
});
