import { afterEach, beforeEach, expect, vi } from 'vitest';

/** A warning or an error on the console fails the test that caused it, unless the test's name begins with "warns". */
const said: string[] = [];

beforeEach(() => {
  said.length = 0;
  for (const level of ['warn', 'error'] as const) {
    vi.spyOn(console, level).mockImplementation((...parts) => {
      said.push(parts.map(String).join(' '));
    });
  }
});

afterEach(({ task }) => {
  if (!task.name.startsWith('warns')) expect(said, 'printed on the console').toEqual([]);
});
