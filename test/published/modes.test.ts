import { describe, expect, test } from 'vitest';
import { rayleighFactors } from '../../src/core/frame/damping.ts';
import { prepared, shearFrame } from '../support/frames.ts';

const all = (n: number, x: number) => Array.from({ length: n }, () => x);

// Uniform shear building, closed form: omega_n = 2 sqrt(k/m) sin((2n - 1) pi / (2 (2N + 1))), phi_jn = sin(j (2n - 1) pi / (2N + 1)).
describe('B1 uniform building', () => {
  test.each([1, 2, 5, 10, 30, 60])('%d storeys', (N) => {
    const { modes } = prepared(shearFrame(all(N, 1), all(N, 1)));
    modes.forEach(({ frequency, shape }, r) => {
      const angle = ((2 * r + 1) * Math.PI) / (2 * N + 1);
      expect(frequency).toBeCloseTo(2 * Math.sin(angle / 2), 9);
      for (let j = 0; j < N; j++) {
        const closed = Math.sin((j + 1) * angle) / Math.sin(N * angle);
        expect(Math.abs(shape[j] - closed)).toBeLessThan(1e-9 * Math.max(1, Math.abs(1 / Math.sin(N * angle))));
      }
    });
  });
});

// Chopra, Dynamics of Structures, Examples 10.4 and 13.2 (from memory): masses 2m, m on 2k, k, ground storey first. Exact.
test('B2 two storeys', () => {
  const { modes } = prepared(shearFrame([2, 1], [2, 1]));
  expect(modes[0].frequency ** 2).toBeCloseTo(0.5, 12);
  expect(modes[1].frequency ** 2).toBeCloseTo(2, 12);
  expect(modes[0].shape[0]).toBeCloseTo(0.5, 12);
  expect(modes[1].shape[0]).toBeCloseTo(-1, 12);
  expect(modes[0].participation).toBeCloseTo(4 / 3, 12);
  expect(modes[1].participation).toBeCloseTo(-1 / 3, 12);
  expect(modes[0].effectiveMass).toBeCloseTo(8 / 3, 12);
  expect(modes[1].effectiveMass).toBeCloseTo(1 / 3, 12);
});

// Clough and Penzien, Dynamics of Structures, Example E11-1 (from memory; the print is slide-rule accurate).
test('B3 three storeys', () => {
  const { modes } = prepared(shearFrame([2, 1.5, 1], [1800, 1200, 600]));
  [14.5, 31.1, 46.1].forEach((w, r) => {
    expect(Math.abs(modes[r].frequency - w)).toBeLessThan(0.06);
  });
  [0.3, 0.644, 1].forEach((x, i) => {
    expect(Math.abs(modes[0].shape[i] - x)).toBeLessThan(1.5e-2);
  });
});

// Chopra, section 13.2.6 and Example 12.8 (from memory): five floors of 100 kips / g on storeys of 31.54 kip/in, 12 ft high.
test('B4 five storeys: periods, effective masses and heights', () => {
  const g = 386;
  const { modes, arrays } = prepared(shearFrame(all(5, 100 / g), all(5, 31.54), { kind: 'none' }, 144));
  [2.0, 0.6852, 0.4346, 0.3383, 0.2966].forEach((T, r) => {
    expect(Math.abs(modes[r].period - T)).toBeLessThan(8e-4);
  });
  [4.398, 0.436, 0.121, 0.0375, 0.0078].forEach((m, r) => {
    expect(Math.abs(modes[r].effectiveMass / arrays.mass[0] - m)).toBeLessThan(6e-4);
  });
  [3.51, -1.2, 0.76, -0.59, 0.52].forEach((h, r) => {
    expect(Math.abs(modes[r].effectiveHeight / 144 - h)).toBeLessThan(6e-3);
  });
});

// Chopra, Example 11.1 (from memory): 400, 400, 200 kips / g on storeys of 610 kip/in; 5 % in modes 1 and 2.
test('D1 Rayleigh damping of three storeys', () => {
  const g = 386;
  const frame = shearFrame([400 / g, 400 / g, 200 / g], all(3, 610), {
    kind: 'rayleigh',
    modes: [1, 2],
    ratios: [0.05, 0.05],
  });
  const { modes, dampingRatios } = prepared(frame);
  [12.57, 34.33, 46.89].forEach((w, r) => {
    expect(Math.abs(modes[r].frequency - w)).toBeLessThan(0.03);
  });
  const { a0, a1 } = rayleighFactors(modes[0].frequency, modes[1].frequency, [0.05, 0.05]);
  expect(Math.abs(a0 - 0.9198)).toBeLessThan(8e-4);
  expect(Math.abs(a1 - 0.00213)).toBeLessThan(8e-6);
  expect(dampingRatios[0]).toBeCloseTo(0.05, 12);
  expect(dampingRatios[1]).toBeCloseTo(0.05, 12);
  expect(Math.abs(dampingRatios[2] - 0.0598)).toBeLessThan(2e-4);
});

// Clough and Penzien, Example E12-3 (from memory): 5 % in modes 1 and 3 of 14.5, 31.1, 46.1 rad/s; second mode 4.34 %.
test('D2 Rayleigh factors', () => {
  const { a0, a1 } = rayleighFactors(14.5, 46.1, [0.05, 0.05]);
  expect(Math.abs(a0 - 1.103)).toBeLessThan(6e-4);
  expect(Math.abs(a1 - 0.00165)).toBeLessThan(6e-6);
  expect(Math.abs(a0 / 2 / 31.1 + (a1 * 31.1) / 2 - 0.0434)).toBeLessThan(1e-4);
});

// Closed forms, storey-wise geometric stiffness: T = T0 / sqrt(1 - theta), theta = P / (k h); stable if and only if P < k h.
test.each([0.05, 0.1, 0.25, 0.5, 0.9])('F1 period with theta %d', (theta) => {
  const frame = shearFrame([1000], [4e4], { kind: 'none' }, 3, true);
  const heavy = { ...frame, storeys: [{ ...frame.storeys[0], gravity: theta * 4e4 * 3 }] };
  expect(prepared(heavy).modes[0].period * Math.sqrt(1 - theta)).toBeCloseTo((2 * Math.PI) / Math.sqrt(40), 9);
});
