import { describe, expect, test } from 'vitest';
import { demoMotions } from '../../../src/core/motion/demoMotions.ts';
import { codesOf, readText, rows, warningsOf, wave } from './records.ts';

const FULL = { interval: 0.01, unit: 'g' } as const;
const one = wave(400);
const two = wave(400, 0.2).reverse();
const three = wave(400, 0.1).map((value, i) => (i % 3 === 0 ? -value : value));

/** What can be read two ways is asked, so that no wrong number looks right. */
describe('components side by side', () => {
  const beside = one.map((value, i) => `${value} ${two[i]} ${three[i]}`).join('\n');

  test('columns that go on more smoothly than the rows: a column is chosen, or the rows are read across', () => {
    const reading = readText(`ns ew ud\n${beside}`, FULL);
    expect(codesOf(reading)).toEqual(['components']);
    expect(reading.faults[0].choices.map(({ id }) => id)).toEqual([
      'column-1',
      'column-2',
      'column-3',
      'across',
      'leave-out',
    ]);
    const taken = (choice: string) => readText(beside, { ...FULL, mends: { components: { choice } } });
    expect(taken('column-2').values).toEqual(Float64Array.from(two));
    expect(taken('column-2').motion?.origin.mends).toMatchObject([{ was: '3 columns', is: 'column 2' }]);
    expect(taken('across').values.length).toBe(1200);
    expect(codesOf(taken('column-4'))).toEqual(['components']);
  });

  test('a stated count that is that of the rows', () => {
    const text = `NPTS= 400, DT= .01 SEC, units g\n${beside}`;
    expect(codesOf(readText(text))).toEqual(['components']);
    const chosen = readText(text, { mends: { components: { choice: 'column-1' } } });
    expect(chosen.motion?.acceleration.length).toBe(400);
    expect(readText(`NPTS= 1200, DT= .01 SEC, units g\n${beside}`).motion?.acceleration.length).toBe(1200);
  });

  test('a spoilt value of the column is told with its line and its place on it', () => {
    const text = beside
      .split('\n')
      .map((line, i) => (i === 30 ? line.replace(/ \S+ /, ' x ') : line))
      .join('\n');
    const chosen = (choice: string) => readText(text, { ...FULL, mends: { components: { choice } } });
    expect(chosen('column-2').faults).toMatchObject([{ where: 'line 31, value 2' }]);
    expect(chosen('column-1').motion).not.toBeNull();
  });

  test.each([2, 3, 4, 5, 6, 8, 10])('records read across in rows of %d are not taken for them', (perLine) => {
    for (const { acceleration } of demoMotions()) {
      expect(codesOf(readText(rows([...acceleration], perLine, 12), FULL))).toEqual([]);
    }
  });
});

describe('numbers of samples', () => {
  test.each([0, 1])('counted from %d, they are no acceleration and no time', (from) => {
    const text = one.map((value, i) => `${i + from}\t${value}`).join('\n');
    const reading = readText(text, FULL);
    expect(reading.layout).toBe('time-and-acceleration');
    expect(reading.motion?.acceleration).toEqual(Float64Array.from(one, (value) => value * 9.80665));
    expect(readText(text, { unit: 'g' }).asks).toEqual(['interval']);
  });

  test('one that is missing is told', () => {
    const text = one.flatMap((value, i) => (i === 70 ? [] : [`${i} ${value}`])).join('\n');
    expect(readText(text, FULL).faults).toMatchObject([{ id: 'time', line: 71 }]);
  });

  test('named times of one second are times', () => {
    const text = `time (s), acc (g)\n${one.map((value, i) => `${i}, ${value}`).join('\n')}`;
    const reading = readText(text);
    expect(reading.interval).toBe(1);
    expect(warningsOf(reading)).toContain('implausible-interval');
  });
});

test('names with underscores: time_ms and acc_g', () => {
  const text = `time_ms,acc_g\n${one.map((value, i) => `${5 * i},${value}`).join('\n')}`;
  expect(readText(text)).toMatchObject({ interval: 0.005, unit: 'g', faults: [], asks: [] });
});

test('a time that falls is at fault, and no acceleration', () => {
  const text = one.map((value, i) => `${-0.01 * i} ${value}`).join('\n');
  expect(readText(text, FULL).faults).toMatchObject([{ id: 'time', code: 'time-not-rising' }]);
});

