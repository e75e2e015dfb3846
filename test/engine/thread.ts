import { parentPort } from 'node:worker_threads';
import { jobs } from '../../src/engine/job.ts';
import type { FromWorker } from '../../src/engine/protocol.ts';
import { immediateTurns } from './ends.ts';

// The worker's few lines, on a thread of Node: parentPort in the place of self.
const port = parentPort;
if (!port) throw new TypeError('thread.ts runs on a thread only');
const post = (message: FromWorker, transfer: Transferable[] = []) =>
  port.postMessage(message, transfer as ArrayBuffer[]);
port.on('message', jobs(post, immediateTurns()));
post({ kind: 'ready' });
