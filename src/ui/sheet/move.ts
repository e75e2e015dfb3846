import type { Selection } from '../../state/session.ts';

/** The grid that can be walked: columns from left to right, storeys from 0 at the ground. */
export interface Ground {
  readonly storeys: number;
  readonly columns: readonly string[];
}

export type Step = 'up' | 'down' | 'left' | 'right' | 'top' | 'bottom' | 'first' | 'last' | 'roof' | 'ground';

/** The storey and column a step leads to; the edge is the end. */
function cellAfter(storey: number, column: string, step: Step, ground: Ground): { storey: number; column: string } {
  const columns = ground.columns;
  const at = Math.max(0, columns.indexOf(column));
  const across = (index: number) => columns[Math.min(columns.length - 1, Math.max(0, index))] ?? column;
  const upright = (value: number) => Math.min(ground.storeys - 1, Math.max(0, value));
  switch (step) {
    case 'up':
      return { storey: upright(storey + 1), column };
    case 'down':
      return { storey: upright(storey - 1), column };
    case 'left':
      return { storey, column: across(at - 1) };
    case 'right':
      return { storey, column: across(at + 1) };
    case 'top':
      return { storey: ground.storeys - 1, column };
    case 'bottom':
      return { storey: 0, column };
    case 'first':
      return { storey, column: across(0) };
    case 'last':
      return { storey, column: across(columns.length - 1) };
    case 'roof':
      return { storey: ground.storeys - 1, column: across(0) };
    case 'ground':
      return { storey: 0, column: across(0) };
  }
}

/** One cell chosen. */
export function single(storey: number, column: string): Selection {
  return { storey, column, anchorStorey: storey, anchorColumn: column };
}

/** The selection after a step; `extend` keeps the far corner where it is. */
export function moved(selection: Selection, step: Step, extend: boolean, ground: Ground): Selection {
  const { storey, column } = cellAfter(selection.storey, selection.column, step, ground);
  return extend ? { ...selection, storey, column } : single(storey, column);
}

/** The rectangle a selection covers: storeys from low to high, columns from left to right. */
export function coverOf(
  selection: Selection,
  columns: readonly string[],
): { readonly low: number; readonly high: number; readonly columns: readonly string[] } {
  const from = columns.indexOf(selection.column);
  const to = columns.indexOf(selection.anchorColumn);
  return {
    low: Math.min(selection.storey, selection.anchorStorey),
    high: Math.max(selection.storey, selection.anchorStorey),
    columns: columns.slice(Math.min(from, to), Math.max(from, to) + 1),
  };
}
