import { spectrumOf } from '../core/doors.ts';
import { readNumber } from './commandLine.ts';
import { answersOf, RECORD_FLAGS, recordAt } from './record.ts';
import { faultLines, misused, type Verb } from './verb.ts';

/** The response spectrum of one record at the periods asked for, SI. */
export const spectrum: Verb = {
  usage: 'RECORD --damping 0.05 --periods 0.1,0.5,1 [--unit g] [--interval 0.01]',
  summary: 'response spectrum of a record',
  flags: { damping: 'value', periods: 'value', ...RECORD_FLAGS },
  run(line) {
    const { answers, faults: answerFaults } = answersOf(line);
    const faults = [...answerFaults];
    if (line.words.length !== 1) faults.push(`spectrum: takes one RECORD, ${line.words.length} are named`);
    const damping = readNumber(line.flags.get('damping') ?? '');
    if (damping === null || !(damping >= 0 && damping < 1)) {
      faults.push('--damping: wants a ratio of critical from 0 to below 1, such as 0.05');
    }
    const periods = (line.flags.get('periods') ?? '').split(',').map(readNumber);
    if (!periods.every((period) => period !== null && period > 0)) {
      faults.push('--periods: wants periods in seconds above 0 with commas between them, such as 0.1,0.5,1');
    }
    if (faults.length > 0 || damping === null) return misused(faults);
    const [file] = line.words;
    const record = recordAt(file, answers);
    if (!record.ok) return { exit: 1, messages: faultLines(file, record.faults) };
    const answer = spectrumOf(record.value.motion, damping, Float64Array.from(periods, Number));
    return {
      exit: 0,
      output: {
        periods: [...answer.periods],
        displacement: [...answer.displacement],
        pseudoVelocity: [...answer.pseudoVelocity],
        pseudoAcceleration: [...answer.pseudoAcceleration],
      },
      messages: record.value.warnings.length > 0 ? faultLines(file, record.value.warnings) : [],
    };
  },
};
