import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { caseOf } from '../../src/document/case.ts';
import {
  addMotions,
  addStorey,
  growTo,
  makeEqualStoreys,
  moveStorey,
  removeStorey,
  useMotion,
} from '../../src/document/edits.ts';
import { emptyProject } from '../../src/document/empty.ts';
import { fieldOf, readAt, writeAt } from '../../src/document/fields.ts';
import type { MotionEntry, Project } from '../../src/document/project.ts';

const entry: MotionEntry = { name: 'M', interval: 0.02, samples: 'digest', count: 100, scale: 1, used: true };
const three = (): Project => {
  let project = makeEqualStoreys(emptyProject(), 3, 3.6);
  for (let i = 0; i < 3; i++) {
    project = writeAt(project, `frame.storeys[${i}].mass`, 2e5);
    project = writeAt(project, `frame.storeys[${i}].stiffness`, 2e8);
  }
  return project;
};
const faults = (project: Project) => {
  const made = caseOf(project);
  return made.ok ? [] : made.faults.map(({ where, code }) => `${where} ${code}`);
};

describe('[DOC-4] the case of a document', () => {
  test('a whole frame without motions is a case', () => {
    const made = caseOf(three());
    expect(made.ok && made.value.prepared.modes.length).toBe(3);
  });
  test('the empty sheet says what is missing', () =>
    expect(faults(emptyProject())).toEqual(['frame.storeys no-storey']));
  test('every cell that is not typed, not readable or out of range is named', () => {
    let project = three();
    project = writeAt(project, 'frame.storeys[0].height', null);
    project = writeAt(project, 'frame.storeys[1].mass', '12 furlong');
    project = writeAt(project, 'frame.storeys[2].stiffness', -1);
    project = writeAt(project, 'limits.drift', '');
    expect(faults(project).sort()).toEqual(
      [
        'frame.storeys[0].height not-typed',
        'frame.storeys[1].mass unreadable',
        'frame.storeys[2].stiffness not-positive',
        'limits.drift unreadable',
      ].sort(),
    );
  });
  test.each([Number.NaN, Number.POSITIVE_INFINITY, 0, -5])(
    '%d is refused at the cell for mass, height and stiffness',
    (value) => {
      for (const key of ['mass', 'height', 'stiffness']) {
        const path = `frame.storeys[1].${key}`;
        const found = faults(writeAt(three(), path, value));
        expect(found.length).toBe(1);
        expect(found[0].startsWith(path)).toBe(true);
      }
    },
  );
  test('1 to 60 storeys work, 61 are refused', () => {
    for (const count of [1, 60]) {
      let project = makeEqualStoreys(emptyProject(), count, 3);
      for (let i = 0; i < count; i++)
        project = writeAt(writeAt(project, `frame.storeys[${i}].mass`, 1e5), `frame.storeys[${i}].stiffness`, 1e8);
      expect(faults(project)).toEqual([]);
      if (count === 60) expect(() => addStorey(project, 0)).toThrow(RangeError);
    }
    const tall = three();
    const storeys = Array.from({ length: 61 }, () => tall.frame.storeys[0]);
    expect(faults({ ...tall, frame: { ...tall.frame, storeys } })).toEqual(['frame.storeys wrong-count']);
  });
  test('a mode that went with its storey is named, and comes back with it', () => {
    const project: Project = {
      ...three(),
      frame: { ...three().frame, damping: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] } },
    };
    expect(faults(project)).toEqual([]);
    expect(faults(removeStorey(project, 2))).toEqual(['frame.damping.modes[1] no-such-mode']);
    expect(faults(addStorey(removeStorey(project, 2), 2, 1))).toEqual([]);
  });
  test('a step that is no whole part of an interval names the nearest ones; beyond the limit it names the limit', () => {
    const project = addMotions(three(), [entry, { ...entry, interval: 0.01 }]);
    const off = caseOf(writeAt(project, 'analysis.step', 0.007));
    expect(off.ok ? [] : off.faults.map(({ mend }) => mend)).toEqual([
      'Take 0.01 or 0.006667 s',
      'Take 0.01 or 0.005 s',
    ]);
    const explicit: Project = {
      ...project,
      analysis: { ...project.analysis, method: { kind: 'central-difference' }, step: { parts: 1 } },
    };
    const limit = 2 / (2 * Math.sqrt(1000) * Math.sin((5 * Math.PI) / 14));
    expect(faults(explicit)).toEqual(limit < 0.02 ? ['analysis.step beyond-stability-limit'] : []);
    const soft = writeAt(explicit, 'frame.storeys[0].stiffness', 2e11);
    const found = caseOf(soft);
    expect(found.ok ? '' : found.faults[0].message).toMatch(/stability limit of 0\.00\d+ s/);
  });
  test('gravity that a storey cannot carry is named at the cell', () => {
    const project = { ...three(), frame: { ...three().frame, pDelta: true } };
    expect(faults(writeAt(project, 'frame.storeys[0].stiffness', 1e6))).toEqual([
      'frame.storeys[0].stiffness unstable-under-gravity',
    ]);
  });
});

