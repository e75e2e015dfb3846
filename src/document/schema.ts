import { z } from 'zod';
import type { StepChoice } from '../core/dynamics/run.ts';
import { ACCELERATION_UNITS } from '../core/motion/motion.ts';
import { MAX_STOREYS, PROJECT_FORMAT } from './project.ts';
import { objectOf } from './raw.ts';

/**
 * The shape of the project file, all of the project-file page: what a key may hold, its defaults written out. Unknown keys are
 * faults. What one key alone cannot tell (a mode that is not there, two motions of one name) stands in crossChecks.ts; what a
 * later version brings is in shape here and refused by notYet.ts.
 */
const above0 = z.number().gt(0);
const from0 = z.number().gte(0);
const ratio = z.number().gte(0).lt(1);
const hardening = z.number().gte(0).lt(1);
const modeNumber = z.int().gte(1);

const law = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('elastic') }),
  z.strictObject({ kind: z.literal('bilinear'), strength: above0, hardening }),
  z.strictObject({ kind: z.literal('peak-oriented'), strength: above0, hardening }),
  z.strictObject({
    kind: z.literal('bouc-wen'),
    strength: above0,
    hardening,
    exponent: z.number().gte(1),
    beta: z.number().gte(0.5),
    gamma: z.number(),
  }),
  z.strictObject({ kind: z.literal('flag'), strength: above0, hardening, ratio: z.number().gte(0).lte(1) }),
]);

const storey = z.strictObject({
  name: z.string(),
  height: above0,
  mass: above0,
  stiffness: above0,
  law,
  gravity: from0.optional(),
  damper: z.strictObject({ coefficient: from0, exponent: z.number().gt(0) }).optional(),
  role: z.enum(['storey', 'isolator']).optional(),
});

const damping = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('none') }),
  z.strictObject({
    kind: z.literal('rayleigh'),
    modes: z.tuple([modeNumber, modeNumber]),
    ratios: z.tuple([ratio, ratio]),
    stiffness: z.enum(['initial', 'tangent']).optional(),
  }),
  z.strictObject({ kind: z.literal('modal'), ratios: z.array(ratio).min(1) }),
  z.strictObject({ kind: z.literal('stiffness-proportional'), mode: modeNumber, ratio }),
]);

export const frameSchema = z.strictObject({
  storeys: z.array(storey).min(1).max(MAX_STOREYS),
  damping,
  pDelta: z.boolean(),
});

const method = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('newmark'), beta: from0, gamma: z.number().gte(0.5) }),
  z.strictObject({ kind: z.literal('generalized-alpha'), spectralRadius: z.number().gte(0).lte(1) }),
  z.strictObject({
    kind: z.literal('hht'),
    alpha: z
      .number()
      .gte(-1 / 3)
      .lte(0),
  }),
  z.strictObject({ kind: z.literal('central-difference') }),
]);

const parts = z.strictObject({ parts: z.int().gte(1) });

/** By hand and not as a union, so that the fault names the part at fault. */
const step = z.custom<StepChoice>().superRefine((value: unknown, context) => {
  if (value === 'auto') return;
  const { error } = (objectOf(value) === null ? above0 : parts).safeParse(value);
  for (const issue of error?.issues ?? []) context.addIssue({ ...issue });
});

export const analysisSchema = z.strictObject({
  method,
  step,
  tail: from0,
  stopDrift: above0,
});

export const limitsSchema = z.strictObject({
  drift: above0,
  measure: z.enum(['mean', 'median', 'max']).optional(),
  factor: above0,
  source: z.string(),
});

const originSchema = z.strictObject({
  file: z.string().optional(),
  digest: z.string().optional(),
  layout: z.string().optional(),
  unit: z.enum(ACCELERATION_UNITS).optional(),
  unitFrom: z.enum(['file', 'answer']).optional(),
  interval: above0.optional(),
  intervalFrom: z.enum(['file', 'answer']).optional(),
  event: z.string().optional(),
  station: z.string().optional(),
  component: z.string().optional(),
  mends: z.array(z.strictObject({ line: z.int(), was: z.string(), is: z.string(), why: z.string() })).optional(),
});

const notZero = z.number().refine((value) => value !== 0, { error: 'is 0, must be another number' });

/** What the file and the document hold alike of a motion. */
export const motionUse = {
  name: z.string().min(1),
  scale: notZero,
  used: z.boolean(),
  reason: z.string().optional(),
};

const motion = z.strictObject({
  ...motionUse,
  interval: above0.optional(),
  /** Checked by motionSource.ts: a million samples have one fault and not a million. */
  acceleration: z.custom<readonly number[]>(() => true).optional(),
  file: z.string().min(1).optional(),
  unit: z.enum(ACCELERATION_UNITS).optional(),
  origin: originSchema.optional(),
});

export const projectSchema = z.strictObject({
  format: z.literal(PROJECT_FORMAT),
  version: z.literal(1),
  title: z.string(),
  frame: frameSchema,
  motions: z.array(motion),
  analysis: analysisSchema,
  limits: limitsSchema,
});

export type FileProject = z.infer<typeof projectSchema>;
export type FileMotion = FileProject['motions'][number];
