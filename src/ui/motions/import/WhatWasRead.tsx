import type { ReactNode } from 'react';
import { ACCELERATION_UNITS, type AccelerationUnit } from '../../../core/motion/motion.ts';
import type { LayoutId, RecordAnswers, RecordFact, RecordReading } from '../../../core/motion/reading.ts';
import { printQuantity, printTyped, type System } from '../../../core/units/quantities.ts';
import { readQuantity } from '../../../core/units/read.ts';
import { answerRecord, type ImportFile, nameRecord } from '../../../state/importQueue.ts';
import type { ReadAnswer } from '../../../state/imports.ts';
import { CautionMark } from '../../controls/Icon.tsx';
import { Select } from '../../controls/Select.tsx';
import { Field } from './Field.tsx';
import { count, LAYOUT_NAMES, placeOf, seconds } from './words.ts';

export const UNIT_NAMES: Readonly<Record<AccelerationUnit, string>> = {
  g: 'g',
  'm/s2': 'm/s²',
  'cm/s2': 'cm/s² (gal)',
  'mm/s2': 'mm/s²',
};

export interface WhatWasReadProps {
  readonly file: ImportFile;
  readonly answer: ReadAnswer;
  readonly system: System;
}

/** Each thing that was understood of a file, with where it stands; every one can be answered otherwise. */
export function WhatWasRead({ file, answer, system }: WhatWasReadProps) {
  const { reading, measures } = answer;
  const { answers } = file;
  const again = (changed: RecordAnswers) => answerRecord(file.id, { ...answers, ...changed });
  // A new answer opens anew what was settled between the one before and the file.
  const answerAnew = (what: 'interval' | 'unit', changed: RecordAnswers) => {
    const { [`contradicts-${what}`]: _, ...mends } = answers.mends ?? {};
    again({ ...changed, mends });
  };
  const fact = (what: RecordFact['what']) => reading.facts.find((entry) => entry.what === what);
  const from = (what: 'interval' | 'unit') =>
    (answers[what] !== undefined && answers[what] === reading[what] ? 'answered' : placeOf(fact(what))) ??
    'the file does not say';
  const samples = reading.values.length;
  return (
    <dl className="import-rows">
      <Row name="Layout" from={answers.layout === undefined ? 'found' : 'chosen'}>
        <Select<LayoutId>
          label="Layout"
          value={reading.layout}
          options={(Object.keys(LAYOUT_NAMES) as LayoutId[]).map((id) => ({ value: id, label: LAYOUT_NAMES[id] }))}
          onChange={(layout) => again({ layout })}
        />
      </Row>
      <Row name="Heading lines" from={answers.headingLines === undefined ? 'found' : 'answered'}>
        <Field
          label="Heading lines"
          width={56}
          value={String(answers.headingLines ?? reading.firstLine - 1)}
          take={(text) => {
            const lines = Number(text);
            if (!/^\d+$/.test(text.trim()) || lines > answer.lines) return 'A whole number of lines of the file.';
            again({ headingLines: lines });
            return null;
          }}
        />
      </Row>
      {reading.columns && <Columns columns={reading.columns} answers={answers} again={again} />}
      <Row name="Name" from={answers.name === undefined ? (placeOf(fact('name')) ?? 'the file name') : 'typed'}>
        <Field
          label="Name"
          width={200}
          value={reading.name}
          take={(text) => {
            if (text.trim() === '') return 'A motion needs a name.';
            nameRecord(file.id, text.trim());
            return null;
          }}
        />
      </Row>
      <Row name="Interval, s" from={from('interval')} asked={reading.asks.includes('interval')}>
        <Field
          label="Interval, s"
          width={88}
          placeholder="say 0.01"
          value={reading.interval === null ? '' : printTyped(reading.interval, 'time', 'si')}
          take={(text) => {
            const read = readQuantity(text, 'time', 'si');
            if (read.kind !== 'value' || !(read.value > 0)) return 'A time in seconds above 0, as 0.01.';
            answerAnew('interval', { interval: read.value });
            return null;
          }}
        />
      </Row>
      <Row name="Unit" from={from('unit')} asked={reading.asks.includes('unit')}>
        <Select<AccelerationUnit | ''>
          label="Unit"
          value={reading.unit ?? ''}
          options={[
            ...(reading.unit === null ? [{ value: '' as const, label: 'choose', disabled: true }] : []),
            ...ACCELERATION_UNITS.map((unit) => ({ value: unit, label: UNIT_NAMES[unit] })),
          ]}
          onChange={(unit) => unit !== '' && answerAnew('unit', { unit })}
        />
      </Row>
      <Row name="Samples" from={samplesFrom(answer, placeOf(fact('count')))}>
        {printQuantity(samples, 'count', system)}
      </Row>
      {measures !== null && (
        <Row name="Peak" from={peakFrom(answer)}>
          {printQuantity(measures.peakAcceleration, 'acceleration', system)} g
        </Row>
      )}
    </dl>
  );
}

interface RowProps {
  readonly name: string;
  /** Where it was found. */
  readonly from: string;
  readonly asked?: boolean;
  readonly children: ReactNode;
}

function Row({ name, from, asked = false, children }: RowProps) {
  return (
    <div className={asked ? 'asked' : ''}>
      <dt>{name}</dt>
      <dd>{children}</dd>
      <dd className="import-from small">
        {asked && <CautionMark />}
        {asked ? 'the file does not say: answer it' : from}
      </dd>
    </div>
  );
}

interface ColumnsProps {
  readonly columns: NonNullable<RecordReading['columns']>;
  readonly answers: RecordAnswers;
  readonly again: (changed: RecordAnswers) => void;
}

function Columns({ columns, answers, again }: ColumnsProps) {
  const { time, acceleration, names } = columns;
  const chosen = { time, acceleration };
  const options = names.map((name, i) => ({
    value: String(i),
    label: name === '' ? String(i + 1) : `${i + 1}, ${name}`,
  }));
  return (
    <Row name="Columns" from={answers.columns === undefined ? 'found' : 'chosen'}>
      <span className="import-columns">
        time
        <Select
          label="Column of the time"
          value={String(chosen.time)}
          options={options}
          onChange={(column) => again({ columns: { ...chosen, time: Number(column) } })}
        />
        acceleration
        <Select
          label="Column of the acceleration"
          value={String(chosen.acceleration)}
          options={options}
          onChange={(column) => again({ columns: { ...chosen, acceleration: Number(column) } })}
        />
      </span>
    </Row>
  );
}

function samplesFrom({ reading }: ReadAnswer, place: string | null): string {
  const { statedCount, values, interval } = reading;
  const length = interval === null ? '' : seconds((values.length - 1) * interval);
  const said =
    statedCount === null
      ? 'counted'
      : statedCount === values.length
        ? `as ${place ?? 'the file'} says`
        : `${place ?? 'the file'} says ${count(statedCount, 'value')}`;
  return [said, length].filter(Boolean).join('; ');
}

function peakFrom({ reading, measures }: ReadAnswer): string {
  if (measures === null || reading.motion === null || reading.unit === null) return '';
  const at = `at ${seconds(measures.peakAccelerationTime)}`;
  if (reading.unit === 'g') return at;
  const i = Math.round(measures.peakAccelerationTime / reading.motion.interval);
  return `${Number(Math.abs(reading.values[i]).toPrecision(4))} ${reading.unit.replace('2', '²')}, ${at}`;
}
