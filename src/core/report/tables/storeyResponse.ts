import { type ReportSource, yields } from '../source.ts';
import { type Column, roofFirst, type Table } from '../table.ts';
import { dividedBy, statisticColumns } from './statisticColumns.ts';
import { storeyColumns } from './storeyColumns.ts';

/**
 * What each storey answers to the suite, against the limit: the drift as computed and as compared (factor x measure). An isolator is
 * left out of the drift limit and stands against its own.
 */
export function storeyResponse({ prepared, envelope }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const n = storeys.length;
  const { motions, drift, ratio, limit, measure, factor, isolator, ductility, residualDrift } = envelope;
  const measured = drift === null ? null : drift[measure];
  const drifts = (value: (i: number) => number | undefined) =>
    roofFirst(
      storeys.map((_, i) => (isolator !== null && i === 0 ? null : (value(i) ?? null))),
      n,
    );
  return {
    id: 'storey-response',
    title: 'Storey response of the suite',
    columns: [
      ...storeyColumns(storeys),
      ...statisticColumns('driftRatio', 'peak drift ratio', 'percent', drift, n, motions),
      { key: 'measure', name: 'Measure compared', quantity: 'text', values: storeys.map(() => measure) },
      { key: 'factor', name: 'Factor on drift', quantity: 'ratio', values: drifts(() => factor) },
      {
        key: 'comparedDriftRatio',
        name: 'Drift ratio compared',
        quantity: 'percent',
        values: drifts((i) => (measured === null ? undefined : factor * measured[i])),
      },
      { key: 'limit', name: 'Limit', quantity: 'percent', values: drifts(() => limit) },
      ...isolatorColumns(envelope, n),
      {
        key: 'ofLimit',
        name: 'Of limit',
        quantity: 'ratio',
        values: roofFirst(
          storeys.map((_, i) => (isolator !== null && i === 0 ? isolator.ratio : (ratio?.[i] ?? null))),
          n,
        ),
      },
      ...statisticColumns('shear', 'peak shear', 'force', envelope.shear, n, motions),
      ...statisticColumns('overturning', 'peak overturning', 'moment', envelope.overturning, n, motions),
      ...(storeys.some(yields) ? statisticColumns('ductility', 'ductility', 'ratio', ductility, n, motions) : []),
      ...statisticColumns('residualDrift', 'residual drift', 'drift', residualDrift, n, motions).map((column) =>
        column.quantity === 'drift' ? { ...column, decimals: 1 } : column,
      ),
      ...statisticColumns(
        'residualDriftRatio',
        'residual drift ratio',
        'percent',
        dividedBy(
          residualDrift,
          storeys.map(({ height }) => height),
        ),
        n,
        motions,
      ),
    ],
  };
}

/** What the isolator is compared by, on its row: its own displacement, without the factor on storey drifts. */
function isolatorColumns({ isolator, displacement, measure }: ReportSource['envelope'], n: number): Column[] {
  if (isolator === null) return [];
  const first = (value: number | null | undefined) => roofFirst([value ?? null], n);
  return [
    {
      key: 'comparedDisplacement',
      name: 'Isolator displacement compared',
      quantity: 'displacement',
      values: first(displacement?.[measure][0]),
    },
    { key: 'isolatorLimit', name: 'Isolator limit', quantity: 'displacement', values: first(isolator.limit) },
  ];
}
