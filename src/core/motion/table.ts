import { commaOf } from './comma.ts';
import { type Comma, Tokens } from './numerals.ts';
import { type Lines, lineText, textBetween } from './text.ts';

export interface HeadingLine {
  /** From 1. */
  readonly line: number;
  readonly text: string;
}

/** A line of figures that stands apart from the rows, above them. */
export interface LooseFigures {
  readonly line: number;
  readonly values: readonly number[];
}

/** The figures of a file: heading lines, then rows of numbers. NaN stands for a token that is no number. */
export interface Table {
  readonly lines: Lines;
  readonly comma: Comma;
  /** Heading and comment lines above the rows. */
  readonly heading: readonly HeadingLine[];
  readonly above: readonly LooseFigures[];
  /** Row r holds values[rowStart[r]] up to values[rowStart[r + 1]]; it stands on line rowLine[r], from 1. */
  readonly values: Float64Array;
  readonly rowStart: Int32Array;
  readonly rowLine: Int32Array;
  readonly rows: number;
  /** Values of most rows. */
  readonly columns: number;
  /** Lines of text with rows after them: line from 1, and how many values stood before it. */
  readonly between: readonly { readonly line: number; readonly valuesBefore: number }[];
  /** First line of text after the last row, from 1; null where there is none. */
  readonly trailing: number | null;
}

export interface Cell {
  readonly row: number;
  readonly column: number;
}

/** A token of the table and where it stands: line and value from 1, span in characters of the line. */
export interface Place {
  readonly line: number;
  readonly value: number;
  readonly text: string;
  readonly span: readonly [number, number];
}

/** Lines at the top that are looked at as heading, and how many lines the rows are looked for in. */
const HEADING_LINES = 400;
const LOOKED_AT = 20_000;
/** So many rows one after the other are the record, whatever follows. */
const SURELY_ROWS = 50;
const TEXTS_KEPT = 50;
/** Characters of a value that are shown. */
const LONGEST_TEXT = 40;
/** A slip such as `0,0123`, `1.2.3` or `1E999`; a date or a time of day is none. */
const NUMBER_LIKE = /^[+-]?[\d.,]*\d[\d.,]*(?:[eEdD][+-]?\d+)?$/;
const MISSING = /^(?:-{1,4}|\*+|[x?]+|n\/?a)$/i;
const NOT_A_NUMBER = /^[+-]?(?:nan|inf(?:inity)?)$/i;

/**
 * Finds the rows of figures: the longest run of lines that hold nothing but numbers (a spoilt value among as many as the
 * other rows hold does not end it). Comment lines (#, %, !, //) and blank lines end no run.
 *
 * @param skip  heading lines that are passed over, whatever they hold
 * @param stop  line from which nothing is read any more, from 1
 */
export function tableOf(lines: Lines, skip = 0, stop = Number.POSITIVE_INFINITY): Table {
  const comma = commaOf(lines, skip);
  const tokens = new Tokens();
  const columns = commonCount(lines, skip, comma, tokens);
  const { first, above } = firstRow(lines, skip, comma, columns, tokens);
  const heading: HeadingLine[] = [];
  for (let i = 0; i < Math.min(first, HEADING_LINES); i++) {
    heading.push({ line: i + 1, text: lineText(lines, i).slice(0, 400) });
  }
  const last = Math.min(lines.count, stop - 1);
  return { lines, comma, heading, above, columns, ...rowsOf(lines, first, last, comma, columns, tokens) };
}

/** Row and column, from 0, of value `at` of the table. */
export function cellOf({ rowStart, rows }: Table, at: number): Cell {
  let [low, high] = [0, rows - 1];
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (rowStart[middle] <= at) low = middle;
    else high = middle - 1;
  }
  return { row: low, column: at - rowStart[low] };
}

/** Where a value stands, read from its line again; the end of the line where the row has no such column. */
export function placeOf({ lines, rowLine, comma }: Table, { row, column }: Cell): Place {
  const line = rowLine[row];
  const [start, end] = [lines.start[line - 1], lines.end[line - 1]];
  const tokens = new Tokens();
  tokens.read(lines, start, end, comma);
  const [from, to] = column < tokens.count ? [tokens.from[column], tokens.to[column]] : [end, end];
  return {
    line,
    value: column + 1,
    text: textBetween(lines.codes, from, Math.min(to, from + LONGEST_TEXT)),
    span: [from - start, to - start],
  };
}

/** How many values most rows hold; of counts that are equally common, the larger. */
function commonCount(lines: Lines, skip: number, comma: Comma, tokens: Tokens): number {
  const found = new Map<number, number>();
  let rows = 0;
  for (let i = skip; i < Math.min(lines.count, LOOKED_AT) && rows < HEADING_LINES; i++) {
    if (isComment(lines, i)) continue;
    tokens.read(lines, lines.start[i], lines.end[i], comma);
    if (tokens.count === 0 || tokens.bad > tokens.count / 2) continue;
    found.set(tokens.count, (found.get(tokens.count) ?? 0) + 1);
    rows++;
  }
  let [common, times] = [0, 0];
  for (const [count, often] of found) {
    if (often > times || (often === times && count > common)) [common, times] = [count, often];
  }
  return common;
}

