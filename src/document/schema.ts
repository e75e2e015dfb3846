import * as z from 'zod/mini';
import type { StepChoice } from '../core/dynamics/run.ts';
import { ACCELERATION_UNITS } from '../core/motion/motion.ts';
import { MAX_STOREYS, PROJECT_FORMAT, PROJECT_VERSION } from './project.ts';
import { objectOf } from './raw.ts';

/**
 * The shape of the project file, all of the project-file page: what a key may hold, its defaults written out. Unknown keys are
 * faults. What one key alone cannot tell (a mode that is not there, two motions of one name) stands in crossChecks.ts.
 */
const above0 = z.number().check(z.gt(0));
const from0 = z.number().check(z.gte(0));
const ratio = z.number().check(z.gte(0), z.lt(1));
const hardening = z.number().check(z.gte(0), z.lt(1));
const modeNumber = z.int().check(z.gte(1));

const law = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('elastic') }),
  z.strictObject({ kind: z.literal('bilinear'), strength: above0, hardening }),
  z.strictObject({ kind: z.literal('peak-oriented'), strength: above0, hardening }),
  z.strictObject({
    kind: z.literal('bouc-wen'),
    strength: above0,
    hardening,
    exponent: z.number().check(z.gte(1)),
    beta: z.number().check(z.gte(0.5)),
    gamma: z.number(),
  }),
  z.strictObject({ kind: z.literal('flag'), strength: above0, hardening, ratio: z.number().check(z.gte(0), z.lte(1)) }),
]);

const storey = z.strictObject({
  name: z.string(),
  height: above0,
  mass: above0,
  stiffness: above0,
  law,
  gravity: z.optional(from0),
  damper: z.optional(z.strictObject({ coefficient: from0, exponent: z.number().check(z.gte(0.15), z.lte(2)) })),
  role: z.optional(z.enum(['storey', 'isolator'])),
});

const damping = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('none') }),
  z.strictObject({
    kind: z.literal('rayleigh'),
    modes: z.tuple([modeNumber, modeNumber]),
    ratios: z.tuple([ratio, ratio]),
    stiffness: z.optional(z.enum(['initial', 'tangent'])),
  }),
  z.strictObject({ kind: z.literal('modal'), ratios: z.array(ratio).check(z.minLength(1)) }),
  z.strictObject({ kind: z.literal('stiffness-proportional'), mode: modeNumber, ratio }),
]);

export const frameSchema = z.strictObject({
  storeys: z.array(storey).check(z.minLength(1), z.maxLength(MAX_STOREYS)),
  damping,
  pDelta: z.boolean(),
});

const method = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('newmark'), beta: from0, gamma: z.number().check(z.gte(0.5)) }),
  z.strictObject({ kind: z.literal('generalized-alpha'), spectralRadius: z.number().check(z.gte(0), z.lte(1)) }),
  z.strictObject({
    kind: z.literal('hht'),
    alpha: z.number().check(z.gte(-1 / 3), z.lte(0)),
  }),
  z.strictObject({ kind: z.literal('central-difference') }),
]);

const parts = z.strictObject({ parts: z.int().check(z.gte(1)) });

/** By hand and not as a union, so that the fault names the part at fault. */
const step = z.custom<StepChoice>().check(
  z.superRefine((value: unknown, context) => {
    if (value === 'auto') return;
    const { error } = (objectOf(value) === null ? above0 : parts).safeParse(value);
    for (const issue of error?.issues ?? []) context.addIssue({ ...issue });
  }),
);

export const analysisSchema = z.strictObject({
  method,
  step,
  tail: from0,
  stopDrift: above0,
});

export const limitsSchema = z.strictObject({
  drift: above0,
  measure: z.optional(z.enum(['mean', 'median', 'max'])),
  factor: above0,
  source: z.string(),
  isolator: z.optional(above0),
});

const originSchema = z.strictObject({
  file: z.optional(z.string()),
  digest: z.optional(z.string()),
  layout: z.optional(z.string()),
  unit: z.optional(z.enum(ACCELERATION_UNITS)),
  unitFrom: z.optional(z.enum(['file', 'answer'])),
  interval: z.optional(above0),
  intervalFrom: z.optional(z.enum(['file', 'answer'])),
  event: z.optional(z.string()),
  station: z.optional(z.string()),
  component: z.optional(z.string()),
  mends: z.optional(z.array(z.strictObject({ line: z.int(), was: z.string(), is: z.string(), why: z.string() }))),
});

const notZero = z
  .number()
  .check(z.refine((value) => value !== 0, { error: 'is 0, which leaves nothing of the motion' }));

/** What the file and the document hold alike of a motion. */
export const motionUse = {
  name: z.string().check(z.minLength(1)),
  scale: notZero,
  used: z.boolean(),
  reason: z.optional(z.string()),
};

const motion = z.strictObject({
  ...motionUse,
  interval: z.optional(above0),
  /** Checked by motionSource.ts: a million samples have one fault and not a million. */
  acceleration: z.optional(z.custom<readonly number[]>(() => true)),
  file: z.optional(z.string().check(z.minLength(1))),
  unit: z.optional(z.enum(ACCELERATION_UNITS)),
  origin: z.optional(originSchema),
});

export const projectSchema = z.strictObject({
  format: z.literal(PROJECT_FORMAT),
  version: z.literal(PROJECT_VERSION),
  title: z.string(),
  frame: frameSchema,
  motions: z.array(motion),
  analysis: analysisSchema,
  limits: limitsSchema,
});

export type FileProject = z.infer<typeof projectSchema>;
export type FileMotion = FileProject['motions'][number];
