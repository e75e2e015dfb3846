import { describe, expect, it } from 'vitest';
import { addStorey, makeEqualStoreys } from '../../../src/document/edits.ts';
import { emptyProject } from '../../../src/document/empty.ts';
import type { Project } from '../../../src/document/project.ts';
import { inputColumns } from '../../../src/ui/sheet/columns.ts';
import { type PastePlan, planPaste } from '../../../src/ui/sheet/paste.ts';

const columns = inputColumns({ hardening: true, gravity: false, damper: false });
const four = makeEqualStoreys(emptyProject(), 4, 3);

function plan(project: Project, block: string[][], storey: number, column = 'height', commas = {}): PastePlan {
  return planPaste(project, block, storey, column, columns, 'si', commas);
}

function applied(project: Project, pasted: PastePlan): Project {
  if (pasted.kind !== 'ready') throw new Error(pasted.kind);
  return pasted.apply(project);
}

const heights = (project: Project) => project.frame.storeys.map(({ height }) => height);

describe('a pasted block', () => {
  it('goes down from the chosen storey, top row first', () => {
    const pasted = plan(four, [['5'], ['6']], 2);
    expect(pasted).toMatchObject({ kind: 'ready', low: 2, high: 3, growsTo: null });
    expect(heights(applied(four, pasted))).toEqual([3, 6, 5, 3]);
  });

  it('stands on the ground where it would not fit above it', () => {
    expect(heights(applied(four, plan(four, [['7'], ['8'], ['9']], 0)))).toEqual([9, 8, 7, 3]);
  });

  it('taller than the frame makes the frame taller, and says so', () => {
    const rows = Array.from({ length: 6 }, (_, index) => [String(9 - index)]);
    const pasted = plan(four, rows, 3);
    expect(pasted).toMatchObject({ growsTo: 6 });
    expect(heights(applied(four, pasted))).toEqual([4, 5, 6, 7, 8, 9]);
  });

  it('makes the storeys of an empty sheet, several columns at once', () => {
    const project = applied(
      emptyProject(),
      plan(
        emptyProject(),
        [
          ['3.6', '5 350', '205'],
          ['4.2', '7 250', '455'],
        ],
        0,
      ),
    );
    expect(heights(project)).toEqual([4.2, 3.6]);
    expect(project.frame.storeys[0]?.stiffness).toBe(4.55e8);
  });

  it('one bad cell refuses the whole block and names itself', () => {
    const pasted = plan(four, [['3'], ['three'], ['-1']], 3);
    expect(pasted.kind).toBe('refused');
    if (pasted.kind !== 'refused') return;
    expect(pasted.faults.map(({ place }) => place)).toContain('Row 2, height');
  });

  it('refuses what is zero or negative', () => {
    expect(plan(four, [['0']], 3)).toMatchObject({ kind: 'refused', faults: [{ place: 'Row 1, height' }] });
  });

  it('a column whose commas no cell decides is asked once', () => {
    const block = [['1,250'], ['1,300']];
    expect(plan(four, block, 3, 'stiffness')).toMatchObject({ kind: 'commas', column: 'stiffness' });
    const decided = plan(four, block, 3, 'stiffness', { stiffness: 'thousands' });
    expect(applied(four, decided).frame.storeys[3]?.stiffness).toBe(1.25e9);
  });

  it('wider than the columns, or taller than a frame can be, is refused', () => {
    expect(plan(four, [['1', '2']], 0, 'hardening').kind).toBe('refused');
    expect(
      plan(
        four,
        Array.from({ length: 61 }, () => ['3']),
        0,
      ).kind,
    ).toBe('refused');
    expect(plan(four, [['3']], 0, 'drift').kind).toBe('refused');
  });

  it('leaves everything else as it was', () => {
    const named = addStorey(four, 4);
    const project = applied(named, plan(named, [['5']], 4));
    expect(project.frame.storeys.slice(0, 4)).toEqual(named.frame.storeys.slice(0, 4));
  });

  describe('with laws', () => {
    const laws = (project: Project) => project.frame.storeys.map(({ law }) => law);

    it('takes names, strengths and hardening beside one another', () => {
      const block = [
        ['Bouc-Wen', '2 900', '3'],
        ['elastic', '', ''],
        ['peak oriented', '5 800', '0'],
        ['', 'none', 'none'],
      ];
      const project = applied(four, plan(four, block, 3, 'law'));
      expect(laws(project)).toEqual([
        { kind: 'elastic' },
        { kind: 'peak-oriented', strength: 5.8e6, hardening: 0 },
        { kind: 'elastic' },
        { kind: 'bouc-wen', strength: 2.9e6, hardening: 0.03, exponent: 2, beta: 0.5, gamma: 0.5 },
      ]);
    });

    it('a strength beside no law makes an elastic storey bilinear', () => {
      expect(laws(applied(four, plan(four, [['9030', '5']], 1, 'strength')))[1]).toEqual({
        kind: 'bilinear',
        strength: 9.03e6,
        hardening: 0.05,
      });
    });

    it('refuses a name that is no law, a strength beside elastic, a hardening beside nothing, a range passed', () => {
      const places = (block: string[][], column: string) => {
        const pasted = plan(four, block, 3, column);
        return pasted.kind === 'refused' ? pasted.faults.map(({ place }) => place) : pasted.kind;
      };
      expect(places([['plastic']], 'law')).toEqual(['Row 1, law']);
      expect(
        places(
          [
            ['flag', '100'],
            ['elastic', '100'],
          ],
          'law',
        ),
      ).toEqual(['Row 2, strength']);
      expect(places([['3']], 'hardening')).toEqual(['Row 1, hardening']);
      expect(places([['0', '3']], 'strength')).toEqual(['Row 1, strength']);
      expect(places([['100', '100']], 'strength')).toEqual(['Row 1, hardening']);
    });

    it('a damper is its force and its exponent; without the force there is none', () => {
      const wide = inputColumns({ hardening: true, gravity: true, damper: true });
      const damped = (block: string[][], column: string) => planPaste(four, block, 0, column, wide, 'si', {});
      expect(applied(four, damped([['500', '0.5']], 'coefficient')).frame.storeys[0]?.damper).toEqual({
        coefficient: 5e5,
        exponent: 0.5,
      });
      expect(damped([['0.5']], 'exponent')).toMatchObject({
        kind: 'refused',
        faults: [{ place: 'Row 1, damper exponent' }],
      });
      expect(damped([['500', '3']], 'coefficient').kind).toBe('refused');
    });

    it('a floor may carry no gravity load', () => {
      const wide = inputColumns({ hardening: true, gravity: true, damper: false });
      const pasted = planPaste(four, [['0']], 2, 'gravity', wide, 'si', {});
      expect(applied(four, pasted).frame.storeys[2]?.gravity).toBe(0);
    });
  });
});
