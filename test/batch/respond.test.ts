import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BARE_RECORD, batch, folderWith, projectOf, TIMED_RECORD } from './support.ts';

const respond = (folder: string, ...more: string[]) =>
  batch(folder, 'respond', 'p.swaybook.json', '--out', 'out', ...more);
const read = (folder: string, name: string) => readFileSync(join(folder, 'out', name), 'utf8');

describe('[BATCH-4] respond', () => {
  test('writes the response file and the tables, and prints the envelope', () => {
    const folder = folderWith({ 'p.swaybook.json': projectOf() });
    const { status, stdout, lines } = respond(folder);
    expect({ status, lines }).toEqual({ status: 0, lines: [] });
    const response = JSON.parse(read(folder, 'response.json'));
    expect(JSON.parse(stdout)).toEqual(response.envelope);
    expect(response.runs).toHaveLength(1);
    expect(response.runs[0].stepError).toBeGreaterThan(0);
    expect(response.runs[0].stepError).toBeLessThan(0.05);
    const files = readdirSync(join(folder, 'out'));
    expect(files).toEqual(expect.arrayContaining(['storey-response.csv', 'floor-response.csv', 'energy.csv']));
    expect(files.filter((name) => name.startsWith('histories-'))).toEqual([]);
    // The table holds the very numbers of the response file, roof first.
    const [heads, roof] = read(folder, 'storey-response.csv')
      .split('\r\n')
      .map((row) => row.split(','));
    expect(roof[heads.indexOf('Largest peak drift ratio [-]')]).toBe(String(response.envelope.storeys[1].max));
  });

  test('histories have a row a step, in a file with a safe name', () => {
    const [motion] = (projectOf() as { motions: object[] }).motions;
    const folder = folderWith({ 'p.swaybook.json': projectOf({ motions: [{ ...motion, name: '../A: 1/2' }] }) });
    expect(respond(folder, '--histories').status).toBe(0);
    const [run] = JSON.parse(read(folder, 'response.json')).runs;
    const rows = read(folder, 'histories-A-1-2.csv').trimEnd().split('\r\n');
    expect(rows).toHaveLength(1 + run.steps + 1);
    expect(rows[0]).toMatch(/^Time \[s\],Ground acceleration \[m\/s2\],Displacement of floor 1 \[m\],/);
  });

  test('takes record files beside the project, wherever it is run from', () => {
    const motions = [
      { name: 'timed', file: 'records/timed.csv' },
      { name: 'bare', file: 'records/bare.txt', unit: 'g', interval: 0.01, scale: -0.5 },
    ];
    const folder = folderWith({
      'sub/p.swaybook.json': projectOf({ motions }),
      'sub/records/timed.csv': TIMED_RECORD,
      'sub/records/bare.txt': BARE_RECORD,
    });
    const { status, lines } = batch(folder, 'respond', 'sub/p.swaybook.json', '--out', 'out');
    expect({ status, lines }).toEqual({ status: 0, lines: [] });
    const { runs } = JSON.parse(read(folder, 'response.json'));
    expect(runs.map((run: { motion: string }) => run.motion)).toEqual(['timed', 'bare']);
    expect(runs.map((run: { step: number }) => run.step)).toEqual([0.01, 0.005]);
  });

  test('a collapse is a result, said on the way, with no statistics', () => {
    const [motion] = (projectOf() as { motions: object[] }).motions;
    const folder = folderWith({ 'p.swaybook.json': projectOf({ motions: [{ ...motion, scale: 500 }] }) });
    const { status, stdout, lines } = respond(folder);
    expect(status).toBe(0);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(
      /^p\.swaybook\.json: motion Motion A: did not finish: storey \d passed the drift .* at \d\.\d\d s/,
    );
    expect(JSON.parse(stdout)).toMatchObject({ incomplete: ['Motion A'], storeys: [{ mean: null }, { mean: null }] });
  });

  test('`npm run --silent batch` is the same command', () => {
    const folder = folderWith({ 'p.swaybook.json': projectOf() });
    const args = [
      'run',
      '--silent',
      'batch',
      '--',
      'respond',
      join(folder, 'p.swaybook.json'),
      '--out',
      join(folder, 'out'),
    ];
    const { status, stdout } = spawnSync('npm', args, { encoding: 'utf8', shell: process.platform === 'win32' });
    expect(status).toBe(0);
    expect(JSON.parse(stdout)).toEqual(JSON.parse(read(folder, 'response.json')).envelope);
  });
});

