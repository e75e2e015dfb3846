import { memo } from 'react';
import type { System } from '../../core/units/quantities.ts';
import type { StoreyRow as Row } from '../../document/project.ts';
import { Icon } from '../controls/Icon.tsx';
import { Menu } from '../controls/Menu.tsx';
import { CellInput } from './CellInput.tsx';
import { cellText, isNone } from './cellText.ts';
import { COLUMN_NAMES, cellPath, type InputColumn } from './columns.ts';
import { add, isolate, move, remove, toggleDamper } from './commands.ts';
import { LawGlyph } from './LawGlyph.tsx';

export interface StoreyRowProps {
  readonly storey: number;
  readonly row: Row;
  readonly size: number;
  readonly system: System;
  readonly columns: readonly InputColumn[];
  /** Whether the name of a law stands beside its glyph. */
  readonly lawNames: boolean;
  /** Signs a column has room for. */
  readonly signs: Readonly<Partial<Record<InputColumn, number>>>;
  /** The storey whose histories are shown. */
  readonly chosen: boolean;
  readonly governs: boolean;
  readonly over: boolean;
  /** What stands under the name: "governs", "unstable in E", "isolator"; null: nothing. */
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
  /** Ductility and residual drift; null: not shown. */
  readonly ductility: string | null;
  readonly residual: string | null;
  readonly shear: string;
  readonly acceleration: string;
  /** What an isolator's row says in the place of a drift; null: it is a storey. */
  readonly isolator: string | null;
  readonly old: boolean;
  readonly fillHandle: boolean;
}

/** One storey: what is typed at the left, what it answers at the right. */
export const StoreyRow = memo(function StoreyRow(props: StoreyRowProps) {
  const { storey, row, size, chosen, governs, over, tag, failed, cell, columns, editing, text, system } = props;
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
        {shown && (
          <span className={`tag ${failed ? 'failed' : ''} ${!failed && tag.length > 10 ? 'wide' : ''}`} title={tag}>
            {tag}
          </span>
        )}
        <RowMenu storey={storey} row={row} />
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
          text={editing === column ? text : cellText(row, column, system, props.signs[column])}
          none={isNone(row, column)}
          law={column === 'law' ? row.law.kind : null}
          named={props.lawNames}
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
  /** The storey has no such part. */
  readonly none: boolean;
  /** Kind of law in the cell of the law. */
  readonly law: Row['law']['kind'] | null;
  readonly named: boolean;
  readonly unread: boolean;
  readonly fillHandle: boolean;
}

const InputCell = memo(function InputCell(props: InputCellProps) {
  const { storey, column, last, className, chosen, editing, text, none, law, named, unread, fillHandle } = props;
  const label = `Storey ${storey + 1}, ${COLUMN_NAMES[column]}`;
  return (
    <div
      role="gridcell"
      className={`cell ${column} ${last ? 'last' : ''} ${className}`}
      style={{ gridColumn: column }}
      data-cell={column}
      tabIndex={chosen && !editing ? 0 : -1}
      aria-selected={chosen}
      aria-label={editing ? undefined : `${label}, ${none ? 'none' : text === '' ? 'not typed' : text}`}
      aria-haspopup={law === null ? undefined : 'dialog'}
      aria-invalid={unread}
    >
      {law !== null ? (
        <>
          <LawGlyph kind={law} />
          {named && <span>{text}</span>}
        </>
      ) : editing ? (
        <CellInput path={cellPath(storey, column)} text={text} unread={unread} label={label} />
      ) : none ? (
        <span className="none">none</span>
      ) : (
        <span>{text}</span>
      )}
      {fillHandle && !editing && <i className="fill-handle" data-fill="" />}
    </div>
  );
});

function RowMenu({ storey, row }: { readonly storey: number; readonly row: Row }) {
  const { name, role, damper } = row;
  return (
    <Menu
      className="icon-button low row-menu"
      label={`Storey ${storey + 1}${name === '' ? '' : `, ${name}`}: add, move, remove, damper`}
      tabIndex={-1}
      items={[
        { id: 'above', label: 'Add a storey above', keys: 'Alt+↑', run: () => add(storey, 'above') },
        { id: 'below', label: 'Add a storey below', keys: 'Alt+↓', run: () => add(storey, 'below') },
        { id: 'up', label: 'Move up', keys: 'Alt+Shift+↑', run: () => move(storey, true) },
        { id: 'down', label: 'Move down', keys: 'Alt+Shift+↓', run: () => move(storey, false) },
        { id: 'remove', label: 'Remove', keys: 'Alt+Delete', run: () => remove(storey) },
        { id: 'damper', label: 'Damper', checked: damper !== undefined, run: () => toggleDamper(storey) },
        ...(storey === 0 || role === 'isolator'
          ? [{ id: 'isolator', label: 'Isolator', checked: role === 'isolator', run: () => isolate(storey) }]
          : []),
      ]}
    >
      <Icon name="more" />
    </Menu>
  );
}

function Answers(props: StoreyRowProps) {
  const { storey, measure, drift, ratio, ductility, residual, shear, acceleration, over, cell } = props;
  const none = drift === 'none';
  const says =
    props.isolator !== null
      ? `Storey ${storey + 1}, isolator, ${props.isolator}, ${ratio} of its limit${over ? ', over' : ''}${props.old ? ', out of date' : ''}`
      : none
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
      <div
        className={`answer ratio ${past} ${ratio === 'none' ? 'none' : ''}`}
        style={{ gridColumn: 'ratio' }}
        aria-hidden="true"
      >
        {ratio}
      </div>
      {ductility !== null && (
        <div
          role="gridcell"
          className={`answer second ${ductility === 'none' ? 'none' : ''}`}
          style={{ gridColumn: 'ductility' }}
          data-cell="ductility"
          tabIndex={cell === 'ductility' ? 0 : -1}
          aria-label={`Storey ${storey + 1}, ductility ${ductility}`}
        >
          {ductility}
        </div>
      )}
      {residual !== null && (
        <div
          role="gridcell"
          className={`answer second ${quiet}`}
          style={{ gridColumn: 'residual' }}
          data-cell="residual"
          tabIndex={cell === 'residual' ? 0 : -1}
          aria-label={`Storey ${storey + 1}, residual drift ${residual === '' ? 'not compared' : `${residual} percent`}`}
        >
          {residual}
        </div>
      )}
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
