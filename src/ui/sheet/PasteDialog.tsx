import { useEffect, useMemo, useState } from 'react';
import { printShort, type System, unitOf } from '../../core/units/quantities.ts';
import { documentStore, edit } from '../../state/document.ts';
import { setSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { parseBlock } from './block.ts';
import { COLUMN_NAMES, COLUMN_QUANTITIES, type InputColumn } from './columns.ts';
import { type Commas, type PastePlan, planPaste } from './paste.ts';

export interface PasteDialogProps {
  /** What was on the clipboard. */
  readonly text: string;
  readonly cell: { readonly storey: number; readonly column: string };
  readonly columns: readonly InputColumn[];
  readonly system: System;
  readonly onClose: () => void;
}

/** Takes a pasted block in; asks only what the block leaves open: the commas of a column, a taller frame. */
export function PasteDialog({ text, cell, columns, system, onClose }: PasteDialogProps) {
  const [commas, setCommas] = useState<Readonly<Partial<Record<InputColumn, Commas>>>>({});
  const plan = useMemo(
    () =>
      planPaste(documentStore.getState().project, parseBlock(text), cell.storey, cell.column, columns, system, commas),
    [text, cell.storey, cell.column, columns, system, commas],
  );
  const count = documentStore.getState().project.frame.storeys.length;
  const asks = plan.kind !== 'ready' || (plan.growsTo !== null && count > 0);
  useEffect(() => {
    if (asks || plan.kind !== 'ready') return;
    take(plan, cell.column);
    onClose();
  }, [asks, plan, cell.column, onClose]);
  if (!asks) return null;
  switch (plan.kind) {
    case 'refused':
      return <RefusedBlock plan={plan} onClose={onClose} />;
    case 'commas':
      return (
        <AskCommas
          plan={plan}
          system={system}
          onClose={onClose}
          onChoose={(way) => setCommas({ ...commas, [plan.column]: way })}
        />
      );
    case 'ready':
      return (
        <Dialog
          title={`Make it ${plan.growsTo} storeys?`}
          width={440}
          onClose={onClose}
          foot={
            <>
              <Button onClick={onClose}>Do not paste</Button>
              <Button
                kind="primary"
                onClick={() => {
                  take(plan, cell.column);
                  onClose();
                }}
              >
                Make it {plan.growsTo} storeys
              </Button>
            </>
          }
        >
          The block has {plan.high - plan.low + 1} rows and the frame {count} {count === 1 ? 'storey' : 'storeys'}. New
          storeys start as copies of the roof storey; the block then fills its columns.
        </Dialog>
      );
  }
}

function take(plan: Extract<PastePlan, { kind: 'ready' }>, column: string): void {
  const where = plan.low === plan.high ? `storey ${plan.high}` : `storeys ${plan.low} to ${plan.high}`;
  edit(`${where} pasted`, plan.apply);
  setSession({
    selection: { storey: plan.high - 1, column, anchorStorey: plan.low - 1, anchorColumn: column },
    storey: plan.high - 1,
  });
}

function RefusedBlock({
  plan,
  onClose,
}: {
  readonly plan: Extract<PastePlan, { kind: 'refused' }>;
  readonly onClose: () => void;
}) {
  return (
    <Dialog
      title="The block was not pasted"
      onClose={onClose}
      foot={
        <Button kind="primary" onClick={onClose}>
          Close
        </Button>
      }
    >
      <p className="quiet">
        Nothing was changed. In the way {plan.faults.length === 1 ? 'stands one cell' : 'stand these cells'}:
      </p>
      <ul className="fault-list">
        {plan.faults.map((fault) => (
          <li key={fault.place}>
            <b>{fault.place}</b>
            <span>{fault.what}</span>
            <span className="quiet">{fault.mend}</span>
          </li>
        ))}
      </ul>
    </Dialog>
  );
}

const SHOWN_ROWS = 6;

function AskCommas({
  plan,
  system,
  onChoose,
  onClose,
}: {
  readonly plan: Extract<PastePlan, { kind: 'commas' }>;
  readonly system: System;
  readonly onChoose: (way: Commas) => void;
  readonly onClose: () => void;
}) {
  const quantity = COLUMN_QUANTITIES[plan.column];
  const print = (value: number | null | undefined) =>
    value === null || value === undefined || quantity === null ? '' : printShort(value, quantity, system);
  const unit = quantity === null ? '' : unitOf(quantity, system);
  const rows = plan.texts.map((text, row) => ({ text, row })).filter(({ text }) => text !== '');
  return (
    <Dialog
      title={`How are the commas meant in ${COLUMN_NAMES[plan.column]}?`}
      onClose={onClose}
      foot={
        <>
          <Button data-first="" onClick={onClose}>
            Do not paste
          </Button>
          <Button onClick={() => onChoose('thousands')}>Thousands</Button>
          <Button onClick={() => onChoose('decimal')}>Decimals</Button>
        </>
      }
    >
      <p className="quiet">No cell of the column tells. Both readings, in {unit}:</p>
      <table className="readings">
        <thead>
          <tr>
            <th scope="col">As pasted</th>
            <th scope="col">Thousands</th>
            <th scope="col">Decimals</th>
          </tr>
        </thead>
        <tbody>
          {rows.slice(0, SHOWN_ROWS).map(({ text, row }) => (
            <tr key={row}>
              <td>{text}</td>
              <td>{print(plan.thousands[row])}</td>
              <td>{print(plan.decimal[row])}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {rows.length > SHOWN_ROWS && <p className="quiet">and {rows.length - SHOWN_ROWS} more</p>}
    </Dialog>
  );
}
