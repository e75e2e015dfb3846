import type { Quantity } from '../units/quantities.ts';

export type Cell = number | string | null;

/** One column: SI values (or words), top row first, with what they measure, so that a head can carry their unit. */
export interface Column {
  /** Stable within its table, in camel case: `meanDriftRatio`. */
  readonly key: string;
  /** Head in words, without a unit. */
  readonly name: string;
  readonly quantity: Quantity | 'text';
  /** Null where there is none: a suite that is not complete, a value that this frame does not have. */
  readonly values: readonly Cell[];
  /** On the screen and on paper; absent: the quantity's own. A file always gets full precision. */
  readonly decimals?: number;
}

/** A result table as columns of equal length. The screen, the note and the files all print these. */
export interface Table {
  /** Stable, and safe as a file name: `storey-response`. */
  readonly id: string;
  readonly title: string;
  readonly columns: readonly Column[];
}

/** Decimals that show three figures of each value, and no more than it has: 2 of 0.01, 4 of 0.0025. */
export function decimalsOf(values: readonly number[]): number {
  const decimals = (value: number) => String(Number(value.toPrecision(3))).split('.')[1]?.length ?? 0;
  return Math.max(0, ...values.map(decimals));
}

/** Values of ground-up arrays from the roof down, as the sheet shows them; nulls where there is none (NaN, what is not finite). */
export function roofFirst(values: ArrayLike<number | null> | null | undefined, n: number): Cell[] {
  return Array.from({ length: n }, (_, row) => {
    const value = values?.[n - 1 - row] ?? null;
    return Number.isFinite(value) ? value : null;
  });
}
