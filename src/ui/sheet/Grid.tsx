import { type ClipboardEvent, type KeyboardEvent, type PointerEvent, useLayoutEffect, useMemo, useRef } from 'react';
import type { Fault } from '../../core/fault.ts';
import type { System } from '../../core/units/quantities.ts';
import type { Project, StoreyRow as Row } from '../../document/project.ts';
import { documentStore, useDocument } from '../../state/document.ts';
import { sessionStore, setSession, useSession } from '../../state/session.ts';
import type { AnswerRows } from './answerRows.ts';
import { answerColumns, COLUMN_NAMES, cellOf, type InputColumn } from './columns.ts';
import { choose, clear, ensureStorey, fill } from './commands.ts';
import { copyBlock } from './copy.ts';
import { type Keyboard, open, sheetKey } from './keys.ts';
import { coverOf } from './move.ts';
import type { Rows } from './rows.ts';
import { StoreyRow } from './StoreyRow.tsx';

export interface GridProps {
  readonly project: Project;
  readonly columns: readonly InputColumn[];
  readonly rows: Rows;
  readonly lawNames: boolean;
  readonly signs: Readonly<Partial<Record<InputColumn, number>>>;
  /** Ductility and residual drift stand on the row. */
  readonly yielding: boolean;
  readonly system: System;
  /** The chosen cell: the reader's, or where the sheet starts. */
  readonly cell: { readonly storey: number; readonly column: string };
  readonly chosenStorey: number;
  readonly answers: AnswerRows | null;
  readonly old: boolean;
  readonly faults: readonly Fault[];
  readonly letters: Readonly<Record<string, string>>;
  /** The panel of a law is open. */
  readonly panel: boolean;
  readonly onPaste: (text: string) => void;
  /** Opens the panel of a storey's law; null closes it. */
  readonly onLaw: (storey: number | null) => void;
}

