import { digestOfSamples } from '../core/digest.ts';
import { demoMotions } from '../core/motion/demoMotions.ts';
import { fromDisplay } from '../core/units/quantities.ts';
import type { OpenedProject } from './file.ts';
import type { MotionEntry, StoreyRow } from './project.ts';

/**
 * The frame of an invented clinic, from the ground up: name, height [m], weight [kN], stiffness [kN/mm], strength [kN]. Imaging
 * wanted its walls out of the way, and its storey shows it.
 */
const CLINIC: readonly (readonly [string, number, number, number, number])[] = [
  ['Entrance', 4.8, 6900, 640, 9600],
  ['Imaging', 4.2, 7250, 455, 8700],
  ['Theatres', 4.2, 7100, 460, 8200],
  ['Maternity', 3.6, 6450, 440, 7500],
  ['Wards', 3.6, 6300, 395, 6800],
  ['Wards', 3.6, 6300, 345, 5800],
  ['Wards', 3.6, 6300, 280, 4500],
  ['Plant', 3.6, 5350, 205, 2900],
];

/** Stiffness of its concrete frames after yield, over the initial one. */
const HARDENING = 0.03;

/**
 * Factors by which the seven synthetic motions are used; chosen so that storeys yield moderately, one is a little over the invented
 * limit, and none collapses.
 */
const FACTORS: readonly number[] = [1.6, 1.4, 2.5, 2.55, 2.3, 1.25, 1.6];

/** Five first periods of the clinic, to the half second [s]. */
const TAIL = 6.5;

/**
 * The example that a first visit opens: a frame, a brief and motions of our own, all invented. Nothing in it describes a real
 * building, site or record.
 */
export function demoProject(): OpenedProject {
  const samples = new Map<string, Float64Array>();
  const motions = demoMotions().map(({ name, interval, acceleration, origin }, i): MotionEntry => {
    const digest = digestOfSamples(acceleration);
    samples.set(digest, acceleration);
    return { name, interval, samples: digest, count: acceleration.length, scale: FACTORS[i] ?? 1, used: true, origin };
  });
  const storeys = CLINIC.map(
    ([name, height, weight, stiffness, strength]): StoreyRow => ({
      name,
      height,
      mass: fromDisplay(weight, 'weight', 'si'),
      stiffness: fromDisplay(stiffness, 'stiffness', 'si'),
      law: { kind: 'peak-oriented', strength: fromDisplay(strength, 'force', 'si'), hardening: HARDENING },
    }),
  );
  return {
    project: {
      title: 'Riverside clinic, transverse frame',
      frame: { storeys, damping: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] }, pDelta: true },
      motions,
      analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: 0.005, tail: TAIL, stopDrift: 0.1 },
      limits: {
        drift: 0.015,
        factor: 1,
        source:
          'Invented design brief 4.2: 1.5 % of storey height, design earthquake, mean of seven unreduced histories',
      },
    },
    samples,
  };
}
