import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BARE_RECORD, batch, folderWith, TIMED_RECORD } from './support.ts';

const RECORD = resolve('../shared/records/imperial-valley-1940-ns.txt');

describe('[BATCH-2] inspect', () => {
  test('describes each motion found under the names of the project-file page', () => {
    const folder = folderWith({ 'timed.csv': TIMED_RECORD });
    const { status, stdout } = batch(folder, 'inspect', 'timed.csv');
    expect(status).toBe(0);
    const [found, ...more] = JSON.parse(stdout);
    expect(more).toEqual([]);
    expect(Object.keys(found)).toEqual([
      'file',
      'layout',
      'name',
      'interval',
      'samples',
      'unit',
      'peakAcceleration',
      'peakVelocity',
      'peakDisplacement',
      'endVelocity',
      'ariasIntensity',
      'duration5to95',
      'warnings',
    ]);
    expect(found).toMatchObject({ file: 'timed.csv', layout: 'time-and-acceleration', samples: 200, unit: 'cm/s2' });
    expect(found.interval).toBeCloseTo(0.02, 12);
    expect(found.peakAcceleration).toBeCloseTo(1.5, 3);
  });

  test('asks for what the file does not say, and takes it from the flags', () => {
    const folder = folderWith({ 'bare.txt': BARE_RECORD });
    const asked = batch(folder, 'inspect', 'bare.txt');
    expect(asked.status).toBe(1);
    expect(asked.lines).toHaveLength(2);
    expect(asked.lines.every((line) => line.startsWith('bare.txt: '))).toBe(true);
    expect(asked.lines.join('\n')).toMatch(/--unit/);
    expect(asked.lines.join('\n')).toMatch(/--interval/);
    const told = batch(folder, 'inspect', 'bare.txt', '--unit', 'g', '--interval', '0.01');
    expect(told.status).toBe(0);
    expect(JSON.parse(told.stdout)).toMatchObject([{ samples: 150, interval: 0.01, unit: 'g' }]);
  });

  test('a unit that contradicts the file is refused', () => {
    const { status, lines } = batch(folderWith({ 'timed.csv': TIMED_RECORD }), 'inspect', 'timed.csv', '--unit', 'g');
    expect(status).toBe(1);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(/^timed\.csv: .*cm\/s2/);
  });

  test('every file at fault has its lines, those that could be read are still described', () => {
    const folder = folderWith({ 'timed.csv': TIMED_RECORD, 'broken.csv': TIMED_RECORD.replace('1.00, ', '1.00, x') });
    const { status, stdout, lines } = batch(folder, 'inspect', 'gone.txt', 'broken.csv', 'timed.csv');
    expect(status).toBe(1);
    expect(JSON.parse(stdout)).toMatchObject([{ file: 'timed.csv' }]);
    expect(lines[0]).toBe('gone.txt: file: is not there. Check its path.');
    expect(lines.some((line) => /^broken\.csv: line 52/.test(line))).toBe(true);
  });
});

describe('[BATCH-3] spectrum', () => {
  const args = ['spectrum', 'bare.txt', '--unit', 'g', '--interval', '0.01', '--damping', '0.05'];

  test('has a value a period, and the pseudo values follow from the displacement', () => {
    const { status, stdout } = batch(folderWith({ 'bare.txt': BARE_RECORD }), ...args, '--periods', '0.1,0.5,1');
    expect(status).toBe(0);
    const { periods, displacement, pseudoVelocity, pseudoAcceleration } = JSON.parse(stdout);
    expect(periods).toEqual([0.1, 0.5, 1]);
    periods.forEach((period: number, i: number) => {
      const w = (2 * Math.PI) / period;
      expect(displacement[i]).toBeGreaterThan(0);
      expect(pseudoVelocity[i] / displacement[i]).toBeCloseTo(w, 9);
      expect(pseudoAcceleration[i] / (w * displacement[i])).toBeCloseTo(w, 9);
    });
  });

  test('a record that is not there', () => {
    const { status, stdout, lines } = batch(folderWith({}), ...args, '--periods', '1');
    expect({ status, stdout, lines }).toEqual({
      status: 1,
      stdout: '',
      lines: ['bare.txt: file: is not there. Check its path.'],
    });
  });
});

describe.runIf(existsSync(RECORD))('the 1940 record', () => {
  // Its heading says 1559 points and it holds 1560; peak 0.3188 g, Arias 1.7236 m/s, 23.86 s: published checks, C1.
  test('is read whole, with a word about its count', () => {
    const { status, stdout } = batch(folderWith({}), 'inspect', RECORD);
    expect(status).toBe(0);
    const [found] = JSON.parse(stdout);
    expect(found).toMatchObject({ layout: 'count-and-interval', samples: 1560, interval: 0.02, unit: 'g' });
    expect(found.peakAcceleration / 9.80665).toBeCloseTo(0.3188, 4);
    expect(found.ariasIntensity).toBeCloseTo(1.7236, 4);
    expect(found.duration5to95).toBeCloseTo(23.86, 2);
    expect(found.warnings.join(' ')).toMatch(/1559.*1560|1560.*1559/);
  });

  // Displacement at 5 %: 5.7062, 11.3041, 13.6532 cm at 0.5, 1 and 2 s: published checks, the table under C3.
  test('gives the published displacements', () => {
    const { stdout } = batch(folderWith({}), 'spectrum', RECORD, '--damping', '0.05', '--periods', '0.5,1,2');
    const { displacement } = JSON.parse(stdout);
    [0.057062, 0.113041, 0.136532].forEach((published, i) => {
      expect(Math.abs(displacement[i] / published - 1)).toBeLessThan(1e-4);
    });
  });
});