/** The storey table: one tab stop, every cell within reach of the keys. */
export function Grid(props: GridProps) {
  const { project, columns, rows, system, cell, chosenStorey, answers, old, faults, letters, yielding } = props;
  const { lawNames, signs, panel, onPaste, onLaw } = props;
  const grid = useRef<HTMLDivElement>(null);
  const wanted = useRef(false);
  const selection = useSession((state) => state.selection);
  const draft = useDocument((state) => state.draft);
  // What is typed in the panel of a law shows in its cell, and is edited there.
  const edited = draft === null || panel ? null : cellOf(draft.path);
  const walked = useMemo(() => [...columns, ...answerColumns(yielding)], [columns, yielding]);
  const storeys = project.frame.storeys;
  const keyboard: Keyboard = {
    ground: { storeys: Math.max(1, storeys.length), columns: walked },
    inputs: columns,
    cell,
    ensureStorey,
    openLaw: onLaw,
  };

  // The focus follows the chosen cell wherever a key or the end of an edit left it; at first it starts there.
  useLayoutEffect(() => {
    const root = grid.current;
    if (root === null || edited !== null) return;
    const focused = document.activeElement;
    const walks = wanted.current || root.contains(focused);
    if (!walks && focused !== document.body) return;
    wanted.current = false;
    const target = root.querySelector<HTMLElement>(`[data-storey="${cell.storey}"] [data-cell="${cell.column}"]`);
    if (target === focused) return;
    target?.focus({ preventScroll: true });
    if (walks) target?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  }, [cell.storey, cell.column, edited]);

  const onKeyDown = (event: KeyboardEvent) => {
    if (panel) {
      // The panel is on its way: a key that is meant for it must not move the cell.
      if (event.key === 'Escape') onLaw(null);
      event.preventDefault();
      return;
    }
    wanted.current = true;
    if (!sheetKey(event, keyboard)) {
      wanted.current = false;
      return;
    }
    event.preventDefault();
    event.stopPropagation();
  };
  const onPointerDown = (event: PointerEvent) => {
    const place = placeOf(event.target);
    if (place === null || event.button !== 0) return;
    if (event.target instanceof HTMLElement && event.target.dataset.fill !== undefined) {
      event.preventDefault();
      startFill(grid.current, columns);
      return;
    }
    if (edited?.storey === place.storey && edited.column === place.column) return;
    wanted.current = true;
    if (event.shiftKey && columns.includes(place.column as InputColumn)) extendTo(place, cell);
    else {
      choose(place.storey, place.column);
      if (columns.includes(place.column as InputColumn)) startBlock(grid.current, columns, place.column);
    }
    event.preventDefault();
    const target = grid.current?.querySelector<HTMLElement>(
      `[data-storey="${place.storey}"] [data-cell="${place.column}"]`,
    );
    target?.focus({ preventScroll: true });
  };
  const onCopy = (event: ClipboardEvent) => {
    if (event.target instanceof HTMLInputElement) return;
    const text = copyBlock(columns, system);
    if (text === null) return;
    event.clipboardData.setData('text/plain', text);
    event.preventDefault();
    if (event.type === 'cut') clear(columns);
  };
  const onPasteBlock = (event: ClipboardEvent) => {
    const text = event.clipboardData.getData('text/plain');
    if (event.target instanceof HTMLInputElement && !/[\t\n]/.test(text.trim())) return;
    event.preventDefault();
    onPaste(text);
  };

  const cover = selection === null ? null : coverOf(selection, columns);
  const editedPath = draft?.path ?? null;
  const faulty = useMemo(() => faultyCells(faults, editedPath), [faults, editedPath]);
  return (
    <div
      ref={grid}
      className="grid"
      role="grid"
      aria-label="Storeys, roof on top"
      aria-rowcount={storeys.length + 1}
      aria-multiselectable="true"
      data-part="cells"
      onKeyDown={onKeyDown}
      onPointerDown={onPointerDown}
      onClick={(event) => {
        const place = placeOf(event.target);
        if (place?.column === 'law' && !event.shiftKey) open({ ...keyboard, cell: place });
      }}
      onDoubleClick={(event) => {
        const place = placeOf(event.target);
        if (place !== null && place.column !== 'law') open(keyboard);
      }}
      onCopy={onCopy}
      onCut={onCopy}
      onPaste={onPasteBlock}
    >
      <div role="row" className="spoken" aria-rowindex={1}>
        {columns.map((column) => (
          <span role="columnheader" key={column}>
            {COLUMN_NAMES[column]}
          </span>
        ))}
        {answerColumns(yielding).map((column) => (
          <span role="columnheader" key={column}>
            {ANSWERED[column]}
          </span>
        ))}
      </div>
      {[...rows.heights.keys()].reverse().map((storey) => {
        const row: Row = storeys[storey] ?? EMPTY_ROW;
        const failed = answers?.failed.filter((entry) => entry.storey === storey) ?? [];
        const governs = !old && answers !== null && answers.drift !== null && answers.governing === storey;
        const isolator = storey === 0 && row.role === 'isolator';
        const standing = [...(isolator ? ['isolator'] : []), ...(governs ? ['governs'] : [])].join(', ');
        const tag =
          failed.length > 0
            ? `${failed[0].how} ${letters[failed[0].motion] ?? failed[0].motion}${failed.length > 1 ? ` +${failed.length - 1}` : ''}`
            : standing === ''
              ? null
              : standing;
        const inBlock = cover !== null && cover.columns.length * (cover.high - cover.low + 1) > 1;
        return (
          <StoreyRow
            key={storey}
            storey={storey}
            row={row}
            size={rows.heights[storey] ?? 0}
            system={system}
            columns={columns}
            lawNames={lawNames}
            signs={signs}
            chosen={chosenStorey === storey}
            governs={governs}
            over={(answers?.over[storey] ?? false) && !old}
            tag={tag}
            failed={failed.length > 0}
            cell={cell.storey === storey ? cell.column : null}
            block={inBlock && storey >= cover.low && storey <= cover.high ? cover.columns.join(' ') : ''}
            editing={edited?.storey === storey ? edited.column : null}
            text={edited?.storey === storey ? (draft?.text ?? '') : ''}
            faulty={faulty.get(storey) ?? ''}
            measure={answers?.measure ?? 'mean'}
            drift={answers?.print.drift[storey] ?? ''}
            ratio={answers?.print.ratio[storey] ?? ''}
            ductility={yielding ? (answers?.print.ductility[storey] ?? '') : null}
            residual={yielding ? (answers?.print.residual[storey] ?? '') : null}
            isolator={isolator ? (answers?.isolator?.words ?? 'isolator') : null}
            shear={answers?.print.shear[storey] ?? ''}
            acceleration={answers?.print.acceleration[storey] ?? ''}
            old={old}
            fillHandle={storeys.length > 1}
          />
        );
      })}
    </div>
  );
}

