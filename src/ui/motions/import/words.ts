import type { LayoutId, RecordFact, RecordFault } from '../../../core/motion/reading.ts';
import { printQuantity } from '../../../core/units/quantities.ts';
import { type ImportFile, isReady } from '../../../state/importQueue.ts';

/** How far a file is on its way in. */
export type Standing = 'reading' | 'ready' | 'look' | 'asks' | 'stopped' | 'failed' | 'left-out';

export function standingOf(file: ImportFile): Standing {
  if (file.leftOut) return 'left-out';
  if (file.status === 'failed') return 'failed';
  if (file.answer === null) return 'reading';
  const { faults, asks, warnings } = file.answer.reading;
  if (faults.length > 0) return 'stopped';
  if (asks.length > 0) return 'asks';
  return warnings.length > 0 ? 'look' : 'ready';
}

export function count(value: number, one: string, many = `${one}s`): string {
  return `${printQuantity(value, 'count', 'si')} ${value === 1 ? one : many}`;
}

/** "A", "A and B", "A, B and C". */
export function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

/** What stands under a file's name in the list. */
export function shortWords(file: ImportFile): string {
  switch (standingOf(file)) {
    case 'left-out':
      return 'left out';
    case 'failed':
      return 'could not be read';
    case 'reading':
      return 'reading';
    case 'stopped': {
      const line = file.answer?.reading.faults[0].line ?? null;
      return line === null ? 'stopped' : `stopped at line ${line}`;
    }
    case 'asks':
      return `asks for its ${listed(file.answer?.reading.asks ?? [])}`;
    default:
      return samplesWords(file);
  }
}

function samplesWords({ answer }: ImportFile): string {
  const motion = answer?.reading.motion;
  if (!motion) return '';
  const { length } = motion.acceleration;
  return `${count(length, 'sample')}, ${seconds((length - 1) * motion.interval)}`;
}

export function seconds(time: number): string {
  return `${printQuantity(time, 'time', 'si')} s`;
}

/** One or two sentences over the whole list. */
export function summaryOf(files: readonly ImportFile[]): string {
  if (files.length === 0) return 'Plain text: one value a line, rows of values, or time and value in columns.';
  const standings = files.map(standingOf);
  const many = (standing: Standing) => standings.filter((entry) => entry === standing).length;
  if (many('reading') > 0) return `Reading ${count(many('reading'), 'file')}.`;
  const ready = files.filter(isReady).length;
  const open = files.find((_, i) => ['stopped', 'asks', 'failed'].includes(standings[i]));
  if (open !== undefined) {
    const before = `${ready} of ${count(files.length, 'file')} ${ready === 1 ? 'is' : 'are'} ready. `;
    return `${files.length > 1 ? before : ''}${open.file} ${openWords(open)}; nothing of it has been added.`;
  }
  const look = many('look');
  if (look === 0) return `${count(files.length, 'file')} read.`;
  const subject = files.length === 1 ? 'It' : look === 1 ? 'One' : String(look);
  return `${count(files.length, 'file')} read. ${subject} ${look === 1 ? 'has' : 'have'} something to look at before ${look === 1 ? 'it goes' : 'they go'} in.`;
}

function openWords(file: ImportFile): string {
  const words = shortWords(file);
  return standingOf(file) === 'stopped' && words === 'stopped' ? 'was not read to its end' : words;
}

export const LAYOUT_NAMES: Readonly<Record<LayoutId, string>> = {
  'count-and-interval': 'Heading, then rows of values',
  'time-and-acceleration': 'Time and acceleration in columns',
  values: 'Values only',
};

/** "line 3", "the file name"; where a fact was found. */
export function placeOf(fact: RecordFact | undefined): string | null {
  return fact === undefined || fact.line === null ? null : `line ${fact.line}`;
}

/** "Line 418, value 3" or "Count". */
export function placeWords({ where }: Pick<RecordFault, 'where'>): string {
  return where.charAt(0).toUpperCase() + where.slice(1);
}

/** A number's hyphen as the minus that the screen uses. */
export function realMinus(words: string): string {
  return words.replace(/(^|[\s(])-(?=[\d.])/g, '$1\u2212');
}

/** A sentence of words that may have ended without a full stop. */
export function sentence(words: string): string {
  const text = words.charAt(0).toUpperCase() + words.slice(1);
  return /[.?!]$/.test(text) ? text : `${text}.`;
}
