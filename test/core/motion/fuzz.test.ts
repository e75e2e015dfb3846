import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readRecord } from '../../../src/core/motion/read.ts';
import type { RecordAnswers, RecordReading } from '../../../src/core/motion/reading.ts';
import { readText, rows, wave } from './records.ts';

/** What holds of every reading, whatever was read. */
function isWhole(reading: RecordReading): void {
  const { faults, asks, motion, values } = reading;
  expect(motion === null).toBe(faults.length > 0 || asks.length > 0);
  expect(new Set(faults.map(({ id }) => id)).size).toBe(faults.length);
  expect(faults.length).toBeLessThanOrEqual(60);
  for (const fault of faults) {
    expect(fault.choices.some(({ id }) => id === 'leave-out')).toBe(true);
    expect(new Set(fault.choices.map(({ id }) => id)).size).toBe(fault.choices.length);
    expect(`${fault.where}${fault.message}${fault.mend}`.length).toBeLessThan(800);
  }
  if (motion === null) return;
  expect(motion.acceleration.length).toBe(values.length);
  expect(values.length).toBeGreaterThanOrEqual(2);
  expect(motion.acceleration.every(Number.isFinite)).toBe(true);
  expect(motion.interval > 0 && Number.isFinite(motion.interval)).toBe(true);
}

const FULL: RecordAnswers = { unit: 'g', interval: 0.01 };
const answers = fc.record(
  {
    layout: fc.constantFrom('count-and-interval', 'time-and-acceleration', 'values' as const),
    unit: fc.constantFrom('g', 'm/s2', 'cm/s2', 'mm/s2' as const),
    interval: fc.oneof(fc.constant(0.01), fc.double()),
    headingLines: fc.oneof(fc.nat(5), fc.double()),
    columns: fc.record({ time: fc.integer({ min: -1, max: 9 }), acceleration: fc.integer({ min: -1, max: 9 }) }),
    mends: fc.constantFrom<RecordAnswers['mends']>(
      { count: { choice: 'take' }, text: { choice: 'pass-over' }, time: { choice: 'even' } },
      { count: { choice: 'stated' }, text: { choice: 'stop' }, 'row-length': { choice: 'as-it-stands' } },
      { 'line-2-value-1': { choice: 'mean' }, 'line-3-value-2': { choice: 'typed', value: Number.NaN } },
    ),
  },
  { requiredKeys: [] },
);

/** The answers that a file asks for, or any. */
const sensible = fc.oneof(fc.constant({}), fc.constant(FULL), answers);

const good = [
  `NPTS= 40, DT= .0100 SEC\nUNITS OF G\n${rows(wave(40))}`,
  `time (s),acc (g)\n${wave(40)
    .map((value, i) => `${(i * 0.01).toFixed(2)},${value}`)
    .join('\n')}`,
  wave(40)
    .map((value) => String(value).replace('.', ','))
    .join('\n'),
  `# 40 points at equal spacing of 0.02 sec\n# units cm/s2\n${rows(
    wave(40).map((value) => value * 400 - 100),
    8,
    10,
  )}# end\n`,
];

describe('any bytes are read without a throw, and to a whole reading', () => {
  test('random bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), answers, (bytes, given) => isWhole(readRecord('a', bytes, given))),
      { numRuns: 400 },
    );
  });

  test('random signs of figures', () => {
    const sign = fc.constantFrom(...'0123456789.,;-+eEdD \t\n\r"#xg*'.split(''));
    fc.assert(
      fc.property(fc.array(sign, { maxLength: 300 }), answers, (signs, given) =>
        isWhole(readText(signs.join(''), given)),
      ),
      { numRuns: 600 },
    );
  });

  test('good files with bytes changed, taken out and put in', () => {
    let motions = 0;
    const change = fc.tuple(fc.nat(2000), fc.constantFrom('set', 'cut', 'put'), fc.nat(255));
    fc.assert(
      fc.property(fc.constantFrom(...good), fc.array(change, { maxLength: 8 }), sensible, (text, changes, given) => {
        const bytes = [...new TextEncoder().encode(text)];
        for (const [where, what, byte] of changes) {
          const at = where % bytes.length;
          if (what === 'set') bytes[at] = byte;
          else if (what === 'cut') bytes.splice(at, 1);
          else bytes.splice(at, 0, byte);
        }
        const reading = readRecord('a', Uint8Array.from(bytes), given);
        if (reading.motion) motions++;
        isWhole(reading);
      }),
      { numRuns: 600 },
    );
    expect(motions).toBeGreaterThan(30);
  });

  test('each mend on offer, taken at random until nothing is open or nothing changes, gives a whole reading', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...good),
        fc.nat(500),
        fc.constantFrom('x', ',', '-', '\n', ' '),
        fc.nat(9),
        (text, at, put, pick) => {
          const broken = `${text.slice(0, at)}${put}${text.slice(at + 1)}`;
          let mends: Record<string, { choice: string; value?: number }> = {};
          for (let round = 0; round < 8; round++) {
            const reading = readText(broken, { ...(readText(broken).asks.length > 0 ? FULL : {}), mends });
            isWhole(reading);
            const taken = reading.faults.map(({ id, choices }) => {
              const { id: choice, asksValue } = choices[pick % choices.length];
              return [id, asksValue ? { choice, value: 0.01 } : { choice }] as const;
            });
            mends = { ...mends, ...Object.fromEntries(taken) };
          }
        },
      ),
      { numRuns: 150 },
    );
  });
});

describe('hostile files', () => {
  const many = 200_000;
  test.each([
    ['one endless line of figures', '1'.repeat(many)],
    ['one endless line of points', '.'.repeat(many)],
    ['one endless line of touching numbers', '0.12345-0.54321'.repeat(many / 10)],
    ['one endless line of signs', '+-'.repeat(many)],
    ['one endless line of commas', ','.repeat(many)],
    ['one endless line of values', '0.1 '.repeat(many)],
    ['one endless line of words', 'units of g '.repeat(many / 10)],
    ['nothing but line ends', '\r'.repeat(many)],
    ['text and figures by turns', '0.1\nword of text\n'.repeat(many / 20)],
    ['figures and spoilt figures by turns', '0.1\n0.1x\n'.repeat(many / 10)],
    ['only spoilt figures', `0.1\n0.2\n${'1x\n'.repeat(many / 10)}`],
    ['rows of every length', Array.from({ length: 600 }, (_, i) => '0.5 '.repeat(i)).join('\n')],
    ['a heading without an end', `${'dt = spacing of units acc ('.repeat(40)}\n`.repeat(2000)],
    ['exponents beyond all bounds', `1e${'9'.repeat(1000)}\n`.repeat(100)],
    ['empty cells', '1,,,,,,,,,2\n'.repeat(many / 20)],
    ['times that never rise', '0 0.1\n'.repeat(many / 10)],
    ['times too large to add', '1e308 0.1\n-1e308 0.2\n1e308 0.3\n'],
  ])('%s', (_, text) => {
    isWhole(readText(text, FULL));
    isWhole(readText(text, { ...FULL, layout: 'time-and-acceleration' }));
  });
});
