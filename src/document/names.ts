/** A name that is not taken yet: itself, else with " (2)", " (3)" ... behind it. */
export function uniqueName(name: string, taken: ReadonlySet<string>): string {
  if (!taken.has(name)) return name;
  for (let i = 2; ; i++) {
    const numbered = `${name} (${i})`;
    if (!taken.has(numbered)) return numbered;
  }
}
