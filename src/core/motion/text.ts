/**
 * A record file as lines of bytes: marks of order taken off, UTF-16 turned into one byte a sign (records are plain figures; a
 * sign beyond Latin-1 becomes "?"), any line end understood. Never throws.
 */
export interface Lines {
  readonly bytes: Uint8Array;
  /** Line i is bytes[start[i]] up to, not including, bytes[end[i]]. */
  readonly start: Int32Array;
  readonly end: Int32Array;
  readonly count: number;
  /** The bytes hold control signs that no text has. */
  readonly binary: boolean;
}

export function linesOf(raw: Uint8Array): Lines {
  const bytes = oneByteASign(raw);
  const { length } = bytes;
  let capacity = 1;
  for (let i = 0; i < length; i++) if (bytes[i] === 10 || bytes[i] === 13) capacity++;
  const start = new Int32Array(capacity);
  const end = new Int32Array(capacity);
  let count = 0;
  let from = 0;
  let odd = 0;
  for (let i = 0; i < length; i++) {
    const b = bytes[i];
    if (b === 10 || b === 13) {
      start[count] = from;
      end[count++] = i;
      if (b === 13 && bytes[i + 1] === 10) i++;
      from = i + 1;
    } else if (b < 32 && b !== 9 && b !== 12 && b !== 26) odd++;
  }
  if (from < length) {
    start[count] = from;
    end[count++] = length;
  }
  return { bytes, start, end, count, binary: odd > 0 && odd > length / 1000 };
}

/** Line i as text: UTF-8 where it is that, else Latin-1. */
export function lineText({ bytes, start, end }: Lines, i: number): string {
  return decoded(bytes.subarray(start[i], end[i]));
}

function oneByteASign(raw: Uint8Array): Uint8Array {
  if (raw[0] === 0xef && raw[1] === 0xbb && raw[2] === 0xbf) return raw.subarray(3);
  const marked = (raw[0] === 0xff && raw[1] === 0xfe) || (raw[0] === 0xfe && raw[1] === 0xff);
  const little = marked ? raw[0] === 0xff : zeros(raw, 1);
  if (!marked && !little && !zeros(raw, 0)) return raw;
  const body = marked ? raw.subarray(2) : raw;
  const out = new Uint8Array(body.length >> 1);
  for (let i = 0; i < out.length; i++) {
    const code = little ? body[2 * i] | (body[2 * i + 1] << 8) : (body[2 * i] << 8) | body[2 * i + 1];
    out[i] = code < 256 ? code : 63;
  }
  return out;
}

/** Whether nearly every second byte, from an offset on, is zero: UTF-16 without its mark. */
function zeros(raw: Uint8Array, offset: number): boolean {
  const sample = Math.min(raw.length, 4096);
  let found = 0;
  for (let i = offset; i < sample; i += 2) if (raw[i] === 0) found++;
  return sample >= 4 && found > 0.45 * sample;
}

function decoded(bytes: Uint8Array): string {
  let out = '';
  for (let i = 0; i < bytes.length; ) {
    const b = bytes[i];
    const length = b < 0x80 ? 1 : b >= 0xf0 && b < 0xf5 ? 4 : b >= 0xe0 ? 3 : b >= 0xc2 ? 2 : 0;
    if (length === 1) {
      out += String.fromCharCode(b);
      i++;
      continue;
    }
    let code = length === 2 ? b & 0x1f : length === 3 ? b & 0x0f : b & 0x07;
    let fine = length > 0 && i + length <= bytes.length;
    for (let k = 1; fine && k < length; k++) {
      if ((bytes[i + k] & 0xc0) !== 0x80) fine = false;
      code = (code << 6) | (bytes[i + k] & 0x3f);
    }
    if (!fine || code > 0x10ffff || (code >= 0xd800 && code < 0xe000)) return latin1(bytes);
    out += String.fromCodePoint(code);
    i += length;
  }
  return out;
}

function latin1(bytes: Uint8Array): string {
  let out = '';
  for (const b of bytes) out += String.fromCharCode(b);
  return out;
}
