import type { Quantity } from '../../core/units/quantities.ts';

/** The columns a person types into, from left to right. */
export type InputColumn = 'name' | 'height' | 'mass' | 'stiffness' | 'law' | 'gravity';
/** Columns that answer: read with the arrows, never typed into. */
export type AnswerColumn = 'drift' | 'shear' | 'acceleration';

export const COLUMN_NAMES: Readonly<Record<InputColumn, string>> = {
  name: 'name',
  height: 'height',
  mass: 'weight',
  stiffness: 'stiffness',
  law: 'law',
  gravity: 'gravity load',
};

/** What a column measures; null where it holds words. */
export const COLUMN_QUANTITIES: Readonly<Record<InputColumn, Quantity | null>> = {
  name: null,
  height: 'length',
  mass: 'weight',
  stiffness: 'stiffness',
  law: null,
  gravity: 'force',
};

export const ANSWER_COLUMNS: readonly AnswerColumn[] = ['drift', 'shear', 'acceleration'];

export function inputColumns(gravity: boolean): readonly InputColumn[] {
  const columns: InputColumn[] = ['name', 'height', 'mass', 'stiffness', 'law'];
  if (gravity) columns.push('gravity');
  return columns;
}

export function isInput(column: string): column is InputColumn {
  return column in COLUMN_NAMES;
}

/** Whether a column can be typed into: the law has one choice in this version. */
export function isTyped(column: string): column is Exclude<InputColumn, 'law'> {
  return isInput(column) && column !== 'law';
}

/** The field of a cell as a path of the project file. */
export function cellPath(storey: number, column: string): string {
  return `frame.storeys[${storey}].${column}`;
}

/** The cell of a path, or null where the path is no cell of the sheet. */
export function cellOf(path: string): { readonly storey: number; readonly column: InputColumn } | null {
  const match = /^frame\.storeys\[(\d+)\]\.(\w+)$/.exec(path);
  const column = match?.[2];
  return match === null || column === undefined || !isInput(column) ? null : { storey: Number(match[1]), column };
}