test('a count that stands alone above as many values', () => {
  const reading = readText(`400\n${one.join('\n')}`, FULL);
  expect(reading.statedCount).toBe(400);
  expect(reading.values).toEqual(Float64Array.from(one));
  expect(readText(`390\n${one.join('\n')}`, FULL).values.length).toBe(401);
});

describe('commas before three figures', () => {
  const whole = one.map((value) => Math.round(value * 1e4));
  const grouped = whole.map((value) => {
    const size = String(Math.abs(value));
    return `${value < 0 ? '-' : ''}${size.length > 3 ? `${size.slice(0, -3)},${size.slice(-3)}` : size}`;
  });

  test('may part thousands: asked, not guessed', () => {
    expect(grouped.some((text) => text.includes(','))).toBe(true);
    const reading = readText(grouped.join('\n'), { interval: 0.01, unit: 'mm/s2' });
    expect(codesOf(reading)).toEqual(['unclear-commas']);
    expect(reading.faults[0].message).toMatch(/thousands .*[1-9],\d{3}$/);
    const decimals = { interval: 0.01, unit: 'mm/s2', mends: { commas: { choice: 'decimals' } } } as const;
    expect(readText(grouped.join('\n'), decimals).motion).not.toBeNull();
  });

  test('are decimal signs where one value shows it', () => {
    for (const shows of ['0,125', ',250', '1,25', '12345,125']) {
      expect(codesOf(readText([...grouped, shows].join('\n'), FULL))).toEqual([]);
    }
  });
});

test('quoted values between commas, whichever their decimal sign', () => {
  for (const sign of ['.', ',']) {
    const cell = (value: string) => `"${value.replace('.', sign)}"`;
    const text = one.map((value, i) => `${cell((0.01 * i).toFixed(2))},${cell(value.toFixed(5))}`).join('\n');
    const reading = readText(`"Time","Acc (g)"\n${text}`);
    expect(reading).toMatchObject({ interval: 0.01, unit: 'g', faults: [] });
    expect(reading.values).toEqual(Float64Array.from(one));
  }
});

describe('spoilt values at the head', () => {
  test.each(['NaN', '0,0063', '1e999', '1.2.3'])('%s is the first sample, not a heading', (spoilt) => {
    for (const before of [0, 2]) {
      const text = [...one.slice(0, before), spoilt, ...one].join('\n');
      const reading = readText(text, FULL);
      expect(reading.values.length).toBe(401 + before);
      expect(reading.faults).toMatchObject([{ where: `line ${before + 1}, value 1` }]);
    }
  });

  test.each(['2020-01-01', '12:30:05', 'Alder Creek', '---'])('%s is a heading', (head) => {
    expect(readText(`${head}\n${one.join('\n')}`, FULL).motion?.acceleration.length).toBe(400);
  });
});

test('a blank line among values is said; blank lines between blocks are not', () => {
  const lines = one.map(String);
  const reading = readText([...lines.slice(0, 100), '', ...lines.slice(101)].join('\n'), FULL);
  expect(reading.warnings.find(({ code }) => code === 'blank-line')).toMatchObject({ where: 'line 101' });
  const blocks = lines.map((line, i) => (i % 50 === 49 ? `${line}\n` : line)).join('\n');
  expect(warningsOf(readText(blocks, FULL))).not.toContain('blank-line');
});

describe('an answer against the file', () => {
  const text = `interval 0.005 s   unit cm/s2   values 400\n${rows(one)}`;
  const answers = { interval: 0.01, unit: 'g' } as const;
  test('is a fault with both on offer, and the mend is kept', () => {
    const { faults } = readText(text, answers);
    expect(faults.map(({ id }) => id)).toEqual(['contradicts-interval', 'contradicts-unit']);
    for (const { choices } of faults) expect(choices.map(({ id }) => id)).toEqual(['file', 'answer', 'leave-out']);
    const mends = { 'contradicts-interval': { choice: 'file' }, 'contradicts-unit': { choice: 'answer' } };
    const { motion } = readText(text, { ...answers, mends });
    expect(motion?.interval).toBe(0.005);
    expect(motion?.origin).toMatchObject({ unit: 'g', unitFrom: 'answer', intervalFrom: 'file' });
    expect(motion?.origin.mends).toMatchObject([{ line: 1, was: 'cm/s2', is: 'g' }]);
  });
});
