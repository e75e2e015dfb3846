import { methodOf } from '../../dynamics/methods.ts';
import type { StepChoice } from '../../dynamics/run.ts';
import { never } from '../../fault.ts';
import type { Damping } from '../../frame/frame.ts';
import { STANDARD_GRAVITY } from '../../units/constants.ts';
import type { ReportMotion, ReportSource } from '../source.ts';
import { type Cell, type Column, roofFirst, type Table } from '../table.ts';
import { storeyColumns } from './storeyColumns.ts';

/** The storeys as they were computed, roof first. */
export function storeyInputs({ prepared }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const n = storeys.length;
  const gravity = storeys.map((storey) => storey.gravity ?? storey.mass * STANDARD_GRAVITY);
  return {
    id: 'storeys',
    title: 'Storeys',
    columns: [
      ...storeyColumns(storeys),
      {
        key: 'height',
        name: 'Height',
        quantity: 'length',
        values: roofFirst(
          storeys.map((s) => s.height),
          n,
        ),
      },
      {
        key: 'mass',
        name: 'Weight',
        quantity: 'weight',
        values: roofFirst(
          storeys.map((s) => s.mass),
          n,
        ),
      },
      {
        key: 'stiffness',
        name: 'Stiffness',
        quantity: 'stiffness',
        values: roofFirst(
          storeys.map((s) => s.stiffness),
          n,
        ),
      },
      { key: 'law', name: 'Law', quantity: 'text', values: storeys.map((s) => s.law.kind).reverse() },
      { key: 'gravity', name: 'Gravity load for P-Delta', quantity: 'force', values: roofFirst(gravity, n) },
    ],
  };
}

/** The motions with their scales, those left out as well, and where each came from. */
export function motionInputs({ motions }: ReportSource): Table {
  const column = (
    key: string,
    name: string,
    quantity: Column['quantity'],
    of: (one: ReportMotion) => Cell,
  ): Column => ({
    key,
    name,
    quantity,
    values: motions.map(of),
  });
  return {
    id: 'motions',
    title: 'Ground motions',
    columns: [
      column('motion', 'Motion', 'text', ({ name }) => name),
      column('used', 'Used', 'text', ({ used }) => (used ? 'yes' : 'no')),
      column('reason', 'Reason for leaving out', 'text', ({ reason }) => reason ?? null),
      column('interval', 'Interval', 'time', ({ interval }) => interval),
      column('samples', 'Samples', 'count', ({ count }) => count),
      column('scale', 'Scale', 'ratio', ({ scale }) => scale),
      column('peak', 'Peak as read', 'acceleration', ({ peakAcceleration }) => peakAcceleration),
      column('scaledPeak', 'Peak as scaled', 'acceleration', ({ peakAcceleration, scale }) =>
        peakAcceleration === null ? null : Math.abs(scale) * peakAcceleration,
      ),
      column('event', 'Event', 'text', ({ origin }) => origin?.event ?? null),
      column('station', 'Station', 'text', ({ origin }) => origin?.station ?? null),
      column('component', 'Component', 'text', ({ origin }) => origin?.component ?? null),
      column('file', 'File', 'text', ({ origin }) => origin?.file ?? null),
      column('mends', 'Changes to the record', 'text', ({ origin }) => mendsOf(origin?.mends ?? [])),
      column('digest', 'SHA-256 of the file', 'text', ({ origin }) => origin?.digest ?? null),
    ],
  };
}

/** How it was computed and what it is compared with: a table of one row. */
export function analysisInputs({ title, prepared, analysis, limits, envelope }: ReportSource): Table {
  const { frame } = prepared;
  const method = methodOf(analysis.method);
  const text = (key: string, name: string, value: Cell): Column => ({ key, name, quantity: 'text', values: [value] });
  return {
    id: 'analysis',
    title: 'Analysis and limit',
    columns: [
      text('title', 'Project', title),
      text('method', 'Method', method.name),
      text('source', 'Source of the method', method.source),
      text('step', 'Step', stepWords(analysis.step)),
      { key: 'tail', name: 'Free vibration after the record', quantity: 'time', values: [analysis.tail] },
      {
        key: 'stopDrift',
        name: 'Drift ratio at which a run is stopped',
        quantity: 'percent',
        values: [analysis.stopDrift],
      },
      text('damping', 'Damping', dampingWords(frame.damping)),
      text('pDelta', 'P-Delta', frame.pDelta ? 'on' : 'off'),
      { key: 'limit', name: 'Allowable drift ratio', quantity: 'percent', values: [envelope.limit] },
      text('measure', 'Measure of the suite', envelope.measure),
      { key: 'factor', name: 'Factor on drift', quantity: 'ratio', values: [envelope.factor] },
      text('limitSource', 'Source of the limit', limits.source),
    ],
  };
}

function stepWords(step: StepChoice): string {
  if (step === 'auto') return 'by halving';
  return typeof step === 'number' ? `${step} s` : `interval of each motion in ${step.parts} parts`;
}

/** A damping description in one line, ratios in percent of critical. */
function dampingWords(damping: Damping): string {
  const percent = (ratio: number) => `${Number((100 * ratio).toPrecision(12))} %`;
  switch (damping.kind) {
    case 'none':
      return 'none';
    case 'rayleigh': {
      const [i, j] = damping.modes;
      const [first, second] = damping.ratios;
      return `Rayleigh, ${percent(first)} in mode ${i} and ${percent(second)} in mode ${j}`;
    }
    case 'modal':
      return `modal, ${damping.ratios.map(percent).join(', ')}, the last repeated`;
    case 'stiffness-proportional':
      return `stiffness-proportional, ${percent(damping.ratio)} in mode ${damping.mode}`;
    default:
      return never(damping);
  }
}

function mendsOf(mends: NonNullable<NonNullable<ReportMotion['origin']>['mends']>): string | null {
  return mends.length === 0
    ? null
    : mends.map(({ line, was, is, why }) => `line ${line}: ${was} taken as ${is} (${why})`).join('; ');
}
