import type { Fault, Result } from '../core/fault.ts';

/**
 * Reads JSON (RFC 8259), with the place of what is wrong in lines and columns, which engines tell each in their own words or not
 * at all. A key that stands twice in one object is a fault too: one of its two values would be lost without a word.
 */
export function readJson(text: string): Result<unknown> {
  const bare = text.startsWith('\ufeff') ? text.slice(1) : text;
  let value: unknown;
  try {
    value = JSON.parse(bare);
  } catch {
    return { ok: false, faults: [brokenAt(bare)] };
  }
  const faults = keysTwice(bare);
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value };
}

const STRING = '"[^"\\\\]*(?:\\\\.[^"\\\\]*)*"';

/** Keys that stand twice in one object of a text that is known to be JSON. */
function keysTwice(text: string): Fault[] {
  const faults: Fault[] = [];
  const objects: Set<string>[] = [];
  for (const token of text.matchAll(new RegExp(`(${STRING})(\\s*:)?|[{}]`, 'g'))) {
    const [sign, key, colon] = token;
    if (sign === '{') objects.push(new Set());
    else if (sign === '}') objects.pop();
    else if (colon !== undefined) {
      const name = String(JSON.parse(key));
      const keys = objects.at(-1);
      if (keys?.has(name)) {
        const message = `the key ${key} stands twice in one object`;
        faults.push({ code: 'key-twice', where: placeOf(text, token.index), message, mend: 'Take one of the two out' });
      }
      keys?.add(name);
    }
  }
  return faults;
}

const BLANK = /[ \t\r\n]*/y;
const SCALAR =
  /"(?:[^"\\\p{Cc}]|[\u007f-\u009f]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*"|-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null/uy;

type Wanted =
  | 'a value'
  | 'a value or ]'
  | 'a key in double quotes'
  | 'a key in double quotes or }'
  | ':'
  | ', or }'
  | ', or ]'
  | 'the end';

/** The first place where a text stops being JSON, and what would have to stand there. */
function brokenAt(text: string): Fault {
  const open: ('{' | '[')[] = [];
  let wanted: Wanted = 'a value';
  let at = 0;
  const skip = (pattern: RegExp): string | null => {
    pattern.lastIndex = at;
    const found = pattern.exec(text)?.[0] ?? null;
    at += found?.length ?? 0;
    return found;
  };
  const after = (): Wanted => (open.length === 0 ? 'the end' : open.at(-1) === '{' ? ', or }' : ', or ]');
  for (;;) {
    skip(BLANK);
    const sign = text[at];
    if (sign === undefined) break;
    if (wanted === 'a value' || wanted === 'a value or ]') {
      if (sign === ']' && wanted === 'a value or ]') {
        open.pop();
        at++;
        wanted = after();
      } else if (sign === '{' || sign === '[') {
        open.push(sign);
        at++;
        wanted = sign === '{' ? 'a key in double quotes or }' : 'a value or ]';
      } else if (skip(SCALAR)) wanted = after();
      else break;
    } else if (wanted === 'a key in double quotes' || wanted === 'a key in double quotes or }') {
      if (sign === '}' && wanted === 'a key in double quotes or }') {
        open.pop();
        at++;
        wanted = after();
      } else if (sign === '"' && skip(SCALAR)) wanted = ':';
      else break;
    } else if (wanted === ':' && sign === ':') {
      at++;
      wanted = 'a value';
    } else if ((wanted === ', or }' || wanted === ', or ]') && sign === ',') {
      at++;
      wanted = wanted === ', or }' ? 'a key in double quotes' : 'a value';
    } else if ((wanted === ', or }' && sign === '}') || (wanted === ', or ]' && sign === ']')) {
      open.pop();
      at++;
      wanted = after();
    } else break;
  }
  const stands =
    at < text.length ? `${JSON.stringify(text.slice(at, at + 12).split('\n')[0])} stands there` : 'the text ends';
  return {
    code: 'not-json',
    where: placeOf(text, at),
    message: `is no JSON: ${wanted} is wanted here, ${stands}`,
    mend: 'Choose a project file (.swaybook.json), or mend it there',
  };
}

/** Line and column, both from 1. */
function placeOf(text: string, at: number): string {
  const before = text.slice(0, at).split('\n');
  return `line ${before.length}, column ${(before.at(-1) ?? '').length + 1}`;
}
