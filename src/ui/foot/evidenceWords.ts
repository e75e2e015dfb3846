import { printQuantity } from '../../core/units/quantities.ts';

/** A ratio as percent with two figures that count. */
export function percent(ratio: number): string {
  if (ratio < 0.00001) return 'under 0.001 %';
  return `${printQuantity(ratio, 'percent', 'si', decimalsOf(ratio))} %`;
}

/** The same beside an aim: with as many more decimals as it takes to tell the two apart, two at most. */
export function percentBeside(aim: number, ratio: number): string {
  if (ratio < 0.00001 || ratio === aim) return percent(ratio);
  const least = decimalsOf(ratio);
  const print = (value: number, decimals: number) => printQuantity(value, 'percent', 'si', decimals);
  let decimals = least;
  while (decimals < least + 2 && print(ratio, decimals) === print(aim, decimals)) decimals++;
  return `${print(ratio, decimals)} %`;
}

function decimalsOf(ratio: number): number {
  return ratio >= 0.01 ? 1 : ratio >= 0.00005 ? 2 : 3;
}

/** "7 runs", and how many of them ended early. @param finished  of each run, whether it came to its end */
export function runsWords(finished: readonly boolean[]): string {
  const early = finished.filter((one) => !one).length;
  const runs = finished.length === 1 ? '1 run' : `${finished.length} runs`;
  if (early === 0) return runs;
  return `${runs}${finished.length === early ? (early === 1 ? '' : ', all') : `, ${early}`} ended early,`;
}

/** @param took [ms] */
export function tookWords(took: number): string {
  return took < 10 ? 'under 0.01 s' : `${printQuantity(took / 1000, 'time', 'si', 2)} s`;
}
