import { digestOfSamples } from '../../src/core/digest.ts';
import { syntheticMotion } from '../../src/core/motion/synthetic.ts';
import { emptyProject } from '../../src/document/empty.ts';
import { writeProject } from '../../src/document/file.ts';
import type { MotionEntry, Project } from '../../src/document/project.ts';

/** A project file of so many equal-looking storeys under so many seeded synthetic motions of 4,000 samples; where they yield, to a ductility of some 2 to 5. */
export function suiteFile(storeys: number, motions: number, yields = false): string {
  const samples = new Map<string, Float64Array>();
  const entries = Array.from({ length: motions }, (_, i): MotionEntry => {
    const acceleration = syntheticMotion({
      seed: 100 + i,
      interval: 0.01,
      duration: 39.99,
      peak: 3,
      groundFrequency: 1.5 + (i % 4) * 0.4,
      groundDamping: 0.5,
      lowCut: 0.3,
      strongFrom: 2,
      strongTo: 10,
      fade: 5,
    });
    const digest = digestOfSamples(acceleration);
    samples.set(digest, acceleration);
    return {
      name: `Motion ${i + 1}`,
      interval: 0.01,
      samples: digest,
      count: acceleration.length,
      scale: 1,
      used: true,
    };
  });
  const project: Project = {
    ...emptyProject(),
    analysis: { ...emptyProject().analysis, step: { parts: 1 } },
    title: `Bench, ${storeys} storeys, ${motions} motions`,
    frame: {
      storeys: Array.from({ length: storeys }, (_, i) => ({
        name: `S${i + 1}`,
        height: 3.5,
        mass: 4e5,
        stiffness: 8e8 * (1 - (0.6 * i) / storeys),
        law: yields
          ? { kind: 'bilinear', strength: 6e6 * (1 - (0.6 * i) / storeys), hardening: 0.03 }
          : { kind: 'elastic' },
      })),
      damping: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] },
      pDelta: false,
    },
    motions: entries,
    limits: { drift: 0.01, factor: 1, source: 'bench' },
  };
  return writeProject(project, (digest) => samples.get(digest) ?? new Float64Array());
}
