import { describe, expect, test } from 'vitest';
import { readRecord } from '../../../src/core/motion/read.ts';
import { linesOf, lineText } from '../../../src/core/motion/text.ts';
import { wave } from './records.ts';

const utf8 = (text: string) => new TextEncoder().encode(text);
const textsOf = (bytes: Uint8Array) => {
  const lines = linesOf(bytes);
  return Array.from({ length: lines.count }, (_, i) => lineText(lines, i));
};

function utf16(text: string, little: boolean, mark: boolean): Uint8Array {
  const codes = [...(mark ? [0xfeff] : []), ...Array.from({ length: text.length }, (_, i) => text.charCodeAt(i))];
  return Uint8Array.from(codes.flatMap((c) => (little ? [c & 255, c >> 8] : [c >> 8, c & 255])));
}

describe('lines of a file', () => {
  test('end in LF, CR LF or CR; a last line needs no end', () => {
    for (const end of ['\n', '\r\n', '\r']) {
      expect(textsOf(utf8(`a${end}${end}c`))).toEqual(['a', '', 'c']);
      expect(textsOf(utf8(`a${end}b${end}`))).toEqual(['a', 'b']);
    }
    expect(textsOf(new Uint8Array())).toEqual([]);
  });

  test('UTF-8 with and without its mark, UTF-16 of both orders with and without, Latin-1', () => {
    const text = 'Štip, Übung, 2 cm/s²\n0.01\n0.02 𝛼';
    const lines = text.split('\n');
    expect(textsOf(utf8(text))).toEqual(lines);
    expect(textsOf(Uint8Array.from([0xef, 0xbb, 0xbf, ...utf8(text)]))).toEqual(lines);
    for (const little of [true, false]) {
      expect(textsOf(utf16(text, little, true))).toEqual(lines);
      expect(textsOf(utf16('unit g\n0.01\n', little, false))).toEqual(['unit g', '0.01']);
    }
    expect(textsOf(Uint8Array.from([0xdc, 0x62, 0x20, 0xb2]))).toEqual(['Üb ²']);
  });

  test('a typographic minus is a minus, typographic spaces are blanks', () => {
    expect(textsOf(utf8('\u22120.5\u202f0.1\u2009'))).toEqual(['-0.5 0.1 ']);
  });

  test('bytes that no text has make a binary file', () => {
    expect(linesOf(Uint8Array.from({ length: 400 }, (_, i) => (i * 7) % 256)).binary).toBe(true);
    expect(linesOf(utf8('0.01\t0.02\f\n\x1a')).binary).toBe(false);
  });
});

test('the same record is read from every encoding and with every line end', () => {
  const values = wave(40);
  const text = `Übung, interval 0.01 s, unit cm/s²\n${values.join('\n')}\n`;
  const expected = Float64Array.from(values, (value) => value * 0.01);
  const files = [
    utf8(text),
    utf8(text.replaceAll('\n', '\r\n')),
    utf8(text.replaceAll('\n', '\r')),
    utf8(text.replaceAll('-', '\u2212')),
    utf16(text, true, true),
    utf16(text, false, true),
    utf16(text, true, false),
    Uint8Array.from(text, (c) => c.charCodeAt(0)),
  ];
  for (const bytes of files) {
    const { motion, unit, interval } = readRecord('a.txt', bytes, {});
    expect({ unit, interval }).toEqual({ unit: 'cm/s2', interval: 0.01 });
    expect(motion?.acceleration).toEqual(expected);
  }
});
