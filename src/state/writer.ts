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
  /** Settles when everything asked so far was written or refused. Tries again what was refused before. */
  flush(): Promise<void>;
}

/**
 * Writes to the browser's store, one write after the other, always the newest of each: what is asked during a write is
 * written after it, and what was refused stays asked for.
 *
 * @param known  digests whose samples are stored already
 * @param told   after each round: why something was refused, or null
 */
export function writerTo(keeper: Keeper, known: Set<string>, told: (refusal: string | null) => void): Writer {
  const samples = new Map<string, Float64Array>();
  let document: Project | null = null;
  let draft: { readonly value: Draft | null } | null = null;
  let round: Promise<void> | null = null;
  let again = false;

  /** One after the other: samples before the document that refers to them. A refusal of one does not keep the others back. */
  async function writeAll(): Promise<void> {
    await null;
    do {
      again = false;
      let refusal: string | null = null;
      let attempts = 0;
      const attempt = async (write: () => Promise<void>) => {
        attempts += 1;
        try {
          await write();
        } catch (error) {
          refusal ??= error instanceof Error ? error.message : String(error);
        }
      };
      for (const [digest, values] of samples) {
        await attempt(async () => {
          await keeper.set(KEYS.samples(digest), values);
          known.add(digest);
          samples.delete(digest);
        });
      }
      const [project, typed] = [document, draft];
      if (project) {
        await attempt(async () => {
          await keeper.set(KEYS.document, envelopeFor(project));
          if (document === project) document = null;
        });
      }
      if (typed) {
        await attempt(async () => {
          if (typed.value) await keeper.set(KEYS.draft, typed.value);
          else await keeper.delete(KEYS.draft);
          if (draft === typed) draft = null;
        });
      }
      if (attempts > 0) told(refusal);
    } while (again);
    // Here and not in a `finally` of the promise: nothing may be asked between the last look at `again` and this.
    round = null;
  }

  function start(): Promise<void> {
    if (round) again = true;
    else round = writeAll();
    return round;
  }

  return {
    samples(digest, values) {
      if (known.has(digest)) return;
      samples.set(digest, values);
      void start();
    },
    document(project) {
      document = project;
      void start();
    },
    draft(value) {
      draft = { value };
      void start();
    },
    flush: () => start(),
  };
}
