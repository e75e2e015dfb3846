import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readRecord } from '../../src/core/doors.ts';
import type { RecordAnswers } from '../../src/core/motion/reading.ts';
import { caseOf } from '../../src/document/case.ts';
import { readAt } from '../../src/document/fields.ts';
import { readProject, writeProject } from '../../src/document/file.ts';
import { migrated } from '../../src/document/migrations.ts';

const good = () => ({
  format: 'swaybook',
  version: 1,
  title: 'Two storeys',
  frame: {
    storeys: [
      { name: 'A', height: 4, mass: 2e5, stiffness: 2e8, law: { kind: 'elastic' } },
      { name: 'B', height: 3.5, mass: 1e5, stiffness: 1e8, law: { kind: 'elastic' }, gravity: 9e5 },
    ],
    damping: { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] },
    pDelta: true,
  },
  motions: [{ name: 'One', interval: 0.01, acceleration: [0, 0.1, -0.2, 0.05], scale: -1.2 }],
  analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: 0.005 },
  limits: { drift: 0.02, source: 'a clause' },
});
type Good = ReturnType<typeof good>;
const faultsOfChanged = (
  change: (file: Good & Record<string, unknown>) => void,
  readFile?: Parameters<typeof readProject>[1],
) => {
  const file = good();
  change(file);
  const read = readProject(JSON.stringify(file), readFile);
  return read.ok ? [] : read.faults;
};
const places = (change: (file: Good & Record<string, unknown>) => void) =>
  faultsOfChanged(change).map(({ where, code }) => `${where} ${code}`);

