import type { AccelerationUnit } from './motion.ts';

/** A unit of acceleration named in a text; `unknown` is one that is none of ours (`ft/s2`, `%g`), as it was written. */
export interface UnitFound {
  readonly value: AccelerationUnit | 'unknown';
  readonly written: string;
  readonly line: number;
  readonly span: readonly [number, number];
  /** 3 in a phrase about units, 2 beside the word acceleration or in brackets, 1 elsewhere. */
  readonly weight: number;
}

const SECOND = 's(?:ec(?:ond)?s?)?\\.?';
/** `/s2`, `/s^2`, `/sec**2`, `/s²`, `/s/s`, ` s-2`, `/sq. sec`, ` per second per second`. */
const PER_SECOND_SQUARED = `(?:\\s*(?:/|per)\\s*\\(?\\s*(?:${SECOND}\\s*(?:\\^|\\*\\*)?\\s*(?:2|²|squared)\\s*\\)?|${SECOND}\\s*(?:/|per)\\s*${SECOND}|sq(?:uare)?\\.?\\s*${SECOND})|[\\s.*]*s\\s*\\^?\\s*-\\s*2)`;
const LENGTH = '(mm|cm|m|km|in|inch(?:es)?|ft|feet|foot|millimet(?:er|re)s?|centimet(?:er|re)s?|met(?:er|re)s?)';

const PER_SECOND = new RegExp(`(?<![a-z])${LENGTH}${PER_SECOND_SQUARED}(?![a-z0-9])`, 'gi');
const GAL = /(?<![a-z])(m|milli-?|u|micro-?)?gals?(?![a-z])/gi;
/** `g` alone is a letter like others: only where units or acceleration are spoken of, or in brackets or a cell of its own. */
const GRAVITY: readonly (readonly [RegExp, number])[] = [
  [
    /\bunits?\b[\s:=]*(?:(?:is|are|of|in|for|all|acc(?:el(?:eration)?)?s?)\b[\s:=]*){0,4}[("'[]*\s*g(?:'s|s)?(?![\w/*%])/gi,
    3,
  ],
  [/\bacc(?:el(?:eration)?)?s?\.?[\s,:=_/]*(?:in\s+)?(?:units?\s+of\s+)?[([]?\s*g(?:'s|s)?(?![\w/*%])/gi, 2],
  [/[([]\s*g\s*[)\]]/gi, 2],
  [/(?:^|[,;\t])\s*"?g"?\s*(?=$|[,;\t])/gi, 2],
  [/\b(?:in|fractions?\s+of)\s+g(?:'s|s)?(?![\w/*%])/gi, 1],
];
/** Parts of g and unscaled counts: no unit of ours. */
const FOREIGN: readonly (readonly [RegExp, number])[] = [
  [/(?:%\s*(?:of\s+)?g\b|\bpercent\s+(?:of\s+)?g\b|\bg\s*[/*]\s*10+\b|\bmilli-?\s?g(?:'s|s)?\b)/gi, 3],
  [/(?<=\bunits?\b[\s:=]*(?:(?:of|is|in)\s+)?)[\d.]+(?:e[+-]?\d+)?[\s*]*g\b/gi, 3],
  [/(?<=\bunits?\b[^\n]{0,20}?[\s([:=]|[([]\s*)(?:mg|counts?|volts?|mv|lsb)\b/gi, 3],
];

const UNITS_WORD = /\bunits?\b/i;
const ACCELERATION_WORD = /\bacc(?:el(?:eration)?)?s?\b/i;

/** The units of acceleration that a line names. A figure before a unit makes it a value (`peak 312.3 cm/s2`), and it counts for nothing. */
export function unitsIn(text: string, line: number): UnitFound[] {
  const found: UnitFound[] = [];
  const add = (value: UnitFound['value'], from: number, written: string, weight: number) =>
    found.push({ value, written: written.trim(), line, span: [from, from + written.trimEnd().length], weight });
  for (const match of text.matchAll(PER_SECOND)) {
    weigh(text, match, (weight, foreign) => {
      const value = foreign ? 'unknown' : named(match[1]);
      // "in s - 2" of plain prose is no unit.
      if (value !== 'unknown' || weight > 1) add(value, match.index, match[0], weight);
    });
  }
  for (const match of text.matchAll(GAL)) {
    weigh(text, match, (weight, foreign) =>
      add(match[1] === undefined && !foreign ? 'cm/s2' : 'unknown', match.index, match[0], weight),
    );
  }
  for (const [pattern, weight] of FOREIGN) {
    for (const match of text.matchAll(pattern)) add('unknown', match.index, match[0], weight);
  }
  for (const [pattern, weight] of GRAVITY) {
    for (const match of text.matchAll(pattern)) {
      const lead = match[0].search(/g(?:'?s)?[^a-z]*$/i);
      if (/\d\s*$/.test(text.slice(0, match.index + lead))) continue;
      add('g', match.index + lead, match[0].slice(lead).replace(/[^a-z']+$/i, ''), weight);
    }
  }
  return found;
}

/** Adds what stands before a unit to the judgement: the word unit, acceleration, a bracket, or a figure. */
function weigh(text: string, match: RegExpExecArray, add: (weight: number, foreign: boolean) => void): void {
  const before = text.slice(0, match.index);
  const units = UNITS_WORD.test(before);
  const figure = /(?:^|[^a-z\d])[+-]?\d[\d.,]*(?:e[+-]?\d+)?\s*\(?$/i.test(before);
  if (figure && !units) return;
  // "units 0.1 cm/s2" is a unit, but none of ours.
  add(units ? 3 : /[([]\s*$/.test(before) || ACCELERATION_WORD.test(text) ? 2 : 1, figure);
}

function named(length: string): UnitFound['value'] {
  const word = length.toLowerCase();
  if (word === 'mm' || word.startsWith('millim')) return 'mm/s2';
  if (word === 'cm' || word.startsWith('centim')) return 'cm/s2';
  if (word === 'm' || word.startsWith('met')) return 'm/s2';
  return 'unknown';
}
