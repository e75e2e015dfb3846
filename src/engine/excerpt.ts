import { linesOf, lineText } from '../core/motion/text.ts';

/** One line of a file as the import dialog shows it. */
export interface ExcerptLine {
  /** From 1. */
  readonly line: number;
  readonly text: string;
}

const FIRST = 40;
const AROUND = 12;
const MOST = 400;
/** A file without line ends would otherwise be one line of megabytes. */
const LONGEST = 400;

/**
 * The first lines of a file and those around the places given, with their numbers, and how many lines it has: lines as the
 * reader of records counts them.
 *
 * @param places  line numbers from 1, in any order
 */
export function excerptOf(
  bytes: Uint8Array,
  places: readonly number[],
): { readonly excerpt: readonly ExcerptLine[]; readonly lines: number } {
  const lines = linesOf(bytes);
  const shown = new Set<number>();
  const show = (from: number, to: number) => {
    for (let line = Math.max(1, from); line <= Math.min(to, lines.count); line++) shown.add(line);
  };
  show(1, FIRST);
  for (const place of places) if (shown.size < MOST) show(place - AROUND, place + AROUND);
  const cut = { ...lines, end: lines.end.map((end, i) => Math.min(end, lines.start[i] + LONGEST)) };
  const excerpt = [...shown].sort((a, b) => a - b).map((line) => ({ line, text: lineText(cut, line - 1) }));
  return { excerpt, lines: lines.count };
}
