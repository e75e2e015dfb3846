/** One waiting task at a time: setting it again starts its time anew. */
export interface Timer {
  set(milliseconds: number, task: () => void): void;
  clear(): void;
  waits(): boolean;
}

export function timer(): Timer {
  let handle: ReturnType<typeof setTimeout> | null = null;
  const clear = () => {
    if (handle !== null) clearTimeout(handle);
    handle = null;
  };
  return {
    set(milliseconds, task) {
      clear();
      handle = setTimeout(() => {
        handle = null;
        task();
      }, milliseconds);
    },
    clear,
    waits: () => handle !== null,
  };
}
