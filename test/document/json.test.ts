import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readJson } from '../../src/document/json.ts';

const place = (text: string) => {
  const read = readJson(text);
  return read.ok ? 'fine' : read.faults.map(({ code, where }) => `${code} ${where}`).join('; ');
};

describe('[DOC-6] the text of a file', () => {
  test.each<[string, string, string]>([
    ['a word', '{\n  oops\n}', 'line 2, column 3'],
    ['a comma too many', '{"a": 1,\n}', 'line 2, column 1'],
    ['a comma missing', '[1 2]', 'line 1, column 4'],
    ['an end that is missing', '{"a": [1,\n2', 'line 2, column 2'],
    ['a text that is not closed', '{"a": "b}', 'line 1, column 7'],
    ['a colon missing', '{"a" 1}', 'line 1, column 6'],
    ['a number that is none', '[1, 0x10]', 'line 1, column 6'],
    ['NaN', '[1,\n NaN]', 'line 2, column 2'],
    ['something behind the end', '{} {}', 'line 1, column 4'],
    ['nothing', '', 'line 1, column 1'],
    ['a bad escape', '["a\\q"]', 'line 1, column 2'],
    ['a line break in a text', '["a\nb"]', 'line 1, column 2'],
    ['a bracket of the other kind', '[1}', 'line 1, column 3'],
  ])('%s is placed by line and column', (_, text, where) => expect(place(text)).toBe(`not-json ${where}`));

  test('a key that stands twice is a fault, since one of its values would be lost', () => {
    expect(place('{"a": 1,\n "b": {"a": 2, "\\u0061": 3}}')).toBe('key-twice line 2, column 16');
    expect(place('[{"a": 1}, {"a": "a\\" : {"}]')).toBe('fine');
  });

  test('reads what JSON is and nothing else, and whatever it refuses has a place within the text', () => {
    let [refused, read] = [0, 0];
    fc.assert(
      fc.property(
        fc.json(),
        fc.nat(),
        fc.constantFrom('', '"', '}', ']', ',', ':', 'x', '\\', '\n'),
        (json, at, sign) => {
          const cut = at % (json.length + 1);
          const text = json.slice(0, cut) + sign + json.slice(cut + 1);
          let value: unknown;
          let valid = true;
          try {
            value = JSON.parse(text);
          } catch {
            valid = false;
          }
          const result = readJson(text);
          if (result.ok) {
            read++;
            expect(valid).toBe(true);
            expect(result.value).toEqual(value);
            return;
          }
          refused++;
          for (const fault of result.faults) {
            const [, line, column] = /^line (\d+), column (\d+)$/.exec(fault.where) ?? [];
            const lines = text.split('\n');
            expect(Number(line)).toBeLessThanOrEqual(lines.length);
            expect(Number(column)).toBeLessThanOrEqual(lines[Number(line) - 1].length + 1);
            expect(fault.code === 'key-twice').toBe(valid);
            // What is no JSON is not read to its very end and then refused without a reason.
            if (!valid) expect(fault.message).not.toMatch(/the end is wanted here, the text ends/);
          }
        },
      ),
      { numRuns: 700 },
    );
    expect(refused).toBeGreaterThan(50);
    expect(read).toBeGreaterThan(50);
  });
});
