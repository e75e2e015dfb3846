import { createStore, get, keys, promisifyRequest } from 'idb-keyval';

/**
 * The browser's store as autosave sees it: structured values by key. Calls take effect in the order they were made (as
 * IndexedDB promises for one store; samples may come later than the rest), also those of a page that is left. Everything may be refused (quota, blocked storage).
 */
export interface Keeper {
  get(key: string): Promise<unknown>;
  set(key: string, value: unknown): Promise<void>;
  delete(key: string): Promise<void>;
  keys(): Promise<readonly string[]>;
}

const SAMPLES = 'samples/';

/**
 * IndexedDB, opened when it is first needed. Samples have a database of their own, so that a document never waits behind
 * megabytes: a page that is left at once after an import loses at most the record, not the edit.
 */
export function browserKeeper(): Keeper {
  const stores = new Map<string, ReturnType<typeof createStore>>();
  const opened = (name: string) => {
    const store = stores.get(name) ?? createStore(name, 'kept');
    stores.set(name, store);
    return store;
  };
  const storeOf = (key: string) => opened(key.startsWith(SAMPLES) ? 'swaybook-samples' : 'swaybook');
  /** Commits by itself: a page that is left does not live to see its request succeed, and would then lose the transaction. */
  const write = (key: string, act: (kept: IDBObjectStore) => void): Promise<void> =>
    storeOf(key)('readwrite', (kept) => {
      act(kept);
      kept.transaction.commit();
      return promisifyRequest(kept.transaction);
    });
  // `async`, so that a browser without IndexedDB refuses like one that blocks it.
  return {
    get: async (key) => get(key, storeOf(key)),
    set: async (key, value) => write(key, (kept) => kept.put(value, key)),
    delete: async (key) => write(key, (kept) => kept.delete(key)),
    keys: async () => (await Promise.all([keys(storeOf('')), keys(storeOf(SAMPLES))])).flat().map(String),
  };
}
