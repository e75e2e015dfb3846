import { describe, expect, test } from 'vitest';
import type { MethodChoice } from '../../src/core/dynamics/run.ts';
import type { Damping } from '../../src/core/frame/frame.ts';
import { AVERAGE, LINEAR, run, shearFrame } from '../support/frames.ts';

// A. K. Chopra, Dynamics of Structures, 4th ed., Examples 5.2 to 5.4 and Tables E5.2 to E5.4 (values from memory of the
// print, confirmed by an independent computation): m = 0.2533 kip s2/in, k = 10 kip/in, 5 % damping, p = 10 sin(pi t / 0.6)
// kip to 0.6 s, step 0.1 s; u in inches at 0, 0.1 ... 1.0 s. Tolerance 1.5e-4 in. A force p is a ground acceleration -p / m.
const MASS = 0.2533;
const LOAD = Float64Array.from({ length: 11 }, (_, i) => (i < 6 ? (-10 * Math.sin((Math.PI * i) / 6)) / MASS : 0));
const TABLES: readonly (readonly [string, MethodChoice, readonly number[]])[] = [
  [
    'A2 central difference',
    { kind: 'central-difference' },
    [0, 0, 0.1914, 0.6293, 1.1825, 1.5808, 1.5412, 0.9141, -0.0247, -0.8968, -1.3726],
  ],
  [
    'A3 average acceleration',
    AVERAGE,
    [0, 0.0437, 0.2326, 0.6121, 1.0825, 1.4309, 1.4231, 0.9622, 0.1908, -0.6044, -1.1442],
  ],
  [
    'A4 linear acceleration',
    LINEAR,
    [0, 0.03, 0.2193, 0.6166, 1.113, 1.4782, 1.4625, 0.9514, 0.1273, -0.6954, -1.2208],
  ],
];
const DAMPINGS: readonly Damping[] = [
  { kind: 'modal', ratios: [0.05] },
  { kind: 'stiffness-proportional', mode: 1, ratio: 0.05 },
];

describe.each(TABLES)('%s', (_, method, printed) => {
  test.each(DAMPINGS)('digit for digit with $kind damping [DYN-1]', (damping) => {
    const { histories } = run(shearFrame([MASS], [10], damping), LOAD, 0.1, { method, histories: true });
    expect(histories?.count).toBe(11);
    printed.forEach((u, i) => {
      expect(Math.abs((histories?.displacement[i] ?? Number.NaN) - u), `t = ${i / 10} s`).toBeLessThan(1.5e-4);
    });
  });
});
