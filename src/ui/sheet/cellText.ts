import type { System } from '../../core/units/quantities.ts';
import type { StoreyRow } from '../../document/project.ts';
import { typedText } from '../controls/field.ts';
import { COLUMN_QUANTITIES, type InputColumn } from './columns.ts';

/** What stands in a cell while it is not edited. */
export function cellText(row: StoreyRow, column: InputColumn, system: System): string {
  if (column === 'law') return row.law.kind;
  if (column === 'name') return row.name;
  return typedText(row[column] ?? null, COLUMN_QUANTITIES[column], system);
}
