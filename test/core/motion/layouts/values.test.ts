import { describe, expect, test } from 'vitest';
import { readText, rows, wave } from '../records.ts';

const values = wave(203);

describe('values only', () => {
  test.each([
    ['one a line', `${values.join('\n')}\n`, 1],
    ['one a line, decimal commas', values.map((value) => String(value).replace('.', ',')).join('\n'), 1],
    ['rows of fixed width', rows(values), 8],
    ['rows with commas', rows(values, 5).replaceAll(/(\d) /g, '$1,'), 5],
    ['rows under a title', `Eskfoot, as recorded\n\n${rows(values, 10)}`, 10],
  ])('%s: interval and unit are asked for', (_, text, perLine) => {
    const reading = readText(text);
    expect(reading).toMatchObject({ layout: 'values', perLine, interval: null, unit: null, motion: null, faults: [] });
    expect(reading.asks).toEqual(['interval', 'unit']);
    expect(reading.values).toEqual(Float64Array.from(values));
    const { motion } = readText(text, { interval: 0.005, unit: 'mm/s2' });
    expect(motion?.acceleration).toEqual(Float64Array.from(values, (value) => value * 0.001));
    expect(motion?.origin).toMatchObject({
      unitFrom: 'answer',
      intervalFrom: 'answer',
      unit: 'mm/s2',
      interval: 0.005,
    });
  });

  test('whole numbers between commas may be decimal commas: asked, not guessed', () => {
    const text = Array.from({ length: 30 }, (_, i) => `0,${10 + i},-0,${20 + i}`).join('\n');
    const reading = readText(text, { layout: 'values', interval: 0.01, unit: 'g' });
    expect(reading.faults.map(({ id }) => id)).toEqual(['commas']);
    const mends = { commas: { choice: 'separators' } };
    expect(readText(text, { layout: 'values', interval: 0.01, unit: 'g', mends }).motion).not.toBeNull();
  });

  test('a layout that was answered is taken', () => {
    const text = Array.from({ length: 30 }, (_, i) => `${(i * 0.01).toFixed(2)} 0.5`).join('\n');
    expect(readText(text, { layout: 'values' }).values.length).toBe(60);
    expect(readText(text, { layout: 'time-and-acceleration' }).values.length).toBe(30);
  });
});
