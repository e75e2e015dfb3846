import { useDeferredValue, useMemo, useRef } from 'react';
import type { Run } from '../../core/dynamics/run.ts';
import type { Answers } from '../../state/answers.ts';
import { useResults } from '../../state/results.ts';
import { useChosenMotion, useChosenStorey } from '../../state/selectors.ts';

/** The run with histories that the panels show. */
export interface ShownRun {
  readonly motion: string;
  readonly run: Run;
  readonly answers: Answers;
  /** Storey whose histories are shown, from 0. */
  readonly storey: number;
  /** Of the storeys of that run [m]. */
  readonly heights: readonly number[];
}

/**
 * The chosen motion's run with histories. While a newer one of the same motion is computed the last one stays; of another
 * motion, or of another number of storeys, none is shown. The panels follow the bars: theirs is a rendering of its own, after
 * the answers stand on the sheet.
 */
export function useShownRun(): { readonly shown: ShownRun | null; readonly old: boolean } {
  const chosen = useResults((state) => state.chosen);
  const answers = useResults((state) => state.answers);
  const old = useResults((state) => state.status === 'stale' || (state.status === 'running' && state.slow));
  const motion = useChosenMotion();
  const storey = useChosenStorey();
  const last = useRef(chosen);
  if (chosen !== null) last.current = chosen;
  const run = last.current?.motion === motion ? last.current.run : null;
  const shown = useMemo((): ShownRun | null => {
    if (run === null || run.histories === null || answers === null || motion === null) return null;
    const heights = answers.case.frame.storeys.map(({ height }) => height);
    if (run.histories.displacement.length !== heights.length * run.histories.count) return null;
    return { motion, run, answers, storey: Math.min(storey, heights.length - 1), heights };
  }, [run, answers, motion, storey]);
  return { shown: useDeferredValue(shown), old };
}
