import type { Fault } from '../../core/fault.ts';
import type { Project } from '../../document/project.ts';
import { cellOf, type InputColumn, type ShownColumns } from './columns.ts';

/** Columns that can be folded away. */
export type Foldable = 'hardening' | 'gravity' | 'damper' | 'answers';

/** What the reader chose to see; what is not named follows the width of the page and what is typed. */
export type Choice = Readonly<Partial<Record<Foldable, boolean>>>;

export interface Shown extends ShownColumns {
  /** Ductility and residual drift on the row. */
  readonly answers: boolean;
  /** Columns that hold something and are folded away. */
  readonly hidden: number;
}

/**
 * Which columns are shown: the reader's choice, else what is typed and fits. A fault is never folded away.
 *
 * @param narrow  the page has room for the least of them
 * @param roomy   it has room for ductility and residual drift too
 */
export function shownOf(
  { frame }: Pick<Project, 'frame'>,
  faults: readonly Fault[],
  choice: Choice,
  narrow: boolean,
  roomy: boolean,
): Shown {
  const faulty = new Set<InputColumn | undefined>(faults.map(({ where }) => cellOf(where)?.column));
  const yields = frame.storeys.some(({ law }) => law.kind !== 'elastic');
  const gravity = frame.pDelta && frame.storeys.some((storey) => storey.gravity !== undefined);
  const damper = frame.storeys.some((storey) => storey.damper !== undefined);
  const held = { hardening: yields, gravity, damper, answers: yields };
  const fits = { hardening: !narrow, gravity, damper, answers: roomy && yields };
  const shown = {
    hardening: faulty.has('hardening') || (choice.hardening ?? fits.hardening),
    gravity: frame.pDelta && (faulty.has('gravity') || (choice.gravity ?? fits.gravity)),
    damper: faulty.has('coefficient') || faulty.has('exponent') || (choice.damper ?? fits.damper),
    answers: yields && (choice.answers ?? fits.answers),
  };
  const keys = Object.keys(held) as Foldable[];
  return { ...shown, hidden: keys.filter((key) => held[key] && !shown[key]).length };
}
