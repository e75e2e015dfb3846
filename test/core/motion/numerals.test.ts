import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Comma, lastPlace, numberOf, Tokens } from '../../../src/core/motion/numerals.ts';
import { linesOf } from '../../../src/core/motion/text.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const read = (text: string, decimal = '.') => numberOf(bytesOf(text), 0, text.length, decimal.charCodeAt(0));

function tokensOf(text: string, comma: Comma = 'neither'): number[] {
  const lines = linesOf(bytesOf(text));
  const tokens = new Tokens();
  tokens.read(lines, lines.start[0], lines.end[0], comma);
  return Array.from(tokens.value.subarray(0, tokens.count));
}

describe('one number', () => {
  test('is what the language reads, to the last bit', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        // The language writes minus zero as 0.
        expect(read(String(value))).toBe(value === 0 ? 0 : value);
      }),
    );
    fc.assert(
      fc.property(fc.integer({ min: -9e15, max: 9e15 }), fc.integer({ min: 0, max: 20 }), (figures, decimals) => {
        const text = `${figures}e-${decimals}`;
        expect(read(text)).toBe(Number(text));
      }),
    );
  });

  test('in the spellings of Fortran', () => {
    expect(read('1.2D-03')).toBe(1.2e-3);
    expect(read('-.5E-2')).toBe(-0.005);
    expect(read('.12345-3')).toBe(0.00012345);
    expect(read('1.5+2')).toBe(150);
    expect(read('0.123-100')).toBe(0.123e-100);
    expect(read('+7.')).toBe(7);
    expect(read('0,25', ',')).toBe(0.25);
  });

  test('is finite, and nothing else is one', () => {
    for (const text of [
      '',
      '-',
      '.',
      'e5',
      '1e',
      '1e+',
      '--1',
      '1.2.3',
      '0x10',
      '1_0',
      'NaN',
      'Inf',
      '1e999',
      '5-3',
      '1 2',
    ])
      expect(read(text)).toBeNaN();
  });
});

describe('numbers of a line', () => {
  test('parted by blanks, tabs, semicolons, and commas where they part', () => {
    expect(tokensOf(' 1\t2;3  4;')).toEqual([1, 2, 3, 4]);
    expect(tokensOf('1, 2,3 ,', 'separator')).toEqual([1, 2, 3]);
    expect(tokensOf('0,5; -0,25', 'decimal')).toEqual([0.5, -0.25]);
    expect(tokensOf('0,5, -0,25', 'decimal')).toEqual([0.5, -0.25]);
    expect(tokensOf('"0.5","1.5"', 'separator')).toEqual([0.5, 1.5]);
  });

  test('an empty cell between two separators is a value that is missing', () => {
    expect(tokensOf('1,,3', 'separator')).toEqual([1, Number.NaN, 3]);
    expect(tokensOf(';2', 'neither')).toEqual([Number.NaN, 2]);
    expect(tokensOf('1,,', 'separator')).toEqual([1]);
  });

  test('fields of fixed width that touch are parted', () => {
    expect(tokensOf('  -0.12345-123.45678 123.45678   0.00001')).toEqual([-0.12345, -123.45678, 123.45678, 0.00001]);
    expect(tokensOf('-123.45678-223.45678-323.45678')).toEqual([-123.45678, -223.45678, -323.45678]);
    expect(tokensOf('1.1200E-03-1.1100E-03')).toEqual([1.12e-3, -1.11e-3]);
    expect(tokensOf(' .12345-3-.23456-3')).toEqual([0.12345e-3, -0.23456e-3]);
    expect(tokensOf('0.123450.23456')).toEqual([0.12345, 0.23456]);
  });

  test('a slip is not parted as if it were fields', () => {
    expect(tokensOf('0.01.71 0.2 0.3')).toEqual([Number.NaN, 0.2, 0.3]);
    expect(tokensOf('0.0171-0.0181 0.3')).toEqual([Number.NaN, 0.3]);
    expect(tokensOf('0.1.2')).toEqual([Number.NaN]);
    expect(tokensOf('0.5 -0,0171 0.3')).toEqual([0.5, Number.NaN, 0.3]);
  });

  test('rows of any values in fields that hold them are read as they were printed', () => {
    const value = fc.integer({ min: -9_999_999, max: 9_999_999 }).map((figures) => figures / 1e5);
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 8 }), (values) => {
        const text = values.map((entry) => entry.toFixed(5).padStart(9)).join('');
        expect(tokensOf(text)).toEqual(values.map((entry) => Number(entry.toFixed(5))));
      }),
    );
  });
});

test('the place of the last figure of a print', () => {
  expect(lastPlace('1.25')).toBeCloseTo(0.01, 15);
  expect(lastPlace('1.250E+02')).toBeCloseTo(0.1, 15);
  expect(lastPlace('7')).toBe(1);
  expect(lastPlace('x')).toBe(0);
});
