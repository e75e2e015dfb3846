import type { System } from '../../core/units/quantities.ts';
import { type ColumnReading, readColumn } from '../../core/units/read.ts';
import { growTo, setLaw } from '../../document/edits.ts';
import { writeAt } from '../../document/fields.ts';
import { MAX_STOREYS, type Project, type Typed } from '../../document/project.ts';
import { COLUMN_NAMES, COLUMN_QUANTITIES, cellPath, type InputColumn, isInput } from './columns.ts';
import { LAWS, lawNamed } from './lawWords.ts';

/** How the commas of a column that leaves it open are meant. */
export type Commas = 'decimal' | 'thousands';

export interface PasteFault {
  /** Row of the block, from 1 at its top, and the column it would go to. */
  readonly place: string;
  readonly what: string;
  readonly mend: string;
}

/** What comes of a pasted block: ready, or what is still to be asked, or why it is refused as a whole. */
export type PastePlan =
  | {
      readonly kind: 'ready';
      /** The storeys it fills, counted from 1 at the ground. */
      readonly low: number;
      readonly high: number;
      /** Storeys of the frame afterwards, where it grows. */
      readonly growsTo: number | null;
      readonly apply: (project: Project) => Project;
    }
  | {
      readonly kind: 'commas';
      readonly column: InputColumn;
      readonly texts: readonly string[];
      readonly decimal: readonly (number | null)[];
      readonly thousands: readonly (number | null)[];
    }
  | { readonly kind: 'refused'; readonly faults: readonly PasteFault[] };

interface Filled {
  readonly column: InputColumn;
  readonly values: readonly Typed[];
}

/**
 * Plans a block from a spreadsheet: the top row is the upper storey. It goes down from the chosen storey; where it does
 * not fit above the ground, it stands on the ground instead, and a block taller than the frame makes the frame taller.
 *
 * @param storey   chosen storey, from 0 at the ground
 * @param first    column of the block's left edge
 * @param columns  input columns, from left to right
 * @param chosen   how commas are meant, by column, where it was asked
 */
export function planPaste(
  project: Project,
  block: readonly (readonly string[])[],
  storey: number,
  first: string,
  columns: readonly InputColumn[],
  system: System,
  chosen: Readonly<Partial<Record<InputColumn, Commas>>>,
): PastePlan {
  const faults = shapeFaults(block, first, columns);
  if (faults.length > 0) return { kind: 'refused', faults };
  const width = Math.max(...block.map((row) => row.length));
  const from = columns.indexOf(first as InputColumn);
  const filled: Filled[] = [];
  for (const [offset, column] of columns.slice(from, from + width).entries()) {
    const texts = block.map((row) => row[offset] ?? '');
    const read = readInto(column, texts, system, chosen[column]);
    if ('kind' in read) return read;
    faults.push(...read.faults);
    if (read.values !== null) filled.push({ column, values: read.values });
  }
  const count = project.frame.storeys.length;
  const rows = block.length;
  const top = Math.max(rows - 1, Math.min(storey, Math.max(count, rows) - 1));
  faults.push(...partFaults(project, filled, rows, top));
  if (faults.length > 0) return { kind: 'refused', faults };
  return {
    kind: 'ready',
    low: top - rows + 2,
    high: top + 1,
    growsTo: top + 1 > count ? top + 1 : null,
    apply: (before) => {
      let next = growTo(before, top + 1);
      for (const { column, values } of filled) {
        for (const [row, value] of values.entries()) {
          if (column !== 'law') next = writeAt(next, cellPath(top - row, column), value);
          else if (typeof value === 'string') next = setLaw(next, [top - row], lawNamed(value) ?? 'elastic');
        }
      }
      return next;
    },
  };
}

function shapeFaults(block: readonly (readonly string[])[], first: string, columns: readonly string[]): PasteFault[] {
  const width = Math.max(0, ...block.map((row) => row.length));
  if (block.length === 0 || width === 0) {
    return [{ place: 'The clipboard', what: 'holds no cells', mend: 'Copy the cells again' }];
  }
  if (block.length > MAX_STOREYS) {
    return [
      {
        place: 'The block',
        what: `has ${block.length} rows, a frame holds at most ${MAX_STOREYS} storeys`,
        mend: 'Copy fewer rows',
      },
    ];
  }
  const from = columns.indexOf(first);
  if (!isInput(first) || from < 0) {
    return [{ place: 'The chosen cell', what: 'is an answer', mend: 'Choose a cell on the left and paste there' }];
  }
  const room = columns.length - from;
  if (width <= room) return [];
  const names = columns.slice(from).map((column) => COLUMN_NAMES[column as InputColumn]);
  return [
    {
      place: 'The block',
      what: `is ${width} columns wide, from here there are ${room}: ${names.join(', ')}`,
      mend: 'Choose a cell further left, or copy fewer columns',
    },
  ];
}

