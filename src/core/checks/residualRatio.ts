import type { Frame } from '../frame/frame.ts';
import type { Envelope } from './envelope.ts';

/**
 * Residual drift over storey height of the statistic that is compared, ground up [-]; null while there is no statistic. A height is
 * the same in every run, so the statistic of the ratios is the ratio of the statistic.
 */
export function residualRatios({ residualDrift, measure }: Envelope, { storeys }: Pick<Frame, 'storeys'>) {
  return residualDrift?.[measure].map((drift, i) => drift / storeys[i].height) ?? null;
}
