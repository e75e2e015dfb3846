import { type DecimalSign, Tokens, tokensInto } from './figures.ts';
import { type Lines, lineText } from './text.ts';

/** A token among the figures that is no number. */
export interface BadValue {
  /** Line from 1, and value on that line from 1. */
  readonly line: number;
  readonly value: number;
  readonly text: string;
  /** Index into `values`, where NaN stands for it. */
  readonly at: number;
}

/** The figures of a file: heading lines, then rows of numbers. */
export interface Table {
  readonly decimal: DecimalSign;
  /** Heading and comment lines, with their numbers from 1. */
  readonly heading: readonly { readonly line: number; readonly text: string }[];
  /** Row r holds values[rowStart[r]] up to values[rowStart[r + 1]]; it stands on line rowLine[r], from 1. */
  readonly values: Float64Array;
  readonly rowStart: Int32Array;
  readonly rowLine: Int32Array;
  readonly rows: number;
  readonly bad: readonly BadValue[];
  /** Bad tokens beyond those listed. */
  readonly moreBad: number;
  /** First line of text after the last figures, from 1; null where there is none. */
  readonly trailing: number | null;
}

/** How many bad values are listed one by one. */
const LISTED = 50;
/** Lines at the top that are looked at as heading. */
const HEADING = 400;

/**
 * Finds the rows of figures. They begin at the first line that holds nothing but numbers and is followed by another such line
 * (or by nothing); `skip` lines are passed over first. Comment lines (#, %, !, //) count as heading wherever they stand.
 */
export function tableOf(lines: Lines, skip = 0): Table {
  const decimal = decimalSign(lines, skip);
  const tokens = new Tokens();
  const heading: { line: number; text: string }[] = [];
  let values = new Float64Array(4096);
  let rowStart = new Int32Array(1024);
  let rowLine = new Int32Array(1024);
  let [rows, filled, moreBad] = [0, 0, 0];
  const bad: BadValue[] = [];
  let trailing: number | null = null;
  let started = false;
  let texts: { line: number; text: string }[] = [];
  const read = (i: number) => tokensInto(lines.bytes, lines.start[i], lines.end[i], decimal, tokens);
  const pure = (i: number) => {
    read(i);
    return tokens.count > 0 && tokens.bad === 0;
  };
  for (let i = 0; i < lines.count; i++) {
    if (i < skip || isComment(lines, i)) {
      if (heading.length < HEADING) heading.push({ line: i + 1, text: lineText(lines, i) });
      continue;
    }
    read(i);
    if (tokens.count === 0) continue;
    if (!started) {
      const begins = tokens.bad === 0 && followed(lines, i, pure);
      read(i);
      if (!begins) {
        if (heading.length < HEADING) heading.push({ line: i + 1, text: lineText(lines, i) });
        continue;
      }
      started = true;
    }
    if (tokens.bad === tokens.count && !looksLikeFigures(lines, tokens)) {
      // All words: a note after the figures, or something among them that the next row of figures shows to be a fault.
      texts.push({ line: i + 1, text: lineText(lines, i) });
      continue;
    }
    for (const { line, text } of texts) {
      if (bad.length < LISTED) bad.push({ line, value: 1, text: text.trim().slice(0, 60), at: filled });
      else moreBad++;
      if (filled === values.length) values = grown(values);
      values[filled++] = Number.NaN;
      if (rows + 1 >= rowStart.length) [rowStart, rowLine] = [grownInt(rowStart), grownInt(rowLine)];
      rowLine[rows] = line;
      rowStart[rows++] = filled - 1;
    }
    texts = [];
    if (rows + 1 >= rowStart.length) [rowStart, rowLine] = [grownInt(rowStart), grownInt(rowLine)];
    rowLine[rows] = i + 1;
    rowStart[rows++] = filled;
    while (filled + tokens.count > values.length) values = grown(values);
    for (let t = 0; t < tokens.count; t++) {
      const value = tokens.value[t];
      if (Number.isNaN(value)) {
        if (bad.length < LISTED) bad.push({ line: i + 1, value: t + 1, text: tokenText(lines, tokens, t), at: filled });
        else moreBad++;
      }
      values[filled++] = value;
    }
  }
  if (texts.length > 0) trailing = texts[0].line;
  rowStart[rows] = filled;
  return {
    decimal,
    heading,
    values: values.slice(0, filled),
    rowStart: rowStart.slice(0, rows + 1),
    rowLine: rowLine.slice(0, rows),
    rows,
    bad,
    moreBad,
    trailing,
  };
}

/** Whether the next line that is neither blank nor a comment is figures too, or there is none. */
function followed(lines: Lines, i: number, pure: (i: number) => boolean): boolean {
  for (let next = i + 1; next < lines.count; next++) {
    if (lines.end[next] - lines.start[next] === 0 || lineText(lines, next).trim() === '' || isComment(lines, next))
      continue;
    return pure(next);
  }
  return true;
}

function isComment({ bytes, start, end }: Lines, i: number): boolean {
  let at = start[i];
  while (at < end[i] && (bytes[at] === 32 || bytes[at] === 9)) at++;
  if (at >= end[i]) return false;
  const b = bytes[at];
  return b === 35 || b === 37 || b === 33 || (b === 47 && bytes[at + 1] === 47);
}

/** A token that begins like a number (a figure within its first three signs) is a spoilt value, not a word. */
function looksLikeFigures({ bytes }: Lines, tokens: Tokens): boolean {
  for (let i = tokens.from[0]; i < Math.min(tokens.to[0], tokens.from[0] + 3); i++)
    if (bytes[i] >= 48 && bytes[i] <= 57) return true;
  return /^(nan|[+-]?inf)/i.test(tokenText({ bytes } as Lines, tokens, 0));
}

function tokenText({ bytes }: Lines, tokens: Tokens, t: number): string {
  let out = '';
  for (let i = tokens.from[t]; i < Math.min(tokens.to[t], tokens.from[t] + 60); i++)
    out += String.fromCharCode(bytes[i]);
  return out;
}

/**
 * Comma or point as the decimal sign, from a sample of the lines with figures: the comma where lines hold commas between
 * figures but no point, and something else parts the numbers (or there is one number a line).
 */
function decimalSign(lines: Lines, skip: number): DecimalSign {
  let [comma, point] = [0, 0];
  const step = Math.max(1, Math.floor((lines.count - skip) / 400));
  for (let i = skip; i < lines.count; i += step) {
    if (lines.end[i] - lines.start[i] > 4000) continue;
    const text = lineText(lines, i);
    if (!/^[\s\d.,;+\-eEdD]*$/.test(text) || !/\d/.test(text)) continue;
    if (/\d\.|\.\d/.test(text)) point++;
    else if (/\d,\d/.test(text)) {
      const parts = text.trim().split(/[\s;]+/);
      if (parts.every((part) => (part.match(/,/g)?.length ?? 0) <= 1)) comma++;
    }
  }
  return comma > point ? 'comma' : 'point';
}

function grown(x: Float64Array<ArrayBuffer>): Float64Array<ArrayBuffer> {
  const out = new Float64Array(2 * x.length);
  out.set(x);
  return out;
}

function grownInt(x: Int32Array<ArrayBuffer>): Int32Array<ArrayBuffer> {
  const out = new Int32Array(2 * x.length);
  out.set(x);
  return out;
}
