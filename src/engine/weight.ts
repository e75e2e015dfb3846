import type { Frame } from '../core/frame/frame.ts';
import type { RunRequest } from './protocol.ts';

/** A storey of a frame that yields, or has dampers, costs about so many of a linear one. Measured in Node, 20 bilinear storeys. */
const NONLINEAR = 4;

/** What a run costs, in storey-steps of a linear frame. */
export function weightOf({ frame, analysis, motion }: RunRequest, samples: number): number {
  const { step, tail } = analysis;
  const parts = step === 'auto' ? 1 : typeof step === 'number' ? motion.interval / step : step.parts;
  const cost = isNonlinear(frame) ? NONLINEAR : 1;
  return Math.max(1, frame.storeys.length * parts * (samples + tail / motion.interval) * cost);
}

/** Whether a step of this frame is more than one solve with one matrix. */
export function isNonlinear({ storeys }: Frame): boolean {
  return storeys.some(({ law, damper, role }) => law.kind !== 'elastic' || damper !== undefined || role === 'isolator');
}