const ANSWERED = {
  drift: 'drift',
  ductility: 'ductility',
  residual: 'residual drift',
  shear: 'shear',
  acceleration: 'acceleration',
} as const;

const EMPTY_ROW = { name: '', height: null, mass: null, stiffness: null, law: { kind: 'elastic' } } satisfies Row;

/** Cells at fault; where an edit makes a storey unstable under gravity, the edited cell too. */
function faultyCells(faults: readonly Fault[], edited: string | null): ReadonlyMap<number, string> {
  const cells = new Map<number, string>();
  const unstable = faults.some(({ code }) => code === 'unstable-under-gravity');
  for (const where of [...faults.map((fault) => fault.where), ...(unstable && edited !== null ? [edited] : [])]) {
    const cell = cellOf(where);
    if (cell !== null) cells.set(cell.storey, `${cells.get(cell.storey) ?? ''} ${cell.column}`.trim());
  }
  return cells;
}

function placeOf(target: EventTarget | null): { readonly storey: number; readonly column: string } | null {
  if (!(target instanceof Element) || target.closest('.row-menu, [role="menu"]') !== null) return null;
  const column = target.closest<HTMLElement>('[data-cell]')?.dataset.cell;
  const storey = target.closest<HTMLElement>('[data-storey]')?.dataset.storey;
  return column === undefined || storey === undefined ? null : { storey: Number(storey), column };
}

function extendTo(
  place: { readonly storey: number; readonly column: string },
  from: { readonly storey: number; readonly column: string },
): void {
  const before = sessionStore.getState().selection;
  setSession({
    selection: {
      ...place,
      anchorStorey: before?.anchorStorey ?? from.storey,
      anchorColumn: before?.anchorColumn ?? from.column,
    },
    storey: place.storey,
  });
}

/** Follows the pointer until it is let go. */
function follow(onMove: (event: globalThis.PointerEvent) => void, onEnd: () => void): void {
  const end = () => {
    window.removeEventListener('pointermove', onMove);
    window.removeEventListener('pointerup', end);
    window.removeEventListener('pointercancel', end);
    onEnd();
  };
  window.addEventListener('pointermove', onMove);
  window.addEventListener('pointerup', end);
  window.addEventListener('pointercancel', end);
}

/** Drags a block open from the cell that was pressed. */
function startBlock(grid: HTMLElement | null, columns: readonly string[], first: string): void {
  const anchor = sessionStore.getState().selection;
  if (grid === null || anchor === null) return;
  follow(
    (event) => {
      const place = placeOf(document.elementFromPoint(event.clientX, event.clientY));
      const before = sessionStore.getState().selection;
      if (place === null || before === null || !columns.includes(place.column)) return;
      if (place.storey === before.storey && place.column === before.column) return;
      setSession({
        selection: { ...place, anchorStorey: anchor.storey, anchorColumn: first },
        storey: place.storey,
      });
    },
    () => {},
  );
}

/** Drags the handle of the chosen cell up or down: the storeys passed get its value, as one step. */
function startFill(grid: HTMLElement | null, columns: readonly string[]): void {
  const { selection } = sessionStore.getState();
  if (grid === null || selection === null) return;
  const cover = coverOf(selection, columns);
  const from = selection.anchorStorey;
  let low = cover.low;
  let high = cover.high;
  follow(
    (event) => {
      const place = placeOf(document.elementFromPoint(event.clientX, event.clientY));
      if (place === null) return;
      low = Math.min(cover.low, place.storey);
      high = Math.max(cover.high, place.storey);
      const far = place.storey < from ? low : high;
      setSession({ selection: { ...selection, anchorStorey: from, storey: far } });
    },
    () => {
      const top = documentStore.getState().project.frame.storeys.length - 1;
      const to: number[] = [];
      for (let storey = low; storey <= Math.min(high, top); storey++) if (storey !== from) to.push(storey);
      fill(cover.columns, from, to);
    },
  );
}
