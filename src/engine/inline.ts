import { createPool } from './pool.ts';
import type { Endpoint, Engine, FromWorker } from './protocol.ts';
import { messageTurns, type Turns } from './turns.ts';

/** The far side of the protocol on this thread: no worker, the same jobs, the same bits. They are loaded when they are needed: a page with workers never needs them. */
export function inlineEndpoint(turns: Turns = messageTurns()): Endpoint {
  let hear: (message: FromWorker) => void = () => {};
  const receiving = import('./job.ts').then(({ jobs }) => jobs((message) => hear(message), turns));
  return {
    // Promises of one source are settled in order, so messages keep theirs.
    post: (message) => void receiving.then((receive) => receive(message)),
    listen(heard) {
      hear = heard;
      void receiving.then(() => turns.next(() => hear({ kind: 'ready' })));
    },
    onDeath() {},
    end() {
      hear = () => {};
      turns.close();
    },
  };
}

/** The engine where workers are missing. */
export function inlineEngine(turns?: Turns): Engine {
  return createPool({ size: 1, make: () => inlineEndpoint(turns) });
}