describe('[DOC-1] a project file', () => {
  test('opens, with its defaults, and is written back to the same project', () => {
    const read = readProject(JSON.stringify(good()));
    if (!read.ok) throw new Error(JSON.stringify(read.faults));
    const { project, samples } = read.value;
    expect(project.analysis).toMatchObject({ tail: 0, stopDrift: 0.1 });
    expect(project.motions[0]).toMatchObject({ scale: -1.2, used: true, count: 4 });
    const text = writeProject(project, (digest) => samples.get(digest) ?? new Float64Array());
    expect(readProject(text)).toEqual(read);
    expect(writeProject(project, (digest) => samples.get(digest) ?? new Float64Array())).toBe(text);
  });

  test('keeps every sample to the last bit and every title to the last sign', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 2, maxLength: 50 }),
        fc.string(),
        (values, title) => {
          const file = { ...good(), title: `${title}"acceleration": null` };
          file.motions[0].acceleration = values;
          const read = readProject(JSON.stringify(file));
          if (!read.ok) throw new Error(JSON.stringify(read.faults));
          const { project, samples } = read.value;
          const again = readProject(writeProject(project, (digest) => samples.get(digest) ?? new Float64Array()));
          if (!again.ok) throw new Error(JSON.stringify(again.faults));
          expect(again.value.project.title).toBe(file.title);
          expect(Array.from(again.value.samples.get(again.value.project.motions[0].samples) ?? [])).toEqual(
            values.map((v) => v + 0),
          );
        },
      ),
    );
  });

  test('with ten mistakes lists all ten, each with its place', () => {
    expect(
      places((file) => {
        file.frame.storeys[0].height = -3;
        file.frame.storeys[0].mass = 0;
        file.frame.storeys[1].stiffness = 'stiff' as never;
        file.frame.damping.modes = [1, 3];
        file.frame.damping.ratios = [0.05, 1.5];
        (file.frame as Record<string, unknown>).colour = 'red';
        file.motions.push({ ...file.motions[0], acceleration: [0] });
        file.analysis.method.gamma = 0.4;
        file.analysis.step = 0;
        delete (file.limits as Partial<Good['limits']>).source;
      }).sort(),
    ).toEqual(
      [
        'frame.storeys[0].height not-positive',
        'frame.storeys[0].mass not-positive',
        'frame.storeys[1].stiffness unreadable',
        'frame.damping.modes[1] no-such-mode',
        'frame.damping.ratios[1] out-of-range',
        'frame.colour unknown-key',
        'motions[1].acceleration wrong-count',
        'motions[1].name same-name',
        'analysis.method.gamma out-of-range',
        'analysis.step not-positive',
        'limits.source missing',
      ].sort(),
    );
  });

  test.each<[string, (file: Good & Record<string, unknown>) => void, string, unknown]>([
    [
      'a yielding law',
      (f) => Object.assign(f.frame.storeys[0], { law: { kind: 'bilinear', strength: 1e6, hardening: 0.02 } }),
      'frame.storeys[0].law.strength',
      1e6,
    ],
    [
      'a damper',
      (f) => Object.assign(f.frame.storeys[0], { damper: { coefficient: 1e6, exponent: 0.5 } }),
      'frame.storeys[0].damper.exponent',
      0.5,
    ],
    [
      'an isolator',
      (f) => Object.assign(f.frame.storeys[0], { role: 'isolator' }),
      'frame.storeys[0].role',
      'isolator',
    ],
    [
      'tangent damping',
      (f) => Object.assign(f.frame.damping, { stiffness: 'tangent' }),
      'frame.damping.stiffness',
      'tangent',
    ],
    ['step auto', (f) => Object.assign(f.analysis, { step: 'auto' }), 'analysis.step', 'auto'],
    ['a limit of the isolator', (f) => Object.assign(f.limits, { isolator: 0.35 }), 'limits.isolator', 0.35],
  ])('%s is read, makes a case, and is written back', (_, change, path, value) => {
    const file = good();
    change(file);
    const read = readProject(JSON.stringify(file));
    if (!read.ok) throw new Error(JSON.stringify(read.faults));
    const { project, samples } = read.value;
    expect(readAt(project, path)).toBe(value);
    const made = caseOf(project);
    if (!made.ok) throw new Error(JSON.stringify(made.faults));
    const { frame, analysis, limits } = made.value;
    expect(readAt({ ...project, frame, analysis, limits: { ...project.limits, ...limits } }, path)).toBe(value);
    expect(readProject(writeProject(project, (digest) => samples.get(digest) ?? new Float64Array()))).toEqual(read);
  });

  test.each<[string, (file: Good & Record<string, unknown>) => void, string]>([
    [
      '61 storeys',
      (f) => f.frame.storeys.push(...Array.from({ length: 59 }, () => f.frame.storeys[1])),
      'frame.storeys wrong-count',
    ],
    ['no storey', (f) => f.frame.storeys.splice(0), 'frame.storeys no-storey'],
    ['samples and a file', (f) => Object.assign(f.motions[0], { file: 'a.txt' }), 'motions[0] both-samples-and-file'],
    ['neither', (f) => delete (f.motions[0] as Partial<Good['motions'][0]>).acceleration, 'motions[0] no-samples'],
    ['left out without a reason', (f) => Object.assign(f.motions[0], { used: false }), 'motions[0].reason no-reason'],
    ['a scale of zero', (f) => Object.assign(f.motions[0], { scale: 0 }), 'motions[0].scale not-allowed'],
    [
      'an unknown law',
      (f) => Object.assign(f.frame.storeys[0], { law: { kind: 'magic' } }),
      'frame.storeys[0].law.kind unknown-kind',
    ],
    ['a later version', (f) => Object.assign(f, { version: 3 }), 'version later-version'],
    ['another format', (f) => Object.assign(f, { format: 'other' }), 'format wrong-format'],
    [
      'a flag that would not re-centre',
      (f) => Object.assign(f.frame.storeys[0], { law: { kind: 'flag', strength: 1, hardening: 0.1, ratio: 0.95 } }),
      'frame.storeys[0].law.ratio out-of-range',
    ],
    ['Rayleigh on one storey', (f) => f.frame.storeys.pop(), 'frame.damping rayleigh-on-one-storey'],
  ])('%s is refused', (_, change, expected) => expect(places(change)).toContain(expected));

  test('every fault has a place, a message and a mend without a full stop', () => {
    const faults = faultsOfChanged((f) => {
      f.frame.storeys[0].height = null as never;
      f.frame.damping = { kind: 'modal', ratios: [] } as never;
      f.analysis.method = { kind: 'hht', alpha: 1 } as never;
      f.limits.drift = 'x' as never;
    });
    expect(faults.length).toBeGreaterThanOrEqual(4);
    for (const { where, message, mend } of faults) {
      expect(where).not.toBe('');
      expect(message).not.toMatch(/\.$/);
      expect(mend).toMatch(/^[A-Z].*[^.]$/);
    }
  });

  test('text that is no JSON names line and column', () => {
    const read = readProject('{\n  "format": "swaybook",\n  oops\n}');
    expect(read.ok).toBe(false);
    if (!read.ok) expect(read.faults[0]).toMatchObject({ code: 'not-json', where: 'line 3, column 3' });
  });

  test('no text whatever makes it throw', () => {
    let cases = 0;
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string(),
          fc.json(),
          fc.json().map((j) => `{"format":"swaybook","version":1,"frame":${j},"motions":${j}}`),
        ),
        (text) => {
          cases++;
          const read = readProject(text);
          if (!read.ok) expect(read.faults.length).toBeGreaterThan(0);
        },
      ),
      { numRuns: 500 },
    );
    expect(cases).toBe(500);
  });
});

