import type { RecordFact } from './reading.ts';
import type { HeadingLine } from './table.ts';
import { type UnitFound, unitsIn } from './unitWords.ts';

/** One thing that heading lines say, and where. */
export interface Said<T> {
  readonly value: T;
  readonly line: number;
  readonly span: readonly [number, number];
}

/** What the heading of a record says in words. Null: nothing, or two different things with the same weight. */
export interface Heading {
  /** [s] */
  readonly interval: Said<number> | null;
  readonly count: Said<number> | null;
  readonly unit: UnitFound | null;
  /** Things that are said twice and not alike: left to the user. */
  readonly disputed: readonly { readonly what: 'interval' | 'unit'; readonly lines: readonly number[] }[];
  /** First mention of a factor on the values. */
  readonly factor: Said<string> | null;
  readonly event: Said<string> | null;
  readonly station: Said<string> | null;
  readonly component: Said<string> | null;
}

const NUMBER = '([+-]?(?:\\d+\\.?\\d*|\\.\\d+)(?:[eEdD][+-]?\\d{1,3})?)';
const INTERVAL_NAME =
  '(?:d\\s?t|\\u0394t|delta[\\s-]?t|time[\\s-]*(?:step|interval|increment|spacing)|sampl(?:e|ing)[\\s-]*(?:interval|period|time|step)|interval|spacing)s?';
const BRACKETS = '(?:\\s*[([]\\s*(s|sec|secs|seconds?|ms|msec|hz)\\.?\\s*[)\\]])?';
const IS = '\\s*(?:is|of|are|=|:)?\\s*';
const TIME_UNIT = '\\s*(ms|msecs?|milliseconds?|s|secs?|seconds?|hz)?\\b';
const RATE_NAME = '(?:sampl(?:e|ing)[\\s-]*(?:rate|freq(?:uency)?\\.?)|samples\\s*(?:per|/)\\s*s(?:ec(?:ond)?)?)';

/** A spelling of the interval: its first group is the figure unless it says otherwise; the weightier spelling counts. */
const INTERVALS: readonly { readonly pattern: RegExp; readonly rate: boolean; readonly weight: number }[] = [
  {
    pattern: new RegExp(`(?<![a-z])${INTERVAL_NAME}${BRACKETS}${IS}${NUMBER}${TIME_UNIT}`, 'gi'),
    rate: false,
    weight: 3,
  },
  { pattern: new RegExp(`^\\s*\\d+()\\s+${NUMBER}()\\s+NPTS\\s*,?\\s*DT\\b`, 'gi'), rate: false, weight: 3 },
  { pattern: new RegExp(`(?<![a-z])${RATE_NAME}${BRACKETS}${IS}${NUMBER}${TIME_UNIT}`, 'gi'), rate: true, weight: 2 },
  {
    pattern: new RegExp(`()${NUMBER}\\s*(?:samples\\s*(?:per|/)\\s*s(?:ec(?:ond)?)?|sps)()\\b`, 'gi'),
    rate: true,
    weight: 2,
  },
  {
    pattern: new RegExp(`\\b(?:at|every)()\\s+${NUMBER}\\s*(ms|msec|s|secs?|seconds?)\\b`, 'gi'),
    rate: false,
    weight: 1,
  },
];

const WHOLE = '(\\d{1,3}(?:[ ,]\\d{3})+|\\d{1,9})';
const COUNTED = '(?:data\\s+)?(?:points|samples|values|data|pts|readings|accelerations?\\s+(?:points|values))';
const COUNTS: readonly RegExp[] = [
  new RegExp(`\\bNPTS?\\s*(?:=|:)?\\s*${WHOLE}(?![\\d.])`, 'i'),
  /^\s*(\d{1,9})\s+[\d.eEdD+-]+\s+NPTS\b/i,
  new RegExp(`\\b(?:number|no\\.?|nr\\.?)\\s*of\\s*${COUNTED}\\s*(?:is|=|:)?\\s*${WHOLE}(?![\\d.])`, 'i'),
  new RegExp(`\\b(?:values|samples|points|count)\\s*(?:is|are|=|:)?\\s*${WHOLE}(?![\\d.])`, 'i'),
  new RegExp(`(?<![\\d.,])${WHOLE}\\s*${COUNTED}\\b(?!\\s*(?:per|a|in|across|each|/)(?![a-z]))`, 'i'),
];

