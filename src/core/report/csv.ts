import { type Quantity, type System, toDisplay } from '../units/quantities.ts';
import { headOf, type TableSystem } from './head.ts';
import type { Cell, Table } from './table.ts';

export interface CsvOptions {
  /** Semicolon where the decimal sign is a comma; a tab for the clipboard. */
  readonly separator: ',' | ';' | '\t';
  readonly decimal: '.' | ',';
  /** Units of heads and cells: the user's, or coherent SI as in the project file. */
  readonly system: TableSystem;
}

/** What a file in coherent SI is written with: the batch command's tables. */
export const PLAIN_CSV: CsvOptions = { separator: ',', decimal: '.', system: 'base' };

/** Digits that a value converted for display keeps: more would show the rounding of the conversion. */
const DISPLAY_DIGITS = 12;

/**
 * A cell that begins so is run as a formula by spreadsheets when a file is opened; the wide forms are taken for the plain
 * ones by some. Source: OWASP, CSV Injection (from memory).
 */
const FORMULA_START = /^[=+\-@\t\r\n＝＋－＠]/u;

/**
 * A table as comma-separated values: one head row with units, CRLF after each row, quotes only where a cell needs them.
 * Numbers stand in full precision without thousands separators; null and what is not finite is an empty cell; words that a
 * spreadsheet would run as a formula get an apostrophe before them. Source: RFC 4180.
 */
export function csvOf(table: Table, options: CsvOptions): string {
  const { columns } = table;
  const rows = columns.length === 0 ? 0 : columns[0].values.length;
  const lines = [columns.map((column) => wordCell(headOf(column, options.system), options)).join(options.separator)];
  for (let row = 0; row < rows; row++) {
    lines.push(columns.map(({ values, quantity }) => cellOf(values[row], quantity, options)).join(options.separator));
  }
  return lines.map((line) => `${line}\r\n`).join('');
}

function cellOf(value: Cell, quantity: Quantity | 'text', options: CsvOptions): string {
  if (value === null) return '';
  if (typeof value === 'string') return wordCell(value, options);
  return numberCell(value, quantity, options);
}

function wordCell(text: string, options: CsvOptions): string {
  return quoted(FORMULA_START.test(text) ? `'${text}` : text, options);
}

function numberCell(value: number, quantity: Quantity | 'text', options: CsvOptions): string {
  const { system, decimal } = options;
  const shown = system === 'base' || quantity === 'text' ? value : converted(value, quantity, system);
  if (!Number.isFinite(shown)) return '';
  return quoted(String(shown).replace('.', decimal), options);
}

function converted(value: number, quantity: Quantity, system: System): number {
  return Number(toDisplay(value, quantity, system).toPrecision(DISPLAY_DIGITS));
}

function quoted(text: string, { separator }: CsvOptions): string {
  return text.includes(separator) || /["\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
