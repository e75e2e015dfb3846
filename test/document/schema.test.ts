import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Fault } from '../../src/core/fault.ts';
import { readProject, readProjectOnItsWay } from '../../src/document/file.ts';
import { MIGRATIONS, migrated } from '../../src/document/migrations.ts';
import { PROJECT_VERSION } from '../../src/document/project.ts';

type Raw = Record<string, unknown>;

/** A file that holds every key of the project file once. */
const whole = (): Raw => ({
  format: 'swaybook',
  version: 2,
  title: 'All keys',
  frame: {
    storeys: [
      {
        name: 'Isolators',
        height: 1.5,
        mass: 3e5,
        stiffness: 2e7,
        law: { kind: 'bilinear', strength: 1e6, hardening: 0.1 },
        gravity: 3e6,
        damper: { coefficient: 2e6, exponent: 0.5 },
        role: 'isolator',
      },
      { name: 'A', height: 4, mass: 2e5, stiffness: 2e8, law: { kind: 'peak-oriented', strength: 1e6, hardening: 0 } },
      {
        name: 'B',
        height: 4,
        mass: 2e5,
        stiffness: 2e8,
        law: { kind: 'bouc-wen', strength: 1e6, hardening: 0.02, exponent: 2, beta: 0.6, gamma: 0.4 },
      },
      {
        name: 'C',
        height: 4,
        mass: 2e5,
        stiffness: 2e8,
        law: { kind: 'flag', strength: 1e6, hardening: 0.1, ratio: 0.9 },
        role: 'storey',
      },
      { name: 'D', height: 4, mass: 2e5, stiffness: 2e8, law: { kind: 'elastic' } },
    ],
    damping: { kind: 'rayleigh', modes: [1, 5], ratios: [0.05, 0.02], stiffness: 'tangent' },
    pDelta: true,
  },
  motions: [
    {
      name: 'Embedded',
      interval: 0.01,
      acceleration: [0, 0.1, -0.1],
      scale: -1.5,
      used: false,
      reason: 'clipped',
      origin: {
        file: 'a.txt',
        digest: 'ab',
        layout: 'values',
        unit: 'g',
        unitFrom: 'answer',
        interval: 0.01,
        intervalFrom: 'file',
        event: 'e',
        station: 's',
        component: 'c',
        mends: [{ line: 4, was: '1,2', is: '1.2', why: 'decimal comma' }],
      },
    },
  ],
  analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: 'auto', tail: 5, stopDrift: 0.1 },
  limits: { drift: 0.02, measure: 'median', factor: 1, source: 'a clause', isolator: 0.4 },
});

const faultsOf = (raw: unknown): readonly Fault[] => {
  const read = readProject(JSON.stringify(raw));
  return read.ok ? [] : read.faults;
};
const said = (raw: unknown) => faultsOf(raw).map(({ where, code }) => `${where} ${code}`);

/** Writes a value at a path of a raw file; undefined takes the key out. */
const at = (raw: Raw, path: string, value: unknown): Raw => {
  const keys = path.split(/[.[\]]+/).filter((key) => key !== '');
  const copy = structuredClone(raw);
  let node: Raw = copy;
  for (const key of keys.slice(0, -1)) node = node[key] as Raw;
  const last = keys[keys.length - 1];
  if (value === undefined) delete node[last];
  else node[last] = value;
  return copy;
};

/** Every place of a raw file, those inside of lists included. */
const places = (value: unknown, path = ''): string[] => {
  if (typeof value !== 'object' || value === null) return [path];
  const inside = Object.entries(value).flatMap(([key, part]) =>
    places(part, Array.isArray(value) ? `${path}[${key}]` : path === '' ? key : `${path}.${key}`),
  );
  return path === '' ? inside : [path, ...inside];
};

