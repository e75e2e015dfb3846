/** One line of a file as the import dialog shows it. */
export interface ExcerptLine {
  /** From 1. */
  readonly line: number;
  readonly text: string;
}

const FIRST = 40;
const AROUND = 3;
const MOST = 400;
/** A file without line ends would otherwise be one line of megabytes. */
const LONGEST = 400;
const NEWLINE = 10;
const RETURN = 13;

/**
 * The first lines of a file and those around the places given, with their numbers, and how many lines it has. Lines end at
 * LF, CR LF or CR; a last line without an end counts. Only the lines shown are decoded.
 *
 * @param places  line numbers from 1, in any order
 */
export function excerptOf(
  bytes: Uint8Array,
  places: readonly number[],
): { readonly excerpt: readonly ExcerptLine[]; readonly lines: number } {
  const shown = new Set<number>();
  for (let line = 1; line <= FIRST; line++) shown.add(line);
  for (const place of places) {
    if (shown.size > MOST) break;
    for (let line = place - AROUND; line <= place + AROUND; line++) shown.add(line);
  }
  const decoder = new TextDecoder('utf-8');
  const excerpt: ExcerptLine[] = [];
  let [line, from] = [1, 0];
  for (let at = 0; at <= bytes.length; at++) {
    const byte = bytes[at];
    const last = at === bytes.length;
    if (!last && byte !== NEWLINE && byte !== RETURN) continue;
    if (last && from === at) break;
    if (shown.has(line)) {
      excerpt.push({ line, text: decoder.decode(bytes.subarray(from, Math.min(at, from + LONGEST))) });
    }
    if (byte === RETURN && bytes[at + 1] === NEWLINE) at += 1;
    from = at + 1;
    line += 1;
  }
  return { excerpt, lines: line - 1 };
}
