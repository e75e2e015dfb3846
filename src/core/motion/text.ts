/**
 * A record file as lines of characters, whatever wrote it: UTF-8 or UTF-16 with or without its mark, else Latin-1; any line
 * end. A typographic minus counts as a minus, a typographic space as a blank. Never throws.
 */
export interface Lines {
  /** One code a character (UTF-16 units). */
  readonly codes: Uint8Array | Uint16Array;
  /** Line i is codes[start[i]] up to, not including, codes[end[i]]. */
  readonly start: Int32Array;
  readonly end: Int32Array;
  readonly count: number;
  /** The file holds control characters that no text has. */
  readonly binary: boolean;
}

const LF = 10;
const CR = 13;
const TAB = 9;
const FORM_FEED = 12;
/** Ends a text in some old archives. */
const END_OF_TEXT = 26;
/** Share of control characters from which a file is no text. Own figure. */
const BINARY = 1e-3;

export function linesOf(raw: Uint8Array): Lines {
  const codes = codesOf(raw);
  const { length } = codes;
  let most = 1;
  for (let i = 0; i < length; i++) if (codes[i] === LF || codes[i] === CR) most++;
  const start = new Int32Array(most);
  const end = new Int32Array(most);
  let [count, from, controls] = [0, 0, 0];
  for (let i = 0; i < length; i++) {
    const c = codes[i];
    if (c >= 32) continue;
    if (c === LF || c === CR) {
      start[count] = from;
      end[count++] = i;
      if (c === CR && codes[i + 1] === LF) i++;
      from = i + 1;
    } else if (c !== TAB && c !== FORM_FEED && c !== END_OF_TEXT) controls++;
  }
  if (from < length) {
    start[count] = from;
    end[count++] = length;
  }
  return { codes, start, end, count, binary: controls > BINARY * length };
}

/** Line i, from 0, as text. */
export function lineText({ codes, start, end }: Lines, i: number): string {
  return textBetween(codes, start[i], end[i]);
}

export function textBetween(codes: Lines['codes'], from: number, to: number): string {
  let out = '';
  for (let i = from; i < to; i += 4096) out += String.fromCharCode(...codes.subarray(i, Math.min(to, i + 4096)));
  return out;
}

/** The bytes themselves where each is a character; a copy only where the file has more than plain letters. */
function codesOf(raw: Uint8Array): Uint8Array | Uint16Array {
  if (raw[0] === 0xff && raw[1] === 0xfe) return plain(fromUtf16(raw.subarray(2), true));
  if (raw[0] === 0xfe && raw[1] === 0xff) return plain(fromUtf16(raw.subarray(2), false));
  if (zerosFrom(raw, 1)) return plain(fromUtf16(raw, true));
  if (zerosFrom(raw, 0)) return plain(fromUtf16(raw, false));
  const bytes = raw[0] === 0xef && raw[1] === 0xbb && raw[2] === 0xbf ? raw.subarray(3) : raw;
  if (isAscii(bytes)) return bytes;
  const decoded = fromUtf8(bytes);
  return decoded ? plain(decoded) : bytes;
}

function isAscii(bytes: Uint8Array): boolean {
  let all = 0;
  for (let i = 0; i < bytes.length; i++) all |= bytes[i];
  return all < 0x80;
}

/** Whether nearly every second byte, from an offset on, is zero: UTF-16 without its mark. */
function zerosFrom(raw: Uint8Array, offset: number): boolean {
  const probe = Math.min(raw.length, 4096);
  let [zeros, others] = [0, 0];
  for (let i = 0; i < probe; i++) if (raw[i] === 0) i % 2 === offset ? zeros++ : others++;
  return probe >= 4 && zeros > 0.45 * probe && others === 0;
}

function fromUtf16(raw: Uint8Array, little: boolean): Uint16Array {
  const out = new Uint16Array(raw.length >> 1);
  const [low, high] = little ? [0, 1] : [1, 0];
  for (let i = 0; i < out.length; i++) out[i] = raw[2 * i + low] | (raw[2 * i + high] << 8);
  return out;
}

/** Null where the bytes are no UTF-8. Source: RFC 3629. */
function fromUtf8(bytes: Uint8Array): Uint16Array | null {
  const out = new Uint16Array(bytes.length);
  let count = 0;
  for (let i = 0; i < bytes.length; ) {
    const lead = bytes[i++];
    if (lead < 0x80) {
      out[count++] = lead;
      continue;
    }
    const more =
      lead >= 0xf0 && lead < 0xf5 ? 3 : lead >= 0xe0 && lead < 0xf0 ? 2 : lead >= 0xc2 && lead < 0xe0 ? 1 : 0;
    if (more === 0) return null;
    let code = lead & (0x3f >> more);
    for (let k = 0; k < more; k++) {
      const next = bytes[i++];
      if ((next & 0xc0) !== 0x80) return null;
      code = (code << 6) | (next & 0x3f);
    }
    if (code > 0xffff) {
      out[count++] = 0xd800 + ((code - 0x10000) >> 10);
      out[count++] = 0xdc00 + ((code - 0x10000) & 0x3ff);
    } else out[count++] = code;
  }
  return out.subarray(0, count);
}

const MINUS_SIGN = 0x2212;
const FIRST_SPACE = 0x2000;
const LAST_SPACE = 0x200b;
const NARROW_SPACE = 0x202f;

/** Typographic minus and spaces as the plain ones, in place. */
function plain(codes: Uint16Array): Uint16Array {
  for (let i = 0; i < codes.length; i++) {
    const c = codes[i];
    if (c === MINUS_SIGN) codes[i] = 45;
    else if ((c >= FIRST_SPACE && c <= LAST_SPACE) || c === NARROW_SPACE || c === 0xfeff) codes[i] = 32;
  }
  return codes;
}
