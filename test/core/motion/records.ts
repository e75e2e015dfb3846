import { readRecord } from '../../../src/core/motion/read.ts';
import type { RecordAnswers, RecordReading } from '../../../src/core/motion/reading.ts';

/** A record file given as text. */
export function readText(text: string, answers: RecordAnswers = {}, file = 'record.txt'): RecordReading {
  return readRecord(file, new TextEncoder().encode(text), answers);
}

/** Values of a decaying motion, with few figures, so that they print and read back exactly. */
export function wave(count: number, peak = 0.3): number[] {
  return Array.from({ length: count }, (_, i) => {
    const value = peak * Math.sin(0.7 * i + 0.2) * (1 - i / count);
    return Number(value.toFixed(5));
  });
}

/** Rows of so many values, each `width` wide with five decimals. */
export function rows(values: readonly number[], perLine = 8, width = 10): string {
  const lines: string[] = [];
  for (let i = 0; i < values.length; i += perLine) {
    const row = values.slice(i, i + perLine).map((value) => value.toFixed(5).padStart(width));
    lines.push(row.join(''));
  }
  return `${lines.join('\n')}\n`;
}

export const codesOf = ({ faults }: RecordReading): string[] => faults.map(({ code }) => code);
export const warningsOf = ({ warnings }: RecordReading): string[] => warnings.map(({ code }) => code);
