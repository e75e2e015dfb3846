import { useState } from 'react';
import { headOf } from '../../core/report/head.ts';
import type { Column, Table } from '../../core/report/table.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { Sideways } from './Sideways.tsx';
import './table.css';

export interface TableViewProps {
  readonly table: Table;
  readonly system: System;
  /** [px] */
  readonly height: number;
}

const ROW = 24;
/** Rows kept ready above and below those in sight. */
const SPARE = 12;

/** A result table as it is printed. Only the rows in sight stand in the page, so that a long history opens at once. */
export function TableView({ table, system, height }: TableViewProps) {
  const [top, setTop] = useState(0);
  const rows = table.columns[0]?.values.length ?? 0;
  const from = Math.max(0, Math.min(rows - 1, Math.floor(top / ROW)) - SPARE);
  const to = Math.min(rows, Math.ceil((top + height) / ROW) + SPARE);
  return (
    <Sideways>
      {/* biome-ignore lint/a11y/useSemanticElements: a section would be one more landmark */}
      <div
        className="table-view"
        style={{ maxHeight: height }}
        role="region"
        aria-label={table.title}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: a part that scrolls must be reachable by keyboard
        tabIndex={0}
        onScroll={(event) => setTop(event.currentTarget.scrollTop)}
      >
        <table aria-rowcount={rows + 1}>
          <thead>
            <tr aria-rowindex={1}>
              {table.columns.map((column) => (
                <Head key={column.key} column={column} system={system} />
              ))}
            </tr>
          </thead>
          <tbody>
            <Spacer rows={from} columns={table.columns.length} />
            {Array.from({ length: to - from }, (_, i) => from + i).map((row) => (
              <tr key={row} aria-rowindex={row + 2}>
                {table.columns.map((column) => (
                  <Cell key={column.key} column={column} row={row} system={system} />
                ))}
              </tr>
            ))}
            <Spacer rows={rows - to} columns={table.columns.length} />
          </tbody>
        </table>
      </div>
    </Sideways>
  );
}

/** A long name breaks, but not into single words. */
const LONG = 14;

function Head({ column, system }: { readonly column: Column; readonly system: System }) {
  const words = headOf(column, system);
  return (
    <th
      scope="col"
      className={column.quantity === 'text' ? 'words' : ''}
      style={{ minWidth: words.length > LONG ? 108 : undefined }}
    >
      {words}
    </th>
  );
}

function Spacer({ rows, columns }: { readonly rows: number; readonly columns: number }) {
  if (rows <= 0) return null;
  return (
    <tr>
      <td colSpan={columns} className="spacer" style={{ height: rows * ROW }} />
    </tr>
  );
}

function Cell({
  column: { values, quantity, decimals },
  row,
  system,
}: {
  readonly column: Column;
  readonly row: number;
  readonly system: System;
}) {
  const value = values[row];
  if (quantity === 'text' || typeof value === 'string') return <td className="words">{value ?? ''}</td>;
  const none = value === null || !Number.isFinite(value);
  return <td className={none ? 'none' : ''}>{printQuantity(value, quantity, system, decimals)}</td>;
}
