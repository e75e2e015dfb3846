import { never } from '../fault.ts';
import type { MethodChoice } from './run.ts';

/**
 * A time-stepping scheme of the one family: four numbers with order and source.
 *   M a(n+1-am) + C v(n+1-af) + f(n+1-af) = p(n+1-af), weights (1 - am), am and (1 - af), af on n+1 and n;
 *   u(n+1) = u + h v + h^2 [(1/2 - beta) a + beta a(n+1)],  v(n+1) = v + h [(1 - gamma) a + gamma a(n+1)].
 */
export interface Method {
  readonly name: string;
  /** Order of accuracy of displacement and velocity. */
  readonly order: 1 | 2;
  readonly am: number;
  readonly af: number;
  readonly beta: number;
  readonly gamma: number;
  readonly source: string;
}

const NEWMARK = 'Newmark (1959), J. Eng. Mech. Div. ASCE 85(EM3), 67-94';

/** The four numbers of a choice. @throws RangeError outside of the ranges of the project file */
export function methodOf(choice: MethodChoice): Method {
  switch (choice.kind) {
    case 'newmark': {
      const { beta, gamma } = choice;
      require('gamma', gamma, 0.5, Number.POSITIVE_INFINITY);
      require('beta', beta, 0, Number.POSITIVE_INFINITY);
      return {
        name: newmarkName(beta, gamma),
        order: gamma === 0.5 ? 2 : 1,
        am: 0,
        af: 0,
        beta,
        gamma,
        source: NEWMARK,
      };
    }
    case 'generalized-alpha': {
      const r = choice.spectralRadius;
      require('spectralRadius', r, 0, 1);
      const am = (2 * r - 1) / (r + 1);
      const af = r / (r + 1);
      const beta = (1 - am + af) ** 2 / 4;
      const source = 'Chung and Hulbert (1993), J. Appl. Mech. 60, 371-375';
      return { name: `generalized-alpha, spectral radius ${r}`, order: 2, am, af, beta, gamma: 0.5 - am + af, source };
    }
    case 'hht': {
      const { alpha } = choice;
      require('alpha', alpha, -1 / 3, 0);
      const source = 'Hilber, Hughes and Taylor (1977), Earthq. Eng. Struct. Dyn. 5, 283-292';
      return {
        name: `HHT, alpha ${alpha}`,
        order: 2,
        am: 0,
        af: 0 - alpha,
        beta: (1 - alpha) ** 2 / 4,
        gamma: 0.5 - alpha,
        source,
      };
    }
    case 'central-difference':
      return { name: 'central difference', order: 2, am: 0, af: 0, beta: 0, gamma: 0.5, source: NEWMARK };
    default:
      return never(choice);
  }
}

/**
 * Largest omega x step for which the scheme is stable, undamped; Infinity where it is stable at any step. For the Newmark
 * family 1 / sqrt(gamma / 2 - beta) where 2 beta < gamma; physical damping does not lower it for gamma >= 1/2. The HHT and
 * generalized-alpha schemes are stable at any step within their ranges.
 * Source: Hughes, The Finite Element Method, section 9.1.2 (from memory); published check A9.
 */
export function stabilityLimit(method: Method): number {
  const { am, af, beta, gamma } = method;
  return am === 0 && af === 0 && 2 * beta < gamma ? 1 / Math.sqrt(gamma / 2 - beta) : Number.POSITIVE_INFINITY;
}

/**
 * Spectral radius of the scheme as omega x step grows without bound: 1 keeps the highest modes' amplitude, 0 removes it in a
 * step. Source: for 2 beta >= gamma, the roots of the amplification matrix at infinity, (am / (am - 1)-type root included);
 * closed forms in Chung and Hulbert (1993) and published check A7.
 */
export function spectralRadiusAtInfinity(method: Method): number {
  const { af, beta, gamma } = method;
  if (stabilityLimit(method) < Number.POSITIVE_INFINITY) return Number.POSITIVE_INFINITY;
  // At infinity the equation is (1 - af) u(n+1) + af u(n) = 0, one root -af / (1 - af); the other two are those of the
  // 2 x 2 update that remains, lambda^2 beta + lambda (gamma + 1/2 - 2 beta) + (1/2 + beta - gamma) = 0.
  const first = af / (1 - af);
  const b = gamma + 0.5 - 2 * beta;
  const c = 0.5 + beta - gamma;
  const discriminant = b * b - 4 * beta * c;
  const second =
    discriminant >= 0 ? (Math.abs(b) + Math.sqrt(discriminant)) / (2 * beta) : Math.sqrt(Math.max(0, c / beta));
  return Math.max(first, second);
}

function newmarkName(beta: number, gamma: number): string {
  if (gamma === 0.5 && beta === 0.25) return 'average acceleration (Newmark)';
  if (gamma === 0.5 && Math.abs(beta - 1 / 6) < 1e-12) return 'linear acceleration (Newmark)';
  return `Newmark, beta ${beta}, gamma ${gamma}`;
}

function require(name: string, value: number, from: number, to: number): void {
  if (!(value >= from && value <= to)) throw new RangeError(`${name}: ${value}, expected ${from} to ${to}`);
}
