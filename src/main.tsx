import { createRoot } from 'react-dom/client';
import { demoProject } from './document/demo.ts';
import { workerEndpoint } from './engine/endpoint.ts';
import { inlineEndpoint, inlineEngine } from './engine/inline.ts';
import { createPool } from './engine/pool.ts';
import type { Engine } from './engine/protocol.ts';
import { startAutosave } from './state/autosave.ts';
import { startImports } from './state/imports.ts';
import { browserKeeper } from './state/keeper.ts';
import { aloneInBrowser, onLeavePage } from './state/page.ts';
import { startResults } from './state/results.ts';
import { App } from './ui/App.tsx';

/** Workers for at most four cores; this thread where there are none, or where they cannot be started. */
function engineOf(): Engine {
  if (typeof Worker === 'undefined') return inlineEngine();
  const make = () =>
    workerEndpoint(new Worker(new URL('./engine/worker.ts', import.meta.url), { type: 'module', name: 'swaybook' }));
  const size = Math.max(1, Math.min(navigator.hardwareConcurrency ?? 1, 4));
  return createPool({ size, make, fallback: inlineEndpoint });
}

const engine = engineOf();
await startAutosave(browserKeeper(), { first: demoProject, alone: aloneInBrowser, onLeave: onLeavePage });
startImports(engine);
startResults(engine);
createRoot(document.getElementById('root') ?? document.body).render(<App />);
