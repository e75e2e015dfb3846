import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { excerptOf } from '../../src/engine/excerpt.ts';
import { thin, thinTimes } from '../../src/engine/thin.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);

describe('excerptOf', () => {
  it('counts lines that end in LF, CR LF or CR, and a last one without an end', () => {
    for (const end of ['\n', '\r\n', '\r']) {
      expect(excerptOf(bytesOf(`a${end}${end}c`), []).lines).toBe(3);
      expect(excerptOf(bytesOf(`a${end}b${end}`), []).excerpt).toEqual([
        { line: 1, text: 'a' },
        { line: 2, text: 'b' },
      ]);
    }
    expect(excerptOf(bytesOf(''), [])).toEqual({ excerpt: [], lines: 0 });
  });

  it('shows the first lines and those around each place, each once and in order', () => {
    const text = Array.from({ length: 1000 }, (_, i) => `line ${i + 1}`).join('\n');
    const { excerpt, lines } = excerptOf(bytesOf(text), [500, 502, 1000]);
    expect(lines).toBe(1000);
    const numbers = excerpt.map(({ line }) => line);
    expect(numbers).toEqual([...numbers].sort((a, b) => a - b));
    expect(new Set(numbers).size).toBe(numbers.length);
    for (const line of [1, 2, 497, 500, 505, 997, 1000]) {
      expect(excerpt.find((entry) => entry.line === line)?.text).toBe(`line ${line}`);
    }
    expect(numbers).not.toContain(300);
  });

  it('a file of one endless line is cut, not copied', () => {
    const { excerpt } = excerptOf(bytesOf('1 '.repeat(100_000)), []);
    expect(excerpt.length).toBe(1);
    expect(excerpt[0].text.length).toBeLessThan(1000);
  });
});

describe('thin', () => {
  it('keeps the smallest and the largest value of the series, whatever its length', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ noNaN: true }), { minLength: 1, maxLength: 5000 }), (values) => {
        const series = Float64Array.from(values);
        const thinned = thin(series);
        expect(thinned.length).toBe(thinTimes(series.length, 0.01).length);
        expect(thinned.reduce((a, b) => Math.max(a, b))).toBe(series.reduce((a, b) => Math.max(a, b)));
        expect(thinned.reduce((a, b) => Math.min(a, b))).toBe(series.reduce((a, b) => Math.min(a, b)));
      }),
    );
  });

  it('its instants rise from 0 and stay within the series', () => {
    for (const count of [1, 2, 3, 1201, 100_000]) {
      const times = thinTimes(count, 0.02);
      expect(times[0]).toBe(0);
      for (let i = 1; i < times.length; i++) expect(times[i]).toBeGreaterThan(times[i - 1]);
      expect(times.at(-1)).toBeLessThan(count * 0.02);
    }
  });
});
