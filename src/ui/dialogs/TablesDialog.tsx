import { useMemo, useState } from 'react';
import { type CsvOptions, csvOf } from '../../core/report/csv.ts';
import type { TableSystem } from '../../core/report/head.ts';
import type { Table } from '../../core/report/table.ts';
import { tablesOf } from '../../core/report/tables.ts';
import { useDocument } from '../../state/document.ts';
import { type Answers, useResults } from '../../state/results.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { Segmented } from '../controls/Segmented.tsx';
import { TableView } from '../plots/TableView.tsx';
import { reportSourceOf } from './reportSource.ts';
import { saveFile } from './saveFile.ts';

/** Every table of the answers: to look at, to copy into a spreadsheet, to take away as files. */
export function TablesDialog({ onClose }: { readonly onClose: () => void }) {
  const answers = useResults((state) => state.answers);
  if (answers === null) {
    return (
      <Dialog title="Tables" onClose={onClose} width={480}>
        <p>There are no answers yet: the tables are made from a finished run.</p>
      </Dialog>
    );
  }
  return <TablesOf answers={answers} onClose={onClose} />;
}

function TablesOf({ answers, onClose }: { readonly answers: Answers; readonly onClose: () => void }) {
  const status = useResults((state) => state.status);
  const stepErrors = useResults((state) => state.stepErrors);
  const project = useDocument((state) => state.project);
  const shownSystem = useSession((state) => state.system);
  const [id, setId] = useState('storey-response');
  const [form, setForm] = useState<'comma' | 'semicolon'>('comma');
  const [units, setUnits] = useState<'shown' | 'base'>('shown');
  const tables = useMemo(() => tablesOf(reportSourceOf(answers, project, stepErrors)), [answers, project, stepErrors]);
  const table = tables.find((entry) => entry.id === id) ?? tables[0];
  const current = status === 'current';
  const system: TableSystem = units === 'base' ? 'base' : shownSystem;
  const options: CsvOptions =
    form === 'comma' ? { separator: ',', decimal: '.', system } : { separator: ';', decimal: ',', system };
  const save = (entry: Table) => saveFile(`${entry.id}.csv`, csvOf(entry, options), 'text/csv');
  const copy = async () => {
    // Cells that a spreadsheet takes as they are: tabs between them, the decimal sign as chosen.
    await navigator.clipboard.writeText(csvOf(table, { ...options, separator: '\t' }));
    setSession({ toast: `${table.title}: copied` });
  };
  return (
    <Dialog
      title="Tables"
      onClose={onClose}
      width={1080}
      foot={
        <>
          <span className="table-form">
            <Segmented
              label="Separator and decimal sign"
              value={form}
              onChange={setForm}
              segments={[
                { value: 'comma', label: 'Comma, decimal point' },
                { value: 'semicolon', label: 'Semicolon, decimal comma' },
              ]}
            />
            <Segmented
              label="Units of the files"
              value={units}
              onChange={setUnits}
              segments={[
                { value: 'shown', label: shownSystem === 'si' ? 'kN, m, mm' : 'kip, ft, in' },
                { value: 'base', label: 'N, m, kg', name: 'Coherent SI: newton, metre, kilogram' },
              ]}
            />
          </span>
          <Button disabled={!current} onClick={copy}>
            Copy
          </Button>
          <Button disabled={!current} onClick={() => tables.forEach(save)}>
            Download all {tables.length}
          </Button>
          <Button kind="primary" disabled={!current} onClick={() => save(table)}>
            Download {table.id}.csv
          </Button>
        </>
      }
    >
      <div className="tables">
        <nav aria-label="Tables">
          {tables.map((entry) => (
            <button
              key={entry.id}
              type="button"
              aria-current={entry === table ? 'true' : undefined}
              onClick={() => setId(entry.id)}
            >
              {entry.title}
            </button>
          ))}
        </nav>
        <div className="table-side">
          {!current && (
            <p className="out-of-date" role="status">
              These are the numbers of the last finished run, and no longer those of the sheet. They can be taken away
              once the answers are up to date.
            </p>
          )}
          {answers.envelope.incomplete.length > 0 && (
            <p className="out-of-date">
              {answers.envelope.incomplete.join(', ')} did not run to the end: there is no mean and no ratio of the
              suite.
            </p>
          )}
          <TableView key={table.id} table={table} system={shownSystem} height={440} />
          <p className="quiet small">Files hold every figure in full precision, one head row with units.</p>
        </div>
      </div>
    </Dialog>
  );
}
