import { describe, expect, it } from 'vitest';
import { axisUnitOf } from '../../../src/core/units/axisUnit.ts';
import { valueWords } from '../../../src/ui/plots/valueWords.ts';

describe('valueWords', () => {
  const drift = axisUnitOf('drift', 'si', 0.3);

  it('shows the figure of a value that is small on its axis', () => {
    expect(drift.decimals).toBe(0);
    expect(valueWords(drift, 0.0462)).toBe('46 mm');
    expect(valueWords(drift, -0.0003)).toMatch(/^[-−]0\.3 mm$/);
    expect(valueWords(drift, 0.00004)).toBe('0.04 mm');
  });

  it('shows nothing as 0, without a sign', () => {
    expect(valueWords(drift, 0)).toBe('0 mm');
    expect(valueWords(drift, -1e-12)).toBe('0 mm');
  });
});
