import type { ReportSource } from '../source.ts';
import { roofFirst, type Table } from '../table.ts';
import { statisticColumns } from './statisticColumns.ts';
import { storeyColumns } from './storeyColumns.ts';

/** What each storey answers to the suite, against the limit: the drift as computed and as compared (factor x measure). */
export function storeyResponse({ prepared, envelope }: ReportSource): Table {
  const { storeys } = prepared.frame;
  const n = storeys.length;
  const { motions, drift, ratio, limit, measure, factor } = envelope;
  const measured = drift === null ? null : drift[measure];
  return {
    id: 'storey-response',
    title: 'Storey response of the suite',
    columns: [
      ...storeyColumns(storeys),
      ...statisticColumns('driftRatio', 'peak drift ratio', 'percent', drift, n, motions),
      { key: 'measure', name: 'Measure compared', quantity: 'text', values: storeys.map(() => measure) },
      { key: 'factor', name: 'Factor on drift', quantity: 'ratio', values: storeys.map(() => factor) },
      {
        key: 'comparedDriftRatio',
        name: 'Drift ratio compared',
        quantity: 'percent',
        values: roofFirst(
          measured?.map((value) => factor * value),
          n,
        ),
      },
      { key: 'limit', name: 'Limit', quantity: 'percent', values: storeys.map(() => limit) },
      { key: 'ofLimit', name: 'Of limit', quantity: 'ratio', values: roofFirst(ratio, n) },
      ...statisticColumns('shear', 'peak shear', 'force', envelope.shear, n, motions),
      ...statisticColumns('overturning', 'peak overturning', 'moment', envelope.overturning, n, motions),
      ...statisticColumns('residualDrift', 'residual drift', 'drift', envelope.residualDrift, n, motions),
    ],
  };
}
