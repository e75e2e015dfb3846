import type { Fault } from '../fault.ts';
import type { Heading } from './heading.ts';
import { LEAVE_OUT, type Series } from './layouts/layout.ts';
import { ACCELERATION_UNITS, type AccelerationUnit, type Mend } from './motion.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';

/** A value that the file says or the user answered. */
export interface SettledValue<T> {
  readonly value: T | null;
  readonly from: 'file' | 'answer';
  readonly faults: readonly RecordFault[];
  readonly warnings: readonly Fault[];
  readonly mends: readonly Mend[];
}

/** Share by which an answered interval may differ from the file's: it is typed with fewer figures. Own figure. */
const SAME = 1e-6;

/** The interval [s] of the file, or the answer where the file has none; an answer that contradicts the file is a fault. */
export function settledInterval(
  { interval: said }: Series,
  heading: Heading,
  answers: RecordAnswers,
): SettledValue<number> {
  const none = { faults: [], warnings: [], mends: [] };
  const answered = answers.interval;
  if (answered !== undefined && !positive(answered)) {
    const fault = notPositive('interval', null, answered, []);
    return { ...none, value: null, from: 'answer', faults: [fault] };
  }
  if (said === null) {
    const warnings = disputed(heading, 'interval');
    return { ...none, value: answered ?? null, from: 'answer', warnings };
  }
  const { value, line, span } = said;
  if (!positive(value)) {
    const typed = answered ?? answers.mends?.interval?.value;
    if (typed !== undefined && positive(typed)) {
      const mend = { line, was: `${value} s`, is: `${typed} s`, why: 'the interval was typed in its place' };
      return { ...none, value: typed, from: 'answer', mends: [mend] };
    }
    const choices = [{ id: 'typed', label: 'Type the interval', asksValue: true, valueUnit: 's' as const }];
    return { ...none, value: null, from: 'file', faults: [notPositive(`line ${line}`, line, value, choices, span)] };
  }
  if (answered === undefined || Math.abs(answered - value) <= SAME * value) return { ...none, value, from: 'file' };
  return against('interval', { value, text: `${value} s`, line }, { value: answered, text: `${answered} s` }, answers);
}

/** The unit of the file, or the answer where the file has none; an answer that contradicts the file is a fault. */
export function settledUnit(
  { unit: said }: Series,
  heading: Heading,
  answers: RecordAnswers,
): SettledValue<AccelerationUnit> {
  const none = { faults: [], warnings: [], mends: [] };
  const answered = answers.unit ?? null;
  if (said === null) return { ...none, value: answered, from: 'answer', warnings: disputed(heading, 'unit') };
  const { value, written, line, span } = said;
  if (value === 'unknown') {
    if (answers.mends?.unit?.choice === 'answer') {
      if (answered === null) return { ...none, value: null, from: 'answer' };
      const mend = { line, was: written, is: answered, why: 'the unit was answered against the heading' };
      return { ...none, value: answered, from: 'answer', mends: [mend] };
    }
    const fault: RecordFault = {
      id: 'unit',
      code: 'unknown-unit',
      where: `line ${line}`,
      line,
      span,
      message: `names the unit ${written}; values are read in ${ACCELERATION_UNITS.join(', ')}`,
      mend: 'Convert the values, or name their unit',
      choices: [
        LEAVE_OUT,
        { id: 'answer', label: 'Name the unit of the values', detail: 'The heading is passed over.' },
      ],
    };
    return { ...none, value: null, from: 'file', faults: [fault] };
  }
  if (answered === null || answered === value) return { ...none, value, from: 'file' };
  return against('unit', { value, text: value, line }, { value: answered, text: answered }, answers);
}

function positive(value: number): boolean {
  return value > 0 && Number.isFinite(value);
}

function notPositive(
  where: string,
  line: number | null,
  value: number,
  choices: RecordFault['choices'],
  span?: readonly [number, number],
): RecordFault {
  return {
    id: 'interval',
    code: 'not-positive',
    where,
    line,
    ...(span ? { span } : {}),
    message: `the interval is ${value} s, must be above 0`,
    mend: 'Give the interval in seconds',
    choices: [...choices, LEAVE_OUT],
  };
}

/** An answer against what the file says is a fault, until the user says in so many words which of the two counts. */
function against<T>(
  what: 'interval' | 'unit',
  said: { readonly value: T; readonly text: string; readonly line: number },
  answered: { readonly value: T; readonly text: string },
  { mends }: RecordAnswers,
): SettledValue<T> {
  const none = { faults: [], warnings: [], mends: [] };
  const { line } = said;
  const id = `contradicts-${what}`;
  switch (mends?.[id]?.choice) {
    case 'file':
      return { ...none, value: said.value, from: 'file' };
    case 'answer': {
      const why = `the ${what} was answered against the file`;
      return {
        ...none,
        value: answered.value,
        from: 'answer',
        mends: [{ line, was: said.text, is: answered.text, why }],
      };
    }
    default: {
      const fault: RecordFault = {
        id,
        code: id,
        where: what,
        line,
        message: `line ${line} says ${said.text}, the answer is ${answered.text}`,
        mend: `Leave the ${what} to the file`,
        choices: [
          { id: 'file', label: `Take ${said.text}, as the file says` },
          { id: 'answer', label: `Take ${answered.text}, as answered`, detail: 'What the file says is passed over.' },
          LEAVE_OUT,
        ],
      };
      return { ...none, value: said.value, from: 'file', faults: [fault] };
    }
  }
}

function disputed(heading: Heading, what: 'interval' | 'unit'): Fault[] {
  return heading.disputed
    .filter((entry) => entry.what === what)
    .map(({ lines }) => ({
      code: `disputed-${what}`,
      where: lines.length === 1 ? `line ${lines[0]}` : `lines ${lines.join(' and ')}`,
      message: `name more than one ${what}`,
      mend: `Choose the ${what} of the values`,
    }));
}
