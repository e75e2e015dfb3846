import type { Loop } from './loop.ts';
import type { LoopAxes } from './loopAxes.ts';

/**
 * What a loop shows, in as many words as the head of its panel has room for: whether a damper's force is in it or apart, as
 * the shear beside it on the sheet is that of both.
 *
 * @param at      the storey, from 0
 * @param letter  of the motion
 */
export function loopWords(
  { which, storey }: Pick<Loop, 'which' | 'storey'>,
  { force, drift }: Pick<LoopAxes, 'force' | 'drift'>,
  at: number,
  letter: string,
): string {
  const place = `storey ${at + 1}`;
  if (storey.damper === undefined) return `${place} under ${letter}; ${force.unit} against ${drift.unit}`;
  const units = `${force.unit}, ${drift.unit}`;
  if (which === 'law') return `${place} under ${letter}, damper apart; ${units}`;
  return `${which === 'shear' ? `${place} with damper` : `damper of ${place}`}; ${units}`;
}
