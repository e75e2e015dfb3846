import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseBlock, writeBlock } from '../../../src/ui/sheet/block.ts';
import { cellOf, cellPath } from '../../../src/ui/sheet/columns.ts';
import { coverOf, moved, single } from '../../../src/ui/sheet/move.ts';

describe('blocks of a spreadsheet', () => {
  it('reads rows, tabs, quoted cells and the line end at the foot', () => {
    expect(parseBlock('3.60\t5350\r\n"a ""b"""\t"x\ty"\r\n')).toEqual([
      ['3.60', '5350'],
      ['a "b"', 'x\ty'],
    ]);
    expect(parseBlock('')).toEqual([]);
  });

  it('comes back as it was written', () => {
    const cell = fc.string({ unit: fc.constantFrom('a', '1', '"', '\t', ',', '.', '\n') }).map((text) => text.trim());
    const rows = fc
      .array(fc.tuple(cell, cell), { minLength: 1 })
      .filter((list) => list[list.length - 1]?.some((text) => text !== '') ?? false);
    fc.assert(
      fc.property(rows, (list) => {
        expect(parseBlock(writeBlock(list))).toEqual(list);
      }),
    );
  });
});

describe('walking the grid', () => {
  const ground = { storeys: 4, columns: ['name', 'height', 'mass'] };

  it('up is a storey higher, the edge is the end', () => {
    expect(moved(single(1, 'height'), 'up', false, ground)).toEqual(single(2, 'height'));
    expect(moved(single(3, 'height'), 'up', false, ground)).toEqual(single(3, 'height'));
    expect(moved(single(1, 'mass'), 'right', false, ground)).toEqual(single(1, 'mass'));
    expect(moved(single(1, 'mass'), 'roof', false, ground)).toEqual(single(3, 'name'));
  });

  it('extending keeps the far corner', () => {
    const block = moved(moved(single(1, 'height'), 'up', true, ground), 'right', true, ground);
    expect(coverOf(block, ground.columns)).toEqual({ low: 1, high: 2, columns: ['height', 'mass'] });
  });

  it('a cell is a path of the project file and back', () => {
    expect(cellOf(cellPath(2, 'stiffness'))).toEqual({ storey: 2, column: 'stiffness' });
    expect(cellOf('limits.drift')).toBeNull();
  });
});
