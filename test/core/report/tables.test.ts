import { describe, expect, test } from 'vitest';
import { historiesTable } from '../../../src/core/report/histories.ts';
import type { Cell, Table } from '../../../src/core/report/table.ts';
import { tablesOf } from '../../../src/core/report/tables.ts';
import { exampleSource, isolatedSource } from './example.ts';

const source = exampleSource();
const tables = tablesOf(source);
const yielding = isolatedSource({ limit: 0.25 });
const yieldingTables = tablesOf(yielding);
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
  test.each([...tables, ...yieldingTables].map((table) => [table.id, table] as const))(
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
  expect(cells('energy', 'ending', stopped)[0]).toMatch(/^storey \d lost its stability/);
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

describe('[TAB-5] storeys that yield, dampers and an isolator', () => {
  const here = (id: string, key: string) => cells(id, key, yieldingTables);
  const keysOf = (id: string, among: readonly Table[]) => tableOf(id, among).columns.map(({ key }) => key);

  test('inputs show the law, its numbers, its yield drift and the damper; a linear frame has no such columns', () => {
    expect(here('storeys', 'role')).toEqual(['storey', 'storey', 'isolator']);
    expect(here('storeys', 'law')).toEqual(['elastic', 'bilinear', 'bilinear']);
    expect(here('storeys', 'strength')).toEqual([null, 8e5, 8e5]);
    expect(here('storeys', 'hardening')).toEqual([null, 0.03, 0.3]);
    expect(here('storeys', 'yieldDrift')).toEqual([null, 8e5 / 1.85e8, 8e5 / 4e7]);
    expect(here('storeys', 'damperCoefficient')).toEqual([null, null, 4e5]);
    expect(here('storeys', 'damperExponent')).toEqual([null, null, 1]);
    expect(keysOf('storeys', yieldingTables)).not.toContain('beta');
    expect(keysOf('storeys', tables)).toEqual(['storey', 'name', 'height', 'mass', 'stiffness', 'law', 'gravity']);
    expect(here('analysis', 'damping')).toEqual(['Rayleigh on the tangent stiffness, 5 % in mode 1 and 5 % in mode 2']);
    expect(here('analysis', 'isolatorLimit')).toEqual([0.25]);
  });

  test('ductility is that of the runs, and none stands on the row of an elastic storey', () => {
    const { ductility } = yielding.envelope;
    expect(here('storey-response', 'ductilityMax')).toEqual([null, ductility?.max[1], ductility?.max[0]]);
    expect(ductility?.max[0]).toBeGreaterThan(1);
    const [{ run }] = yielding.runs;
    expect(here('storey-response-by-motion', 'ductility').slice(0, 3)).toEqual([
      null,
      run.storeys.ductility[1],
      run.storeys.ductility[0],
    ]);
    expect(here('storey-response-by-motion', 'firstYield')[2]).toBe(run.storeys.firstYield[0]);
    expect(keysOf('storey-response', tables)).not.toContain('ductilityMax');
    expect(keysOf('storey-response-by-motion', tables)).not.toContain('firstYield');
  });

  test('residual drift stands in length and as a share of the height', () => {
    const heights = [3.6, 4.2, 1.5];
    for (const key of ['Mean', 'Median', 'Max']) {
      const drift = here('storey-response', `residualDrift${key}`).map(Number);
      expect(here('storey-response', `residualDriftRatio${key}`)).toEqual(drift.map((d, row) => d / heights[row]));
    }
    expect(here('storey-response-by-motion', 'residualDriftRatio').slice(0, 3)).toEqual(
      here('storey-response-by-motion', 'residualDrift')
        .slice(0, 3)
        .map((drift, row) => Number(drift) / heights[row]),
    );
  });

  test('an isolator has no drift compared; its displacement stands against its own limit, without the factor', () => {
    for (const key of ['comparedDriftRatio', 'limit', 'factor']) expect(here('storey-response', key)[2]).toBeNull();
    expect(here('storey-response-by-motion', 'comparedDriftRatio').filter((value) => value === null)).toHaveLength(2);
    const displacement = yielding.envelope.displacement?.max[0];
    expect(here('storey-response', 'comparedDisplacement')).toEqual([null, null, displacement]);
    expect(here('storey-response', 'isolatorLimit')).toEqual([null, null, 0.25]);
    expect(here('storey-response', 'ofLimit')[2]).toBeCloseTo(Number(displacement) / 0.25, 14);
    const free = tablesOf(isolatedSource());
    expect(cells('storey-response', 'ofLimit', free)[2]).toBeNull();
    expect(cells('storey-response', 'isolatorLimit', free)).toEqual([null, null, null]);
  });

  test('energies of storeys add up to those of the run; the marching is counted', () => {
    yielding.runs.forEach(({ run }, r) => {
      const sum = (key: string) =>
        here('storey-response-by-motion', key)
          .slice(3 * r, 3 * r + 3)
          .reduce<number>((total, value) => total + Number(value), 0);
      expect(sum('dissipated') / run.energy.hysteretic).toBeCloseTo(1, 9);
      expect(sum('damperWork') / run.energy.dampers).toBeCloseTo(1, 9);
      expect(run.energy.dampers).toBeGreaterThan(0);
      expect(here('energy', 'solves')[r]).toBeGreaterThanOrEqual(run.steps);
      expect(here('energy', 'mostSolves')[r]).toBe(run.marching.mostSolves);
      expect(here('energy', 'halvings')[r]).toBe(run.marching.halvings);
      expect(here('energy', 'baseDampingForce')[r]).toBe(run.base.peakDampingForce);
    });
    expect(cells('energy', 'solves')).toEqual(runs.map(({ run }) => run.steps));
  });

  test('histories show damper forces and when a storey is past yield; those of a linear frame do not', () => {
    const [{ motion, run }] = yielding.runs;
    const table = historiesTable(motion, run);
    const column = (key: string) => cells('histories', key, [table]).map(Number);
    const yielded = column('yielding1');
    expect(new Set(yielded)).toEqual(new Set([0, 1]));
    expect(column('time')[yielded.indexOf(1)]).toBeGreaterThanOrEqual(run.storeys.firstYield[0] - run.step);
    expect(Math.max(...column('yielding3'))).toBe(0);
    expect(Math.max(...column('damperForce1'))).toBeGreaterThan(0);
    expect(Math.max(...column('damperForce2').map(Math.abs))).toBe(0);
    const linear = exampleSource({ histories: true }).runs[0];
    expect(historiesTable(linear.motion, linear.run).columns.some(({ key }) => key.startsWith('yielding'))).toBe(false);
  });
});
