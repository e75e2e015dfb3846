import { memo } from 'react';
import type { System } from '../../core/units/quantities.ts';
import type { StoreyRow as Row } from '../../document/project.ts';
import { Icon } from '../controls/Icon.tsx';
import { Menu } from '../controls/Menu.tsx';
import { CellInput } from './CellInput.tsx';
import { cellText } from './cellText.ts';
import { COLUMN_NAMES, cellPath, type InputColumn } from './columns.ts';
import { add, move, remove } from './commands.ts';

export interface StoreyRowProps {
  readonly storey: number;
  readonly row: Row;
  readonly size: number;
  readonly system: System;
  readonly columns: readonly InputColumn[];
  readonly narrow: boolean;
  /** The storey whose histories are shown. */
  readonly chosen: boolean;
  readonly governs: boolean;
  readonly over: boolean;
  /** What stands under the name: "governs", "unstable in E"; null: nothing. */
  readonly tag: string | null;
  readonly failed: boolean;
  /** Column of the chosen cell where it stands in this row. */
  readonly cell: string | null;
  /** Columns of the chosen block in this row, `first last`; empty: none. */
  readonly block: string;
  /** Column being edited in this row, and its text. */
  readonly editing: string | null;
  readonly text: string;
  /** Columns with a fault, joined by spaces. */
  readonly faulty: string;
  readonly measure: string;
  readonly drift: string;
  readonly ratio: string;
  readonly shear: string;
  readonly acceleration: string;
  readonly old: boolean;
  readonly fillHandle: boolean;
}

/** One storey: what is typed at the left, what it answers at the right. */
export const StoreyRow = memo(function StoreyRow(props: StoreyRowProps) {
  const { storey, row, size, chosen, governs, over, tag, failed, cell, columns, editing, text, system, narrow } = props;
  const classes = ['storey'];
  if (chosen) classes.push('chosen');
  if (governs) classes.push('governs');
  if (over) classes.push('over');
  if (size < 28) classes.push('low');
  const shown = tag !== null && size >= 28;
  const block = props.block === '' ? [] : props.block.split(' ');
  const faulty = props.faulty === '' ? [] : props.faulty.split(' ');
  const state = (column: string) =>
    `${cell === column ? 'sel' : ''} ${block.includes(column) ? 'in-block' : ''} ${faulty.includes(column) ? 'unread' : ''}`;
  const nameEditing = editing === 'name';
  return (
    <div
      className={classes.join(' ')}
      role="row"
      aria-rowindex={props.storey + 2}
      style={{ height: size }}
      data-storey={storey}
    >
      <div
        className="storey-head"
        role="rowheader"
        data-cell="name"
        tabIndex={cell === 'name' && !nameEditing ? 0 : -1}
        aria-selected={cell === 'name'}
      >
        <span className="index">{storey + 1}</span>
        <span className={`name ${shown ? '' : 'alone'} ${row.name === '' ? 'untyped' : ''} ${state('name')}`}>
          {nameEditing ? (
            <CellInput
              path={cellPath(storey, 'name')}
              text={text}
              unread={false}
              label={`Storey ${storey + 1}, name`}
            />
          ) : (
            row.name || (chosen || storey === 0 ? 'name' : '\u00a0')
          )}
        </span>
        {shown && <span className={`tag ${failed ? 'failed' : ''}`}>{tag}</span>}
        <RowMenu storey={storey} name={row.name} />
      </div>
      {columns.slice(1).map((column, index) => (
        <InputCell
          key={column}
          storey={storey}
          column={column}
          last={index === columns.length - 2}
          className={state(column)}
          chosen={cell === column}
          editing={editing === column}
          text={editing === column ? text : cellText(row, column, system)}
          narrow={narrow}
          unread={faulty.includes(column)}
          fillHandle={props.fillHandle && cell === column}
        />
      ))}
      <Answers {...props} />
    </div>
  );
});

interface InputCellProps {
  readonly storey: number;
  readonly column: InputColumn;
  readonly last: boolean;
  readonly className: string;
  readonly chosen: boolean;
  readonly editing: boolean;
  readonly text: string;
  readonly narrow: boolean;
  readonly unread: boolean;
  readonly fillHandle: boolean;
}

