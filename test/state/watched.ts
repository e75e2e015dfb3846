import { inlineEngine } from '../../src/engine/inline.ts';
import type { Engine, RunRequest } from '../../src/engine/protocol.ts';
import { immediateTurns } from '../engine/ends.ts';

/** The inline engine, with a list of what was asked of it; `hold` keeps answers back, `fail` breaks them. */
export interface Watched extends Engine {
  readonly asked: { readonly question: string; readonly request: RunRequest }[];
  hold: Promise<void> | null;
  fail: ((question: string) => string | null) | null;
}

export function watchedEngine(): Watched {
  const engine = inlineEngine(immediateTurns());
  const watched: Watched = {
    ...engine,
    asked: [],
    hold: null,
    fail: null,
    async run(question, request, options) {
      watched.asked.push({ question, request });
      const words = watched.fail?.(question);
      const reply = engine.run(question, request, options);
      await watched.hold;
      return words ? { status: 'failed', message: words } : reply;
    },
  };
  return watched;
}
