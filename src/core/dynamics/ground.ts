/**
 * Ground acceleration at the steps of a run: linear between samples, from the last sample to zero over one more interval,
 * zero after. Entry j is at t = j x interval / parts [m/s2].
 *
 * @param acceleration  samples, sample 0 at t = 0, length >= 1 [m/s2]
 * @param parts         steps an interval, whole, >= 1
 * @param steps         number of steps; the result has steps + 1 entries
 */
export function groundAtSteps(acceleration: Float64Array, scale: number, parts: number, steps: number): Float64Array {
  const out = new Float64Array(steps + 1);
  const last = acceleration.length - 1;
  for (let sample = 0; sample <= last; sample++) {
    const from = scale * acceleration[sample];
    const rise = (sample < last ? scale * acceleration[sample + 1] : 0) - from;
    const start = sample * parts;
    const end = Math.min(parts, steps + 1 - start);
    for (let part = 0; part < end; part++) out[start + part] = from + rise * (part / parts);
  }
  return out;
}

/** Whole steps that fit in (samples - 1) x interval + tail: what lies past the end of the run is not computed. */
export function stepCount(samples: number, parts: number, size: number, tail: number): number {
  return (samples - 1) * parts + Math.floor(tail / size + 1e-9);
}
