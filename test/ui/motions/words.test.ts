import { describe, expect, it } from 'vitest';
import { readFile } from '../../../src/engine/reading.ts';
import type { ImportFile } from '../../../src/state/importQueue.ts';
import {
  listed,
  realMinus,
  sentence,
  shortWords,
  standingOf,
  summaryOf,
} from '../../../src/ui/motions/import/words.ts';

const values = Array.from({ length: 400 }, (_, i) =>
  (0.3 * Math.sin(i / 5) * Math.exp(-(((i - 150) / 60) ** 2))).toFixed(4),
);
const GOOD = `interval 0.01 s, unit (g)\n${values.join('\n')}\n`;

function fileOf(file: string, text: string, changed: Partial<ImportFile> = {}): ImportFile {
  const bytes = new TextEncoder().encode(text);
  const answer = readFile(file, bytes, {});
  return {
    id: file,
    file,
    bytes: bytes.buffer,
    answers: {},
    status: 'read',
    answer,
    failure: null,
    leftOut: false,
    ...changed,
  };
}

const good = fileOf('good.txt', GOOD);
const coarse = fileOf('coarse.txt', GOOD.replace('0.01', '0.02'));
const bare = fileOf('bare.txt', values.join('\n'));
const broken = fileOf('broken.txt', GOOD.replace(values[200], 'void'));
const empty = fileOf('empty.txt', '');
const reading = fileOf('new.txt', '', { status: 'reading', answer: null });

describe('where a file stands', () => {
  it.each([
    [good, 'ready', '400 samples, 3.99 s'],
    [coarse, 'look', '400 samples, 7.98 s'],
    [bare, 'asks', 'asks for its interval and unit'],
    [broken, 'stopped', 'stopped at line 202'],
    [empty, 'stopped', 'stopped'],
    [reading, 'reading', 'reading'],
    [{ ...good, leftOut: true }, 'left-out', 'left out'],
    [{ ...good, status: 'failed' as const }, 'failed', 'could not be read'],
  ])('%#', (file, standing, words) => {
    expect([standingOf(file), shortWords(file)]).toEqual([standing, words]);
  });
});

describe('the sentence over the list', () => {
  it.each([
    [[], 'Plain text: one value a line, rows of values, or time and value in columns.'],
    [[good], '1 file read.'],
    [[good, coarse], '2 files read. One has something to look at before it goes in.'],
    [[coarse], '1 file read. It has something to look at before it goes in.'],
    [[coarse, good, coarse], '3 files read. 2 have something to look at before they go in.'],
    [[good, reading], 'Reading 1 file.'],
    [[good, broken, coarse], '2 of 3 files are ready. broken.txt stopped at line 202; nothing of it has been added.'],
    [[bare, good], '1 of 2 files is ready. bare.txt asks for its interval and unit; nothing of it has been added.'],
    [[empty], 'empty.txt was not read to its end; nothing of it has been added.'],
  ])('%#', (files, words) => expect(summaryOf(files)).toBe(words));
});

it('lists, sentences and minus signs', () => {
  expect([listed([]), listed(['A']), listed(['A', 'B']), listed(['A', 'B', 'C'])]).toEqual([
    '',
    'A',
    'A and B',
    'A, B and C',
  ]);
  expect([sentence('is void'), sentence('is it g?')]).toEqual(['Is void.', 'Is it g?']);
  expect(realMinus('ends at -0.83 m/s, non-zero')).toBe('ends at \u22120.83 m/s, non-zero');
});
