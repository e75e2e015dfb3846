import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { codesOf, readText, warningsOf, wave } from '../records.ts';

const values = wave(120);
const columns = (separator: string, interval = 0.01, decimals = 2) =>
  values.map((value, i) => `${(i * interval).toFixed(decimals)}${separator}${value.toFixed(5)}\n`).join('');

describe('time and acceleration in columns', () => {
  test.each([
    ['commas', `Time (s),Acceleration (g)\n${columns(',')}`],
    ['commas and blanks', `# time (s), acceleration (g)\n${columns(', ')}`],
    ['semicolons', `time;acc\ns;g\n${columns(';')}`],
    ['tabs', `time [s]\tacc [g]\n${columns('\t')}`],
    ['blanks', `a title\n\n t (s)    a (g)\n${columns('   ')}`],
    ['decimal commas and semicolons', `Zeit (s);a (g)\n${columns(';').replaceAll('.', ',')}`],
    ['decimal commas and blanks', `Zeit (s)  a (g)\n${columns('  ').replaceAll('.', ',')}`],
    [
      'quoted decimal commas',
      `"t";"a (g)"\n${columns(',')
        .replaceAll(/(\d+)\.(\d+)/g, '$1,$2')
        .replaceAll(/(-?\d+,\d+)/g, '"$1"')}`,
    ],
    ['trailing separators', `Time (s),Acceleration (g)\n${columns(',').replaceAll('\n', ',\n')}`],
  ])('%s', (_, text) => {
    const reading = readText(text);
    expect(reading).toMatchObject({
      layout: 'time-and-acceleration',
      interval: 0.01,
      unit: 'g',
      perLine: 2,
      faults: [],
      asks: [],
    });
    expect(reading.values).toEqual(Float64Array.from(values));
  });

  test('further columns: the one named acceleration, else the first and a word about the others', () => {
    const rows = values.map(
      (value, i) => `${i + 1} ${(i * 0.01).toFixed(2)} ${(value / 7).toFixed(6)} ${value} ${-value}\n`,
    );
    const named = readText(`no time(s) vel(cm/s) acc(cm/s2) disp(cm)\n${rows.join('')}`);
    expect(named).toMatchObject({ interval: 0.01, unit: 'cm/s2', faults: [] });
    expect(named.values).toEqual(Float64Array.from(values));
    expect(warningsOf(named)).not.toContain('several-columns');
    const bare = readText(rows.join(''), { unit: 'g' });
    expect(bare.interval).toBe(0.01);
    expect(warningsOf(bare)).toContain('several-columns');
    const chosen = readText(rows.join(''), { unit: 'g', columns: { time: 1, acceleration: 4 } });
    expect(chosen.values).toEqual(Float64Array.from(values, (value) => -value));
    expect(warningsOf(chosen)).not.toContain('several-columns');
  });

  test('a column of marks is no acceleration, a first line of count and interval is no row', () => {
    const marked = readText(columns(' ').replaceAll('\n', ' A\n'), { unit: 'g' });
    expect(marked).toMatchObject({ faults: [], columns: { time: 0, acceleration: 1 } });
    expect(warningsOf(marked)).not.toContain('several-columns');
    const headed = readText(`120 0.01\n${columns(' ')}`, { unit: 'g' });
    expect(headed).toMatchObject({ interval: 0.01, firstLine: 2, faults: [] });
    expect(headed.values).toEqual(Float64Array.from(values));
  });

  test('each column has its own unit', () => {
    const rows = values
      .map((value, i) => `${(i * 0.01).toFixed(2)},${value},${(value * 980.665).toFixed(3)}\n`)
      .join('');
    const text = `time (s),acc (g),acc (cm/s2)\n${rows}`;
    expect(readText(text).unit).toBe('g');
    expect(readText(text, { columns: { time: 0, acceleration: 2 } }).unit).toBe('cm/s2');
  });

  test('times in milliseconds', () => {
    expect(readText(`time (ms),acc (g)\n${columns(',', 10, 0)}`)).toMatchObject({ interval: 0.01, faults: [] });
  });

  test('a mere numbering is no time', () => {
    const text = values.map((value, i) => `${i + 1} ${value}\n`).join('');
    expect(readText(text, { unit: 'g' })).not.toMatchObject({ layout: 'time-and-acceleration', interval: 1 });
  });

  test('the interval is the round one that the print allows', () => {
    expect(readText(columns(' ', 1 / 300, 4), { unit: 'g' })).toMatchObject({ interval: 1 / 300, faults: [] });
    expect(readText(columns(' ', 0.005, 2), { unit: 'g' })).toMatchObject({ interval: 0.005, faults: [] });
    expect(readText(columns(' ', 1 / 128, 6), { unit: 'g' })).toMatchObject({ interval: 0.0078125, faults: [] });
    const single = values.map((value, i) => `${Math.fround(i * 0.01)} ${value}\n`).join('');
    expect(readText(single, { unit: 'g' })).toMatchObject({ interval: 0.01, faults: [] });
    const exponents = values.map((value, i) => `${(i * 0.01).toExponential(4)} ${value}\n`).join('');
    expect(readText(exponents, { unit: 'g' })).toMatchObject({ interval: 0.01, faults: [] });
  });

  test('any round interval printed to its figures is found again', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 400 }), fc.integer({ min: 4, max: 6 }), (thousandths, decimals) => {
        const interval = thousandths / 1000;
        expect(readText(columns(' ', interval, decimals), { unit: 'g' })).toMatchObject({ interval, faults: [] });
      }),
      { numRuns: 50 },
    );
  });
});

