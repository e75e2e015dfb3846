import type { Envelope } from './envelope.ts';

/** The row that governs, from 0 at the ground: the storey nearest to its limit, or the isolator where it is nearer to its own; -1: none. */
export function governingRow({ isolator, ratio, governingStorey: at }: Envelope): number {
  const apart = isolator?.ratio ?? null;
  return apart !== null && !(at >= 0 && ratio !== null && ratio[at] >= apart) ? 0 : at;
}
