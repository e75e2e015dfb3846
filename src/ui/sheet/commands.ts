import {
  addStorey,
  clearDamper,
  lowestPlace,
  moveStorey,
  removeStorey,
  setDamper,
  setLaw,
  setRole,
} from '../../document/edits.ts';
import { readAt, writeAt } from '../../document/fields.ts';
import { lawLike } from '../../document/lawLike.ts';
import { MAX_STOREYS, type Project, type StoreyRow } from '../../document/project.ts';
import { documentStore, edit } from '../../state/document.ts';
import { sessionStore, setSession } from '../../state/session.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { cellPath, isTyped, takes } from './columns.ts';
import { coverOf, single } from './move.ts';

/** Chooses a cell, and with it the storey whose histories are shown. */
export function choose(storey: number, column: string): void {
  setSession({ selection: single(storey, column), storey });
}

function count(): number {
  return documentStore.getState().project.frame.storeys.length;
}

function column(): string {
  return sessionStore.getState().selection?.column ?? 'height';
}

/** A storey above or below another, as its copy. */
export function add(storey: number, where: 'above' | 'below'): void {
  commitOpenDraft();
  const before = count();
  if (before >= MAX_STOREYS) {
    setSession({ toast: `${MAX_STOREYS} storeys is the most a frame holds` });
    return;
  }
  const wanted = before === 0 ? 0 : where === 'above' ? storey + 1 : storey;
  const at = Math.max(wanted, lowestPlace(documentStore.getState().project));
  edit(`storey ${at + 1} added`, (project) => addStorey(project, at, before === 0 ? undefined : storey));
  choose(at, column());
}

export function remove(storey: number): void {
  commitOpenDraft();
  if (storey >= count()) return;
  edit(`storey ${storey + 1} removed`, (project) => removeStorey(project, storey));
  const left = count();
  if (left > 0) choose(Math.min(storey, left - 1), column());
  else setSession({ selection: null, storey: null });
}

/** Moves a storey one place up or down. */
export function move(storey: number, up: boolean): void {
  commitOpenDraft();
  const to = storey + (up ? 1 : -1);
  if (to < 0 || to >= count()) return;
  if (Math.min(storey, to) < lowestPlace(documentStore.getState().project)) {
    setSession({ toast: 'The isolator stays on the ground' });
    return;
  }
  edit(`storey ${storey + 1} moved ${up ? 'up' : 'down'}`, (project) => moveStorey(project, storey, to));
  choose(to, column());
}

/** Gives a storey a damper, or takes it out. */
export function toggleDamper(storey: number): void {
  commitOpenDraft();
  const has = documentStore.getState().project.frame.storeys[storey]?.damper !== undefined;
  edit(`storey ${storey + 1} damper ${has ? 'taken out' : 'added'}`, (project) =>
    has ? clearDamper(project, [storey]) : setDamper(project, [storey]),
  );
  if (!has) choose(storey, 'coefficient');
}

/** Makes a storey an isolator, or an isolator a storey again. */
export function isolate(storey: number): void {
  commitOpenDraft();
  const is = documentStore.getState().project.frame.storeys[storey]?.role === 'isolator';
  edit(`storey ${storey + 1} ${is ? 'a storey again' : 'made an isolator'}`, (project) =>
    setRole(project, storey, is ? 'storey' : 'isolator'),
  );
}

/** The chosen block: storeys from high to low, as they stand on the sheet, and its columns. */
export function chosenBlock(
  columns: readonly string[],
): { readonly storeys: readonly number[]; readonly columns: readonly string[] } | null {
  const { selection } = sessionStore.getState();
  if (selection === null) return null;
  const cover = coverOf(selection, columns);
  const high = Math.min(cover.high, count() - 1);
  return {
    storeys: Array.from({ length: high - cover.low + 1 }, (_, index) => high - index),
    columns: cover.columns,
  };
}

/** Empties the chosen cells. */
export function clear(columns: readonly string[]): void {
  const block = chosenBlock(columns);
  if (block === null) return;
  edit(blockLabel(block, 'cleared'), (project) => {
    let next = project;
    for (const storey of block.storeys) {
      for (const key of block.columns) {
        if (key === 'law') next = setLaw(next, [storey], 'elastic');
        else if (takes(next.frame.storeys[storey], key)) {
          next = writeAt(next, cellPath(storey, key), key === 'name' ? '' : null);
        }
      }
    }
    return next;
  });
}

/** Fills the chosen cells with the values of the top row; one row alone takes those of the storey above. */
export function fillDown(columns: readonly string[]): void {
  const block = chosenBlock(columns);
  if (block === null) return;
  const top = block.storeys[0] ?? 0;
  const from = block.storeys.length === 1 ? top + 1 : top;
  if (from >= count()) return;
  fill(
    block.columns,
    from,
    block.storeys.filter((storey) => storey !== from),
  );
}

/** Copies cells of one storey to others, as one step. */
export function fill(columns: readonly string[], from: number, to: readonly number[]): void {
  if (to.length === 0) return;
  const storeys = [...to].sort((a, b) => b - a);
  edit(blockLabel({ storeys }, 'filled'), (project) => copied(project, columns, from, storeys));
}

function copied(project: Project, columns: readonly string[], from: number, to: readonly number[]): Project {
  let next = project;
  for (const key of columns) {
    if (key === 'law') next = lawLike(next, from, to);
    if (!isTyped(key)) continue;
    // A storey without a part has none to give, and one without it takes no number of it.
    if (!holds(project.frame.storeys[from], key)) continue;
    const value = readAt(project, cellPath(from, key));
    for (const storey of to) {
      if (takes(next.frame.storeys[storey], key)) next = writeAt(next, cellPath(storey, key), value);
    }
  }
  return next;
}

function holds(row: StoreyRow | undefined, key: string): boolean {
  return key === 'strength' ? row?.law.kind !== 'elastic' : takes(row, key);
}

function blockLabel({ storeys }: { readonly storeys: readonly number[] }, done: string): string {
  const high = (storeys[0] ?? 0) + 1;
  const low = (storeys.at(-1) ?? 0) + 1;
  return high === low ? `storey ${high} ${done}` : `storeys ${low} to ${high} ${done}`;
}

/** The first storey of an empty sheet, with nothing typed yet. */
export function ensureStorey(): void {
  if (count() === 0) edit('storey 1 added', (project) => addStorey(project, 0));
}
