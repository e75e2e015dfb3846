import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { caseOf } from '../../src/document/case.ts';
import {
  addMotions,
  addStorey,
  clearDamper,
  growTo,
  makeEqualStoreys,
  moveStorey,
  removeStorey,
  setDamper,
  setLaw,
  setRole,
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

describe('[DOC-4] a step chosen by halving', () => {
  const auto = (project: Project): Project => ({ ...project, analysis: { ...project.analysis, step: 'auto' } });
  test('passes as it is: the run is asked with the parts that it comes to', () => {
    const made = caseOf(auto(addMotions(three(), [entry, { ...entry, interval: 0.013 }])));
    expect(made.ok && made.value.analysis.step).toBe('auto');
  });
  test('is refused where even the most parts are beyond the stability limit, and where they are more steps than are held', () => {
    const project = auto(addMotions(three(), [entry]));
    const explicit = (stiffness: number): Project => {
      const stiff = writeAt(project, 'frame.storeys[0].stiffness', stiffness);
      return { ...stiff, analysis: { ...stiff.analysis, method: { kind: 'central-difference' } } };
    };
    // limit about 2 / sqrt(k / m): 0.0006 s is above 0.02 / 64 s, 0.0002 s is not
    expect(faults(explicit(2e12))).toEqual([]);
    expect(faults(explicit(2e13))).toEqual(['analysis.step beyond-stability-limit']);
    // Mode 2 (0.16 s) wants 4 parts of 0.02 s for its 20 steps, so a run at 8 parts is made: 2e7 steps are 5e4 s.
    expect(faults(writeAt(project, 'analysis.tail', 4.9e4))).toEqual([]);
    expect(faults(writeAt(project, 'analysis.tail', 5.1e4))).toEqual(['analysis.tail too-many-steps']);
    // Mode 3, a third of the mass on a stiff storey, wants the most parts, 64: 128 x 50 steps a second.
    expect(faults(writeAt(explicit(2e12), 'analysis.tail', 3.1e3))).toEqual([]);
    expect(faults(writeAt(explicit(2e12), 'analysis.tail', 3.2e3))).toEqual(['analysis.tail too-many-steps']);
    // Whatever the frame, the whole interval and its half are run.
    const open = writeAt(project, 'frame.storeys[0].mass', null);
    expect(faults(writeAt(open, 'analysis.tail', 1.9e5))).toEqual(['frame.storeys[0].mass not-typed']);
    expect(faults(writeAt(open, 'analysis.tail', 2.1e5))).toContain('analysis.tail too-many-steps');
  });
});

describe('[DOC-4] an isolator', () => {
  test('stands under the first storey only', () => {
    expect(faults(setRole(three(), 0, 'isolator'))).toEqual([]);
    const floating = setRole(three(), 2, 'isolator');
    expect(faults(floating)).toEqual(['frame.storeys[2].role isolator-not-first']);
    expect(faults(moveStorey(floating, 2, 0))).toEqual([]);
    expect(setRole(floating, 2, 'storey')).toEqual(three());
  });
  test('stays on the ground: what is put or moved under it stands above it', () => {
    const project = setRole(three(), 0, 'isolator');
    const roles = ({ frame }: Project) => frame.storeys.map(({ role }) => role);
    expect(roles(addStorey(project, 0, 0))).toEqual(['isolator', undefined, undefined, undefined]);
    expect(roles(addStorey(project, 0))).toEqual(['isolator', undefined, undefined, undefined]);
    expect(moveStorey(project, 0, 1)).toBe(project);
    expect(moveStorey(project, 1, 0)).toBe(project);
    expect(roles(moveStorey(project, 2, 1))).toEqual(['isolator', undefined, undefined]);
    expect(roles(removeStorey(project, 0))).toEqual([undefined, undefined]);
  });
  test('its copies are storeys, and a frame of equal storeys is not made of it', () => {
    const project = setRole(writeAt(three(), 'frame.storeys[1].mass', 3e5), 0, 'isolator');
    expect(addStorey(project, 1, 0).frame.storeys.map(({ role }) => role)).toEqual([
      'isolator',
      undefined,
      undefined,
      undefined,
    ]);
    expect(makeEqualStoreys(project, 2, 3).frame.storeys.map(({ role, mass }) => [role, mass])).toEqual([
      [undefined, 3e5],
      [undefined, 3e5],
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
      law: fc.oneof(
        fc.constant({ kind: 'elastic' } as const),
        fc.record({
          kind: fc.constantFrom('bilinear' as const, 'peak-oriented' as const),
          strength: fc.oneof({ weight: 9, arbitrary: plausible }, power),
          hardening: fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }),
        }),
      ),
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
        expect(made.value.frame.storeys).toEqual(storeys);
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

describe('[DOC-10] laws and dampers by edits', () => {
  const kinds = ['elastic', 'bilinear', 'peak-oriented', 'bouc-wen', 'flag'] as const;
  test.each(kinds)('%s runs as it is given, from every other law', (kind) => {
    for (const before of kinds) {
      const project = setLaw(setLaw(three(), [0, 1, 2], before), [0, 2], kind);
      expect(faults(project)).toEqual([]);
      expect(project.frame.storeys.map(({ law }) => law.kind)).toEqual([kind, before, kind]);
    }
  });
  test('a storey starts to yield at 0.5 % of its height, two figures; strength and hardening are kept from then on', () => {
    let project = setLaw(writeAt(three(), 'frame.storeys[1].stiffness', 4.55e8), [1], 'peak-oriented');
    expect(project.frame.storeys[1].law).toEqual({ kind: 'peak-oriented', strength: 8.2e6, hardening: 0.03 });
    project = writeAt(writeAt(project, 'frame.storeys[1].law.strength', 9.03e6), 'frame.storeys[1].law.hardening', 0.6);
    expect(setLaw(project, [1], 'bilinear').frame.storeys[1].law).toEqual({
      kind: 'bilinear',
      strength: 9.03e6,
      hardening: 0.6,
    });
    // More than 1 - hardening would not re-centre.
    const flag = setLaw(project, [1], 'flag');
    expect(flag.frame.storeys[1].law).toEqual({ kind: 'flag', strength: 9.03e6, hardening: 0.6, ratio: 0.4 });
    expect(setLaw(flag, [1], 'bouc-wen').frame.storeys[1].law).toMatchObject({ exponent: 2, beta: 0.5, gamma: 0.5 });
    const typed = writeAt(flag, 'frame.storeys[1].law.ratio', 0.2);
    expect(setLaw(typed, [1], 'flag')).toEqual(typed);
  });
  test('without a stiffness there is no strength to start from, and the cell says so', () => {
    const bare = setLaw(writeAt(three(), 'frame.storeys[0].stiffness', null), [0], 'bilinear');
    expect(faults(bare)).toEqual(['frame.storeys[0].stiffness not-typed', 'frame.storeys[0].law.strength not-typed']);
  });
  test('a damper comes with a start near 5 % of critical, keeps what is typed, and goes', () => {
    const project = setDamper(three(), [1]);
    expect(project.frame.storeys[1].damper).toEqual({ coefficient: 9.5e5, exponent: 1 });
    expect(faults(project)).toEqual([]);
    const typed = writeAt(project, 'frame.storeys[1].damper.exponent', 0.3);
    expect(setDamper(typed, [1, 2]).frame.storeys.map(({ damper }) => damper?.exponent)).toEqual([undefined, 0.3, 1]);
    expect(setDamper(typed, [1], { coefficient: 5, exponent: 2 }).frame.storeys[1].damper?.coefficient).toBe(5);
    expect(clearDamper(typed, [1])).toEqual(three());
  });
  test('cells make and take out their part: a damper by its coefficient, a yielding storey by its strength', () => {
    const damper = (value: number | null, project = three()) =>
      writeAt(project, 'frame.storeys[0].damper.coefficient', value);
    expect(damper(1e6).frame.storeys[0].damper).toEqual({ coefficient: 1e6, exponent: 1 });
    expect(damper(null, damper(1e6))).toEqual(three());
    const half = writeAt(three(), 'frame.storeys[0].damper.exponent', 0.5);
    expect(faults(half)).toEqual(['frame.storeys[0].damper.coefficient not-typed']);
    expect(writeAt(three(), 'frame.storeys[0].damper.exponent', null)).toEqual(three());
    const strong = writeAt(three(), 'frame.storeys[0].law.strength', 2e6);
    expect(strong.frame.storeys[0].law).toEqual({ kind: 'bilinear', strength: 2e6, hardening: 0.03 });
    expect(writeAt(three(), 'frame.storeys[0].law.strength', null)).toEqual(three());
    expect(readAt(three(), 'frame.storeys[0].law.strength')).toBeNull();
    for (const path of ['law.ratio', 'law.kind', 'damper.stroke']) {
      expect(() => writeAt(strong, `frame.storeys[0].${path}`, 1), path).toThrow(RangeError);
    }
    expect(() => writeAt(strong, 'frame.storeys[7].law.strength', 1)).toThrow(RangeError);
  });
  test('every cell has a label and a hint with its usual range', () => {
    const said = (path: string) => [fieldOf(path).label(three()), fieldOf(path).hint('si')];
    expect(said('frame.storeys[1].law.strength')[0]).toBe('Storey 2, strength');
    expect(said('frame.storeys[1].law.hardening')).toEqual([
      'Storey 2, hardening',
      'stiffness after yield over the initial one, usually 0 to 10 %',
    ]);
    expect(said('frame.storeys[1].damper.coefficient')[0]).toBe('Storey 2, damper force at 1 m/s');
    expect(said('limits.isolator')[1]).toBe(
      'of the isolator row; not compared where left empty, usually 200 to 600 mm',
    );
    const limited = writeAt(three(), 'limits.isolator', 0.4);
    expect('isolator' in writeAt(limited, 'limits.isolator', null).limits).toBe(false);
  });
});
