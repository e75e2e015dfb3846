import { describe, expect, test } from 'vitest';
import { command } from '../../src/batch/command.ts';
import { readCommandLine, readNumber } from '../../src/batch/commandLine.ts';
import { safeFileNames } from '../../src/batch/files.ts';
import { batch, folderWith } from './support.ts';

test('words and flags in any order, both ways of giving a value', () => {
  const { line, faults } = readCommandLine(['a', '--unit', 'g', '--interval=0.01', 'b', '--all', '--', '--c'], {
    unit: 'value',
    interval: 'value',
    all: 'switch',
  });
  expect(faults).toEqual([]);
  expect(line.words).toEqual(['a', 'b', '--c']);
  expect(Object.fromEntries(line.flags)).toEqual({ unit: 'g', interval: '0.01', all: '' });
});

test('every fault of a line is said', () => {
  const { faults } = readCommandLine(['--units', 'g', '--out', '--all=yes', '--all', '--toString'], {
    out: 'value',
    all: 'switch',
  });
  expect(faults).toEqual([
    '--units: there is no such flag here',
    '--out: wants a value',
    '--all: takes no value',
    '--all: stands twice',
    '--toString: there is no such flag here',
  ]);
});

test('numbers are plain decimals', () => {
  expect(['0.05', '.5', '5.', '-1e-3', '+2'].map(readNumber)).toEqual([0.05, 0.5, 5, -0.001, 2]);
  expect(['', '0,05', '1x', 'Infinity', '0x10', '1e999'].map(readNumber)).toEqual([null, null, null, null, null, null]);
});

test('names are made safe for files, and no two alike', () => {
  expect(
    safeFileNames(['Motion A', '../../etc/passwd', 'motion a', 'Motion/A', '', '..', 'CON', 'Château 1.5']),
  ).toEqual(['Motion-A', 'etc-passwd', 'motion-a-2', 'Motion-A-3', 'motion', 'motion-2', 'motion-CON', 'Château-1.5']);
  const [long] = safeFileNames(['x'.repeat(300)]);
  expect(long.length).toBeLessThanOrEqual(80);
});

describe('[BATCH-1] a command line at fault ends with 2 and the usage, and prints nothing', () => {
  test.each([
    [[], 'no verb is named'],
    [['judge'], 'judge: there is no such verb'],
    [['toString'], 'toString: there is no such verb'],
    [['inspect'], 'inspect: names no RECORD'],
    [['inspect', 'a.txt', '--unit', 'gal'], '--unit: gal is none of g, m/s2, cm/s2, mm/s2'],
    [['inspect', 'a.txt', '--interval', '0,01'], '--interval: 0,01 is no number of seconds above 0'],
    [['inspect', 'a.txt', '--intervall', '0.01'], '--intervall: there is no such flag here'],
    [['spectrum', 'a.txt', '--damping', '5', '--periods', '1'], '--damping: wants a ratio'],
    [['spectrum', 'a.txt', '--damping', '0.05', '--periods', '1,,2'], '--periods: wants periods'],
    [['respond', 'p.json'], '--out: wants the FOLDER'],
    [['respond', 'p.json', 'q.json', '--out', 'o'], 'respond: takes one PROJECT, 2 are named'],
    [['size', 'p.json', '--out', 'o'], 'size: not available yet'],
    [['check', 'p.json'], 'check: not available yet'],
  ])('%j', (args, message) => {
    const { exit, output, messages } = command(args);
    expect(exit).toBe(2);
    expect(output).toBeUndefined();
    expect(messages[0]).toContain(message);
    expect(messages.some((line) => line.startsWith('usage: '))).toBe(true);
  });

  test('as the process tells it', () => {
    const { status, stdout, lines } = batch(folderWith({}), 'inspect', 'a.txt', '--unit', 'gal', '--interval', '0');
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' });
    expect(lines.slice(0, 3)).toEqual([
      '--unit: gal is none of g, m/s2, cm/s2, mm/s2',
      '--interval: 0 is no number of seconds above 0',
      'usage: npm run --silent batch -- VERB …',
    ]);
  });
});

test('help is no fault', () => {
  const { exit, messages } = command(['--help']);
  expect(exit).toBe(0);
  expect(messages[0]).toMatch(/^usage: /);
});
