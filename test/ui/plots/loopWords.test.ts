import { describe, expect, it } from 'vitest';
import { axisUnitOf } from '../../../src/core/units/axisUnit.ts';
import { loopWords } from '../../../src/ui/plots/loopWords.ts';

const axes = { force: axisUnitOf('force', 'si', 4e5), drift: axisUnitOf('drift', 'si', 0.02) };
const bare = { name: '', height: 3, mass: 1, stiffness: 1e8, law: { kind: 'elastic' as const } };
const damped = { ...bare, damper: { coefficient: 5e5, exponent: 0.5 } };

describe('loopWords', () => {
  it('says whether the damper of the storey is in the force', () => {
    expect(loopWords({ which: 'law', storey: bare }, axes, 2, 'B')).toBe('storey 3 under B; kN against mm');
    expect(loopWords({ which: 'law', storey: damped }, axes, 2, 'B')).toBe('storey 3 under B, damper apart; kN, mm');
    expect(loopWords({ which: 'shear', storey: damped }, axes, 2, 'B')).toBe('storey 3 with damper; kN, mm');
    expect(loopWords({ which: 'damper', storey: damped }, axes, 2, 'B')).toBe('damper of storey 3; kN, mm');
  });
});
