import type { Frame, Law, Storey } from '../core/frame/frame.ts';
import type { RunRequest } from './protocol.ts';

/**
 * What a step of a frame costs, in steps of a linear one: the law that takes longest decides, since all storeys are solved again with
 * it. Measured in Node, 20 storeys at a ductility of a few; good enough to share work out and to know whether a run will be long.
 */
const LAW: Readonly<Record<Law['kind'], number>> = {
  elastic: 1,
  bilinear: 4,
  flag: 8,
  'peak-oriented': 10,
  'bouc-wen': 20,
};
const DAMPER = 16;

/** What a run costs, in storey-steps of a linear frame. */
export function weightOf({ prepared: { frame }, analysis, motion }: RunRequest, samples: number): number {
  const { step, tail } = analysis;
  const parts = step === 'auto' ? 1 : typeof step === 'number' ? motion.interval / step : step.parts;
  const cost = Math.max(...frame.storeys.map(costOf));
  return Math.max(1, frame.storeys.length * parts * (samples + tail / motion.interval) * cost);
}

/** Whether a step of this frame is more than one solve with one matrix. */
export function isNonlinear({ storeys }: Frame): boolean {
  return storeys.some((storey) => costOf(storey) > 1);
}

function costOf({ law, damper, role }: Storey): number {
  // A linear damper is met by its straight line; an isolator's floors are damped by a full matrix.
  const damping = damper === undefined ? 1 : damper.exponent === 1 ? LAW.bilinear : DAMPER;
  return Math.max(LAW[law.kind], damping, role === 'isolator' ? LAW.bilinear : 1);
}
