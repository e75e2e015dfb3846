import type { Analysis } from '../../src/core/dynamics/run.ts';
import type { Frame } from '../../src/core/frame/frame.ts';
import type { RunRequest } from '../../src/engine/protocol.ts';
import { prepared } from '../support/frames.ts';

export function frameOf(storeys: number, stiffness = 1.2e8): Frame {
  return {
    storeys: Array.from({ length: storeys }, (_, i) => ({
      name: `storey ${i + 1}`,
      height: 3.5,
      mass: 2e5,
      stiffness,
      law: { kind: 'elastic' },
    })),
    damping: { kind: 'modal', ratios: [0.05] },
    pDelta: false,
  };
}

/** As above, each storey yields, the first has a damper. */
export function yieldingFrameOf(storeys: number): Frame {
  const frame = frameOf(storeys);
  const law = { kind: 'bilinear', strength: 3e5, hardening: 0.05 } as const;
  return {
    ...frame,
    storeys: frame.storeys.map((storey, i) => ({
      ...storey,
      law,
      ...(i === 0 ? { damper: { coefficient: 4e5, exponent: 0.5 } } : {}),
    })),
  };
}

/** A decaying pair of sines: no randomness, no symmetry. */
export function samplesOf(count: number, seed = 1): Float64Array {
  return Float64Array.from(
    { length: count },
    (_, i) => 2 * Math.exp(-i / count) * (Math.sin(0.11 * seed * i) + 0.4 * Math.sin(0.37 * i + seed)),
  );
}

export const ANALYSIS: Analysis = {
  method: { kind: 'newmark', beta: 0.25, gamma: 0.5 },
  step: { parts: 1 },
  tail: 0,
  stopDrift: 0.1,
};

export function requestOf(samples: string, frame: Frame = frameOf(3), histories = false): RunRequest {
  return {
    frameKey: JSON.stringify(frame),
    prepared: prepared(frame),
    analysis: ANALYSIS,
    motion: { samples, interval: 0.01, scale: 1 },
    want: { histories },
  };
}
