import type { Comma } from './numerals.ts';
import { type Lines, textBetween } from './text.ts';

/** Lines that are looked at, evenly over the file, and how much of each. */
const SAMPLE = 400;
const LONGEST = 2000;

/**
 * What a comma is in a file, from a sample of its lines of figures. In most lines and between points (`0.01, 0.02`), before a
 * sign or in chunks of several (`1,-2,3`): a separator. Within figures that have no point (`0,0123`): the decimal sign. In few
 * lines among points: neither, so that a slip such as `-0,0171` is found and not read as two values.
 */
export function commaOf(lines: Lines, skip: number): Comma {
  let [figures, separating, decimal, points] = [0, 0, 0, 0];
  const step = Math.max(1, Math.ceil((lines.count - skip) / SAMPLE));
  for (let i = skip; i < lines.count; i += step) {
    const text = textBetween(lines.codes, lines.start[i], Math.min(lines.end[i], lines.start[i] + LONGEST));
    if (!/^[\s\d.,;+\-eEdD"]*$/.test(text) || !/\d/.test(text)) continue;
    figures++;
    const pointed = /\d\.|\.\d/.test(text);
    if (pointed) points++;
    const chunks = text.split(/[\s;"]+/).filter((chunk) => chunk !== '');
    const commas = chunks.filter((chunk) => chunk.includes(',') && !(chunk === ',' && text.includes('"')));
    if (commas.length === 0) continue;
    if (pointed) separating += 2 * commas.length >= chunks.length ? 1 : 0;
    else if (commas.every((chunk) => DECIMAL.test(chunk))) decimal++;
    else separating++;
  }
  // A column of two whole numbers, 0,12, looks like one decimal number; some of its rows have a sign after the comma.
  if (separating + decimal > 0 && 2 * (separating + decimal) >= figures)
    return separating > 0.05 * decimal ? 'separator' : 'decimal';
  return decimal > 0 && separating === 0 && points === 0 ? 'decimal' : 'neither';
}

const DECIMAL = /^[+-]?\d*,\d+(?:[eEdD][+-]?\d+)?,?$/;
