import { describe, expect, it } from 'vitest';
import { methodWords } from '../../../src/ui/foot/analysisWords.ts';

describe('methodWords', () => {
  it('says the usual fractions as such, and other numbers in few figures', () => {
    expect(methodWords({ kind: 'newmark', beta: 0.25, gamma: 0.5 })).toBe('Newmark, β ¼, γ ½');
    expect(methodWords({ kind: 'newmark', beta: 1 / 6, gamma: 0.5 })).toBe('Newmark, β 1/6, γ ½');
    expect(methodWords({ kind: 'newmark', beta: 0.3025, gamma: 0.6 })).toBe('Newmark, β 0.3025, γ 0.6');
    expect(methodWords({ kind: 'hht', alpha: -0.1 })).toBe('HHT-α, α −0.1');
  });
});
