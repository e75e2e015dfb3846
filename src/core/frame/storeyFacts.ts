import type { Damper } from './frame.ts';

/** Drift at which a storey yields, strength / initial stiffness [m]. Source: the project-file page. */
export function yieldDrift(strength: number, stiffness: number): number {
  return strength / stiffness;
}

/**
 * Force of a viscous storey damper at a drift velocity [N], F = c |v|^a sgn(v).
 * Source: Soong and Constantinou (1994), Passive and Active Structural Vibration Control (from memory).
 *
 * @param velocity  [m/s]
 */
export function damperForce({ coefficient, exponent }: Damper, velocity: number): number {
  return Math.sign(velocity) * coefficient * Math.abs(velocity) ** exponent;
}
