import { expect, test } from 'vitest';
import { damperForce, yieldDrift } from '../../../src/core/frame/storeyFacts.ts';

test('a storey yields at strength over stiffness', () => {
  expect(yieldDrift(9.03e6, 4.55e8)).toBeCloseTo(0.019846, 6);
});

test('a damper pushes against the velocity by its power law, both ways alike', () => {
  expect(damperForce({ coefficient: 2e6, exponent: 1 }, 0.1)).toBeCloseTo(2e5, 6);
  expect(damperForce({ coefficient: 2e6, exponent: 0.5 }, 0.25)).toBeCloseTo(1e6, 6);
  expect(damperForce({ coefficient: 2e6, exponent: 2 }, -0.1)).toBeCloseTo(-2e4, 6);
  expect(damperForce({ coefficient: 2e6, exponent: 0.3 }, 0)).toBe(0);
});
