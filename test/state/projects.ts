import { digestOfSamples } from '../../src/core/digest.ts';
import type { MotionEntry, Project, StoreyRow } from '../../src/document/project.ts';
import { samplesOf } from '../engine/fixtures.ts';

/** A frame of equal storeys under motions named A, B, C ..., each of its own samples. */
export function projectOf(
  storeys: number,
  motions = 0,
  count = 600,
): { project: Project; samples: Map<string, Float64Array> } {
  const samples = new Map<string, Float64Array>();
  const entries = Array.from({ length: motions }, (_, i): MotionEntry => {
    const values = samplesOf(count, 1 + 0.13 * i);
    const digest = digestOfSamples(values);
    samples.set(digest, values);
    return { name: String.fromCharCode(65 + i), interval: 0.01, samples: digest, count, scale: 1, used: true };
  });
  const row = (i: number): StoreyRow => ({
    name: `storey ${i + 1}`,
    height: 3.5,
    mass: 2e5,
    stiffness: 1.2e8,
    law: { kind: 'elastic' },
  });
  const project: Project = {
    title: 'Test frame',
    frame: {
      storeys: Array.from({ length: storeys }, (_, i) => row(i)),
      damping: { kind: 'modal', ratios: [0.05] },
      pDelta: false,
    },
    motions: entries,
    analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: { parts: 1 }, tail: 0, stopDrift: 0.1 },
    limits: { drift: 0.02, factor: 1, source: 'test' },
  };
  return { project, samples };
}

export function withStorey(project: Project, at: number, change: Partial<StoreyRow>): Project {
  const storeys = project.frame.storeys.map((row, i) => (i === at ? { ...row, ...change } : row));
  return { ...project, frame: { ...project.frame, storeys } };
}
