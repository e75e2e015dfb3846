import type { AccelerationUnit } from './motion.ts';
import type { RecordFact } from './reading.ts';

/** What the heading of a record says in words, each with the place where it says it. */
export interface Heading {
  readonly interval: number | null;
  readonly unit: AccelerationUnit | null;
  readonly count: number | null;
  readonly event: string | null;
  readonly station: string | null;
  readonly component: string | null;
  /** First heading line with words in it, tidied: a name for the record. */
  readonly title: string | null;
  readonly facts: readonly RecordFact[];
}

const FIGURE = '([+-]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eEdD][+-]?\\d+)?)';

/** Spellings of the interval; the last group is the figure, a named unit may be ms, or Hz for a rate. */
const INTERVALS: readonly (readonly [RegExp, 'seconds' | 'milliseconds' | 'hertz'])[] = [
  [
    new RegExp(
      `\\b(?:DT|delta\\s*t|time\\s*step|time\\s*interval|sampling\\s*(?:interval|period|time)|interval|spacing(?:\\s*of)?|step)\\s*(?:is|of|=|:)?\\s*${FIGURE}\\s*(?:ms|msec|millisec\\w*)\\b`,
      'i',
    ),
    'milliseconds',
  ],
  [
    new RegExp(
      `\\b(?:sampling\\s*(?:rate|frequency)|sample\\s*rate|samples\\s*per\\s*second|SPS)\\s*(?:\\(?\\s*hz\\s*\\)?)?\\s*(?:is|of|=|:)?\\s*${FIGURE}`,
      'i',
    ),
    'hertz',
  ],
  [new RegExp(`${FIGURE}\\s*(?:samples\\s*(?:per|/)\\s*s(?:ec(?:ond)?)?|SPS)\\b`, 'i'), 'hertz'],
  [
    new RegExp(
      `\\b(?:DT|delta\\s*t|time\\s*step|time\\s*interval|sampling\\s*(?:interval|period|time)|interval|spacing(?:\\s*of)?|step)\\s*(?:\\(\\s*s(?:ec)?\\s*\\))?\\s*(?:is|of|=|:)?\\s*${FIGURE}`,
      'i',
    ),
    'seconds',
  ],
  [new RegExp(`^\\s*\\d+\\s+${FIGURE}\\s+NPTS\\s*,?\\s*DT\\b`, 'i'), 'seconds'],
  [new RegExp(`\\b(?:at|every)\\s*${FIGURE}\\s*(?:s|sec|seconds?)\\b`, 'i'), 'seconds'],
];

const COUNTS: readonly RegExp[] = [
  /\bNPTS?\s*(?:=|:)\s*(\d+)/i,
  /^\s*(\d+)\s+[\d.eEdD+-]+\s+NPTS\b/i,
  /\b(?:number\s+of\s+(?:points|samples|values|data)|no\.?\s+of\s+(?:points|samples|values)|values|samples|points|count)\s*(?:is|=|:)?\s*(\d{2,})\b/i,
  /\b(\d{2,})\s*(?:points|samples|values|data\s+points|acceleration\s+(?:values|points))\b/i,
];

/** Spellings of a unit, longest first; `g` alone only where the line speaks of units or acceleration. */
const UNITS: readonly (readonly [RegExp, AccelerationUnit])[] = [
  [/\bmm\s*\/\s*(?:s(?:ec)?\s*(?:\^|\*\*)?\s*2|s²|s(?:ec)?\s*\/\s*s(?:ec)?)/i, 'mm/s2'],
  [/\bcm\s*\/\s*(?:s(?:ec)?\s*(?:\^|\*\*)?\s*2|s²|s(?:ec)?\s*\/\s*s(?:ec)?)/i, 'cm/s2'],
  [/\bm\s*\/\s*(?:s(?:ec)?\s*(?:\^|\*\*)?\s*2|s²|s(?:ec)?\s*\/\s*s(?:ec)?)/i, 'm/s2'],
  [/\bgals?\b/i, 'cm/s2'],
  [
    /(?:\bunits?\b|\bacc(?:el(?:eration)?)?\b|\bin\b)[^A-Za-z]{0,12}(?:of\s+|are\s+|is\s+|in\s+)*[("[]?\s*g['s]*\s*[)"\],.;]?(?:\s|$)/i,
    'g',
  ],
  [/[([]\s*g\s*[)\]]/i, 'g'],
];

const LABELS: readonly (readonly [RegExp, 'event' | 'station' | 'component'])[] = [
  [/\b(?:event|earthquake)\s*(?:name)?\s*[:=]\s*(.{2,60}?)\s*$/i, 'event'],
  [/\b(?:station|site)\s*(?:name)?\s*[:=]\s*(.{2,60}?)\s*$/i, 'station'],
  [/\b(?:component|comp|azimuth|direction)\s*[:=]?\s*([A-Za-z0-9][\w -]{0,20}?)\s*(?:,|;|$)/i, 'component'],
];

/** Reads the heading lines; the first that says a thing counts. */
export function headingOf(lines: readonly { readonly line: number; readonly text: string }[]): Heading {
  const facts: RecordFact[] = [];
  let [interval, unit, count, title]: [number | null, AccelerationUnit | null, number | null, string | null] = [
    null,
    null,
    null,
    null,
  ];
  const labels: Record<'event' | 'station' | 'component', string | null> = {
    event: null,
    station: null,
    component: null,
  };
  const note = (what: RecordFact['what'], value: string, line: number, match: RegExpExecArray) =>
    facts.push({ what, value, line, span: [match.index, match.index + match[0].length] });
  for (const { line, text: whole } of lines) {
    const text = whole.slice(0, 400);
    if (title === null && /[A-Za-z]{3}/.test(text))
      title =
        text
          .replace(/^[\s#%!/*-]+/, '')
          .replace(/\s+/g, ' ')
          .trim()
          .slice(0, 60) || null;
    if (interval === null) {
      for (const [pattern, kind] of INTERVALS) {
        const match = pattern.exec(text);
        const figure = match ? Number(match[1].replace(/[dD]/, 'e')) : Number.NaN;
        if (!match || !Number.isFinite(figure)) continue;
        interval = kind === 'hertz' ? 1 / figure : kind === 'milliseconds' ? figure / 1000 : figure;
        note('interval', `${Number(interval.toPrecision(12))} s`, line, match);
        break;
      }
    }
    if (count === null) {
      for (const pattern of COUNTS) {
        const match = pattern.exec(text);
        if (!match) continue;
        count = Number(match[1]);
        note('count', match[1], line, match);
        break;
      }
    }
    if (unit === null) {
      for (const [pattern, named] of UNITS) {
        const match = pattern.exec(text);
        if (!match) continue;
        unit = named;
        note('unit', named, line, match);
        break;
      }
    }
    for (const [pattern, label] of LABELS) {
      if (labels[label] !== null) continue;
      const match = pattern.exec(text);
      if (!match) continue;
      labels[label] = match[1].trim();
      note(label, match[1].trim(), line, match);
    }
  }
  return { interval, unit, count, ...labels, title, facts };
}
