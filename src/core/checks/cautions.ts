import type { Caution, CautionInput } from './cautions/caution.ts';
import { dampingCautions } from './cautions/damping.ts';
import { limitCautions } from './cautions/limit.ts';
import { motionCautions } from './cautions/motions.ts';
import { stepCautions } from './cautions/step.ts';
import { storeyCautions } from './cautions/storeys.ts';

export type { Caution, CautionInput } from './cautions/caution.ts';

/** All cautions: exceeded, failed, storeys, damping, numerics, motions, in that order. */
export function cautionsOf(input: CautionInput): Caution[] {
  return [limitCautions, storeyCautions, dampingCautions, stepCautions, motionCautions].flatMap((of) => of(input));
}
