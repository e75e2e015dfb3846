import { useMemo } from 'react';
import type { MotionEntry, Project } from '../../document/project.ts';
import { samplesOf } from '../../state/samples.ts';
import type { ShownRun } from '../plots/useShownRun.ts';

/** The chosen motion on its time axis. */
export interface TimeAxisFacts {
  readonly entry: MotionEntry | null;
  readonly index: number;
  /** As stored [m/s2]; null where they are not at hand. */
  readonly samples: Float64Array | null;
  /** Factor on them; null while it is not typed. */
  readonly scale: number | null;
  /** When the last sample acts [s]. */
  readonly lastSample: number;
  /** End of the axis: of the run, or what a run would cover [s]. */
  readonly end: number;
  /** One step of the cursor [s]. */
  readonly step: number;
}

export function useTimeAxis(project: Project, motion: string | null, shown: ShownRun | null): TimeAxisFacts {
  const index = project.motions.findIndex(({ name }) => name === motion);
  const entry = project.motions[index] ?? null;
  const { tail } = project.analysis;
  const run = shown?.run ?? null;
  return useMemo(() => {
    const lastSample = entry === null ? 0 : (entry.count - 1) * entry.interval;
    const free = typeof tail === 'number' && tail > 0 ? tail : 0;
    return {
      entry,
      index,
      samples: entry === null ? null : (samplesOf(entry.samples) ?? null),
      scale: typeof entry?.scale === 'number' ? entry.scale : null,
      lastSample,
      end: Math.max(run === null ? lastSample + free : run.steps * run.step, entry?.interval ?? 1),
      step: run?.step ?? entry?.interval ?? 0.01,
    };
  }, [entry, index, tail, run]);
}
