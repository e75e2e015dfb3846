import type { Project } from '../document/project.ts';
import type { Draft } from './document.ts';
import type { Keeper } from './keeper.ts';
import { envelopeFor } from './kept.ts';

export const KEYS = {
  document: 'document',
  draft: 'draft',
  samples: (digest: string) => `samples/${digest}`,
  aside: (at: string) => `aside/${at}`,
};

export interface Writer {
  samples(digest: string, samples: Float64Array): void;
  document(project: Project): void;
  draft(draft: Draft | null): void;
  /** Tries again what was refused; settles when everything asked so far was written or refused. */
  flush(): Promise<void>;
}

interface Write {
  readonly key: string;
  readonly act: () => Promise<void>;
}

/**
 * Writes to the browser's store at once, so that a page which is left has asked for everything: the keeper takes writes in the
 * order asked. What was refused is kept and tried again with the next write, unless a newer one for its key was taken.
 *
 * @param known  digests whose samples are stored already
 * @param told   whenever nothing is under way: why something was refused, or null
 */
export function writerTo(keeper: Keeper, known: Set<string>, told: (refusal: string | null) => void): Writer {
  const newest = new Map<string, Write>();
  const refused = new Map<Write, string>();
  const underWay = new Set<Promise<void>>();

  function ask(key: string, act: () => Promise<void>): void {
    const write = { key, act };
    newest.set(key, write);
    tryAgain();
    start(write);
  }

  function start(write: Write): void {
    const done = write.act().then(
      () => settle(write, null),
      (error) => settle(write, error instanceof Error ? error.message : String(error)),
    );
    const one = done.then(() => {
      underWay.delete(one);
      if (underWay.size === 0) told(refused.values().next().value ?? null);
    });
    underWay.add(one);
  }

  function settle(write: Write, refusal: string | null): void {
    if (refusal !== null && newest.get(write.key) === write) refused.set(write, refusal);
  }

  function tryAgain(): void {
    const again = [...refused.keys()];
    refused.clear();
    for (const write of again) if (newest.get(write.key) === write) start(write);
  }

  return {
    samples(digest, values) {
      if (known.has(digest)) return;
      known.add(digest);
      ask(KEYS.samples(digest), () => keeper.set(KEYS.samples(digest), values));
    },
    document(project) {
      ask(KEYS.document, () => keeper.set(KEYS.document, envelopeFor(project, Date.now())));
    },
    draft(value) {
      ask(KEYS.draft, () => (value ? keeper.set(KEYS.draft, value) : keeper.delete(KEYS.draft)));
    },
    async flush() {
      tryAgain();
      while (underWay.size > 0) await Promise.all(underWay);
    },
  };
}
