import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { digestOfBytes } from '../../../src/core/digest.ts';
import { readRecord } from '../../../src/core/motion/read.ts';
import { codesOf, readText, rows, warningsOf, wave } from './records.ts';

const values = wave(400);
const HEAD = 'interval 0.005 s   unit g   values 400\n';

describe('a value that is no number', () => {
  const spoilt = (text: string, row = 20, column = 2) => {
    const lines = rows(values).trimEnd().split('\n');
    const cells = lines[row].trim().split(/\s+/);
    cells[column] = text;
    lines[row] = cells.map((cell) => cell.padStart(10)).join('');
    return `${HEAD}${lines.join('\n')}\n`;
  };

  test('stops the reading, with line, value, sample and time, and the mends best first', () => {
    const reading = readText(spoilt('-0,0171'));
    expect(reading.motion).toBeNull();
    const [fault, ...more] = reading.faults;
    expect(more).toEqual([]);
    expect(fault).toMatchObject({
      id: 'line-22-value-3',
      where: 'line 22, value 3',
      line: 22,
      span: [23, 30],
      message: '-0,0171 has a comma',
      detail: 'The other values have a decimal point. Sample 163 of 400, at 0.81 s.',
    });
    expect(fault.choices.map(({ id }) => id)).toEqual(['as-decimal', 'typed', 'mean', 'leave-out']);
    expect(fault.choices[0].label).toBe('Read it as \u22120.0171');
  });

  test.each([
    ['as-decimal', undefined, -0.0171],
    ['typed', -0.25, -0.25],
    ['mean', undefined, Number(((values[161] + values[163]) / 2).toPrecision(12))],
  ])('the mend "%s" is applied and kept with the motion', (choice, value, taken) => {
    const mends = { 'line-22-value-3': { choice, ...(value === undefined ? {} : { value }) } };
    const { motion, faults, mends: made } = readText(spoilt('-0,0171'), { mends });
    expect(faults).toEqual([]);
    const expected = values.with(162, taken);
    expect(motion?.acceleration).toEqual(Float64Array.from(expected, (entry) => entry * 9.80665));
    expect(motion?.origin.mends).toEqual(made);
    expect(made).toMatchObject([{ line: 22, was: '-0,0171', is: String(taken) }]);
  });

  test('a mend that settles nothing leaves the fault', () => {
    for (const made of [
      { choice: 'leave-out' },
      { choice: 'typed' },
      { choice: 'typed', value: Number.NaN },
      { choice: '' },
    ])
      expect(codesOf(readText(spoilt('-0,0171'), { mends: { 'line-22-value-3': made } }))).toEqual(['not-a-number']);
    expect(codesOf(readText(spoilt('x'), { mends: { 'line-22-value-3': { choice: 'as-decimal' } } }))).toHaveLength(1);
  });

  test.each(['NaN', 'Inf', '-inf', '1e999', '****', '0.01.71', '0.O171', '--0.1', '0.017l'])('%s', (text) => {
    const { faults } = readText(spoilt(text));
    expect(faults).toMatchObject([{ code: 'not-a-number', where: 'line 22, value 3' }]);
    expect(faults[0].message).toBe(`${text} is no number`);
  });

  test('a number that no acceleration has', () => {
    expect(readText(spoilt('1e300')).faults).toMatchObject([{ message: '1e300 is larger than any acceleration' }]);
  });

  test('commas that part thousands', () => {
    const [fault] = readText(spoilt('-1,016.2')).faults;
    expect(fault.choices.map(({ id }) => id)).toEqual(['as-thousands', 'typed', 'mean', 'leave-out']);
    const mends = { [fault.id]: { choice: 'as-thousands' } };
    expect(readText(spoilt('-1,016.2'), { mends }).values[162]).toBe(-1016.2);
  });

  test('a file that is mostly none is no record', () => {
    const clock = values.map((value, i) => `00:00:0${(i * 0.005).toFixed(3)} ${value}`).join('\n');
    expect(codesOf(readText(clock, { unit: 'g', interval: 0.005 }))).toEqual(['mostly-bad']);
    const columns = { time: 0, acceleration: 1 };
    expect(readText(clock, { unit: 'g', interval: 0.005, columns }).values).toEqual(Float64Array.from(values));
  });

  test('in the first line, in the last, alone on its line', () => {
    expect(readText(spoilt('0,1', 0, 0)).faults).toMatchObject([{ where: 'line 2, value 1' }]);
    expect(readText(spoilt('0,1', 49, 7)).faults).toMatchObject([{ where: 'line 51, value 8' }]);
    const oneALine = values.map((value, i) => (i === 100 ? 'x' : String(value))).join('\n');
    expect(readText(`unit g, dt 0.01\n${oneALine}`).faults).toMatchObject([{ where: 'line 102, value 1' }]);
  });

  test('all are listed, up to fifty, and how many more there are', () => {
    const text = (bad: number) =>
      `unit g, dt 0.01\n${values.map((value, i) => (i < 2 * bad && i % 2 === 1 ? 'x' : String(value))).join('\n')}\n`;
    expect(readText(text(50)).faults).toHaveLength(50);
    const { faults } = readText(text(60));
    expect(faults).toHaveLength(51);
    expect(faults[50]).toMatchObject({ code: 'not-a-number', message: '10 more values are no numbers' });
    const mends = Object.fromEntries(faults.slice(0, 50).map(({ id }) => [id, { choice: 'mean' }]));
    expect(readText(text(60), { mends }).faults).toHaveLength(10);
    expect(codesOf(readText(`unit g, dt 0.01\n0.1\n0.2\n${'0.1 x x\n'.repeat(50)}`))).not.toEqual([]);
  });
});

