import type { Run } from '../core/dynamics/run.ts';
import type { Engine } from '../engine/protocol.ts';
import type { RunAsk } from './question.ts';

/** Runs that are with the engine, each under a name: a newer one of the same name takes its place. */
export interface Jobs {
  /** Sends a run, unless the same one is under way under that name. What comes of it is told unless it was superseded. */
  send(name: string, ask: RunAsk, priority: number, done: (run: Run) => void, failed: (why: string) => void): void;
  /** Of the run under that name [0 to 1]. */
  share(name: string): number;
  /** Whether a name that begins so is under way. */
  any(prefix: string): boolean;
  /** Cancels all that is not wanted. */
  keep(wanted: (name: string, key: string) => boolean): void;
}

/** @param progress  called whenever one has come further */
export function jobsWith(engine: Engine, progress: () => void): Jobs {
  const underWay = new Map<string, { readonly key: string; share: number }>();
  return {
    send(name, { key, request }, priority, done, failed) {
      if (underWay.get(name)?.key === key) return;
      const own = { key, share: 0 };
      underWay.set(name, own);
      const onProgress = (share: number) => {
        own.share = share;
        progress();
      };
      void engine.run(name, request, { priority, onProgress }).then((reply) => {
        if (underWay.get(name) === own) underWay.delete(name);
        if (reply.status === 'done') done(reply.value);
        else if (reply.status === 'failed') failed(reply.message);
      });
    },
    share: (name) => underWay.get(name)?.share ?? 0,
    any: (prefix) => [...underWay.keys()].some((name) => name.startsWith(prefix)),
    keep(wanted) {
      for (const [name, { key }] of underWay) {
        if (wanted(name, key)) continue;
        underWay.delete(name);
        engine.cancel(name);
      }
    },
  };
}