describe('[BATCH-5] a project at fault ends with 1, all its faults listed, and writes nothing', () => {
  const faultsOf = (project: object | string, files: Record<string, string> = {}) => {
    const folder = folderWith({ 'p.swaybook.json': project, ...files });
    const { status, stdout, lines } = respond(folder);
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' });
    expect(existsSync(join(folder, 'out'))).toBe(false);
    for (const line of lines) expect(line).toMatch(/^p\.swaybook\.json: .+: .+\..+\.$/);
    return lines.join('\n');
  };

  test('many faults at once', () => {
    const { frame } = projectOf() as { frame: { storeys: object[] } };
    const lines = faultsOf(
      projectOf({
        frame: {
          ...frame,
          storeys: [
            { ...frame.storeys[0], mass: -3, colour: 'red' },
            { ...frame.storeys[1], height: 0 },
          ],
        },
        limits: { drift: 'two percent', source: '' },
        notes: [],
      }),
    );
    for (const place of [
      'frame.storeys[0].mass',
      'frame.storeys[0].colour',
      'frame.storeys[1].height',
      'limits.drift',
      'notes',
    ]) {
      expect(lines).toContain(`${place}: `);
    }
  });

  test('what a later version brings is refused with a word', () => {
    const { frame } = projectOf() as { frame: { storeys: object[] } };
    const storeys = [{ ...frame.storeys[0], law: { kind: 'bilinear', strength: 1e6, hardening: 0.02 } }];
    const lines = faultsOf(projectOf({ frame: { ...frame, storeys, damping: { kind: 'none' } } }));
    expect(lines).toMatch(/frame\.storeys\[0\]\.law.*not available yet/);
  });

  test('records that are not there, and a unit that contradicts the file', () => {
    const motions = [
      { name: 'gone', file: 'gone.txt' },
      { name: 'timed', file: 'timed.csv', unit: 'g' },
      { name: 'bare', file: 'bare.txt' },
    ];
    const lines = faultsOf(projectOf({ motions }), { 'timed.csv': TIMED_RECORD, 'bare.txt': BARE_RECORD });
    expect(lines).toMatch(/motions\[0\].*gone\.txt/);
    expect(lines).toMatch(/motions\[1\].*cm\/s2/);
    expect(lines).toMatch(/motions\[2\].*unit/);
    expect(lines).toMatch(/motions\[2\].*interval/);
  });

  test('text that is no project', () => {
    expect(faultsOf('{ "format": ')).toMatch(/JSON/);
  });

  test('a project that is not there, a folder that cannot be made', () => {
    const folder = folderWith({ 'p.swaybook.json': projectOf(), out: 'a file' });
    expect(batch(folder, 'respond', 'q.json', '--out', 'o').lines).toEqual([
      'q.json: file: is not there. Check its path.',
    ]);
    const { status, lines } = respond(folder);
    expect(status).toBe(1);
    expect(lines).toEqual(['out: file: is a file, where a folder is wanted. Name a folder that can be written to.']);
  });
});

const RECORD = resolve('../shared/records/imperial-valley-1940-ns.txt');

describe.runIf(existsSync(RECORD))('the five-storey frame under the 1940 record', () => {
  // Chopra, Dynamics of Structures, section 13.2.6: five floors of 100 kip, five storeys of 31.54 kip/in and 12 ft, 5 % in all
  // modes. Printed 6.847 in, 73.278 and 35.217 kip, 2593.2 kip ft; tolerance 0.4 %: published checks, B5.
  test('gives the published peaks', () => {
    const [inch, kip] = [0.0254, 4448.2216152605];
    const storeys = Array.from({ length: 5 }, (_, i) => ({
      name: `Storey ${i + 1}`,
      height: 144 * inch,
      mass: (100 * kip) / 9.80665,
      stiffness: (31.54 * kip) / inch,
      law: { kind: 'elastic' },
    }));
    const project = projectOf({
      frame: { storeys, damping: { kind: 'modal', ratios: [0.05] }, pDelta: false },
      motions: [{ name: '1940', file: '1940.txt' }],
      analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: { parts: 8 } },
    });
    const folder = folderWith({ 'p.swaybook.json': project, '1940.txt': readFileSync(RECORD, 'utf8') });
    expect(respond(folder).status).toBe(0);
    const [run] = JSON.parse(read(folder, 'response.json')).runs;
    const peaks = {
      roof: run.floors[4].peakDisplacement / inch / 6.847,
      base: run.base.peakShear / kip / 73.278,
      top: run.storeys[4].peakShear / kip / 35.217,
      overturning: run.base.peakOverturning / (12 * inch * kip) / 2593.2,
    };
    for (const share of Object.values(peaks)) expect(Math.abs(share - 1)).toBeLessThan(0.004);
    expect(run.stepError).toBeLessThan(0.01);
  });
});
