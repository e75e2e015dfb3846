import { afterEach, describe, expect, it, vi } from 'vitest';

/** The session as a page over this storage finds it. */
async function opened(storage: Pick<Storage, 'getItem' | 'setItem'> | undefined) {
  vi.stubGlobal('localStorage', storage);
  vi.resetModules();
  return import('../../src/state/session.ts');
}

function storageOf(initial: string | null): Pick<Storage, 'getItem' | 'setItem'> & { kept: string | null } {
  const storage = {
    kept: initial,
    getItem: () => storage.kept,
    setItem(_: string, value: string) {
      storage.kept = value;
    },
  };
  return storage;
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('the session', () => {
  it('remembers units and theme, and nothing else', async () => {
    const storage = storageOf(null);
    const first = await opened(storage);
    first.setSession({ system: 'us', theme: 'dark', storey: 3, motion: 'A' });
    first.setTime(4.2);
    const { sessionStore } = await opened(storage);
    expect(sessionStore.getState()).toMatchObject({ system: 'us', theme: 'dark', storey: null, motion: null, time: 0 });
  });

  it.each(['{broken', '7', '{"system":"furlongs","theme":3}'])('passes over what it cannot use: %s', async (kept) => {
    const { sessionStore } = await opened(storageOf(kept));
    expect(sessionStore.getState()).toMatchObject({ system: 'si', theme: 'system' });
  });

  it('works where the browser keeps nothing', async () => {
    const { sessionStore, setSession } = await opened(undefined);
    setSession({ system: 'us' });
    expect(sessionStore.getState().system).toBe('us');
  });

  it('tells of the cursor only when it moves', async () => {
    const { sessionStore, setTime } = await opened(undefined);
    let told = 0;
    sessionStore.subscribe(() => {
      told += 1;
    });
    setTime(1);
    setTime(1);
    expect(told).toBe(1);
  });
});
