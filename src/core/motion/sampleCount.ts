import type { Fault } from '../fault.ts';
import { LEAVE_OUT, type Series } from './layouts/layout.ts';
import type { Mend } from './motion.ts';
import type { RecordAnswers, RecordFault } from './reading.ts';

export interface Counted {
  readonly values: Float64Array;
  readonly faults: readonly RecordFault[];
  readonly warnings: readonly Fault[];
  readonly mends: readonly Mend[];
}

/**
 * The count that a heading states against the values there are: fewer is a fault, a row more or less than that beyond it is
 * said and taken, many more is a fault (another component may follow).
 *
 * @param perLine  values of a row
 */
export function countedValues({ count, values }: Series, perLine: number, answers: RecordAnswers): Counted {
  const found = values.length;
  if (count === null || count.value === found || found === 0) return { values, faults: [], warnings: [], mends: [] };
  const { value: stated, line } = count;
  const taken = answers.mends?.count?.choice;
  const was = `${stated} values stated`;
  const says = `the heading says ${stated} values (line ${line}), the file holds ${found}`;
  const all = { line, was, is: `${found} values`, why: 'all that the file holds was taken' };
  if (found > stated && (found - stated <= Math.max(perLine, 8) || taken === 'take')) {
    const mend = 'Look at the end of the record';
    const warning = { code: 'more-than-stated', where: 'count', message: `${says}: all ${found} are taken`, mend };
    return { values, faults: [], warnings: [warning], mends: taken === 'take' ? [all] : [] };
  }
  if (found > stated && taken === 'stated' && stated >= 2) {
    const mend = {
      line,
      was: `${found} values in the file`,
      is: `the first ${stated}`,
      why: 'as many as the heading states',
    };
    return { values: values.slice(0, stated), faults: [], warnings: [], mends: [mend] };
  }
  if (taken === 'take') return { values, faults: [], warnings: [], mends: [all] };
  const take = { id: 'take', label: `Take the ${found} values that are there` };
  const first = { id: 'stated', label: `Take the first ${stated} values, as the heading says` };
  const fewer = found < stated;
  const fault: RecordFault = {
    id: 'count',
    code: fewer ? 'fewer-than-stated' : 'more-than-stated',
    where: 'count',
    line,
    span: count.span,
    message: fewer ? `${says}: it may be cut off` : `${says}: another record may follow the first`,
    mend: fewer ? 'Get the whole file, or take what is there' : 'Choose how many belong to the record',
    choices: fewer ? [take, LEAVE_OUT] : [...(stated >= 2 ? [first] : []), take, LEAVE_OUT],
  };
  return { values, faults: [fault], warnings: [], mends: [] };
}
