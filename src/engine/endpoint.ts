import type { Endpoint, FromWorker } from './protocol.ts';

/** A module worker of the browser as an endpoint. */
export function workerEndpoint(worker: Worker): Endpoint {
  return {
    post: (message, transfer) => worker.postMessage(message, transfer),
    listen(hear) {
      worker.addEventListener('message', (event: MessageEvent<FromWorker>) => hear(event.data));
    },
    onDeath(died) {
      worker.addEventListener('error', (event) => died(event.message || 'it could not be started'), { once: true });
      worker.addEventListener('messageerror', () => died('a message could not be read'), { once: true });
    },
    end: () => worker.terminate(),
  };
}
