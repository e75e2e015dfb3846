import { objectOf } from './raw.ts';

const DEFAULTS = {
  analysis: { tail: 0, stopDrift: 0.1 },
  limits: { factor: 1 },
} as const;
const MOTION = { scale: 1, used: true } as const;

/** A raw project file with its defaults written out, as far as its parts are of the right kind. */
export function withDefaults(raw: Readonly<Record<string, unknown>>): Record<string, unknown> {
  const filled: Record<string, unknown> = { ...raw };
  for (const [key, values] of Object.entries(DEFAULTS)) {
    const part = objectOf(raw[key]);
    if (part !== null) filled[key] = { ...values, ...part };
  }
  if (Array.isArray(raw.motions)) {
    filled.motions = raw.motions.map((entry: unknown) => {
      const motion = objectOf(entry);
      return motion === null ? entry : { ...MOTION, ...motion };
    });
  }
  return filled;
}
