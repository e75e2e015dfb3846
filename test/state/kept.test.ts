import { expect, it } from 'vitest';
import { setDamper, setLaw, setRole } from '../../src/document/edits.ts';
import { writeAt } from '../../src/document/fields.ts';
import type { DampingRow, Project } from '../../src/document/project.ts';
import { envelopeFor, readEnvelope } from '../../src/state/kept.ts';
import { projectOf } from './projects.ts';

const { project } = projectOf(3, 2);
const damped = (damping: DampingRow): Project => ({ ...project, frame: { ...project.frame, damping } });
const stepped = (step: Project['analysis']['step']): Project => ({
  ...project,
  analysis: { ...project.analysis, step },
});

it.each<[string, Project]>([
  ['frame.storeys[1].height', project],
  ['frame.storeys[1].mass', project],
  ['frame.storeys[1].stiffness', project],
  ['frame.storeys[1].gravity', project],
  ['frame.damping.modes[1]', damped({ kind: 'rayleigh', modes: [1, 2], ratios: [0.05, 0.05] })],
  ['frame.damping.ratios[0]', damped({ kind: 'modal', ratios: [0.05] })],
  ['frame.damping.mode', damped({ kind: 'stiffness-proportional', mode: 1, ratio: 0.05 })],
  ['frame.damping.ratio', damped({ kind: 'stiffness-proportional', mode: 1, ratio: 0.05 })],
  ...(['strength', 'hardening', 'exponent', 'beta', 'gamma'] as const).map((key): [string, Project] => [
    `frame.storeys[1].law.${key}`,
    setLaw(project, [1], 'bouc-wen'),
  ]),
  ['frame.storeys[1].law.strength', setLaw(project, [1], 'bilinear')],
  ['frame.storeys[1].law.hardening', setLaw(project, [1], 'peak-oriented')],
  ['frame.storeys[1].law.ratio', setLaw(project, [1], 'flag')],
  ['frame.storeys[1].damper.coefficient', setDamper(project, [1])],
  ['frame.storeys[1].damper.exponent', setDamper(project, [1])],
  ['limits.isolator', setRole(project, 0, 'isolator')],
  ['motions[1].scale', project],
  ['analysis.step', stepped(0.005)],
  ['analysis.step.parts', stepped({ parts: 2 })],
  ['analysis.tail', project],
  ['analysis.stopDrift', project],
  ['analysis.method.beta', project],
  ['limits.drift', project],
  ['limits.factor', project],
])('%s is kept empty and half-typed', (path, from) => {
  for (const value of [null, '', '12 34', -3]) {
    const half = writeAt(from, path, value);
    const stored: unknown = structuredClone(envelopeFor(half, 0));
    expect(readEnvelope(stored)).toEqual({ ok: true, value: half });
  }
});

it.each([
  ['law', { kind: 'plastic' }],
  ['law', { kind: 'bilinear', strength: 1 }],
  ['law', { kind: 'toString' }],
  ['damper', { coefficient: 1 }],
  ['role', 'roof'],
])('a stored storey with %s %j is not taken', (key, value) => {
  const storeys = project.frame.storeys.map((row, i) => (i === 1 ? { ...row, [key]: value } : row));
  const stored = envelopeFor({ ...project, frame: { ...project.frame, storeys } } as Project, 0);
  expect(readEnvelope(stored)).toMatchObject({ ok: false, faults: [{ where: `frame.storeys[1].${key}` }] });
});
