import { prepareFrame } from '../core/doors.ts';
import type { Result } from '../core/fault.ts';
import type { Frame } from '../core/frame/frame.ts';
import type { Swaying } from '../core/frame/stiffening.ts';
import type { Case } from '../document/case.ts';
import type { Project } from '../document/project.ts';

/**
 * The frame of a document as it sways freely; null where it cannot stand. A step, a limit, a motion or a damping that is at
 * fault takes nothing from the modes: they are those of masses, stiffnesses and gravity alone.
 */
export function standingFrame({ frame }: Project, found: Result<Case>): Swaying | null {
  if (frame.storeys.length === 0) return null;
  if (found.ok) return found.value.prepared;
  const own = found.faults.some(({ where }) => where.startsWith('frame') && !where.startsWith('frame.damping'));
  if (own) return null;
  const prepared = prepareFrame({ ...(frame as Frame), damping: { kind: 'none' } });
  return prepared.ok ? prepared.value : null;
}
