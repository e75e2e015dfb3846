/** What a verb's flags take: a value after them, or nothing. */
export type FlagKind = 'value' | 'switch';

/** The words after the verb, sorted. */
export interface CommandLine {
  readonly words: readonly string[];
  /** Values by flag name without its dashes; '' for a switch. */
  readonly flags: ReadonlyMap<string, string>;
}

/** Sorts words from flags (`--name value`, `--name=value`, `--name`), with every fault of the line. `--` ends the flags. */
export function readCommandLine(
  args: readonly string[],
  kinds: Readonly<Record<string, FlagKind>>,
): { readonly line: CommandLine; readonly faults: readonly string[] } {
  const words: string[] = [];
  const flags = new Map<string, string>();
  const faults: string[] = [];
  for (let at = 0; at < args.length; at++) {
    if (args[at] === '--') {
      words.push(...args.slice(at + 1));
      break;
    }
    const match = /^--?([a-z][\w-]*)(?:=(.*))?$/is.exec(args[at]);
    if (match === null) {
      words.push(args[at]);
      continue;
    }
    const [, name, inline] = match;
    const kind = Object.hasOwn(kinds, name) ? kinds[name] : null;
    if (kind === null) {
      faults.push(`--${name}: there is no such flag here`);
      continue;
    }
    if (flags.has(name)) faults.push(`--${name}: stands twice`);
    if (kind === 'switch') {
      if (inline !== undefined) faults.push(`--${name}: takes no value`);
      flags.set(name, '');
    } else if (inline !== undefined) {
      flags.set(name, inline);
    } else if (at + 1 < args.length && !args[at + 1].startsWith('--')) {
      at++;
      flags.set(name, args[at]);
    } else {
      faults.push(`--${name}: wants a value`);
      flags.set(name, '');
    }
  }
  return { line: { words, flags }, faults };
}

/** A plain decimal number (a point as its decimal sign), or null. */
export function readNumber(text: string): number | null {
  const value = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(text.trim()) ? Number(text) : Number.NaN;
  return Number.isFinite(value) ? value : null;
}
