import { describe, expect, it } from 'vitest';
import { axisUnitOf } from '../../../src/core/units/axisUnit.ts';

describe('axisUnitOf', () => {
  it('keeps the unit of the sheet until the numbers get long', () => {
    expect(axisUnitOf('force', 'si', 4.9e6)).toMatchObject({ unit: 'kN', decimals: 0 });
    expect(axisUnitOf('force', 'si', -11.02e6)).toMatchObject({ unit: 'MN', decimals: 2 });
    expect(axisUnitOf('energy', 'si', 9e6).unit).toBe('MJ');
    expect(axisUnitOf('displacement', 'si', 90).unit).toBe('mm');
  });

  it('prints a value of the axis and a value in SI alike', () => {
    const forces = axisUnitOf('force', 'si', 11.02e6);
    expect(forces.onAxis(11.02e6)).toBeCloseTo(11.02, 12);
    expect(forces.print(-6.854e6, 2)).toBe('−6.85');
    expect(forces.printTick(-10, 0)).toBe('−10');
    const drifts = axisUnitOf('percent', 'si', 0.03);
    expect(drifts.print(-0.0299, 2)).toBe('−2.99');
    expect(drifts.printTick(3, 0)).toBe('3');
  });

  it('knows the customary units: kip inches become kip feet', () => {
    const energy = axisUnitOf('energy', 'us', 1e6);
    // 1 MJ = 8850.7 kip in = 737.56 kip ft. Source: NIST SP 811 (2008), appendix B.8, 1 ft lbf = 1.355818 J.
    expect(energy.unit).toBe('kip ft');
    expect(energy.onAxis(1e6)).toBeCloseTo(737.562, 2);
    expect(axisUnitOf('force', 'us', 1e8).unit).toBe('kip');
  });
});
