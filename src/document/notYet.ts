import type { Fault } from '../core/fault.ts';
import { listOf, objectOf } from './raw.ts';

const YIELDING: ReadonlySet<unknown> = new Set(['bilinear', 'peak-oriented', 'bouc-wen', 'flag']);

/** What a project may hold and this version does not compute yet, on whatever stands there: refused in words, never ignored. */
export function notYet(raw: unknown): Fault[] {
  const project = objectOf(raw);
  const frame = objectOf(project?.frame);
  const faults: Fault[] = [];
  const refuse = (where: string, what: string, mend: string) =>
    faults.push({ code: 'not-available-yet', where, message: `${what} is not available yet in this version`, mend });
  for (const [i, entry] of listOf(frame?.storeys).entries()) {
    const storey = objectOf(entry);
    const at = `frame.storeys[${i}]`;
    const kind = objectOf(storey?.law)?.kind;
    if (YIELDING.has(kind)) {
      refuse(`${at}.law`, `the ${kind} law`, 'Make the storey elastic, or open the file in a later version');
    }
    if (storey?.damper !== undefined) {
      refuse(`${at}.damper`, 'a storey damper', 'Take it out, or open the file in a later version');
    }
    if (storey?.role === 'isolator') {
      refuse(`${at}.role`, 'an isolator', 'Take the role out, or open the file in a later version');
    }
  }
  const damping = objectOf(frame?.damping);
  if (damping?.kind === 'rayleigh' && damping.stiffness === 'tangent') {
    refuse('frame.damping.stiffness', 'Rayleigh damping on the tangent stiffness', 'Take "initial"');
  }
  if (objectOf(project?.analysis)?.step === 'auto') {
    refuse('analysis.step', 'a step chosen by halving ("auto")', 'Give a step in seconds, or { "parts": n }');
  }
  return faults;
}
