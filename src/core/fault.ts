/**
 * A fault in something the user gave us: one clear line with place and mend. Faults come back as a full list, never one
 * at a time, and never as an exception (a caller's mistake throws instead).
 */
export interface Fault {
  /** Stable name of the kind of fault, e.g. `not-positive`, `unknown-key`, `not-available-yet`. */
  readonly code: string;
  /** Where it stands, e.g. `frame.storeys[2].mass`, or `line 418, value 3` in a record. */
  readonly where: string;
  /** What is wrong, in one sentence without the place. */
  readonly message: string;
  /** What to do about it, in one sentence. */
  readonly mend: string;
  /** Where a number is out of its range: the numbers of the sentence, so that they can be said in other units. */
  readonly range?: Range;
}

export type RangeRule = 'above' | 'at least' | 'below' | 'at most' | 'possible';

/** A number [SI] and what it must be: `above` a bound, or `possible`, which is within what any building has. */
export interface Range {
  readonly value: number;
  readonly rule: RangeRule;
  /** [SI] */
  readonly bound: number;
}

export type Result<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** `frame.storeys[2].mass: is -3, must be above 0. Type a mass in kg above 0.` */
export function faultLine(fault: Fault): string {
  return `${fault.where}: ${fault.message}. ${fault.mend}.`;
}

/** The end of a `switch` over a closed union: does not compile while a case is missing, throws if it is reached. */
export function never(value: never): never {
  throw new TypeError(`unhandled case: ${JSON.stringify(value)}`);
}