/** The line, from 0, on which the rows begin (the number of lines where there are none), and lines of figures above it. */
function firstRow(lines: Lines, skip: number, comma: Comma, columns: number, tokens: Tokens) {
  const above: LooseFigures[] = [];
  let [best, bestLength] = [lines.count, 0];
  let run: number[] = [];
  let runLength = 0;
  const loose = (numbers: readonly number[]) => {
    for (const i of numbers) {
      if (above.length === HEADING_LINES) return;
      tokens.read(lines, lines.start[i], lines.end[i], comma);
      above.push({ line: i + 1, values: Array.from(tokens.value.subarray(0, tokens.count)) });
    }
  };
  for (let i = skip; i <= Math.min(lines.count, LOOKED_AT); i++) {
    const over = i === Math.min(lines.count, LOOKED_AT);
    if (!over) {
      if (isComment(lines, i)) continue;
      tokens.read(lines, lines.start[i], lines.end[i], comma);
      if (tokens.count === 0) continue;
      const row = tokens.bad === 0 || (tokens.count === columns && spoilt(lines, tokens, runLength > 0));
      if (row) {
        runLength++;
        if (run.length < SURELY_ROWS) run.push(i);
        if (runLength < SURELY_ROWS) continue;
      }
    }
    if (runLength > bestLength) [best, bestLength] = [start(lines, run, comma, columns, tokens), runLength];
    if (runLength >= SURELY_ROWS) break;
    run = [];
    runLength = 0;
  }
  for (let i = skip; i < best && above.length < HEADING_LINES; i++) {
    if (isComment(lines, i)) continue;
    tokens.read(lines, lines.start[i], lines.end[i], comma);
    if (tokens.count > 0 && tokens.bad === 0) loose([i]);
  }
  return { first: best, above };
}

/** Where the rows of a run begin: up to three lines at its head that hold another number of values are no rows. */
function start(lines: Lines, run: readonly number[], comma: Comma, columns: number, tokens: Tokens): number {
  for (let k = 0; k < Math.min(run.length, 4); k++) {
    tokens.read(lines, lines.start[run[k]], lines.end[run[k]], comma);
    if (tokens.count === columns) return run[k];
  }
  return run[0];
}

function rowsOf(lines: Lines, first: number, last: number, comma: Comma, columns: number, tokens: Tokens) {
  // As many as there can be rows; values only grow where rows are longer than most. A value takes two characters at least.
  const rowStart = new Int32Array(Math.max(0, last - first) + 1);
  const rowLine = new Int32Array(rowStart.length);
  let values = new Float64Array(Math.max(64, Math.min(rowStart.length * columns, lines.codes.length >> 1)));
  let rows = 0;
  let filled = 0;
  const between: { line: number; valuesBefore: number }[] = [];
  // Lines without a single number: spoilt values or text, as the lines after them will tell.
  let waiting: number[] = [];
  const push = (i: number) => {
    rowStart[rows] = filled;
    rowLine[rows++] = i + 1;
    while (filled + tokens.count > values.length) values = grown(values);
    for (let t = 0; t < tokens.count; t++) values[filled++] = tokens.value[t];
  };
  const read = (i: number) => tokens.read(lines, lines.start[i], lines.end[i], comma);
  for (let i = first; i < last; i++) {
    if (isComment(lines, i)) continue;
    read(i);
    if (tokens.count === 0) continue;
    if (tokens.bad > 0 && (tokens.bad === tokens.count || (tokens.count !== columns && hasWord(lines, tokens)))) {
      waiting.push(i);
      continue;
    }
    if (waiting.length > 0) {
      for (const text of waiting) {
        read(text);
        if (tokens.count === columns) push(text);
        else if (between.length < TEXTS_KEPT) between.push({ line: text + 1, valuesBefore: filled });
      }
      waiting = [];
      read(i);
    }
    push(i);
  }
  let trailing: number | null = null;
  for (const i of waiting) {
    read(i);
    if (trailing === null && tokens.count === columns && !hasWord(lines, tokens)) push(i);
    else trailing ??= i + 1;
  }
  rowStart[rows] = filled;
  return {
    values: values.subarray(0, filled),
    rowStart: rowStart.subarray(0, rows + 1),
    rowLine: rowLine.subarray(0, rows),
    rows,
    between,
    trailing,
  };
}

function isComment({ codes, start, end }: Lines, i: number): boolean {
  let at = start[i];
  while (at < end[i] && codes[at] <= 32) at++;
  if (at >= end[i]) return false;
  const c = codes[at];
  return c === 35 || c === 37 || c === 33 || (c === 47 && codes[at + 1] === 47);
}

/**
 * Whether a line's bad tokens are spoilt values: no words beside numbers; alone on the line, made of a number's signs or,
 * within the rows, a mark for a value that is missing.
 */
function spoilt(lines: Lines, tokens: Tokens, within: boolean): boolean {
  if (tokens.bad < tokens.count) return !hasWord(lines, tokens);
  for (let t = 0; t < tokens.count; t++) {
    const text = textBetween(lines.codes, tokens.from[t], Math.min(tokens.to[t], tokens.from[t] + LONGEST_TEXT));
    if (!NOT_A_NUMBER.test(text) && !NUMBER_LIKE.test(text) && !(within && MISSING.test(text))) return false;
  }
  return true;
}

/** Whether a line's bad tokens are words (three letters one after the other), as a heading has; NaN and Inf are values. */
function hasWord({ codes }: Lines, tokens: Tokens): boolean {
  for (let t = 0; t < tokens.count; t++) {
    if (!Number.isNaN(tokens.value[t])) continue;
    let letters = 0;
    for (let i = tokens.from[t]; i < tokens.to[t]; i++) {
      const c = codes[i] | 32;
      letters = c >= 97 && c <= 122 ? letters + 1 : 0;
      if (
        letters === 3 &&
        !NOT_A_NUMBER.test(textBetween(codes, tokens.from[t], Math.min(tokens.to[t], tokens.from[t] + 10)))
      )
        return true;
    }
  }
  return false;
}

function grown(from: Float64Array<ArrayBuffer>): Float64Array<ArrayBuffer> {
  const into = new Float64Array(2 * from.length);
  into.set(from);
  return into;
}