describe('times that are not even', () => {
  const lines = columns(' ').trimEnd().split('\n');
  const without = (...taken: number[]) => lines.filter((_, i) => !taken.includes(i)).join('\n');

  test('a lost line is told with its line, and mended only when asked', () => {
    const reading = readText(without(50), { unit: 'g' });
    expect(reading.motion).toBeNull();
    expect(reading.faults).toMatchObject([{ id: 'time', code: 'uneven-time', line: 51 }]);
    expect(reading.faults[0].message).toBe('the time goes on by 0.02 s, elsewhere by 0.01 s');
    const fill = readText(without(50), { unit: 'g', mends: { time: { choice: 'fill' } } });
    expect(fill.motion).toMatchObject({ interval: 0.01, origin: { mends: [{ line: 51, is: '1 missing value' }] } });
    expect(fill.values[50]).toBeCloseTo((values[49] + values[51]) / 2, 12);
    expect(Array.from(fill.values).toSpliced(50, 1)).toEqual(values.toSpliced(50, 1));
    const even = readText(without(50), { unit: 'g', mends: { time: { choice: 'even' } } });
    expect(even.motion).toMatchObject({ interval: 0.01, origin: { mends: [{ line: 51 }] } });
    const typed = readText(without(50), { unit: 'g', mends: { time: { choice: 'typed', value: 0.02 } } });
    expect(typed.motion?.interval).toBe(0.02);
  });

  test('every such line is named, up to five', () => {
    expect(readText(without(20, 40), { unit: 'g' }).faults[0].message).toMatch(/likewise line 40 \(0.02 s\)$/);
    const many = readText(without(10, 20, 30, 40, 50, 60, 70), { unit: 'g' }).faults[0].message;
    expect(many).toMatch(/and 2 more$/);
  });

  test('a doubled time, a step back, times that stand still', () => {
    const doubled = lines.map((line, i) => (i === 30 ? line.replace('0.30', '0.29') : line)).join('\n');
    expect(codesOf(readText(doubled, { unit: 'g' }))).toEqual(['uneven-time']);
    const back = lines.map((line, i) => (i === 30 ? line.replace('0.30', '0.10') : line)).join('\n');
    expect(codesOf(readText(back, { unit: 'g' }))).toEqual(['uneven-time']);
    const still = values.map((value) => `0.00 ${value}`).join('\n');
    const columnsChosen = { time: 0, acceleration: 1 };
    expect(codesOf(readText(still, { unit: 'g', columns: columnsChosen }))).toEqual(['time-not-rising']);
  });

  test('a gap of several lines beside a spoilt value is filled all the same, a leap that is no whole one is not', () => {
    const text = lines
      .map((line, i) => (i === 49 ? '0.49 x' : line))
      .filter((_, i) => i < 50 || i > 52)
      .join('\n');
    const mends = { time: { choice: 'fill' }, 'line-50-value-2': { choice: 'typed', value: 0.5 } };
    const { motion, values: filled } = readText(text, { unit: 'g', mends });
    expect(motion?.acceleration.length).toBe(120);
    expect(filled[49]).toBe(0.5);
    expect(filled[51]).toBeCloseTo((values[48] + values[53]) / 2, 12);
    const odd = lines.map((line, i) =>
      i > 60 ? line.replace(/^\S+/, (time) => (Number(time) + 0.005).toFixed(3)) : line,
    );
    expect(readText(odd.join('\n'), { unit: 'g' }).faults[0].choices.map(({ id }) => id)).toEqual([
      'even',
      'typed',
      'leave-out',
    ]);
  });

  test('a heading that says another interval', () => {
    const text = `dt = 0.02 s\n${lines.join('\n')}`;
    expect(codesOf(readText(text, { unit: 'g' }))).toEqual(['two-intervals']);
    const choose = (choice: string) => readText(text, { unit: 'g', mends: { 'two-intervals': { choice } } }).interval;
    expect([choose('times'), choose('heading')]).toEqual([0.01, 0.02]);
  });

  test('a time that is no number, a missing acceleration', () => {
    const spoilt = lines
      .map((line, i) => (i === 30 ? line.replace('0.30', '0.3O') : i === 40 ? '0.40' : line))
      .join('\n');
    const reading = readText(`time acc(g)\n${spoilt}`);
    expect(reading.interval).toBe(0.01);
    expect(reading.faults).toMatchObject([{ line: 42, where: 'line 42, value 2', message: 'there is no value' }]);
  });
});
