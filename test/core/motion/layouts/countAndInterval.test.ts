import { describe, expect, test } from 'vitest';
import { codesOf, readText, rows, warningsOf, wave } from '../records.ts';

const values = wave(400);

describe('count and interval, then rows of values', () => {
  test.each([
    ['NPTS= 400, DT= .0100 SEC\nACCELERATION IN UNITS OF G\n'],
    ['title\n400 0.0100 NPTS, DT\n(g)\n'],
    ['#400 points at equal spacing of 0.01 sec\n#Points are listed in the format of 8F10.5\n#The units are (g)\n'],
    ['Eskfoot, old pumping house\ninterval 0.01 s   unit g   values 400\n------------\n'],
    ['number of points: 400\nsampling rate: 100 Hz\nunit: g\n'],
  ])('%s', (head) => {
    const reading = readText(head + rows(values));
    expect(reading).toMatchObject({
      layout: 'count-and-interval',
      interval: 0.01,
      unit: 'g',
      statedCount: 400,
      perLine: 8,
      faults: [],
      asks: [],
      firstLine: head.split('\n').length,
    });
    expect(reading.values).toEqual(Float64Array.from(values));
    expect(reading.motion?.acceleration).toEqual(Float64Array.from(values, (value) => value * 9.80665));
  });

  test('bare figures above the rows, where they agree with them', () => {
    for (const head of ['400 0.01\n', 'a title\n400 0.01\n', 'a title\n 400   .01\n\n']) {
      expect(readText(head + rows(values), { unit: 'g' })).toMatchObject({
        layout: 'count-and-interval',
        interval: 0.01,
        statedCount: 400,
        faults: [],
      });
    }
    const oneALine = readText(`400\n0.01\n${values.join('\n')}\n`, { unit: 'g' });
    expect(oneALine).toMatchObject({ layout: 'count-and-interval', interval: 0.01, statedCount: 400, firstLine: 3 });
    expect(oneALine.values).toEqual(Float64Array.from(values));
  });

  test('bare figures that do not agree are no heading', () => {
    const reading = readText(`300\n0.01\n${values.join('\n')}\n`, { unit: 'g' });
    expect(reading).toMatchObject({ layout: 'values', interval: null, statedCount: null });
    expect(reading.values.length).toBe(402);
  });

  test('numbers that touch, and Fortran exponents', () => {
    const big = values.map((value) => value * 400 - 100);
    const touching = readText(`NPTS= 400, DT= .01 SEC, units cm/s2\n${rows(big, 8, 10)}`);
    expect(touching.values).toEqual(Float64Array.from(big, (value) => Number(value.toFixed(5))));
    const exponents = values.map((value) => value.toExponential(4).replace('e', 'D'));
    const text = `NPTS= 400, DT= .01 SEC, units g\n${exponents.join(' ')}\n`;
    expect(readText(text).values).toEqual(Float64Array.from(exponents, (value) => Number(value.replace('D', 'e'))));
  });

  test('a row that lost or gained a value stops the reading, unless the count agrees', () => {
    const lines = rows(values).trimEnd().split('\n');
    const cut = lines.map((line, i) => (i === 20 ? line.slice(0, -10) : line)).join('\n');
    const reading = readText(`dt 0.01 s, units g\n${cut}`);
    expect(reading.motion).toBeNull();
    expect(reading.faults).toMatchObject([{ id: 'row-length', line: 22, where: 'line 22' }]);
    expect(reading.faults[0].message).toMatch(/7 values .* 8/);
    const mends = { 'row-length': { choice: 'as-it-stands' } };
    expect(readText(`dt 0.01 s, units g\n${cut}`, { mends }).motion?.acceleration.length).toBe(399);
    expect(codesOf(readText(`NPTS= 399, DT= 0.01 s, units g\n${cut}`))).toEqual([]);
  });

  test('figures above the rows with text between are asked about', () => {
    const text = `dt 0.01 s, units g\n0.1\n0.2\nx marks the spot\n${values.join('\n')}\n`;
    expect(readText(text).faults).toMatchObject([{ id: 'figures-above', line: 2 }]);
    expect(readText(text, { mends: { 'figures-above': { choice: 'heading' } } }).motion?.acceleration.length).toBe(400);
    expect(readText(text, { headingLines: 4 }).motion?.acceleration.length).toBe(400);
  });
});

describe('a second record behind the first', () => {
  const second = `second component\n${rows(values)}`;
  test('is not read where the count says where the first ends', () => {
    const reading = readText(`NPTS= 400, DT= .01 SEC, units g\n${rows(values)}${second}`);
    expect(reading.motion?.acceleration.length).toBe(400);
    expect(warningsOf(reading)).toContain('not-read');
  });

  test('is asked about where nothing says', () => {
    const text = `DT= .01 SEC, units g\n${rows(values)}${second}`;
    const [fault] = readText(text).faults;
    expect(fault).toMatchObject({ id: 'text', line: 52 });
    expect(fault.message).toContain('"second component"');
    const stop = readText(text, { mends: { text: { choice: 'stop' } } });
    expect(stop.motion?.acceleration.length).toBe(400);
    expect(stop.motion?.origin.mends).toMatchObject([{ line: 52, was: '"second component"' }]);
    expect(readText(text, { mends: { text: { choice: 'pass-over' } } }).motion?.acceleration.length).toBe(800);
  });
});
