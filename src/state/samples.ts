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

/** Autosave hears of each digest once; null: nobody does. */
export function onNewSamples(hear: ((digest: string, samples: Float64Array) => void) | null): void {
  written = hear;
}
