import type { Fault } from '../fault.ts';
import { STANDARD_GRAVITY } from '../units/constants.ts';
import { velocityOf } from './integrals.ts';
import type { AccelerationUnit, Motion } from './motion.ts';

/** From this interval on the lost high frequencies are said. Nyquist: 1 / (2 x interval). */
const COARSE = 0.02;
/** No recorder of ground motion samples at a longer or a shorter interval [s]. Own figures. */
const INTERVALS = { least: 1e-4, most: 0.1 };
/** Share of the peak above which a last sample is cut off. Source: project-file page. */
const CUT_OFF = 0.01;
/** Share of its peak at which a velocity that ends is far from zero. Own figure. */
const ENDS_MOVING = 0.05;
/** Peaks outside of this band are asked about: the largest recorded ground acceleration is near 3 g (from memory). */
const PLAUSIBLE = { least: 0.001 * STANDARD_GRAVITY, most: 4 * STANDARD_GRAVITY };

/** What to look at in a motion that was read: nothing of it stops the motion. */
export function motionWarnings(motion: Motion, unit: AccelerationUnit): Fault[] {
  const { interval, acceleration } = motion;
  const peak = largest(acceleration);
  const velocity = velocityOf(acceleration, interval);
  const endVelocity = velocity[velocity.length - 1];
  const out: Fault[] = [];
  const warn = (code: string, where: string, message: string, mend: string) => out.push({ code, where, message, mend });
  if (peak > PLAUSIBLE.most || peak < PLAUSIBLE.least) {
    const peakG = peak / STANDARD_GRAVITY;
    const other = likelier(peak, unit);
    warn(
      'implausible-peak',
      'unit',
      `the peak is ${short(peakG)} g with the unit ${unit}`,
      other ? `Check the unit: is it ${other}?` : 'Check the unit',
    );
  }
  if (Math.abs(endVelocity) > ENDS_MOVING * largest(velocity)) {
    warn(
      'velocity-ends',
      'end of the record',
      `the velocity ends at ${short(endVelocity)} m/s, not at zero; a shifted baseline does that`,
      'Use it as read, or take a corrected record',
    );
  }
  if (interval > INTERVALS.most || interval < INTERVALS.least) {
    warn(
      'implausible-interval',
      'interval',
      `${short(interval)} s is no usual interval of a recorder`,
      'Check that it is in seconds',
    );
  }
  if (interval >= COARSE) {
    warn(
      'coarse-interval',
      'interval',
      `${short(interval)} s: nothing above ${short(0.5 / interval)} Hz is in this record`,
      'Enough for a frame whose modes stay well below that',
    );
  }
  const last = Math.abs(acceleration[acceleration.length - 1]);
  if (last > CUT_OFF * peak) {
    warn(
      'cut-off',
      'end of the record',
      `the last sample is at ${Math.round((100 * last) / peak)} % of the peak; the motion is taken to fall to zero over one interval`,
      'Use it as read, or take a record that is not cut off',
    );
  }
  return out;
}

function largest(x: Float64Array): number {
  let most = 0;
  for (let i = 0; i < x.length; i++) most = Math.max(most, Math.abs(x[i]));
  return most;
}

/** The unit that would make a peak an earthquake's. */
function likelier(peak: number, unit: AccelerationUnit): AccelerationUnit | null {
  const sizes: Record<AccelerationUnit, number> = { g: STANDARD_GRAVITY, 'm/s2': 1, 'cm/s2': 0.01, 'mm/s2': 0.001 };
  const raw = peak / sizes[unit];
  for (const other of ['g', 'm/s2', 'cm/s2', 'mm/s2'] as const) {
    const as = raw * sizes[other];
    if (other !== unit && as >= 0.02 * STANDARD_GRAVITY && as <= 1.5 * STANDARD_GRAVITY) return other;
  }
  return null;
}

function short(value: number): string {
  return String(Number(value.toPrecision(3)));
}
