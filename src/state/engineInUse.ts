import type { Engine } from '../engine/protocol.ts';

let inUse: Engine | null = null;

/** The engine that main.tsx made, for what is loaded later; null before. */
export function engineInUse(): Engine | null {
  return inUse;
}

export function putEngine(engine: Engine): void {
  inUse = engine;
}
