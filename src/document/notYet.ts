import type { Fault } from '../core/fault.ts';
import type { FileProject } from './schema.ts';

/** What the file may hold and this version does not compute yet: refused in words, never ignored. */
export function notYet({ frame, analysis }: FileProject): Fault[] {
  const faults: Fault[] = [];
  const refuse = (where: string, what: string, mend: string) =>
    faults.push({ code: 'not-available-yet', where, message: `${what} is not available yet in this version`, mend });
  for (const [i, { law, damper, role }] of frame.storeys.entries()) {
    const at = `frame.storeys[${i}]`;
    if (law.kind !== 'elastic')
      refuse(`${at}.law`, `the ${law.kind} law`, 'Make the storey elastic, or open the file in a later version');
    if (damper !== undefined)
      refuse(`${at}.damper`, 'a storey damper', 'Take it out, or open the file in a later version');
    if (role === 'isolator')
      refuse(`${at}.role`, 'an isolator', 'Take the role out, or open the file in a later version');
  }
  if (frame.damping.kind === 'rayleigh' && frame.damping.stiffness === 'tangent') {
    refuse('frame.damping.stiffness', 'Rayleigh damping on the tangent stiffness', 'Take "initial"');
  }
  if (analysis.step === 'auto')
    refuse('analysis.step', 'a step chosen by halving ("auto")', 'Give a step in seconds, or { "parts": n }');
  return faults;
}