describe('[DOC-7] the whole of the project file is known', () => {
  test('every key of the project file is taken', () => expect(said(whole())).toEqual([]));

  test('an unknown key is named where it stands, in every object there is', () => {
    const objects = places(whole()).filter((path) => {
      const value = path
        .split(/[.[\]]+/)
        .filter((key) => key !== '')
        .reduce<unknown>((node, key) => (node as Raw)[key], whole());
      return typeof value === 'object' && !Array.isArray(value);
    });
    expect(objects.length).toBeGreaterThan(15);
    for (const path of objects)
      expect(said(at(whole(), `${path}.stray`, 1)), path).toContain(`${path}.stray unknown-key`);
    expect(said({ ...whole(), stray: 1 })).toContain('stray unknown-key');
    expect(said(JSON.parse(JSON.stringify(whole()).replace('"title"', '"__proto__": 1, "title"')))).toEqual([
      '__proto__ unknown-key',
    ]);
  });

  test('a value of another kind is a fault at its own place or at the object that holds it, at every place there is', () => {
    for (const path of places(whole())) {
      for (const wrong of [{ stray: 1 }, ['x', 'y', 'z'], true]) {
        const found = faultsOf(at(whole(), path, wrong));
        const allowed = path.endsWith('used') || path.endsWith('pDelta') ? wrong === true : false;
        if (!allowed)
          expect(
            found.some(({ where }) => where.startsWith(path)),
            `${path} = ${JSON.stringify(wrong)}`,
          ).toBe(true);
      }
    }
  });

  test.each<[string, unknown, string]>([
    ['frame.storeys[0].height', 0, 'not-positive'],
    ['frame.storeys[0].mass', -1, 'not-positive'],
    ['frame.storeys[0].stiffness', null, 'not-typed'],
    ['frame.storeys[0].gravity', -1, 'out-of-range'],
    ['frame.storeys[0].law', { kind: 'elastic', strength: 1 }, ''],
    ['frame.storeys[0].law', { kind: 'plastic', strength: 1, hardening: 0 }, 'unknown-kind'],
    ['frame.storeys[0].law.strength', 0, 'not-positive'],
    ['frame.storeys[0].law.strength', -1, 'not-positive'],
    ['frame.storeys[0].law.strength', undefined, 'missing'],
    ['frame.storeys[0].law.strength', 1e30, 'out-of-range'],
    ['frame.storeys[0].law.hardening', -0.01, 'out-of-range'],
    ['frame.storeys[0].law.hardening', 1, 'out-of-range'],
    ['frame.storeys[1].law.strength', 0, 'not-positive'],
    ['frame.storeys[1].law.hardening', 1, 'out-of-range'],
    ['frame.storeys[2].law.strength', 0, 'not-positive'],
    ['frame.storeys[2].law.exponent', 0.99, 'out-of-range'],
    ['frame.storeys[2].law.beta', 0.49, 'out-of-range'],
    ['frame.storeys[2].law.gamma', 0.401, 'out-of-range'],
    ['frame.storeys[2].law.gamma', null, 'not-typed'],
    ['frame.storeys[3].law.strength', 0, 'not-positive'],
    ['frame.storeys[3].law.ratio', -0.1, 'out-of-range'],
    ['frame.storeys[3].law.ratio', 0.91, 'out-of-range'],
    ['frame.storeys[3].law.ratio', 1.1, 'out-of-range'],
    ['frame.storeys[0].damper.coefficient', -1, 'out-of-range'],
    ['frame.storeys[0].damper.coefficient', undefined, 'missing'],
    ['frame.storeys[0].damper.exponent', 0.149, 'out-of-range'],
    ['frame.storeys[0].damper.exponent', 2.01, 'out-of-range'],
    ['frame.storeys[1].role', 'isolator', 'isolator-not-first'],
    ['frame.storeys[0].role', 'base', 'unknown-value'],
    ['frame.damping.stiffness', 'secant', 'unknown-value'],
    ['frame.damping.ratios[0]', 1, 'out-of-range'],
    ['frame.damping.ratios[0]', -0.01, 'out-of-range'],
    ['frame.damping.modes[0]', 0, 'out-of-range'],
    ['frame.damping.modes[0]', 1.5, 'wrong-kind'],
    ['frame.damping.modes[1]', 1, 'same-mode'],
    ['frame.damping.modes[1]', 6, 'no-such-mode'],
    ['frame.damping', { kind: 'stiffness-proportional', mode: 6, ratio: 0.05 }, ''],
    ['analysis.method', { kind: 'newmark', beta: -0.1, gamma: 0.5 }, ''],
    ['analysis.method', { kind: 'newmark', beta: 0.25, gamma: 0.49 }, ''],
    ['analysis.method', { kind: 'generalized-alpha', spectralRadius: 1.1 }, ''],
    ['analysis.method', { kind: 'generalized-alpha', spectralRadius: -0.1 }, ''],
    ['analysis.method', { kind: 'hht', alpha: -0.34 }, ''],
    ['analysis.method', { kind: 'hht', alpha: 0.1 }, ''],
    ['analysis.method', { kind: 'central-difference', beta: 0 }, ''],
    ['analysis.method', { kind: 'euler' }, ''],
    ['analysis.step', 0, 'not-positive'],
    ['analysis.step', 'fast', 'unreadable'],
    ['analysis.step', { parts: 0 }, ''],
    ['analysis.step', { parts: 2.5 }, ''],
    ['analysis.step', { part: 2 }, ''],
    ['analysis.step', true, 'wrong-kind'],
    ['analysis.tail', -1, 'out-of-range'],
    ['analysis.stopDrift', 0, 'not-positive'],
    ['limits.drift', 0, 'not-positive'],
    ['limits.factor', 0, 'not-positive'],
    ['limits.measure', 'mode', 'unknown-value'],
    ['limits.isolator', 0, 'not-positive'],
    ['limits.isolator', -0.1, 'not-positive'],
    ['motions[0].scale', 0, 'not-allowed'],
    ['motions[0].interval', 0, 'not-positive'],
    ['motions[0].name', '', 'wrong-count'],
    ['motions[0].unit', 'g', 'unit-without-file'],
    ['motions[0].acceleration', [1], 'wrong-count'],
    ['motions[0].acceleration', 'none', 'wrong-kind'],
    ['motions[0].origin.unit', 'furlong', 'unknown-value'],
    ['motions[0].origin.mends[0].line', 'first', 'unreadable'],
    ['title', null, 'wrong-kind'],
    ['frame.pDelta', 'yes', 'wrong-kind'],
  ])('%s = %j is refused there', (path, value, code) => {
    const found = faultsOf(at(whole(), path, value));
    expect(found.length, JSON.stringify(found)).toBeGreaterThan(0);
    for (const { where } of found) expect(where.startsWith(path), where).toBe(true);
    if (code !== '') expect(found.map((fault) => fault.code)).toContain(code);
  });

  test.each<[string, unknown]>([
    ['frame.storeys[0].law', { kind: 'elastic' }],
    ['frame.storeys[0].law.hardening', 0],
    ['frame.storeys[2].law', { kind: 'bouc-wen', strength: 1, hardening: 0, exponent: 1, beta: 0.7, gamma: 0.3 }],
    ['frame.storeys[2].law', { kind: 'bouc-wen', strength: 1, hardening: 0, exponent: 1, beta: 1.5, gamma: -0.5 }],
    // 1 - 0.9 is a little less than 0.1 in doubles
    ['frame.storeys[3].law', { kind: 'flag', strength: 1, hardening: 0.9, ratio: 0.1 }],
    ['frame.storeys[3].law.ratio', 0],
    ['frame.storeys[0].damper', { coefficient: 0, exponent: 0.15 }],
    ['frame.storeys[0].damper', { coefficient: 1e6, exponent: 2 }],
    ['frame.storeys[0].role', 'storey'],
    ['frame.damping.stiffness', 'initial'],
    ['limits.isolator', undefined],
    ['frame.damping', { kind: 'none' }],
    ['frame.damping', { kind: 'modal', ratios: [0.05, 0] }],
    ['frame.damping', { kind: 'stiffness-proportional', mode: 5, ratio: 0.05 }],
    ['analysis.method', { kind: 'hht', alpha: -1 / 3 }],
    ['analysis.method', { kind: 'hht', alpha: 0 }],
    ['analysis.method', { kind: 'generalized-alpha', spectralRadius: 0 }],
    ['analysis.method', { kind: 'central-difference' }],
    ['analysis.step', 0.005],
    ['analysis.tail', undefined],
    ['analysis.stopDrift', undefined],
    ['limits.factor', undefined],
    ['limits.measure', undefined],
    ['frame.storeys[0].gravity', 0],
    ['motions[0].scale', undefined],
    ['motions[0].origin', undefined],
    ['motions', []],
  ])('%s = %j is allowed', (path, value) => expect(said(at(whole(), path, value))).toEqual([]));

  test('faults stand in the order of the file, storeys and motions by number', () => {
    let raw = at(whole(), 'limits.drift', 0);
    raw = at(raw, 'motions[0].used', false);
    raw = at(raw, 'motions[0].reason', '');
    raw = at(raw, 'frame.pDelta', 1);
    for (const i of [4, 0, 2]) raw = at(raw, `frame.storeys[${i}].mass`, i === 2 ? 1e-30 : 0);
    expect(faultsOf({ ...raw, stray: 1 }).map(({ where }) => where)).toEqual([
      'frame.storeys[0].mass',
      'frame.storeys[2].mass',
      'frame.storeys[4].mass',
      'frame.pDelta',
      'motions[0].reason',
      'limits.drift',
      'stray',
    ]);
  });

  test('a million broken samples are one fault, with the first of them and how many follow', () => {
    const samples = Array.from({ length: 50 }, (_, i) => (i < 7 ? i : null));
    const found = faultsOf(at(whole(), 'motions[0].acceleration', samples));
    expect(found.map(({ where, message }) => `${where} ${message}`)).toEqual([
      'motions[0].acceleration[7] is no finite number, and 42 more after it',
    ]);
  });

  test('a file changed at any place to anything never throws, and is read or has faults, each with place and mend', () => {
    const paths = places(whole());
    let refused = 0;
    fc.assert(
      fc.property(fc.constantFrom(...paths), fc.jsonValue(), fc.boolean(), (path, value, onItsWay) => {
        const text = JSON.stringify(at(whole(), path, value));
        const read = onItsWay ? readProjectOnItsWay(text) : readProject(text);
        if (read.ok) return;
        refused++;
        expect(read.faults.length).toBeGreaterThan(0);
        for (const fault of read.faults) for (const word of Object.values(fault)) expect(word).not.toBe('');
      }),
      { numRuns: 200 },
    );
    expect(refused).toBeGreaterThan(100);
  });
});

