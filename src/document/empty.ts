import type { Project } from './project.ts';

/**
 * The empty sheet: no storey, no motion, 5 % in every mode, average acceleration at a step found by halving, five seconds of free vibration (five
 * periods of one second, as long as the frame's own is not known), a limit that is only a start.
 */
export function emptyProject(): Project {
  return {
    title: '',
    frame: { storeys: [], damping: { kind: 'modal', ratios: [0.05] }, pDelta: false },
    motions: [],
    analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: 'auto', tail: 5, stopDrift: 0.1 },
    limits: { drift: 0.02, factor: 1, source: '' },
  };
}
