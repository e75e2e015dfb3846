import type { Measure } from './statistic.ts';

/** A statistic of the suite in words. */
export function worded(measure: Measure): string {
  return measure === 'max' ? 'largest' : measure;
}

/** one to twelve in words, larger numbers in figures. */
export function countWord(count: number): string {
  const words = [
    'no',
    'one',
    'two',
    'three',
    'four',
    'five',
    'six',
    'seven',
    'eight',
    'nine',
    'ten',
    'eleven',
    'twelve',
  ];
  return words[count] ?? String(count);
}
