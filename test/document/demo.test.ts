import { expect, test } from 'vitest';
import { runCase, stepErrorOf } from '../../src/core/doors.ts';
import type { Analysis } from '../../src/core/dynamics/run.ts';
import { printTyped } from '../../src/core/units/quantities.ts';
import { caseOf } from '../../src/document/case.ts';
import { demoProject } from '../../src/document/demo.ts';
import { readProject, writeProject } from '../../src/document/file.ts';

const { project, samples } = demoProject();

test('the example is whole: a case under seven motions, written and read back to the last bit', () => {
  const made = caseOf(project);
  expect(made.ok && made.value.motions.length).toBe(7);
  const text = writeProject(project, (digest) => samples.get(digest) ?? new Float64Array());
  expect(readProject(text)).toEqual({ ok: true, value: { project, samples } });
});

test('its typed numbers are as short as they were typed', () => {
  for (const { mass, stiffness, law } of project.frame.storeys) {
    expect(printTyped(law.kind === 'elastic' ? 0 : Number(law.strength), 'force', 'si')).toMatch(/^\d\u202f\d00$/);
    expect(printTyped(Number(mass), 'weight', 'si')).toMatch(/^\d\u202f\d{3}$/);
    expect(printTyped(Number(stiffness), 'stiffness', 'si')).toMatch(/^\d{3}$/);
  }
});

test('storeys yield moderately and one is a little over the limit on the mean of the suite; no run is stopped, and the step is fine enough', () => {
  const made = caseOf(project);
  if (!made.ok) throw new Error('the example is no case');
  const { frame, analysis, limits, motions } = made.value;
  const sum = frame.storeys.map(() => 0);
  const ductility = frame.storeys.map(() => 0);
  for (const { samples: digest, interval, scale } of motions) {
    const acceleration = samples.get(digest) ?? new Float64Array();
    const at = (step: Analysis['step']) =>
      runCase(
        { frame, analysis: { ...analysis, step }, motion: { interval, acceleration, scale } },
        { histories: false },
      );
    const run = at(analysis.step);
    expect(stepErrorOf(run, at({ parts: Math.round((2 * interval) / run.step) }))).toBeLessThan(0.01);
    expect(run.ending).toBeNull();
    for (const [i, ratio] of run.storeys.peakDriftRatio.entries()) sum[i] += ratio;
    for (const [i, one] of run.storeys.ductility.entries()) ductility[i] += one / motions.length;
    expect(run.energy.imbalance).toBeLessThan(0.001);
  }
  expect(Math.min(...ductility)).toBeGreaterThan(1);
  expect(Math.max(...ductility)).toBeLessThan(4);
  const over = sum.map((ratio) => ratio / motions.length / limits.drift).filter((ratio) => ratio > 1);
  expect(over.length).toBe(1);
  expect(over[0]).toBeGreaterThan(1.01);
  expect(over[0]).toBeLessThan(1.15);
});
