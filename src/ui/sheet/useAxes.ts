import { useRef } from 'react';
import type { AnswerRows } from './answerRows.ts';
import { type Axis, axisFor } from './axis.ts';

export interface Axes {
  readonly drift: Axis;
  readonly shear: Axis;
  readonly acceleration: Axis;
}

/** The axes of the sheet. They hold their range while a cell is edited, so that bars and not the axis move. */
export function useAxes(answers: AnswerRows | null, limit: number | null, editing: boolean): Axes {
  const held = useRef<Axes | null>(null);
  if (editing && held.current !== null) return held.current;
  const axes = axesOf(answers, limit);
  held.current = answers === null ? null : axes;
  return axes;
}

function axesOf(answers: AnswerRows | null, limit: number | null): Axes {
  const aim = limit ?? 0;
  if (answers === null) return { drift: axisFor(1.5 * aim, 3.6), shear: axisFor(0, 2), acceleration: axisFor(0, 2) };
  // A run that broke off says nothing of the scale: its storey carries an X. Nor does an isolator, whose limit is another.
  const rows = (values: readonly number[]) => values.slice(answers.isolator === null ? 0 : 1);
  const drifts = answers.motions.flatMap(({ drift, finished }) => (finished ? rows(drift) : []));
  const accelerations = answers.motions.flatMap(({ acceleration }) => acceleration);
  return {
    drift: axisFor(Math.max(1.08 * aim, ...drifts, ...rows(answers.drift ?? [])), 3.6),
    shear: filled(Math.max(0, ...(answers.shear ?? []), ...reached(answers))),
    acceleration: axisFor(Math.max(0, ...accelerations), 2),
  };
}

/** Strengths that the axis of shear holds: one far beyond what its storey carries does not set the scale. */
function reached({ strengths, shear }: AnswerRows): number[] {
  const largest = Math.max(0, ...(shear ?? []));
  return strengths.filter((value): value is number => value !== null && (largest === 0 || value <= 1.25 * largest));
}

/** A small axis that its largest value fills, whatever its numbers. */
function filled(largest: number): Axis {
  return largest > 0 ? { ...axisFor(largest, 2), end: 1.1 * largest } : axisFor(0, 2);
}
