import { LEAVE_OUT } from './layouts/layout.ts';
import type { RecordFault, RecordReading } from './reading.ts';

const WHY = {
  empty: 'is empty',
  binary: 'is no plain text',
  'no-figures': 'holds no line of figures',
} as const;

/** The reading of a file that holds no record. */
export function nothingRead(file: string, name: string, code: keyof typeof WHY): RecordReading {
  return {
    file,
    layout: 'values',
    name,
    interval: null,
    unit: null,
    statedCount: null,
    values: new Float64Array(),
    firstLine: 1,
    perLine: 0,
    facts: [],
    warnings: [],
    faults: [fault(code, 'file', WHY[code], 'Choose a plain text file with acceleration values')],
    asks: [],
    mends: [],
    motion: null,
  };
}

export function tooFew(count: number): RecordFault {
  const holds = count === 1 ? 'holds 1 value' : `holds ${count} values`;
  return fault('too-few', 'file', `${holds}, a motion has at least 2`, 'Choose another file');
}

function fault(code: string, where: string, message: string, mend: string): RecordFault {
  return { id: code, code, where, line: null, message, mend, choices: [LEAVE_OUT] };
}
