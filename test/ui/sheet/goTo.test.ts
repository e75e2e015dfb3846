import { describe, expect, it } from 'vitest';
import { partOf } from '../../../src/ui/sheet/goTo.ts';

describe('the way from a fault to the analysis', () => {
  it('leads to the section that it stands in', () => {
    expect(partOf('analysis.method.gamma')).toBe('Method');
    expect(partOf('analysis.step')).toBe('Step');
    expect(partOf('analysis.stopDrift')).toBe('Step');
    expect(partOf('frame.damping.ratios[0]')).toBe('Damping');
    expect(partOf('frame.pDelta')).toBe('P-Delta');
    expect(partOf('limits.isolator')).toBe('Limit');
    expect(partOf('frame.storeys[0].height')).toBeNull();
  });
});