describe('the count that the heading states', () => {
  test('more than there are: a choice', () => {
    const text = HEAD + rows(values.slice(0, 380));
    const [fault] = readText(text).faults;
    expect(fault).toMatchObject({ id: 'count', code: 'fewer-than-stated', line: 1 });
    expect(fault.message).toMatch(/400 .*380/);
    expect(fault.choices.map(({ id }) => id)).toEqual(['take', 'leave-out']);
    const { motion } = readText(text, { mends: { count: { choice: 'take' } } });
    expect(motion?.acceleration.length).toBe(380);
    expect(motion?.origin.mends).toMatchObject([{ was: '400 values stated', is: '380 values' }]);
  });

  test('one or a few less than there are: all are taken, in words; many less: a choice', () => {
    const few = readText(HEAD + rows(wave(401)));
    expect(few.motion?.acceleration.length).toBe(401);
    expect(few.warnings.find(({ code }) => code === 'more-than-stated')?.message).toMatch(/400 .*401/);
    const twice = HEAD + rows([...values, ...values]);
    expect(codesOf(readText(twice))).toEqual(['more-than-stated']);
    const taken = (choice: string) => readText(twice, { mends: { count: { choice } } }).motion?.acceleration.length;
    expect([taken('stated'), taken('take')]).toEqual([400, 800]);
  });
});

describe('answers', () => {
  const full = HEAD + rows(values);
  test('that contradict the file are faults, those that agree are not', () => {
    expect(readText(full, { unit: 'cm/s2', interval: 0.01 }).faults).toMatchObject([
      { code: 'contradicts-interval', where: 'interval' },
      { code: 'contradicts-unit', where: 'unit' },
    ]);
    expect(readText(full, { unit: 'g', interval: 0.005 }).motion).not.toBeNull();
  });

  test.each([0, -0.01, Number.NaN, Number.POSITIVE_INFINITY])('an interval of %s is refused', (interval) => {
    expect(codesOf(readText(rows(values), { unit: 'g', interval }))).toEqual(['not-positive']);
  });

  test.each(['0', '-0.01'])('an interval of %s in the file asks for one', (interval) => {
    const text = `NPTS= 400, DT= ${interval} SEC, units g\n${rows(values)}`;
    expect(readText(text).faults).toMatchObject([{ id: 'interval', code: 'not-positive', line: 1 }]);
    const typed = readText(text, { mends: { interval: { choice: 'typed', value: 0.01 } } });
    expect(typed.motion).toMatchObject({ interval: 0.01, origin: { mends: [{ line: 1, is: '0.01 s' }] } });
  });

  test('a unit that is none of ours is not read as one that is', () => {
    const text = `dt 0.01 s, units ft/s2\n${rows(values)}`;
    expect(codesOf(readText(text))).toEqual(['unknown-unit']);
    expect(codesOf(readText(text, { unit: 'm/s2' }))).toEqual(['unknown-unit']);
    const mends = { unit: { choice: 'answer' } };
    expect(readText(text, { mends }).asks).toEqual(['unit']);
    expect(readText(text, { mends, unit: 'm/s2' }).motion?.origin).toMatchObject({
      unit: 'm/s2',
      mends: [{ was: 'ft/s2' }],
    });
  });

  test('heading lines and the name', () => {
    const text = `1 2 3 4 5 6 7 8\n${rows(values)}`;
    expect(readText(text).values.length).toBe(408);
    expect(readText(text, { headingLines: 1 }).values.length).toBe(400);
    expect(readText(full, {}, 'gannet_point-315.v2').name).toBe('Gannet point 315');
    expect(readText(full, { name: ' Gannet ' }, 'x.txt').name).toBe('Gannet');
  });
});