describe('[DOC-2] motions by file', () => {
  const byFile = (more: object) => (f: Good & Record<string, unknown>) => {
    f.motions = [{ name: 'R', file: 'records/r.txt', ...more }] as never;
  };
  test('are refused in the browser, where no file can be reached', () => {
    expect(places(byFile({}))).toEqual(['motions[0].file file-in-browser']);
  });
  // 5 values at 0.02 s in g, with its count and interval in the heading; and the same without unit and interval
  const RECORD = 'NPTS= 5, DT= .02 SEC, UNITS G\n0.01 -0.02 0.03 -0.04 0.05\n';
  const BARE = '0.01\n-0.02\n0.03\n-0.04\n0.05\n';
  const beside = (text: string) => (name: string, answers: RecordAnswers) =>
    ({ ok: true, value: readRecord(name.split('/').at(-1) ?? name, new TextEncoder().encode(text), answers) }) as const;
  test('are read by their file, under the name of the project, in m/s2', () => {
    const file = good() as Good & Record<string, unknown>;
    byFile({})(file);
    const read = readProject(JSON.stringify(file), beside(RECORD));
    if (!read.ok) throw new Error(JSON.stringify(read.faults));
    const [motion] = read.value.project.motions;
    expect(motion).toMatchObject({ name: 'R', interval: 0.02, count: 5, scale: 1, used: true });
    expect(motion.origin).toMatchObject({ file: 'r.txt', unit: 'g', unitFrom: 'file' });
    expect(read.value.samples.get(motion.samples)?.[4]).toBeCloseTo(0.05 * 9.80665, 14);
    const text = writeProject(read.value.project, (digest) => read.value.samples.get(digest) ?? new Float64Array());
    expect(readProject(text)).toEqual(read);
  });
  test('unit and interval are asked for where the file does not say, and refused where they contradict it', () => {
    expect(faultsOfChanged(byFile({}), beside(BARE)).map(({ where }) => where)).toEqual([
      'motions[0].interval',
      'motions[0].unit',
    ]);
    expect(faultsOfChanged(byFile({ unit: 'g', interval: 0.02 }), beside(BARE))).toEqual([]);
    for (const contradiction of [{ unit: 'm/s2' }, { interval: 0.01 }]) {
      const faults = faultsOfChanged(byFile(contradiction), beside(RECORD));
      expect(faults.length).toBe(1);
      expect(faults[0].where).toMatch(/^motions\[0\]/);
    }
  });
  test('a broken record is told of together with what else is wrong', () => {
    const faults = faultsOfChanged(
      (file) => {
        byFile({})(file);
        file.frame.storeys[0].mass = 0;
      },
      beside(RECORD.replace('0.03', '0.0x')),
    );
    expect(faults.map(({ where }) => where.replace(/ .*/, ''))).toEqual(['frame.storeys[0].mass', 'motions[0].file']);
  });
  test('a file that cannot be read is a fault at its motion', () => {
    const faults = faultsOfChanged(byFile({}), () => ({
      ok: false,
      faults: [{ code: 'no-file', where: 'x', message: 'no such file', mend: 'Mend it' }],
    }));
    expect(faults.map(({ where }) => where)).toEqual(['motions[0].file']);
  });
});

describe('[DOC-3] versions', () => {
  test('lower versions are migrated one by one', () => {
    const migrations = new Map<number, (raw: Record<string, unknown>) => Record<string, unknown>>([
      [1, (raw: Record<string, unknown>) => ({ ...raw, title: `${raw.title}!` })],
      [2, (raw: Record<string, unknown>) => ({ ...raw, added: true })],
    ]);
    expect(migrated({ format: 'swaybook', version: 1, title: 'x' }, migrations, 3)).toEqual({
      ok: true,
      value: { format: 'swaybook', version: 3, title: 'x!', added: true },
    });
  });
});
