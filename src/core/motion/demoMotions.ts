import { STANDARD_GRAVITY } from '../units/constants.ts';
import type { Motion } from './motion.ts';
import { syntheticMotion } from './synthetic.ts';

/** Invented stations: name, seed, interval [s], duration [s], peak [g], ground frequency [Hz] and damping, envelope [s]. */
const STATIONS: readonly (readonly [string, number, number, number, number, number, number, number, number, number])[] =
  [
    ['Alder Creek 000', 11, 0.01, 36, 0.31, 1.9, 0.45, 2.5, 9, 4.5],
    ['Brack Hill 090', 23, 0.01, 30, 0.44, 2.6, 0.5, 1.8, 8, 3.5],
    ['Corran Dam 045', 37, 0.005, 28, 0.27, 2.9, 0.55, 1.2, 6.5, 3.2],
    ['Dunmere 270', 41, 0.01, 40, 0.22, 1.5, 0.5, 3, 13, 5],
    ['Eskfoot 180', 59, 0.02, 48, 0.19, 1.3, 0.55, 4, 20, 6.5],
    ['Fallow Bridge 000', 67, 0.01, 32, 0.36, 2.2, 0.45, 2, 9, 3.8],
    ['Gannet Point 315', 83, 0.005, 30, 0.41, 1.6, 0.4, 1, 5.5, 2.8],
  ];

/** Seven seeded synthetic motions for the example; no station of these names exists. */
export function demoMotions(): Motion[] {
  return STATIONS.map(
    ([name, seed, interval, duration, peak, groundFrequency, groundDamping, strongFrom, strongTo, fade]) => ({
      name,
      interval,
      acceleration: syntheticMotion({
        seed,
        interval,
        duration,
        peak: peak * STANDARD_GRAVITY,
        groundFrequency,
        groundDamping,
        lowCut: 0.3,
        strongFrom,
        strongTo,
        fade,
      }),
      origin: {
        layout: `synthetic, seed ${seed}`,
        unit: 'm/s2',
        interval,
        station: name.slice(0, -4),
        component: name.slice(-3),
      },
    }),
  );
}