const LABELS: readonly (readonly ['event' | 'station' | 'component', RegExp])[] = [
  ['event', /\b(?:event|earthquake)(?:\s+name)?\s*[:=]\s*(\S.{0,59})/i],
  ['station', /\b(?:station|site)(?:\s+name)?\s*[:=]\s*(\S.{0,59})/i],
  [
    'component',
    /\b(?:component|comp\.?|azimuth|direction)\s*(?:[:=]\s*|\s)(\d{1,3}(?:\s*deg\w*)?|[NSEWUDVHLTXYZ]{1,3}\d{0,3}[EW]?|up|down|vertical|north|south|east|west)\b/i,
  ],
];

const FACTOR = /\b(?:scale\s*factor|scaling\s*factor|multipl(?:y|ied|ier)\b|conversion\s*factor)[^\n]{0,40}/i;

/** Reads the heading lines of a record. */
export function headingOf(lines: readonly HeadingLine[]): Heading {
  const intervals = lines.flatMap(({ line, text }) => intervalsIn(text, line));
  const units = lines.flatMap(({ line, text }) => unitsIn(text, line));
  const interval = weightiest(intervals, (a, b) => Math.abs(a - b) <= 1e-6 * Math.abs(a));
  const unit = weightiest(units, (a, b) => a === b);
  const disputed: Heading['disputed'][number][] = [];
  if (interval.disputed.length > 0) disputed.push({ what: 'interval', lines: interval.disputed });
  if (unit.disputed.length > 0) disputed.push({ what: 'unit', lines: unit.disputed });
  return {
    interval: interval.chosen,
    unit: unit.chosen,
    disputed,
    count: firstOf(lines, COUNTS, (text) => Number(text.replace(/[ ,]/g, ''))),
    factor: firstOf(lines, [FACTOR], (text) => text.trim()),
    ...labelsOf(lines),
  };
}

/** What was found, as facts for the dialog. */
export function headingFacts({ interval, count, unit, event, station, component }: Heading): RecordFact[] {
  const facts: RecordFact[] = [];
  const note = (what: RecordFact['what'], said: Said<unknown> | null, value: string) => {
    if (said !== null) facts.push({ what, value, line: said.line, span: said.span });
  };
  note('interval', interval, `${Number((interval?.value ?? 0).toPrecision(12))} s`);
  note('count', count, String(count?.value));
  note('unit', unit, unit?.value ?? '');
  note('event', event, event?.value ?? '');
  note('station', station, station?.value ?? '');
  note('component', component, component?.value ?? '');
  return facts;
}

interface Weighed<T> extends Said<T> {
  readonly weight: number;
}

/** The weightiest thing said; none, and the lines, where the weightiest are not alike. */
function weightiest<S extends Weighed<unknown>>(
  all: readonly S[],
  alike: (a: S['value'], b: S['value']) => boolean,
): { readonly chosen: S | null; readonly disputed: readonly number[] } {
  const most = Math.max(0, ...all.map(({ weight }) => weight));
  const best = all.filter(({ weight }) => weight === most);
  const other = best.find(({ value }) => !alike(best[0].value, value));
  if (other) return { chosen: null, disputed: [...new Set([best[0].line, other.line])] };
  return { chosen: best[0] ?? null, disputed: [] };
}

function intervalsIn(text: string, line: number): Weighed<number>[] {
  const found: Weighed<number>[] = [];
  for (const { pattern, rate, weight } of INTERVALS) {
    for (const match of text.matchAll(pattern)) {
      const figure = Number(match[2].replace(/d/i, 'e'));
      const named = (match[3] || match[1] || '').toLowerCase();
      const hertz = rate ? !named.startsWith('s') && !named.startsWith('ms') : named === 'hz';
      const seconds = hertz ? 1 / figure : named.startsWith('m') ? figure / 1000 : figure;
      found.push({ value: seconds, line, span: [match.index, match.index + match[0].trimEnd().length], weight });
    }
  }
  return found;
}

function firstOf<T>(
  lines: readonly HeadingLine[],
  patterns: readonly RegExp[],
  read: (text: string) => T,
): Said<T> | null {
  for (const pattern of patterns) {
    for (const { line, text } of lines) {
      const match = pattern.exec(text);
      if (match) return { value: read(match[1] ?? match[0]), line, span: [match.index, match.index + match[0].length] };
    }
  }
  return null;
}

function labelsOf(lines: readonly HeadingLine[]): Pick<Heading, 'event' | 'station' | 'component'> {
  const found: Record<'event' | 'station' | 'component', Said<string> | null> = {
    event: null,
    station: null,
    component: null,
  };
  for (const [label, pattern] of LABELS) {
    // A label ends where the next one begins, or at a wide gap.
    found[label] = firstOf(lines, [pattern], (text) => text.split(/\s{2,}|[,;\t]|\s+\w+\s*[:=]/)[0].trim());
  }
  return found;
}
