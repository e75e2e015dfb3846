import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readQuantity } from '../../src/core/units/read.ts';
import { caseOf } from '../../src/document/case.ts';
import { makeEqualStoreys, removeStorey, setDamper, setLaw, setRole } from '../../src/document/edits.ts';
import { emptyProject } from '../../src/document/empty.ts';
import { fieldOf, readAt, writeAt } from '../../src/document/fields.ts';
import { readProject, readProjectOnItsWay, writeProject } from '../../src/document/file.ts';
import type { Project, Typed } from '../../src/document/project.ts';

const CELLS = [
  'frame.storeys[0].height',
  'frame.storeys[1].mass',
  'frame.storeys[2].stiffness',
  'frame.storeys[1].gravity',
  'frame.damping.modes[0]',
  'frame.damping.ratios[1]',
  'analysis.step',
  'analysis.tail',
  'analysis.stopDrift',
  'analysis.method.beta',
  'limits.drift',
  'limits.factor',
  'limits.isolator',
  'frame.storeys[0].law.strength',
  'frame.storeys[1].law.hardening',
  'frame.storeys[1].law.exponent',
  'frame.storeys[1].law.beta',
  'frame.storeys[1].law.gamma',
  'frame.storeys[2].law.ratio',
  'frame.storeys[0].damper.coefficient',
  'frame.storeys[0].damper.exponent',
];

function three(): Project {
  let project = makeEqualStoreys(emptyProject(), 3, 3.6);
  for (let i = 0; i < 3; i++) {
    project = writeAt(project, `frame.storeys[${i}].mass`, 2e5);
    project = writeAt(project, `frame.storeys[${i}].stiffness`, 2e8);
  }
  project = setLaw(setLaw(setLaw(project, [0], 'bilinear'), [1], 'bouc-wen'), [2], 'flag');
  project = setDamper(setRole(project, 0, 'isolator'), [0]);
  return {
    ...project,
    frame: { ...project.frame, damping: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] } },
  };
}

const text = (project: Project) => writeProject(project, () => new Float64Array());
const reopened = (project: Project): Project => {
  const read = readProjectOnItsWay(text(project));
  if (!read.ok) throw new Error(JSON.stringify(read.faults));
  return read.value.project;
};
const placesOf = (project: Project) => {
  const made = caseOf(project);
  return made.ok ? [] : made.faults.map(({ where }) => where).sort();
};

describe('[DOC-8] a document on its way', () => {
  test('whatever stands in its cells, it is written, opens again, and names the same cells', () => {
    let refused = 0;
    const cell = fc.record({
      path: fc.constantFrom(...CELLS),
      value: fc.oneof(
        fc.constant(null),
        fc.constantFrom('', '12 furlong', '1,250', 'x', '-3'),
        fc.constantFrom<Typed>(0, -0, -3, 0.5, 2.5, 61, 1e300, 1e-300, -1e9),
        fc.double({ noNaN: true, min: 1e-6, max: 1e9 }),
        fc.double({ noNaN: true, min: -1e9, max: -1e-6 }),
      ),
    });
    fc.assert(
      fc.property(fc.array(cell, { minLength: 1, maxLength: 6 }), (cells) => {
        let project = three();
        for (const { path, value } of cells) project = writeAt(project, path, value);
        const again = reopened(project);
        expect(placesOf(again)).toEqual(placesOf(project));
        for (const { path } of cells) {
          const [was, is] = [readAt(project, path), readAt(again, path)];
          if (Object.is(was, is) || was === 0) continue;
          // A number that its cell refuses comes back as the text that reads as that number.
          refused++;
          const { quantity } = fieldOf(path);
          const reading = quantity === 'text' ? null : readQuantity(String(is), quantity, 'us');
          expect(reading?.kind, `${path}: ${was} as ${is}`).toBe('value');
          if (reading?.kind === 'value') expect(Math.abs(reading.value / Number(was) - 1)).toBeLessThan(1e-14);
        }
        expect(reopened(again)).toEqual(again);
      }),
      { numRuns: 200 },
    );
    expect(refused).toBeGreaterThan(30);
  });

  test('the empty sheet, a lost mode, a motion left out without its reason: all open again', () => {
    expect(reopened(emptyProject())).toEqual(emptyProject());
    const lost = removeStorey(three(), 0);
    expect(reopened(lost)).toEqual(lost);
    expect(reopened(removeStorey(lost, 0))).toEqual(removeStorey(lost, 0));
    const lifted = setRole(setRole(three(), 0, 'storey'), 1, 'isolator');
    expect(placesOf(lifted)).toEqual(['frame.storeys[1].role']);
    expect(reopened(lifted)).toEqual(lifted);
  });

  test('the batch command refuses it with the list that the browser shows', () => {
    let project = writeAt(three(), 'frame.storeys[0].mass', null);
    project = writeAt(project, 'frame.storeys[1].height', '12 furlong');
    project = writeAt(project, 'frame.damping.modes[1]', 9);
    project = writeAt(project, 'limits.drift', 0);
    const read = readProject(text(project));
    expect(read.ok ? [] : read.faults.map(({ where }) => where).sort()).toEqual(placesOf(project));
    expect(placesOf(project)).toEqual([
      'frame.damping.modes[1]',
      'frame.storeys[0].mass',
      'frame.storeys[1].height',
      'limits.drift',
    ]);
  });

  test('a number that is a mistake in a file, a key that nobody knows, a title that is none: refused with all there is', () => {
    const raw = JSON.parse(text(three()));
    raw.frame.storeys[0].mass = -3;
    raw.frame.storeys[1].mass = null;
    raw.frame.storeys[2].name = null;
    raw.stray = 1;
    const read = readProjectOnItsWay(JSON.stringify(raw));
    expect(read.ok ? [] : read.faults.map(({ where }) => where).sort()).toEqual([
      'frame.storeys[0].mass',
      'frame.storeys[1].mass',
      'frame.storeys[2].name',
      'stray',
    ]);
  });
});
