import { printQuantity, printShort, type System, toDisplay } from '../../core/units/quantities.ts';
import type { LawRow, StoreyRow, Typed } from '../../document/project.ts';
import { typedText } from '../controls/field.ts';
import { COLUMN_QUANTITIES, type InputColumn } from './columns.ts';

/** Signs a cell has room for where its column does not say. */
const LONGEST = 8;

/** The value of a cell; null where there is none. */
function cellValue(row: StoreyRow, column: Exclude<InputColumn, 'law'>): Typed {
  switch (column) {
    case 'strength':
    case 'hardening':
      return lawValue(row.law, column);
    case 'coefficient':
    case 'exponent':
      return row.damper?.[column] ?? null;
    default:
      return row[column] ?? null;
  }
}

function lawValue(law: LawRow, key: 'strength' | 'hardening'): Typed {
  return law.kind === 'elastic' ? null : law[key];
}

/** What stands in a cell while it is not edited, in full. */
export function fullText(row: StoreyRow, column: InputColumn, system: System): string {
  if (column === 'law') return row.law.kind;
  const value = cellValue(row, column);
  // As the line above and the edit show it.
  if (column === 'hardening' && typeof value === 'number') return printShort(value, 'percent', system);
  return typedText(value, COLUMN_QUANTITIES[column], system);
}

/**
 * The same in the room of the cell. A number typed in the other system has no short form: the cell rounds it, the line above and
 * the edit show all of it.
 */
export function cellText(row: StoreyRow, column: InputColumn, system: System, signs = LONGEST): string {
  const full = fullText(row, column, system);
  if (column === 'law' || column === 'name' || full.length <= signs) return full;
  const value = cellValue(row, column);
  const quantity = COLUMN_QUANTITIES[column];
  if (typeof value !== 'number' || quantity === null) return full;
  for (const decimals of [2, 1]) {
    const text = printQuantity(value, quantity, system, decimals);
    if (text.length <= signs) return text;
  }
  const whole = printQuantity(value, quantity, system, 0);
  return whole.length <= signs ? whole : powerOfTen(toDisplay(value, quantity, system), signs);
}

/** "3.00e6": a number too long for its cell, with as many figures as it has room for, three at most. */
function powerOfTen(value: number, signs: number): string {
  const texts = [2, 1, 0].map((decimals) => value.toExponential(decimals).replace('e+', 'e').replace('-', '−'));
  return texts.find((text) => text.length <= signs) ?? texts[2];
}

/** Whether a cell holds nothing because its storey has no such part: the cell says "none". */
export function isNone(row: StoreyRow, column: InputColumn): boolean {
  if (column === 'strength' || column === 'hardening') return row.law.kind === 'elastic';
  return (column === 'coefficient' || column === 'exponent') && row.damper === undefined;
}
