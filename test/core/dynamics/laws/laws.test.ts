import { describe, expect, test } from 'vitest';
import { LAWS, numberOf, setLaw } from '../../../../src/core/dynamics/laws/laws.ts';
import { FIELD } from '../../../../src/core/dynamics/record.ts';
import type { Law } from '../../../../src/core/frame/frame.ts';
import { Walker } from './support.ts';

const { STRIDE } = FIELD;
const ALL: readonly Law[] = [
  { kind: 'elastic' },
  { kind: 'bilinear', strength: 4e5, hardening: 0.05 },
  { kind: 'peak-oriented', strength: 4e5, hardening: 0.05 },
  { kind: 'bouc-wen', strength: 4e5, hardening: 0.05, exponent: 2, beta: 0.7, gamma: 0.3 },
  { kind: 'flag', strength: 4e5, hardening: 0.05, ratio: 0.6 },
];

describe('[LAW-6] the list of laws', () => {
  test('every kind has a number and a behaviour of its own; elastic is 0', () => {
    expect(ALL.map(numberOf).sort()).toEqual([0, 1, 2, 3, 4]);
    expect(numberOf({ kind: 'elastic' })).toBe(0);
    expect(new Set(ALL.map((law) => LAWS[numberOf(law)])).size).toBe(LAWS.length);
  });

  test.each(ALL)('$kind: set again over a used record it is in its virgin state', (law) => {
    const k = 2.5e7;
    const fresh = new Walker(law, k);
    const used = new Walker({ kind: 'bouc-wen', strength: 1e5, hardening: 0, exponent: 3, beta: 0.5, gamma: 0.5 }, k);
    used.inParts(0.3, 7);
    used.inParts(-0.1, 7);
    setLaw(used.w, STRIDE, law, k);
    for (const drift of [0.004, 0.05, -0.02, 0.03, -0.09]) expect(used.to(drift)).toBe(fresh.to(drift));
    expect(used.work).toBe(fresh.work);
  });

  test.each(ALL)('$kind: writes nothing outside its record, nor a trial into the state', (law) => {
    const walker = new Walker(law, 2.5e7);
    for (const drift of [0.004, 0.05, -0.02, 0.03, -0.09, 0.01]) {
      const other = new Walker(law, 2.5e7);
      other.w.set(walker.w);
      for (const probe of [0.2, -0.3, 0.02, walker.drift]) walker.try(probe);
      walker.to(drift);
      expect(walker.force).toBe(other.to(drift));
      expect(walker.work).toBe(other.work);
    }
    for (let i = 0; i < STRIDE; i++) {
      expect(walker.w[i]).toBeNaN();
      expect(walker.w[2 * STRIDE + i]).toBeNaN();
    }
  });
});
