import type { Keeper } from '../../src/state/keeper.ts';

/** The browser's store in memory: values are cloned as IndexedDB does, writes may be slow or refused. */
export interface MemoryKeeper extends Keeper {
  readonly values: Map<string, unknown>;
  /** Every write that was taken, in order. */
  readonly writes: string[];
  /** Refuses a call with these words while it returns some. */
  refuse: (call: 'get' | 'set' | 'delete' | 'keys', key: string) => string | null;
  /** Settles when every call made so far was taken or refused. */
  idle(): Promise<void>;
}

export function memoryKeeper(initial: Iterable<readonly [string, unknown]> = []): MemoryKeeper {
  const values = new Map<string, unknown>(initial);
  const writes: string[] = [];
  const open = new Set<Promise<void>>();
  const call = async <T>(kind: 'get' | 'set' | 'delete' | 'keys', key: string, act: () => T): Promise<T> => {
    const turn = new Promise<void>((resolve) => setImmediate(resolve));
    open.add(turn);
    await turn;
    open.delete(turn);
    const refusal = keeper.refuse(kind, key);
    if (refusal !== null) throw new Error(refusal);
    return act();
  };
  const keeper: MemoryKeeper = {
    values,
    writes,
    refuse: () => null,
    async idle() {
      while (open.size > 0) await Promise.all(open);
    },
    get: (key) => call('get', key, () => structuredClone(values.get(key))),
    set(key, value) {
      const copy = structuredClone(value);
      return call('set', key, () => {
        writes.push(key);
        values.set(key, copy);
      });
    },
    delete: (key) => call('delete', key, () => void values.delete(key)),
    keys: () => call('keys', '', () => [...values.keys()]),
  };
  return keeper;
}
