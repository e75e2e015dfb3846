import { expect, it } from 'vitest';
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
