import { useDeferredValue, useEffect, useMemo, useRef, useState } from 'react';
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
 * The chosen motion's run with histories. While a newer one is on its way the last one stays, with the motion and storey that
 * it belongs to; once there are no answers, or the frame has another number of storeys, none is shown. The panels follow the bars: theirs is a rendering
 * of its own, after the answers stand on the sheet.
 */
export function useShownRun(): { readonly shown: ShownRun | null; readonly old: boolean } {
  const chosen = useResults((state) => state.chosen);
  const answers = useResults((state) => state.answers);
  const old = useResults((state) => state.status === 'stale' || (state.status === 'running' && state.slow));
  const motion = useChosenMotion();
  const storey = useChosenStorey();
  const shown = useMemo((): ShownRun | null => {
    if (chosen === null || chosen.motion !== motion || chosen.run.histories === null || answers === null) return null;
    const heights = answers.case.frame.storeys.map(({ height }) => height);
    if (chosen.run.histories.displacement.length !== heights.length * chosen.run.histories.count) return null;
    return { motion, run: chosen.run, answers, storey: Math.min(storey, heights.length - 1), heights };
  }, [chosen, answers, motion, storey]);
  const last = useRef(shown);
  // No answers at all: another document, in which nothing was run yet.
  if (shown !== null || answers === null) last.current = shown;
  const kept =
    answers !== null && last.current?.heights.length === answers.case.frame.storeys.length ? last.current : null;
  const late = useLate(shown === null);
  return { shown: useDeferredValue(shown ?? kept), old: old || late };
}

/** Histories are on their way for a moment after each answer; what is still shown after this is marked as old [ms]. */
const MOMENT = 500;

/** Whether something has been awaited for longer than a moment. */
function useLate(awaited: boolean): boolean {
  const [late, setLate] = useState(false);
  useEffect(() => {
    setLate(false);
    if (!awaited) return;
    const timer = setTimeout(() => setLate(true), MOMENT);
    return () => clearTimeout(timer);
  }, [awaited]);
  return late;
}