const InputCell = memo(function InputCell(props: InputCellProps) {
  const { storey, column, last, className, chosen, editing, text, narrow, unread, fillHandle } = props;
  const label = `Storey ${storey + 1}, ${COLUMN_NAMES[column]}`;
  return (
    <div
      role="gridcell"
      className={`cell ${column} ${last ? 'last' : ''} ${className}`}
      style={{ gridColumn: column }}
      data-cell={column}
      tabIndex={chosen && !editing ? 0 : -1}
      aria-selected={chosen}
      aria-label={editing ? undefined : `${label}, ${text === '' ? 'not typed' : text}`}
      aria-invalid={unread}
    >
      {column === 'law' ? (
        <>
          <ElasticGlyph />
          {!narrow && <span>{text}</span>}
        </>
      ) : editing ? (
        <CellInput path={cellPath(storey, column)} text={text} unread={unread} label={label} />
      ) : (
        <span>{text}</span>
      )}
      {fillHandle && !editing && column !== 'law' && <i className="fill-handle" data-fill="" />}
    </div>
  );
});

function RowMenu({ storey, name }: { readonly storey: number; readonly name: string }) {
  return (
    <Menu
      className="icon-button low row-menu"
      label={`Storey ${storey + 1}${name === '' ? '' : `, ${name}`}: add, move, remove`}
      tabIndex={-1}
      items={[
        { id: 'above', label: 'Add a storey above', keys: 'Alt+↑', run: () => add(storey, 'above') },
        { id: 'below', label: 'Add a storey below', keys: 'Alt+↓', run: () => add(storey, 'below') },
        { id: 'up', label: 'Move up', keys: 'Alt+Shift+↑', run: () => move(storey, true) },
        { id: 'down', label: 'Move down', keys: 'Alt+Shift+↓', run: () => move(storey, false) },
        { id: 'remove', label: 'Remove', keys: 'Alt+Delete', run: () => remove(storey) },
      ]}
    >
      <Icon name="more" />
    </Menu>
  );
}

function ElasticGlyph() {
  return (
    <svg width="18" height="12" viewBox="0 0 18 12" aria-hidden="true">
      <path d="M2 11 16 1" fill="none" stroke="currentColor" strokeWidth="1.2" strokeLinecap="round" />
    </svg>
  );
}

function Answers(props: StoreyRowProps) {
  const { storey, measure, drift, ratio, shear, acceleration, over, cell } = props;
  const none = drift === 'none';
  const says = none
    ? `Storey ${storey + 1}, no answer`
    : `Storey ${storey + 1}, ${measure} drift ${drift} percent, ${ratio} of the limit${over ? ', over' : ''}${props.old ? ', out of date' : ''}`;
  const past = over ? 'past' : '';
  const quiet = none ? 'none' : '';
  return (
    <>
      <div
        role="gridcell"
        className={`answer mean ${past} ${quiet}`}
        style={{ gridColumn: 'mean' }}
        data-cell="drift"
        tabIndex={cell === 'drift' ? 0 : -1}
        aria-label={says}
      >
        {drift}
      </div>
      <div className={`answer ratio ${past} ${quiet}`} style={{ gridColumn: 'ratio' }} aria-hidden="true">
        {ratio}
      </div>
      <div
        role="gridcell"
        className={`answer ${quiet}`}
        style={{ gridColumn: 'force' }}
        data-cell="shear"
        tabIndex={cell === 'shear' ? 0 : -1}
        aria-label={`Storey ${storey + 1}, shear ${shear}`}
      >
        {shear}
      </div>
      <div
        role="gridcell"
        className={`answer ${quiet}`}
        style={{ gridColumn: 'g' }}
        data-cell="acceleration"
        tabIndex={cell === 'acceleration' ? 0 : -1}
        aria-label={`Storey ${storey + 1}, floor acceleration ${acceleration}`}
      >
        {acceleration}
      </div>
    </>
  );
}
