/** What was computed lately, by the key of what it was computed from: undo and a given-up edit find their runs again. */
export interface Recent<T> {
  has(key: string): boolean;
  get(key: string): T | undefined;
  set(key: string, value: T): void;
}

const MOST = 512;

/** The one used longest ago goes first. */
export function recentRuns<T>(most = MOST): Recent<T> {
  const kept = new Map<string, T>();
  return {
    has: (key) => kept.has(key),
    get(key) {
      const value = kept.get(key);
      if (value !== undefined) {
        kept.delete(key);
        kept.set(key, value);
      }
      return value;
    },
    set(key, value) {
      kept.delete(key);
      kept.set(key, value);
      if (kept.size > most) {
        const [oldest] = kept.keys();
        kept.delete(oldest);
      }
    },
  };
}
