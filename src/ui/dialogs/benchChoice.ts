import type { MethodChoice } from '../../core/dynamics/run.ts';
import { BENCH_METHODS, BENCH_PARTS } from '../../core/dynamics/schemeBench.ts';
import type { AnalysisRow } from '../../document/project.ts';

/** A scheme as a key: two choices are the same scheme where their keys are. */
export function methodKey(method: MethodChoice): string {
  return JSON.stringify(Object.entries(method).sort(([a], [b]) => a.localeCompare(b)));
}

/** The schemes that can be set side by side: the usual ones, and the one of the document where it is none of them. */
export function methodsOnOffer(own: MethodChoice): readonly MethodChoice[] {
  const known = BENCH_METHODS.some((method) => methodKey(method) === methodKey(own));
  return known ? BENCH_METHODS : [own, ...BENCH_METHODS];
}

/** The steps that can be set side by side, as parts of the interval, coarsest first; `own`: what the runs take, where it is known. */
export function partsOnOffer(own: number | null): readonly number[] {
  if (own === null || BENCH_PARTS.includes(own)) return BENCH_PARTS;
  return [...BENCH_PARTS, own].sort((a, b) => a - b);
}

/** Parts of a motion's interval that the document asks for; null where halving chooses them, or nothing is typed. */
export function typedParts({ step }: Pick<AnalysisRow, 'step'>, interval: number): number | null {
  if (typeof step === 'number') return step > 0 ? Math.round(interval / step) : null;
  return typeof step === 'object' && step !== null ? step.parts : null;
}
