import type * as z from 'zod/mini';
import type { Fault, RangeRule } from '../core/fault.ts';
import { typeWords } from './faultWords.ts';

/** All that a schema found wrong, as faults with place and mend. `from` is the object that was checked, `at` where it stands. */
export function faultsOf(error: z.core.$ZodError, from: unknown, at = ''): Fault[] {
  return error.issues.flatMap((issue) => faultsOfIssue(issue, from, at));
}

type Issue = z.core.$ZodIssue;

function faultsOfIssue(issue: Issue, from: unknown, at: string): Fault[] {
  const where = placeOf(issue.path, at);
  const value = valueAt(from, issue.path);
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      code: 'unknown-key',
      where: where === '' ? key : `${where}.${key}`,
      message: `${key} is no key known here`,
      mend: 'Take it out, or check its spelling',
    }));
  }
  if (value === undefined) return [fault('missing', where, 'is missing', `Add ${wanted(issue)}`)];
  if (issue.code === 'invalid_type' && (issue.expected === 'number' || issue.expected === 'int')) {
    if (value === null) return [fault('not-typed', where, 'is not typed yet', `Type ${wanted(issue)}`)];
    if (typeof value === 'string')
      return [fault('unreadable', where, `${shown(value)} is no number that can stand here`, `Type ${wanted(issue)}`)];
  }
  switch (issue.code) {
    case 'invalid_type':
      return [fault('wrong-kind', where, `is ${shown(value)}, must be ${wanted(issue)}`, `Put ${wanted(issue)} there`)];
    case 'too_small':
    case 'too_big':
      return [outOfRange(issue, where, value)];
    case 'invalid_union':
      return [
        fault(
          'unknown-kind',
          where,
          `is ${shown(value)}, which is none of the kinds there are`,
          `Take ${wanted(issue)}`,
        ),
      ];
    case 'invalid_value':
      return [fault('unknown-value', where, `is ${shown(value)}, must be ${wanted(issue)}`, `Take ${wanted(issue)}`)];
    default:
      return [fault('not-allowed', where, issue.message, 'Type another number')];
  }
}

function outOfRange(issue: Extract<Issue, { code: 'too_small' | 'too_big' }>, where: string, value: unknown): Fault {
  const [bound, side, open]: [number, Exclude<RangeRule, 'possible'>, boolean] =
    issue.code === 'too_small'
      ? [Number(issue.minimum), issue.inclusive ? 'at least' : 'above', !issue.inclusive]
      : [Number(issue.maximum), issue.inclusive ? 'at most' : 'below', !issue.inclusive];
  if (issue.origin === 'array' || issue.origin === 'string') {
    if (where === 'frame.storeys' && bound === 1) {
      return fault('no-storey', where, 'there is no storey yet', 'Type the first storey');
    }
    if (issue.origin === 'string') return fault('wrong-count', where, 'is empty', 'Type a name');
    const what = where === 'frame.storeys' ? 'storeys' : 'entries';
    const count = (value as { length: number }).length;
    const mend = `Make it ${side} ${bound} ${what}`;
    return fault('wrong-count', where, `has ${count} ${what}, must have ${side} ${bound}`, mend);
  }
  const code = bound === 0 && open ? 'not-positive' : 'out-of-range';
  const words = fault(
    code,
    where,
    `is ${shown(value)}, must be ${side} ${short(bound)}`,
    typeWords(side, short(bound)),
  );
  return typeof value === 'number' ? { ...words, range: { value, rule: side, bound } } : words;
}

function wanted(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return kindWord(issue.expected);
    case 'invalid_value':
      return issue.values.map((value) => JSON.stringify(value)).join(' or ');
    case 'invalid_union':
      return (
        KINDS[String(issue.path.at(-1))] ?? KINDS[String(issue.path.at(-2))] ?? 'one of the kinds of the project file'
      );
    default:
      return 'a value';
  }
}

/** The kinds of each tagged object, by its key. */
const KINDS: Readonly<Record<string, string>> = {
  law: '"elastic", "bilinear", "peak-oriented", "bouc-wen" or "flag"',
  damping: '"none", "rayleigh", "modal" or "stiffness-proportional"',
  method: '"newmark", "generalized-alpha", "hht" or "central-difference"',
};

function kindWord(expected: string): string {
  const words: Readonly<Record<string, string>> = {
    number: 'a finite number',
    int: 'a whole number',
    string: 'a text',
    boolean: 'true or false',
    array: 'a list',
    tuple: 'a list of two',
    object: 'an object',
  };
  return words[expected] ?? expected;
}

function fault(code: string, where: string, message: string, mend: string): Fault {
  return { code, where: where === '' ? 'file' : where, message, mend };
}

function placeOf(path: readonly PropertyKey[], at: string): string {
  let place = at;
  for (const key of path) {
    if (typeof key === 'number') place += `[${key}]`;
    else place += place === '' ? String(key) : `.${String(key)}`;
  }
  return place;
}

function valueAt(from: unknown, path: readonly PropertyKey[]): unknown {
  let node = from;
  for (const key of path) {
    if (typeof node !== 'object' || node === null) return undefined;
    node = (node as Record<PropertyKey, unknown>)[key];
  }
  return node;
}

function shown(value: unknown): string {
  if (typeof value === 'number') return short(value);
  if (Array.isArray(value)) return 'a list';
  if (typeof value === 'object' && value !== null) return 'an object';
  const text = JSON.stringify(value) ?? String(value);
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
}

function short(value: number): string {
  return String(Number(value.toPrecision(6)));
}
