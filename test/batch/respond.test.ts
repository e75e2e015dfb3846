import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import { noise } from '../support/frames.ts';
import { BARE_RECORD, batch, folderWith, projectOf, TIMED_RECORD } from './support.ts';

const respond = (folder: string, ...more: string[]) =>
  batch(folder, 'respond', 'p.swaybook.json', '--out', 'out', ...more);
const read = (folder: string, name: string) => readFileSync(join(folder, 'out', name), 'utf8');

const folderOf = (project: object) => folderWith({ 'p.swaybook.json': project });

/** An isolator with a damper, one storey of each law that yields, and an elastic one. */
const yieldingStoreys = [
  {
    name: 'Isolators',
    height: 1.5,
    mass: 4e5,
    stiffness: 6e7,
    law: { kind: 'bilinear', strength: 1e6, hardening: 0.3 },
    damper: { coefficient: 2e5, exponent: 0.5 },
    role: 'isolator',
  },
  { name: 'A', height: 4, mass: 2e5, stiffness: 2e8, law: { kind: 'peak-oriented', strength: 4e5, hardening: 0.05 } },
  {
    name: 'B',
    height: 4,
    mass: 2e5,
    stiffness: 2e8,
    law: { kind: 'bouc-wen', strength: 4e5, hardening: 0.05, exponent: 2, beta: 0.6, gamma: 0.4 },
  },
  { name: 'C', height: 4, mass: 2e5, stiffness: 1e8, law: { kind: 'flag', strength: 2e5, hardening: 0.1, ratio: 0.8 } },
  { name: 'D', height: 4, mass: 2e5, stiffness: 2e8, law: { kind: 'elastic' } },
];
const yieldingFrame = {
  storeys: yieldingStoreys,
  damping: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05], stiffness: 'tangent' },
  pDelta: true,
};