type Read = { readonly values: readonly Typed[] | null; readonly faults: readonly PasteFault[] };

function readInto(
  column: InputColumn,
  texts: readonly string[],
  system: System,
  commas: Commas | undefined,
): Read | Extract<PastePlan, { kind: 'commas' }> {
  const place = (row: number) => placeOf(row, column);
  if (column === 'name') return { values: texts, faults: [] };
  if (column === 'law') {
    const faults = texts.flatMap((text, row) =>
      text === '' || lawNamed(text) !== null
        ? []
        : [
            {
              place: place(row),
              what: `is "${text}", which is no law`,
              mend: `Use ${LAWS.map(({ kind }) => kind).join(', ')}`,
            },
          ],
    );
    return { values: texts.map((text) => (text === '' ? null : text)), faults };
  }
  const quantity = COLUMN_QUANTITIES[column];
  if (quantity === null) return { values: null, faults: [] };
  // "none" is what a cell says of a part that its storey does not have.
  const given = texts.map((text) => (text === 'none' ? '' : text));
  const reading: ColumnReading = readColumn(given, quantity, system);
  switch (reading.kind) {
    case 'values':
      return inRange(column, reading.values, texts, place);
    case 'undecided':
      return commas === undefined
        ? { kind: 'commas', column, texts: given, decimal: reading.decimal, thousands: reading.thousands }
        : inRange(column, reading[commas], texts, place);
    case 'faults':
      return {
        values: null,
        faults: reading.faults.map(({ row, text, why, mend }) => ({
          place: place(row),
          what: `is "${text}": ${why}`,
          mend,
        })),
      };
  }
}

function placeOf(row: number, column: InputColumn): string {
  return `Row ${row + 1}, ${COLUMN_NAMES[column]}`;
}

interface Range {
  readonly holds: (value: number) => boolean;
  readonly words: string;
}
/** Ranges that the cells refuse beyond, as the project file says; a storey has no height, weight or stiffness of zero or less. */
const ABOVE_0: Range = { holds: (value) => value > 0, words: 'above 0' };
const FROM_0: Range = { holds: (value) => value >= 0, words: '0 or more' };
const RANGES: Readonly<Partial<Record<InputColumn, Range>>> = {
  gravity: FROM_0,
  coefficient: FROM_0,
  hardening: { holds: (value) => value >= 0 && value < 1, words: 'from 0 to under 100 %' },
  exponent: { holds: (value) => value >= 0.15 && value <= 2, words: 'from 0.15 to 2' },
};

function inRange(
  column: InputColumn,
  values: readonly (number | null)[],
  texts: readonly string[],
  place: (row: number) => string,
): Read {
  const { holds, words } = RANGES[column] ?? ABOVE_0;
  const faults = values.flatMap((value, row) =>
    value === null || holds(value)
      ? []
      : [{ place: place(row), what: `is ${texts[row]}, must be ${words}`, mend: `Copy a value ${words}` }],
  );
  return { values, faults };
}

/** Numbers of a part that the storey would not have: the block says elastic beside a strength, or hardening without one. */
function partFaults(project: Project, filled: readonly Filled[], rows: number, top: number): PasteFault[] {
  const { storeys } = project.frame;
  const at = (column: InputColumn, row: number) => filled.find((entry) => entry.column === column)?.values[row] ?? null;
  const faults: PasteFault[] = [];
  for (let row = 0; row < rows; row++) {
    // A storey that the block makes starts as a copy of the roof storey.
    const before = storeys[Math.min(top - row, storeys.length - 1)];
    const named = at('law', row);
    const law = typeof named === 'string' ? lawNamed(named) : (before?.law.kind ?? 'elastic');
    const strength = at('strength', row);
    if (typeof named === 'string' && law === 'elastic' && strength !== null) {
      const what = 'stands beside the elastic law, which has none';
      faults.push({ place: placeOf(row, 'strength'), what, mend: 'Copy another law, or leave the strength out' });
    }
    if (at('hardening', row) !== null && law === 'elastic' && strength === null) {
      const what = 'is of an elastic storey, which has none';
      faults.push({ place: placeOf(row, 'hardening'), what, mend: 'Copy a law or a strength beside it' });
    }
    if (at('exponent', row) !== null && before?.damper === undefined && at('coefficient', row) === null) {
      const what = 'is of a storey without a damper';
      faults.push({ place: placeOf(row, 'exponent'), what, mend: 'Copy the force at 1 m/s beside it' });
    }
  }
  return faults;
}
