import type { Quantity } from '../../core/units/quantities.ts';
import type { StoreyRow } from '../../document/project.ts';

/** The columns a person types into, from left to right. */
export type InputColumn =
  | 'name'
  | 'height'
  | 'mass'
  | 'stiffness'
  | 'law'
  | 'strength'
  | 'hardening'
  | 'gravity'
  | 'coefficient'
  | 'exponent';
/** Columns that answer: read with the arrows, never typed into. */
export type AnswerColumn = 'drift' | 'ductility' | 'residual' | 'shear' | 'acceleration';

export const COLUMN_NAMES: Readonly<Record<InputColumn, string>> = {
  name: 'name',
  height: 'height',
  mass: 'weight',
  stiffness: 'stiffness',
  law: 'law',
  strength: 'strength',
  hardening: 'hardening',
  gravity: 'gravity load',
  coefficient: 'damper force at 1 m/s',
  exponent: 'damper exponent',
};

/** What a column measures; null where it holds words. */
export const COLUMN_QUANTITIES: Readonly<Record<InputColumn, Quantity | null>> = {
  name: null,
  height: 'length',
  mass: 'weight',
  stiffness: 'stiffness',
  law: null,
  strength: 'force',
  hardening: 'percent',
  gravity: 'force',
  coefficient: 'force',
  exponent: 'ratio',
};

/** Where in a storey a column's value stands, where it is not under the column's own name. */
const WITHIN: Readonly<Partial<Record<string, string>>> = {
  strength: 'law.strength',
  hardening: 'law.hardening',
  coefficient: 'damper.coefficient',
  exponent: 'damper.exponent',
};
const COLUMN_OF: ReadonlyMap<string, InputColumn> = new Map([
  ...Object.entries(WITHIN).map(([column, place]) => [place ?? '', column as InputColumn] as const),
  // What a cell of its own does not show is typed where the law is.
  ...['law.exponent', 'law.beta', 'law.gamma', 'law.ratio', 'role'].map((place) => [place, 'law'] as const),
  ['damper', 'coefficient'] as const,
]);

/** Which columns are shown beside those that always are. */
export interface ShownColumns {
  readonly hardening: boolean;
  readonly gravity: boolean;
  readonly damper: boolean;
}

export function inputColumns({ hardening, gravity, damper }: ShownColumns): readonly InputColumn[] {
  const columns: InputColumn[] = ['name', 'height', 'mass', 'stiffness', 'law', 'strength'];
  if (hardening) columns.push('hardening');
  if (gravity) columns.push('gravity');
  if (damper) columns.push('coefficient', 'exponent');
  return columns;
}

/** @param yielding  whether ductility and residual drift are shown */
export function answerColumns(yielding: boolean): readonly AnswerColumn[] {
  return yielding ? ['drift', 'ductility', 'residual', 'shear', 'acceleration'] : ['drift', 'shear', 'acceleration'];
}

export function isInput(column: string): column is InputColumn {
  return column in COLUMN_NAMES;
}

/** Whether a column can be typed into; the law is chosen in a panel of its own. */
export function isTyped(column: string): column is Exclude<InputColumn, 'law'> {
  return isInput(column) && column !== 'law';
}

/**
 * Whether a storey takes a value in a column: no hardening without a strength, no exponent without a coefficient. A strength is
 * taken by an elastic storey too, and makes it yield.
 */
export function takes(row: StoreyRow | undefined, column: string): boolean {
  if (column === 'hardening') return row !== undefined && row.law.kind !== 'elastic';
  if (column === 'exponent') return row?.damper !== undefined;
  return isTyped(column);
}

/** The field of a cell as a path of the project file. */
export function cellPath(storey: number, column: string): string {
  return `frame.storeys[${storey}].${WITHIN[column] ?? column}`;
}

/** The cell of a path, or null where the path is no cell of the sheet. */
export function cellOf(path: string): { readonly storey: number; readonly column: InputColumn } | null {
  const match = /^frame\.storeys\[(\d+)\]\.([\w.]+)$/.exec(path);
  const place = match?.[2];
  if (match === null || place === undefined) return null;
  const column = COLUMN_OF.get(place) ?? (isInput(place) && WITHIN[place] === undefined ? place : null);
  return column === null ? null : { storey: Number(match[1]), column };
}
