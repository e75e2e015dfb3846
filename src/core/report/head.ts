import { type Quantity, type System, unitOf } from '../units/quantities.ts';
import type { Column } from './table.ts';

/** The user's units, or coherent SI as it stands in the project file. */
export type TableSystem = System | 'base';

/** Coherent units of the values in a column. Source: BIPM, The International System of Units, 9th ed. (2019). */
const BASE_UNITS: Readonly<Record<Quantity, string>> = {
  length: 'm',
  drift: 'm',
  displacement: 'm',
  weight: 'kg',
  force: 'N',
  stiffness: 'N/m',
  moment: 'N m',
  energy: 'J',
  acceleration: 'm/s2',
  velocity: 'm/s',
  time: 's',
  frequency: 'Hz',
  percent: '-',
  ratio: '-',
  count: '',
};

/** Unit of a column's values as they are printed; empty for words and counts, `-` where there is none. */
function unitOfColumn({ quantity }: Column, system: TableSystem): string {
  if (quantity === 'text' || quantity === 'count') return '';
  return (system === 'base' ? BASE_UNITS[quantity] : unitOf(quantity, system)) || '-';
}

/** Name of a column's values: a weight is printed for the user and stands as a mass in coherent SI. */
function nameOfColumn({ name, quantity }: Column, system: TableSystem): string {
  return system === 'base' && quantity === 'weight' ? name.replace('Weight', 'Mass').replace('weight', 'mass') : name;
}

/** `Peak drift [mm]`. */
export function headOf(column: Column, system: TableSystem): string {
  const unit = unitOfColumn(column, system);
  return unit === '' ? nameOfColumn(column, system) : `${nameOfColumn(column, system)} [${unit}]`;
}
