import type { System } from '../../core/units/quantities.ts';
import { toDisplay } from '../../core/units/quantities.ts';
import { readAt } from '../../document/fields.ts';
import { documentStore } from '../../state/document.ts';
import { writeBlock } from './block.ts';
import { COLUMN_QUANTITIES, cellPath, isInput } from './columns.ts';
import { chosenBlock } from './commands.ts';

/** The chosen block for a spreadsheet: plain figures in full precision, top row = upper storey; null where nothing is chosen. */
export function copyBlock(columns: readonly string[], system: System): string | null {
  const block = chosenBlock(columns);
  if (block === null || block.columns.length === 0) return null;
  const { project } = documentStore.getState();
  const cell = (storey: number, column: string): string => {
    if (!isInput(column)) return '';
    if (column === 'law') return project.frame.storeys[storey]?.law.kind ?? '';
    const value = readAt(project, cellPath(storey, column));
    const quantity = COLUMN_QUANTITIES[column];
    if (typeof value !== 'number' || quantity === null) return value === null ? '' : String(value);
    return String(Number(toDisplay(value, quantity, system).toPrecision(15)));
  };
  return writeBlock(block.storeys.map((storey) => block.columns.map((column) => cell(storey, column))));
}
