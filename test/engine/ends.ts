import { MessageChannel, Worker } from 'node:worker_threads';
import { jobs } from '../../src/engine/job.ts';
import type { Endpoint, FromWorker, ToWorker } from '../../src/engine/protocol.ts';
import type { Turns } from '../../src/engine/turns.ts';

/** Node empties a message port in one go, so a port that posts to itself would keep the others waiting: here a turn is an immediate. */
export function immediateTurns(): Turns {
  let open = true;
  return {
    next: (task) => void setImmediate(() => open && task()),
    close() {
      open = false;
    },
  };
}

/** An endpoint over a bare message channel on this thread, whose far side the test writes, and can break. */
export interface Fake extends Endpoint {
  readonly received: ToWorker[];
  readonly ended: boolean;
  die(why: string): void;
}

/**
 * @param far  makes the far side: given a way to answer, returns what it does with each message; absent: the real jobs
 */
export function fakeEnd(far?: (answer: (message: FromWorker) => void) => (message: ToWorker) => void): Fake {
  const { port1, port2 } = new MessageChannel();
  const turns = immediateTurns();
  const received: ToWorker[] = [];
  let died: (why: string) => void = () => {};
  let ended = false;
  const answer = (message: FromWorker, transfer: Transferable[] = []) =>
    port2.postMessage(message, transfer as ArrayBuffer[]);
  const receive = far ? far(answer) : jobs(answer, turns);
  port2.on('message', (message: ToWorker) => {
    received.push(message);
    receive(message);
  });
  return {
    received,
    get ended() {
      return ended;
    },
    post: (message, transfer) => port1.postMessage(message, transfer as ArrayBuffer[]),
    listen(hear) {
      port1.on('message', hear);
      answer({ kind: 'ready' });
    },
    onDeath(call) {
      died = call;
    },
    end() {
      ended = true;
      turns.close();
      port1.close();
    },
    die: (why) => died(why),
  };
}

/** A real thread of Node running the worker's code. */
export function threadEnd(): Endpoint & { readonly worker: Worker } {
  const worker = new Worker(new URL('./thread.mjs', import.meta.url));
  return {
    worker,
    post: (message, transfer) => worker.postMessage(message, transfer as ArrayBuffer[]),
    listen(hear) {
      worker.on('message', hear);
    },
    onDeath(died) {
      worker.on('error', (error) => died(error.message));
    },
    end() {
      void worker.terminate();
    },
  };
}