describe('[DOC-9] numbers that no building has', () => {
  test('whatever numbers stand in the cells, there is a case or there are faults, never a crash', () => {
    let [whole, refused] = [0, 0];
    const power = fc.double({ min: -10, max: 22, noNaN: true }).map((exponent) => 10 ** exponent);
    const plausible = fc.double({ min: 3, max: 9, noNaN: true }).map((exponent) => 10 ** exponent);
    const row = fc.record({
      height: fc.oneof({ weight: 9, arbitrary: fc.double({ min: 2, max: 9, noNaN: true }) }, power),
      mass: fc.oneof({ weight: 9, arbitrary: plausible }, power),
      stiffness: fc.oneof({ weight: 9, arbitrary: plausible }, power),
    });
    fc.assert(
      fc.property(fc.array(row, { minLength: 2, maxLength: 12 }), fc.boolean(), (rows, pDelta) => {
        const { frame } = three();
        const storeys = rows.map((numbers) => ({ ...frame.storeys[0], ...numbers }));
        const damping = { kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] } as const;
        const made = caseOf({ ...three(), frame: { storeys, damping, pDelta } });
        if (!made.ok) {
          refused++;
          return;
        }
        whole++;
        for (const mode of made.value.prepared.modes) expect(mode.period).toBeGreaterThan(0);
      }),
      { numRuns: 200 },
    );
    expect(whole).toBeGreaterThan(20);
    expect(refused).toBeGreaterThan(20);
  });
  test('a storey that is stiff beyond reckoning is named; a thousand times the next is fine', () => {
    expect(faults(writeAt(three(), 'frame.storeys[1].stiffness', 1e24))).toEqual([
      'frame.storeys[1].stiffness out-of-range',
    ]);
    expect(faults(writeAt(three(), 'frame.storeys[1].stiffness', 1e21))).toEqual([
      'frame.storeys[1].stiffness out-of-proportion',
    ]);
    expect(faults(writeAt(three(), 'frame.storeys[1].stiffness', 1e11))).toEqual([]);
  });
  test('a run of more steps than can be held is refused where it comes from, beside what else is wrong', () => {
    const project = addMotions(three(), [entry]);
    expect(faults(writeAt(project, 'analysis.step', 0.02 / 1e6))).toEqual(['analysis.step too-many-steps']);
    const long = writeAt(project, 'analysis.tail', 1e9);
    expect(faults(writeAt(long, 'limits.drift', 0))).toEqual([
      'analysis.tail too-many-steps',
      'limits.drift not-positive',
    ]);
    expect(faults(writeAt(project, 'analysis.step.parts', 1000))).toEqual([]);
  });
});

describe('[DOC-5] edits', () => {
  test('storeys are added, copied, moved, removed; nothing else changes', () => {
    const project = writeAt(three(), 'frame.storeys[2].name', 'Roof');
    expect(addStorey(project, 3, 2).frame.storeys[3].name).toBe('Roof');
    expect(moveStorey(project, 2, 0).frame.storeys.map((s) => s.name)).toEqual(['Roof', '', '']);
    expect(removeStorey(project, 0).frame.storeys.length).toBe(2);
    expect(growTo(project, 5).frame.storeys.map((s) => s.name)).toEqual(['', '', 'Roof', 'Roof', 'Roof']);
    expect(addStorey(project, 3, 2).limits).toBe(project.limits);
  });
  test('motions get names of their own', () => {
    expect(addMotions(three(), [entry, entry, entry]).motions.map((m) => m.name)).toEqual(['M', 'M (2)', 'M (3)']);
  });
  test('a motion left out asks for its reason', () => {
    const project = addMotions(three(), [entry]);
    expect(faults(useMotion(project, 0, false))).toEqual(['motions[0].reason no-reason']);
    expect(faults(useMotion(project, 0, false, 'clipped'))).toEqual([]);
    expect(useMotion(useMotion(project, 0, false, 'clipped'), 0, true).motions[0]).toEqual(entry);
  });
  test('what is written at a path is read there; labels speak', () => {
    const project = writeAt(three(), 'frame.storeys[1].stiffness', 4.55e8);
    expect(readAt(project, 'frame.storeys[1].stiffness')).toBe(4.55e8);
    expect(fieldOf('frame.storeys[1].stiffness').label(project)).toBe('Storey 2, stiffness');
    expect(readAt(project, 'frame.storeys[1].gravity')).toBeNull();
    const loaded = writeAt(project, 'frame.storeys[1].gravity', 5);
    expect('gravity' in writeAt(loaded, 'frame.storeys[1].gravity', null).frame.storeys[1]).toBe(false);
    expect(() => fieldOf('frame.colour')).toThrow(RangeError);
    expect(() => writeAt(project, 'frame.storeys[9].mass', 1)).toThrow(RangeError);
  });
});
