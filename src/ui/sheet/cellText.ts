import { printQuantity, type System } from '../../core/units/quantities.ts';
import type { StoreyRow } from '../../document/project.ts';
import { typedText } from '../controls/field.ts';
import { COLUMN_QUANTITIES, type InputColumn } from './columns.ts';

/** Signs a cell has room for. */
const LONGEST = 8;

/** What stands in a cell while it is not edited. */
export function cellText(row: StoreyRow, column: InputColumn, system: System): string {
  if (column === 'law') return row.law.kind;
  if (column === 'name') return row.name;
  const value = row[column] ?? null;
  const quantity = COLUMN_QUANTITIES[column];
  const full = typedText(value, quantity, system);
  // A number typed in the other system has no short form: the cell rounds it, the edit shows all of it.
  if (typeof value !== 'number' || quantity === null || full.length <= LONGEST) return full;
  return printQuantity(value, quantity, system, 2);
}
