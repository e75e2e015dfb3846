import { existsSync, readFileSync } from 'node:fs';
import { readRecord } from '../../src/core/doors.ts';
import { STANDARD_GRAVITY } from '../../src/core/units/constants.ts';

const FILE = new URL('../../../shared/records/imperial-valley-1940-ns.txt', import.meta.url);

/** Whether the real record stands beside the checkout. */
export const RECORD_1940 = existsSync(FILE);

/** Imperial Valley 1940, north-south, as `readRecord` reads it with no answer given; g in the unit that the check uses. */
export function record1940(g = STANDARD_GRAVITY): { readonly interval: number; readonly acceleration: Float64Array } {
  const { motion, faults } = readRecord('imperial-valley-1940-ns.txt', readFileSync(FILE), {});
  if (motion === null)
    throw new Error(`the 1940 record is not read: ${faults.map(({ message }) => message).join('; ')}`);
  return { interval: motion.interval, acceleration: motion.acceleration.map((a) => (a * g) / STANDARD_GRAVITY) };
}
