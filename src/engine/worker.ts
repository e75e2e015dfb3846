import { jobs } from './job.ts';
import type { FromWorker, ToWorker } from './protocol.ts';
import { messageTurns } from './turns.ts';

const post = (message: FromWorker, transfer: Transferable[] = []) => self.postMessage(message, { transfer });
const receive = jobs(post, messageTurns());
self.addEventListener('message', (event: MessageEvent<ToWorker>) => receive(event.data));
post({ kind: 'ready' });
