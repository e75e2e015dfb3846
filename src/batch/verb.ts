import { type Fault, faultLine } from '../core/fault.ts';
import type { CommandLine, FlagKind } from './commandLine.ts';

/** 0 done; 1 the input is at fault; 2 the command line is at fault; 3 a limit is exceeded (`check` only). */
export type ExitStatus = 0 | 1 | 2 | 3;

/** How a verb ended: what goes to standard output as JSON (undefined: nothing), and lines for standard error. */
export interface Outcome {
  readonly exit: ExitStatus;
  readonly output?: unknown;
  readonly messages: readonly string[];
}

export interface Verb {
  /** After the verb's name: `RECORD… [--unit g]`. */
  readonly usage: string;
  readonly summary: string;
  readonly flags: Readonly<Record<string, FlagKind>>;
  run(line: CommandLine): Outcome;
}

/** The command line is at fault; main adds the usage. */
export function misused(faults: readonly string[]): Outcome {
  return { exit: 2, messages: faults };
}

/** `records/a.txt: line 418, value 3: …` */
export function faultLines(file: string, faults: readonly Fault[]): string[] {
  return faults.map((fault) => `${file}: ${faultLine(fault)}`);
}
