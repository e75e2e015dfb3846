import { describe, expect, test } from 'vitest';
import { historiesTable } from '../../../src/core/report/histories.ts';
import type { Cell, Table } from '../../../src/core/report/table.ts';
import { tablesOf } from '../../../src/core/report/tables.ts';
import { exampleSource } from './example.ts';

const source = exampleSource();
const tables = tablesOf(source);
const { runs, envelope, prepared } = source;

function tableOf(id: string, among: readonly Table[] = tables): Table {
  const found = among.find((table) => table.id === id);
  if (found === undefined) throw new Error(`no table ${id}`);
  return found;
}

function cells(id: string, key: string, among?: readonly Table[]): readonly Cell[] {
  const found = tableOf(id, among).columns.find((column) => column.key === key);
  if (found === undefined) throw new Error(`no column ${key} in ${id}`);
  return found.values;
}

describe('[TAB-1] every table', () => {
  test.each(tables.map((table) => [table.id, table] as const))(
    '%s has equal columns and its own keys',
    (id, { columns }) => {
      expect(id).toMatch(/^[a-z-]+$/);
      expect(new Set(columns.map(({ values }) => values.length)).size).toBe(1);
      expect(new Set(columns.map(({ key }) => key)).size).toBe(columns.length);
      expect(new Set(columns.map(({ name }) => name)).size).toBe(columns.length);
      expect(columns[0].values.length).toBeGreaterThan(0);
      for (const { quantity, values } of columns) {
        for (const value of values) {
          if (value !== null) expect(typeof value).toBe(quantity === 'text' ? 'string' : 'number');
        }
      }
    },
  );

  test('has an id of its own', () => {
    expect(new Set(tables.map(({ id }) => id)).size).toBe(tables.length);
  });
});

test('[TAB-2] the storey table shows the roof first, drift as computed and as compared', () => {
  expect(cells('storey-response', 'storey')).toEqual([3, 2, 1]);
  expect(cells('storey-response', 'name')).toEqual(['Plant', 'Wards', 'Entrance']);
  expect(cells('storey-response', 'driftRatioMax')).toEqual([...(envelope.drift?.max ?? [])].reverse());
  expect(cells('storey-response', 'ofLimit')).toEqual([...(envelope.ratio ?? [])].reverse());
  const compared = cells('storey-response', 'comparedDriftRatio').map(Number);
  const computed = cells('storey-response', 'driftRatioMax').map(Number);
  compared.forEach((value, row) => {
    expect(value).toBeCloseTo(1.25 * computed[row], 14);
    expect(value / 0.02).toBeCloseTo(Number(cells('storey-response', 'ofLimit')[row]), 12);
  });
  expect(cells('storey-response', 'shearGoverning')).toEqual(
    [2, 1, 0].map((i) => envelope.motions[envelope.shear?.governing[i] ?? -1]),
  );
});

test('[TAB-2] the floor table stands on running levels', () => {
  expect(cells('floor-response', 'level').map((level) => Number(level).toFixed(9))).toEqual([
    '11.400000000',
    '7.800000000',
    '4.200000000',
  ]);
  expect(cells('floor-response', 'displacementMean')).toEqual([...(envelope.displacement?.mean ?? [])].reverse());
});

test('[TAB-2] the table by motion has a block of rows a motion', () => {
  expect(cells('storey-response-by-motion', 'motion')).toEqual(['A', 'A', 'A', 'B', 'B', 'B']);
  expect(cells('storey-response-by-motion', 'storey')).toEqual([3, 2, 1, 3, 2, 1]);
  expect(cells('storey-response-by-motion', 'peakShear')).toEqual(
    runs.flatMap(({ run }) => [...run.storeys.peakShear].reverse()),
  );
  expect(cells('floor-response-by-motion', 'peakAcceleration')).toEqual(
    runs.flatMap(({ run }) => [...run.floors.peakAcceleration].reverse()),
  );
});

test('[TAB-2] modes come with the damping that each really has, and their masses add up', () => {
  expect(cells('modal-properties', 'damping')).toEqual([...prepared.dampingRatios]);
  expect(cells('modal-properties', 'cumulativeMassRatio').at(-1)).toBeCloseTo(1, 12);
  expect(cells('mode-shapes', 'mode1')[0]).toBe(1);
});

test('[TAB-2] inputs name the gravity load in force, the motions left out and the scheme', () => {
  expect(cells('storeys', 'gravity')).toEqual([310_000 * 9.80665, 3.9e6, 412_000 * 9.80665]);
  expect(cells('motions', 'used')).toEqual(['yes', 'yes', 'no']);
  expect(cells('motions', 'reason')).toEqual([null, null, 'no site match']);
  expect(cells('motions', 'scaledPeak')[1]).toBe(cells('motions', 'peak')[1]);
  expect(cells('motions', 'scaledPeak')[2]).toBeNull();
  expect(cells('analysis', 'method')).toEqual(['average acceleration (Newmark)']);
  expect(cells('analysis', 'damping')).toEqual(['Rayleigh, 5 % in mode 1 and 4 % in mode 2']);
  expect(cells('analysis', 'limitSource')).toEqual(['clause 4.2 of the brief']);
});

test('[TAB-3] a suite with a run that ended early prints no statistic and no ratio', () => {
  const stopped = tablesOf(exampleSource({ strength: 100 }));
  for (const key of ['driftRatioMean', 'comparedDriftRatio', 'ofLimit', 'shearMax', 'driftRatioGoverning']) {
    expect(cells('storey-response', key, stopped)).toEqual([null, null, null]);
  }
  expect(cells('energy', 'ending', stopped)[0]).toMatch(/^storey \d passed the drift/);
  expect(cells('storey-response-by-motion', 'completed', stopped)).toEqual(['no', 'no', 'no', 'yes', 'yes', 'yes']);
});

test('[TAB-4] histories have a row a step and agree with the peaks', () => {
  const [{ motion, run }] = exampleSource({ histories: true }).runs;
  const table = historiesTable(motion, run);
  const column = (key: string) => cells('histories', key, [table]).map(Number);
  expect(column('time')).toHaveLength(run.steps + 1);
  expect(column('time').at(-1)).toBeCloseTo(run.steps * run.step, 12);
  expect(column('time')[3]).toBe(0.03);
  const largest = (values: number[]) => Math.max(...values.map(Math.abs));
  expect(largest(column('displacement3'))).toBe(run.floors.peakDisplacement[2]);
  expect(largest(column('shear1'))).toBeCloseTo(run.storeys.peakShear[0], 6);
  expect(largest(column('acceleration2'))).toBe(run.floors.peakAcceleration[1]);
  expect(column('input').at(-1)).toBe(run.energy.input);
  expect(() => historiesTable('A', runs[0].run)).toThrow(RangeError);
});
