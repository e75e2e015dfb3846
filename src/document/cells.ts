import * as z from 'zod/mini';
import type { Fault } from '../core/fault.ts';
import { crossChecks } from './crossChecks.ts';
import { faultsOf } from './faults.ts';
import type { Project } from './project.ts';
import { analysisSchema, frameSchema, limitsSchema, motionUse } from './schema.ts';

/** What of a document is checked; samples, counts and origins are the program's own. */
const cellsSchema = z.object({
  frame: frameSchema,
  analysis: analysisSchema,
  limits: limitsSchema,
  motions: z.array(z.object(motionUse)),
});

/**
 * Everything that keeps the cells of a document from being a case: not typed, not readable, out of range, a reference to what
 * is not there. The same faults, at the same places, as in the project file.
 */
export function cellFaults(project: Project): Fault[] {
  const parsed = cellsSchema.safeParse(project);
  return [...(parsed.success ? [] : faultsOf(parsed.error, project)), ...crossChecks(project)];
}
