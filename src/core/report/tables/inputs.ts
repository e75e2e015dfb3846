import { methodOf } from '../../dynamics/methods.ts';
import type { StepChoice } from '../../dynamics/run.ts';
import { never } from '../../fault.ts';
import type { Damping, Storey } from '../../frame/frame.ts';
import { STANDARD_GRAVITY } from '../../units/constants.ts';
import type { Quantity } from '../../units/quantities.ts';
import type { ReportMotion, ReportSource } from '../source.ts';
import { type Cell, type Column, decimalsOf, roofFirst, type Table } from '../table.ts';
import { storeyColumns } from './storeyColumns.ts';

/** The storeys as they were computed, roof first. What no storey of the frame has is left out. */
export function storeyInputs({ prepared }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const n = storeys.length;
  const column = (
    key: string,
    name: string,
    quantity: Quantity,
    of: (storey: Storey) => number | null | undefined,
  ): Column => ({
    key,
    name,
    quantity,
    values: roofFirst(
      storeys.map((storey) => of(storey) ?? null),
      n,
    ),
  });
  const lawNumber = (key: string, name: string, quantity: Quantity, of: (law: Yielding) => number | undefined) =>
    column(key, name, quantity, ({ law }) => (law.kind === 'elastic' ? null : of(law)));
  return {
    id: 'storeys',
    title: 'Storeys',
    columns: [
      ...storeyColumns(storeys),
      ...(storeys.some(({ role }) => role === 'isolator')
        ? [{ key: 'role', name: 'Role', quantity: 'text', values: storeys.map(roleOf).reverse() } as const]
        : []),
      column('height', 'Height', 'length', ({ height }) => height),
      column('mass', 'Weight', 'weight', ({ mass }) => mass),
      column('stiffness', 'Stiffness', 'stiffness', ({ stiffness }) => stiffness),
      { key: 'law', name: 'Law', quantity: 'text', values: storeys.map(({ law }) => law.kind).reverse() },
      ...[
        lawNumber('strength', 'Strength', 'force', ({ strength }) => strength),
        lawNumber('hardening', 'Hardening', 'percent', ({ hardening }) => hardening),
        column('yieldDrift', 'Yield drift', 'drift', ({ law, stiffness }) =>
          law.kind === 'elastic' ? null : law.strength / stiffness,
        ),
        lawNumber('exponent', 'Bouc-Wen exponent', 'ratio', (law) => ('exponent' in law ? law.exponent : undefined)),
        lawNumber('beta', 'Bouc-Wen beta', 'ratio', (law) => ('beta' in law ? law.beta : undefined)),
        lawNumber('gamma', 'Bouc-Wen gamma', 'ratio', (law) => ('gamma' in law ? law.gamma : undefined)),
        lawNumber('flag', 'Flag height over strength', 'ratio', (law) => ('ratio' in law ? law.ratio : undefined)),
        // The coefficient's own unit depends on the exponent; its value in SI is this force.
        column('damperCoefficient', 'Damper force at 1 m/s', 'force', ({ damper }) => damper?.coefficient),
        column('damperExponent', 'Damper exponent', 'ratio', ({ damper }) => damper?.exponent),
      ]
        .filter(({ values }) => values.some((value) => value !== null))
        .map((one) => (one.key === 'yieldDrift' ? { ...one, decimals: 1 } : one)),
      column('gravity', 'Gravity load for P-Delta', 'force', ({ gravity, mass }) => gravity ?? mass * STANDARD_GRAVITY),
    ],
  };
}

type Yielding = Exclude<Storey['law'], { readonly kind: 'elastic' }>;

function roleOf({ role }: Storey): string {
  return role ?? 'storey';
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
      {
        ...column('interval', 'Interval', 'time', ({ interval }) => interval),
        decimals: decimalsOf(motions.map(({ interval }) => interval)),
      },
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
      ...(envelope.isolator === null
        ? []
        : [
            {
              key: 'isolatorLimit',
              name: 'Allowable isolator displacement',
              quantity: 'displacement',
              values: [envelope.isolator.limit],
            } as const,
          ]),
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
      const on = damping.stiffness === 'tangent' ? ' on the tangent stiffness' : '';
      return `Rayleigh${on}, ${percent(first)} in mode ${i} and ${percent(second)} in mode ${j}`;
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
