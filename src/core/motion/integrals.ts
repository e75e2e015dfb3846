/**
 * Velocity at the samples: the exact integral of the broken line, from rest.
 *
 * @param acceleration  [m/s2]; @param interval [s]
 * @returns length as the samples [m/s]
 */
export function velocityOf(acceleration: Float64Array, interval: number): Float64Array {
  const out = new Float64Array(acceleration.length);
  for (let i = 1; i < out.length; i++) out[i] = out[i - 1] + (interval / 2) * (acceleration[i - 1] + acceleration[i]);
  return out;
}

/**
 * Displacement at the samples: the exact double integral of the broken line, from rest.
 *
 * @param velocity  as of `velocityOf` for the same samples [m/s]
 * @returns length as the samples [m]
 */
export function displacementOf(acceleration: Float64Array, velocity: Float64Array, interval: number): Float64Array {
  const out = new Float64Array(acceleration.length);
  const h = interval;
  for (let i = 1; i < out.length; i++) {
    out[i] = out[i - 1] + h * velocity[i - 1] + ((h * h) / 6) * (2 * acceleration[i - 1] + acceleration[i]);
  }
  return out;
}
