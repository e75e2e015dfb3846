import type { ReportSource } from './source.ts';
import type { Table } from './table.ts';
import { floorResponseByMotion, storeyResponseByMotion } from './tables/byMotion.ts';
import { energyBalance } from './tables/energy.ts';
import { floorResponse } from './tables/floorResponse.ts';
import { analysisInputs, motionInputs, storeyInputs } from './tables/inputs.ts';
import { modalProperties, modeShapes } from './tables/modalProperties.ts';
import { storeyResponse } from './tables/storeyResponse.ts';

const TABLES: readonly ((source: ReportSource) => Table)[] = [
  storeyResponse,
  storeyResponseByMotion,
  floorResponse,
  floorResponseByMotion,
  modalProperties,
  modeShapes,
  energyBalance,
  storeyInputs,
  motionInputs,
  analysisInputs,
];

/** Every table that the screen, the note and the files print, in the order in which they are offered. */
export function tablesOf(source: ReportSource): Table[] {
  return TABLES.map((table) => table(source));
}
