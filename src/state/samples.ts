/** Record samples [m/s2] by digest: the document holds digests only. Never changed in place. */
const memory = new Map<string, Float64Array>();
let written: ((digest: string, samples: Float64Array) => void) | null = null;

export function samplesOf(digest: string): Float64Array | undefined {
  return memory.get(digest);
}

/** Keeps samples for this session, and tells autosave of those that are new. */
export function putSamples(digest: string, samples: Float64Array): void {
  if (memory.has(digest)) return;
  memory.set(digest, samples);
  written?.(digest, samples);
}

/** Lets go of samples that no project refers to any more. Returns their digests. */
export function dropSamples(isReferred: (digest: string) => boolean): readonly string[] {
  const dropped = [...memory.keys()].filter((digest) => !isReferred(digest));
  for (const digest of dropped) memory.delete(digest);
  return dropped;
}

/** Autosave hears of each digest once; null: nobody does. */
export function onNewSamples(hear: ((digest: string, samples: Float64Array) => void) | null): void {
  written = hear;
}
