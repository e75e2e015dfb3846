/** The letter a motion goes by on the screen: A for the first in the document, Z, then AA. */
export function letterOf(index: number): string {
  const rest = index % 26;
  const before = Math.floor(index / 26);
  return (before > 0 ? letterOf(before - 1) : '') + String.fromCharCode(65 + rest);
}
