import { jobs } from './job.ts';
import { createPool } from './pool.ts';
import type { Endpoint, Engine, FromWorker } from './protocol.ts';
import { messageTurns, type Turns } from './turns.ts';

/** The far side of the protocol on this thread: no worker, the same jobs, the same bits. */
export function inlineEndpoint(turns: Turns = messageTurns()): Endpoint {
  let hear: (message: FromWorker) => void = () => {};
  const receive = jobs((message) => hear(message), turns);
  return {
    post: (message) => receive(message),
    listen(heard) {
      hear = heard;
      turns.next(() => hear({ kind: 'ready' }));
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
