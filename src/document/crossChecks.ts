import type { Fault } from '../core/fault.ts';
import { proportionFaults } from './proportions.ts';
import { listOf, objectOf } from './raw.ts';

/**
 * What no key can tell alone, on whatever stands there (parts that are of the wrong shape have faults of their own and are
 * passed over): modes that exist and differ, Rayleigh damping on more than one storey, names of motions, a reason for what is
 * left out, hardening and flag height that fit together.
 */
export function crossChecks(raw: unknown): Fault[] {
  const project = objectOf(raw);
  const frame = objectOf(project?.frame);
  const storeys = listOf(frame?.storeys);
  return [
    ...dampingFaults(objectOf(frame?.damping), storeys.length),
    ...storeys.flatMap((entry, i) => lawFaults(objectOf(objectOf(entry)?.law), `frame.storeys[${i}].law`)),
    ...storeys.flatMap((entry, i) => roleFaults(objectOf(entry), i)),
    ...proportionFaults(storeys),
    ...motionFaults(listOf(project?.motions)),
  ];
}

function dampingFaults(damping: Record<string, unknown> | null, storeys: number): Fault[] {
  if (damping === null || storeys === 0) return [];
  const faults: Fault[] = [];
  const exists = (mode: unknown, where: string) => {
    if (typeof mode !== 'number' || !Number.isSafeInteger(mode) || mode < 1 || mode <= storeys) return;
    faults.push({
      code: 'no-such-mode',
      where,
      message: `mode ${mode} is not there: a frame of ${storeys} ${storeys === 1 ? 'storey' : 'storeys'} has ${storeys} ${storeys === 1 ? 'mode' : 'modes'}`,
      mend: `Type a mode from 1 to ${storeys}`,
    });
  };
  if (damping.kind === 'rayleigh') {
    if (storeys === 1) {
      const message = 'Rayleigh damping needs two modes, and one storey has one';
      return [{ code: 'rayleigh-on-one-storey', where: 'frame.damping', message, mend: 'Choose modal damping' }];
    }
    const [i, j] = listOf(damping.modes);
    exists(i, 'frame.damping.modes[0]');
    exists(j, 'frame.damping.modes[1]');
    if (typeof i === 'number' && i === j) {
      const message = `both modes are mode ${i}, they must differ`;
      faults.push({ code: 'same-mode', where: 'frame.damping.modes[1]', message, mend: 'Type two different modes' });
    }
  }
  if (damping.kind === 'stiffness-proportional') exists(damping.mode, 'frame.damping.mode');
  return faults;
}

/** How far typed decimals may be from adding up. */
const ROUNDING = 1e-9;

function lawFaults(law: Record<string, unknown> | null, where: string): Fault[] {
  if (law?.kind === 'bouc-wen' && typeof law.beta === 'number' && typeof law.gamma === 'number') {
    if (law.beta >= 0.5 && law.gamma > 0.5 + ROUNDING) {
      const message = `is ${short(law.gamma)}, must be at most 0.5: beta is 1 - gamma, and 0.5 or more`;
      return [{ code: 'out-of-range', where: `${where}.gamma`, message, mend: 'Type a gamma of at most 0.5' }];
    }
    if (law.beta >= 0.5 && !(Math.abs(law.beta + law.gamma - 1) <= ROUNDING)) {
      const message = `beta + gamma is ${short(law.beta + law.gamma)}, must be 1`;
      const mend = `Type gamma ${short(1 - law.beta)}, or beta ${short(1 - law.gamma)}`;
      return [{ code: 'out-of-range', where: `${where}.gamma`, message, mend }];
    }
  }
  if (law?.kind === 'flag' && typeof law.ratio === 'number' && typeof law.hardening === 'number') {
    if (law.ratio <= 1 && law.ratio > 1 - law.hardening + ROUNDING) {
      const most = short(1 - law.hardening);
      const message = `is ${short(law.ratio)}, must be at most 1 - hardening = ${most}: more would not re-centre`;
      return [{ code: 'out-of-range', where: `${where}.ratio`, message, mend: `Type a ratio of at most ${most}` }];
    }
  }
  return [];
}

function roleFaults(storey: Record<string, unknown> | null, i: number): Fault[] {
  if (storey?.role !== 'isolator' || i === 0) return [];
  const message = 'only the first storey can be an isolator';
  return [
    {
      code: 'isolator-not-first',
      where: `frame.storeys[${i}].role`,
      message,
      mend: 'Move it to the ground, or take the role out',
    },
  ];
}

function motionFaults(motions: readonly unknown[]): Fault[] {
  const faults: Fault[] = [];
  const first = new Map<string, number>();
  for (const [i, entry] of motions.entries()) {
    const motion = objectOf(entry);
    if (motion === null) continue;
    const { name, used, reason } = motion;
    if (typeof name === 'string') {
      const before = first.get(name);
      if (before === undefined) first.set(name, i);
      else {
        const message = `"${name}" is also the name of motion ${before + 1}: names are unique in a project`;
        faults.push({ code: 'same-name', where: `motions[${i}].name`, message, mend: 'Give it another name' });
      }
    }
    if (used === false && (typeof reason !== 'string' || reason.trim() === '')) {
      const message = 'the motion is left out and no reason is given';
      faults.push({
        code: 'no-reason',
        where: `motions[${i}].reason`,
        message,
        mend: 'Type why it is left out, or use it',
      });
    }
  }
  return faults;
}

/** Without the last bits that a difference of decimals gets wrong: 0.97 and not 0.9700000000000001. */
function short(value: number): string {
  return String(Number(value.toPrecision(12)));
}