describe('[DOC-3] versions', () => {
  const tried: number[] = [];
  test('version 1 opens: it has all that version 2 has but the limit of an isolator', () => {
    tried.push(1);
    const first = { ...at(whole(), 'limits.isolator', undefined), version: 1 };
    expect(migrated(first)).toEqual({ ok: true, value: { ...first, version: 2 } });
    expect(readProject(JSON.stringify(first))).toEqual(
      readProject(JSON.stringify(at(whole(), 'limits.isolator', undefined))),
    );
  });
  test('each version below the present one has its migration, and each migration was tried here', () => {
    expect([...MIGRATIONS.keys()]).toEqual(Array.from({ length: PROJECT_VERSION - 1 }, (_, i) => i + 1));
    expect(tried).toEqual([...MIGRATIONS.keys()]);
  });
  test.each([undefined, null, 0, -1, 1.5, '1', true])('version %j is refused', (version) => {
    const read = migrated({ format: 'swaybook', version });
    expect(read.ok ? [] : read.faults.map(({ code }) => code)).toEqual(['wrong-version']);
  });
  test('a version of a later release is refused in words, whatever else stands in it', () => {
    const read = readProject('{"format": "swaybook", "version": 3, "novel": true}');
    expect(read.ok ? [] : read.faults.map(({ where, message }) => `${where}: ${message}`)).toEqual([
      'version: the file is of version 3, written by a later release; this one reads up to version 2',
    ]);
  });
});