describe('a file without a record', () => {
  test.each([
    ['empty', ''],
    ['no-figures', 'only words\nand more of them\n'],
    ['no-figures', '\n\n\n'],
    ['too-few', '0.1\n'],
  ])('%s', (code, text) => {
    const reading = readText(text, { unit: 'g', interval: 0.01 });
    expect(reading.motion).toBeNull();
    expect(codesOf(reading)).toEqual([code]);
    expect(reading.faults[0].choices.map(({ id }) => id)).toEqual(['leave-out']);
  });

  test('binary', () => {
    const bytes = Uint8Array.from({ length: 5000 }, (_, i) => (i * i) % 251);
    expect(codesOf(readRecord('a.bin', bytes, {}))).toEqual(['binary']);
  });
});

describe('what to look at', () => {
  test('a coarse interval, a last sample that is cut off, a velocity that goes on', () => {
    const constant = readText(`dt 0.02 s, units g\n${'0.1\n'.repeat(50)}`);
    expect(warningsOf(constant)).toEqual(expect.arrayContaining(['coarse-interval', 'cut-off', 'velocity-ends']));
    const calm = [...wave(400), ...Array.from({ length: 50 }, () => 0)];
    const mean = calm.reduce((sum, value) => sum + value, 0) / 400;
    const level = calm.map((value, i) => (i < 400 ? value - mean : value));
    const quiet = readText(`dt 0.005 s, units g\n${level.join('\n')}\n`);
    expect(warningsOf(quiet)).toEqual([]);
  });

  test('a peak that no ground has had', () => {
    const gals = readText(`dt 0.01 s, units g\n${values.map((value) => value * 117).join('\n')}`);
    expect(gals.warnings.find(({ code }) => code === 'implausible-peak')).toMatchObject({
      message: expect.stringMatching(/34\.\d g/),
      mend: expect.stringContaining('cm/s2'),
    });
  });

  test('a heading that speaks of velocity and not of acceleration', () => {
    expect(warningsOf(readText(`velocity, dt 0.01 s, units cm/s2\n${rows(values)}`))).toContain('other-quantity');
    const both = `acceleration, velocity and displacement\ndt 0.01 s, units g\n${rows(values)}`;
    expect(warningsOf(readText(both))).not.toContain('other-quantity');
  });

  test('a note after the last value, a factor in the heading', () => {
    const reading = readText(`dt 0.01 s, units g, scale factor 2.5\n${rows(values)}end of record\n`);
    expect(reading.motion?.acceleration.length).toBe(400);
    expect(warningsOf(reading)).toEqual(expect.arrayContaining(['trailing-text', 'factor']));
  });
});

test('the origin says how the record was read', () => {
  const text = `Event: Long Valley; Station: Mill; component 180\n${HEAD}${rows(values)}`;
  expect(readText(text, {}, 'mill-180.txt').motion).toMatchObject({
    name: 'Mill 180',
    interval: 0.005,
    origin: {
      file: 'mill-180.txt',
      digest: digestOfBytes(new TextEncoder().encode(text)),
      layout: 'count-and-interval',
      unit: 'g',
      unitFrom: 'file',
      interval: 0.005,
      intervalFrom: 'file',
      event: 'Long Valley',
      station: 'Mill',
      component: '180',
    },
  });
});

test('facts say where they were found, for underlining', () => {
  const { facts } = readText(`title\n${HEAD}${rows(values)}`);
  const found = facts
    .filter(({ span }) => span !== null)
    .map(({ what, line, span }) => [what, line, HEAD.slice(...(span ?? []))]);
  expect(found).toEqual([
    ['interval', 2, 'interval 0.005 s'],
    ['count', 2, 'values 400'],
    ['unit', 2, 'g'],
  ]);
});

test('reading twice gives the same, and leaves the bytes alone', () => {
  const bytes = new TextEncoder().encode(HEAD + rows(values));
  const before = bytes.slice();
  expect(readRecord('a', bytes, {})).toEqual(readRecord('a', bytes, {}));
  expect(bytes).toEqual(before);
});

const RECORD = '../shared/records/imperial-valley-1940-ns.txt';
describe.runIf(existsSync(RECORD))('the 1940 record', () => {
  // Published checks, C1: the heading says 1559 points, 1560 samples stand there; peak 0.3188 g at 2.14 s.
  test('holds 1560 samples, one more than it says', () => {
    const reading = readRecord('imperial-valley-1940-ns.txt', readFileSync(RECORD), {});
    expect(reading).toMatchObject({
      layout: 'count-and-interval',
      interval: 0.02,
      unit: 'g',
      statedCount: 1559,
      perLine: 8,
    });
    expect(reading).toMatchObject({ firstLine: 7, faults: [], asks: [] });
    const acceleration = reading.motion?.acceleration ?? new Float64Array();
    expect(acceleration.length).toBe(1560);
    const peak = acceleration.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    expect(peak / 9.80665).toBeCloseTo(0.3188, 4);
    expect(reading.warnings.find(({ code }) => code === 'more-than-stated')?.message).toMatch(/1559.*1560/);
    expect(warningsOf(reading)).toContain('coarse-interval');
  });
});
