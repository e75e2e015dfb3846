import { createStore, del, get, keys, set } from 'idb-keyval';

/** The browser's store as autosave sees it: structured values by key. Everything may be refused (quota, blocked storage). */
export interface Keeper {
  get(key: string): Promise<unknown>;
  set(key: string, value: unknown): Promise<void>;
  delete(key: string): Promise<void>;
  keys(): Promise<readonly string[]>;
}

/** IndexedDB, opened when it is first needed. */
export function browserKeeper(): Keeper {
  let store: ReturnType<typeof createStore> | null = null;
  const opened = () => {
    store ??= createStore('swaybook', 'kept');
    return store;
  };
  // `async`, so that a browser without IndexedDB refuses like one that blocks it.
  return {
    get: async (key) => get(key, opened()),
    set: async (key, value) => set(key, value, opened()),
    delete: async (key) => del(key, opened()),
    keys: async () => (await keys(opened())).map(String),
  };
}
