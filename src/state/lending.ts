import type { Engine } from '../engine/protocol.ts';

/** Samples that the engine was given: it has what a run needs, and lets go of what the document holds no more. */
export interface Lending {
  /** The engine has the samples, or is given them now; false where they are not there. */
  ready(digest: string): boolean;
  /** Undo gives again what was let go. */
  keepOnly(digests: ReadonlySet<string>): void;
}

export function lendingTo(engine: Engine, samplesOf: (digest: string) => Float64Array | undefined): Lending {
  const given = new Set<string>();
  return {
    ready(digest) {
      if (engine.hasMotion(digest)) return true;
      const samples = samplesOf(digest);
      if (!samples) return false;
      engine.putMotion(digest, samples);
      given.add(digest);
      return true;
    },
    keepOnly(digests) {
      for (const digest of given) {
        if (digests.has(digest)) continue;
        engine.dropMotion(digest);
        given.delete(digest);
      }
    },
  };
}
