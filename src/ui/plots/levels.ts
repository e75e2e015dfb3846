/** Levels of the ground and of each floor [m] from the heights of the storeys; null where one is not typed. */
export function levelsOf(heights: readonly unknown[]): readonly number[] | null {
  const levels = [0];
  for (const height of heights) {
    if (typeof height !== 'number' || !(height > 0)) return null;
    levels.push(levels[levels.length - 1] + height);
  }
  return levels;
}
