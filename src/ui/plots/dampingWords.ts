import { printQuantity } from '../../core/units/quantities.ts';
import type { DampingPicture } from './dampingPlot.ts';

/** The picture in a sentence. */
export function dampingSentence({ modes, ratios }: DampingPicture): string {
  const listed = modes
    .slice(0, 3)
    .map(
      ({ period }, i) =>
        `mode ${i + 1} of ${printQuantity(period, 'time', 'si')} s ${printQuantity(ratios[i], 'percent', 'si', 1)} percent`,
    );
  return `Damping by period: ${listed.join(', ')}`;
}
