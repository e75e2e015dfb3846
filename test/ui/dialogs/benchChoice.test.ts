import { describe, expect, it } from 'vitest';
import { BENCH_METHODS, BENCH_PARTS } from '../../../src/core/dynamics/schemeBench.ts';
import { methodKey, methodsOnOffer, partsOnOffer, typedParts } from '../../../src/ui/dialogs/benchChoice.ts';

describe('what is set side by side', () => {
  it('takes the scheme of the document in where it is none of the usual ones, in whatever order its numbers stand', () => {
    expect(methodsOnOffer({ kind: 'newmark', gamma: 0.5, beta: 0.25 })).toBe(BENCH_METHODS);
    const own = { kind: 'hht', alpha: -0.2 } as const;
    expect(methodsOnOffer(own)).toEqual([own, ...BENCH_METHODS]);
    expect(new Set(methodsOnOffer(own).map(methodKey)).size).toBe(BENCH_METHODS.length + 1);
  });

  it('takes the step of the document in, coarsest first', () => {
    expect(partsOnOffer(null)).toBe(BENCH_PARTS);
    expect(partsOnOffer(2)).toBe(BENCH_PARTS);
    expect(partsOnOffer(3)).toEqual([1, 2, 3, 4, 8]);
  });

  it('reads seconds as parts of the interval; a step that halving chooses is not known from the document', () => {
    expect(typedParts({ step: 0.0025 }, 0.01)).toBe(4);
    expect(typedParts({ step: { parts: 3 } }, 0.01)).toBe(3);
    expect(typedParts({ step: 'auto' }, 0.01)).toBeNull();
    expect(typedParts({ step: null }, 0.01)).toBeNull();
  });
});