/** The frame with its stiffnesses so many times as large. */
const stiffer = (frame: { storeys: object[] }, times: number) => ({
  ...frame,
  storeys: frame.storeys.map((storey) => ({
    ...storey,
    stiffness: times * (storey as { stiffness: number }).stiffness,
  })),
});

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
      /^p\.swaybook\.json: motion Motion A: did not finish: storey \d lost its stability at \d\.\d\d s/,
    );
    expect(JSON.parse(stdout)).toMatchObject({ incomplete: ['Motion A'], storeys: [{ mean: null }, { mean: null }] });
  });

  test('a frame made to collapse under its own weight: the storey and the time are named', () => {
    const { frame } = projectOf() as { frame: { storeys: object[] } };
    // After yield the ground storey has 0.5 % of its stiffness, less than P/h takes away.
    const storeys = [
      { ...frame.storeys[0], law: { kind: 'peak-oriented', strength: 4e5, hardening: 0.005 } },
      frame.storeys[1],
    ];
    const [motion] = (projectOf() as { motions: object[] }).motions;
    const project = projectOf({ frame: { ...frame, storeys }, motions: [{ ...motion, scale: 3 }] });
    const folder = folderOf(project);
    const { status, stdout, lines } = respond(folder);
    expect(status).toBe(0);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(/did not finish: storey 1 lost its stability at \d\.\d\d s, drift 10\.\d %$/);
    const response = JSON.parse(read(folder, 'response.json'));
    const [run] = response.runs;
    expect(run).toMatchObject({ completed: false, stepError: null, reason: { storey: 1 } });
    expect(run.reason.time).toBeGreaterThan(0);
    expect(run.reason.time).toBeLessThan(run.step * run.steps);
    expect(run.storeys[0].peakDriftRatio).toBeGreaterThan(0.1);
    expect(JSON.parse(stdout).incomplete).toEqual(['Motion A']);
    for (const storey of JSON.parse(stdout).storeys) {
      expect(storey).toMatchObject({ mean: null, median: null, max: null, ratio: null, governing: null });
    }
    const still = projectOf({ frame: { ...frame, storeys, pDelta: false }, motions: [motion] });
    expect(respond(folderOf(still)).lines).toEqual([]);
  });

  test('a run that comes to its end, and not at half the step, says so', () => {
    const law = { kind: 'bilinear', strength: 3e5, hardening: 0 };
    const storeys = [law, { kind: 'elastic' }].map((law, i) => ({
      name: `S${i}`,
      height: 3,
      mass: 2e5,
      stiffness: 4e7,
      law,
    }));
    const damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] };
    const project = projectOf({
      frame: { storeys, damping, pDelta: true },
      motions: [{ name: 'Motion A', interval: 0.05, acceleration: Array.from(noise(51, 300)) }],
      analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: 0.05 },
    });
    const folder = folderOf(project);
    const { status, lines } = respond(folder);
    expect({ status, lines }).toEqual({
      status: 0,
      lines: [
        expect.stringMatching(/Motion A: does not finish at half the step: storey 1 lost its stability at 6\.63 s/),
      ],
    });
    expect(JSON.parse(read(folder, 'response.json')).runs[0]).toMatchObject({ completed: true, stepError: null });
  });

  test('every law, a damper and an isolator, at a step chosen by halving', () => {
    const { analysis } = projectOf() as { analysis: object };
    const project = projectOf({
      version: 2,
      frame: yieldingFrame,
      analysis: { ...analysis, step: 'auto' },
      limits: { drift: 0.02, source: 'the clause', isolator: 0.3 },
    });
    const folder = folderOf(project);
    const { status, lines } = respond(folder, '--histories');
    expect(status).toBe(0);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(
      /^p\.swaybook\.json: motion Motion A: step 0\.0\d+ s: (the whole|\d+ parts of the) interval of 0\.02 s, /,
    );
    const { runs, envelope } = JSON.parse(read(folder, 'response.json'));
    const [run] = runs;
    expect(run.stepError).toBeLessThan(0.01);
    expect(Math.log2(0.02 / run.step) % 1).toBeCloseTo(0, 9);
    const ductile = run.storeys.map((storey: { ductility?: number }) => storey.ductility !== undefined);
    expect(ductile).toEqual([true, true, true, true, false]);
    expect(
      Math.max(...run.storeys.slice(1, 4).map((storey: { ductility: number }) => storey.ductility)),
    ).toBeGreaterThan(1);
    const { input, kinetic, strain, damping, dampers, hysteretic, imbalance } = run.energy;
    expect(dampers).toBeGreaterThan(0);
    expect(hysteretic).toBeGreaterThan(0);
    expect(Math.abs(input - kinetic - strain - damping - dampers - hysteretic) / input).toBeLessThan(0.01);
    expect(imbalance).toBeLessThan(0.01);
    const { displacement } = envelope.floors[0];
    expect(displacement).toMatchObject({ limit: 0.3, ratio: displacement.max / 0.3 });
    expect(envelope.storeys[0]).toMatchObject({ limit: null, ratio: null });
    const [heads, row] = read(folder, 'energy.csv').split('\r\n');
    expect(heads).toContain(',Why this step,');
    expect(row).toContain('interval of 0.02 s');
    expect(read(folder, 'histories-Motion-A.csv').split('\r\n')[0]).toContain(',Damper force of storey 1 [N],');
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

  test('numbers that no law, damper or isolator takes, each at its cell with the limit named', () => {
    const law = (i: number, kind: object) => ({ ...yieldingStoreys[i], law: kind });
    const storeys = [
      { ...yieldingStoreys[0], damper: { coefficient: -1, exponent: 0.1 } },
      law(1, { kind: 'peak-oriented', strength: 0, hardening: 1 }),
      law(2, { kind: 'bouc-wen', strength: 1e6, hardening: 0.02, exponent: 0.5, beta: 0.4, gamma: 0.6 }),
      { ...law(3, { kind: 'flag', strength: -1, hardening: 0.1, ratio: 0.95 }), role: 'isolator' },
    ];
    const limits = { drift: 0.02, source: 'the clause', isolator: 0 };
    const lines = faultsOf(projectOf({ frame: { ...yieldingFrame, storeys }, limits }));
    for (const fault of [
      'frame.storeys[0].damper.coefficient: is -1, must be at least 0',
      'frame.storeys[0].damper.exponent: is 0.1, must be at least 0.15',
      'frame.storeys[1].law.strength: is 0, must be above 0',
      'frame.storeys[1].law.hardening: is 1, must be below 1',
      'frame.storeys[2].law.exponent: is 0.5, must be at least 1',
      'frame.storeys[2].law.beta: is 0.4, must be at least 0.5',
      'frame.storeys[3].law.strength: is -1, must be above 0',
      'frame.storeys[3].law.ratio: is 0.95, must be at most 1 - hardening = 0.9',
      'frame.storeys[3].role: only the first storey can be an isolator',
      'limits.isolator: is 0, must be above 0',
    ]) {
      expect(lines).toContain(fault);
    }
  });

  test('a frame that cannot carry its gravity, and a step that its scheme cannot take, even by halving', () => {
    const { frame, analysis } = projectOf() as { frame: { storeys: object[] }; analysis: object };
    const soft = [frame.storeys[0], { ...frame.storeys[1], stiffness: 9e5 }];
    expect(faultsOf(projectOf({ frame: { ...frame, storeys: soft } }))).toMatch(
      /frame\.storeys\[1\]\.stiffness: storey 2 is unstable under gravity: P\/\(k h\).* is [\d.]+ and must stay under 1/,
    );
    const explicit = { ...analysis, method: { kind: 'central-difference' } };
    expect(faultsOf(projectOf({ analysis: { ...explicit, step: 0.1 / 5 }, frame: stiffer(frame, 1e3) }))).toMatch(
      /analysis\.step: a step of 0\.02 s is beyond the stability limit of 0\.00\d+ s/,
    );
    expect(faultsOf(projectOf({ analysis: { ...explicit, step: 'auto' }, frame: stiffer(frame, 1e5) }))).toMatch(
      /analysis\.step: halving stops at 64 parts .* stability limit of 0\.000\d+ s/,
    );
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
