import { expect, test } from 'vitest';
import { histories, oneStorey } from '../support/oneStorey.ts';

// A. K. Chopra, Dynamics of Structures, 4th ed., Example 5.5 and Table E5.5 (values from memory of the print, confirmed by an
// independent computation): the system of Examples 5.1 to 5.4, m = 0.2533 kip s2/in, k = 10 kip/in, 5 % damping, elastoplastic
// with fy = 7.5 kip; p = 10 sin(pi t / 0.6) kip to 0.6 s, step 0.1 s, average acceleration. u in inches at 0, 0.1 ... 1.0 s, tolerance
// 3e-4 in: the print stops iterating at a residual of 1e-3 kip. A force p is a ground acceleration -p / m.
test('A5 elastoplastic, average acceleration [DYN-1]', () => {
  const mass = 0.2533;
  const load = Float64Array.from({ length: 11 }, (_, i) => (i < 6 ? (-10 * Math.sin((Math.PI * i) / 6)) / mass : 0));
  const frame = oneStorey({
    mass,
    stiffness: 10,
    law: { kind: 'bilinear', strength: 7.5, hardening: 0 },
    damping: { kind: 'modal', ratios: [0.05] },
  });
  const { histories: h, marching } = histories(frame, load, 0.1);
  const printed = [0, 0.0437, 0.2326, 0.6121, 1.1143, 1.6214, 1.9891, 2.0951, 1.924, 1.5602, 1.1415];
  expect(h.count).toBe(printed.length);
  printed.forEach((u, i) => {
    expect(Math.abs(h.displacement[i] - u), `t = ${i / 10} s: ${h.displacement[i]}, ${u}`).toBeLessThan(3e-4);
  });
  // Forces in kip from 0.4 to 0.7 s: computed by independent code.
  const forces = [7.5, 7.5, 7.5, 7.5, 5.789, 2.151, -2.036];
  forces.forEach((f, i) => {
    expect(Math.abs(h.shear[4 + i] - f), `t = ${(4 + i) / 10} s`).toBeLessThan(i < 4 ? 1e-9 : 3e-3);
  });
  expect(marching.halvings).toBe(0);
});
