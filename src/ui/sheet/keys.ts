import type { KeyboardEvent } from 'react';
import { documentStore } from '../../state/document.ts';
import { sessionStore, setSession } from '../../state/session.ts';
import { commitField, giveUpField, isAmbiguous, openField, typeField } from '../controls/field.ts';
import { cellOf, cellPath, isTyped, takes } from './columns.ts';
import { add, choose, clear, fillDown, move, remove } from './commands.ts';
import { type Ground, moved, type Step } from './move.ts';

const ARROWS: Readonly<Record<string, Step>> = {
  ArrowUp: 'up',
  ArrowDown: 'down',
  ArrowLeft: 'left',
  ArrowRight: 'right',
};
const EDGES: Readonly<Record<string, Step>> = {
  ArrowUp: 'top',
  ArrowDown: 'bottom',
  ArrowLeft: 'first',
  ArrowRight: 'last',
};

export interface Keyboard {
  readonly ground: Ground;
  /** Columns that Tab walks through and blocks are made of. */
  readonly inputs: readonly string[];
  /** The chosen cell; the sheet always has one. */
  readonly cell: { readonly storey: number; readonly column: string };
  /** Makes the first storey of an empty sheet; nothing where there is one. */
  readonly ensureStorey: () => void;
  /** Opens the panel of a storey's law. */
  readonly openLaw: (storey: number) => void;
}

/** Everything the keys do on the sheet. Returns true where the key is taken. */
export function sheetKey(event: KeyboardEvent, keyboard: Keyboard): boolean {
  const { draft } = documentStore.getState();
  const edited = draft === null ? null : cellOf(draft.path);
  if (event.target instanceof HTMLInputElement && edited !== null) return editingKey(event, keyboard, edited);
  return restingKey(event, keyboard);
}

function editingKey(
  event: KeyboardEvent,
  keyboard: Keyboard,
  edited: { readonly storey: number; readonly column: string },
): boolean {
  const { system } = sessionStore.getState();
  const path = cellPath(edited.storey, edited.column);
  const leave = (step: Step) => {
    commitField(path, system);
    go(keyboard, step, false);
    return true;
  };
  switch (event.key) {
    case 'Enter':
      if (isAmbiguous(path, system)) {
        document.querySelector<HTMLElement>('[data-reading]')?.focus();
        return true;
      }
      return leave(event.shiftKey ? 'up' : 'down');
    case 'ArrowUp':
    case 'ArrowDown':
      return leave(ARROWS[event.key] ?? 'down');
    case 'Tab':
      return tab(event, keyboard, () => commitField(path, system));
    case 'Escape':
      giveUpField(path);
      return true;
    default:
      return false;
  }
}

function restingKey(event: KeyboardEvent, keyboard: Keyboard): boolean {
  const { key, shiftKey, altKey } = event;
  const control = event.ctrlKey || event.metaKey;
  const { storey, column } = keyboard.cell;
  if (altKey && !control) return altKeyOn(event, storey);
  const arrow = ARROWS[key];
  if (arrow !== undefined) return go(keyboard, control ? (EDGES[key] ?? arrow) : arrow, shiftKey);
  if (control) {
    if (key === 'Home' || key === 'End') return go(keyboard, key === 'Home' ? 'roof' : 'ground', shiftKey);
    if (key.toLowerCase() === 'd') {
      fillDown(keyboard.inputs);
      return true;
    }
    if (key.toLowerCase() === 'a') {
      const { storeys } = keyboard.ground;
      setSession({
        selection: {
          storey: storeys - 1,
          column: 'height',
          anchorStorey: 0,
          anchorColumn: keyboard.inputs.at(-1) ?? 'stiffness',
        },
      });
      return true;
    }
    return false;
  }
  switch (key) {
    case 'Home':
    case 'End':
      return go(keyboard, key === 'Home' ? 'first' : 'last', shiftKey);
    case 'Enter':
      return column === 'law' && !shiftKey ? open(keyboard) : go(keyboard, shiftKey ? 'up' : 'down', false);
    case 'Tab':
      return tab(event, keyboard, () => {});
    case 'F2':
      return open(keyboard);
    case 'Delete':
    case 'Backspace':
      clear(keyboard.inputs);
      return true;
    case 'Escape':
      choose(storey, column);
      return true;
    default:
      if (column === 'law' && (key === ' ' || /^[a-z]$/i.test(key))) return open(keyboard);
      if (key.length !== 1 || key === ' ' || !isTyped(column)) return false;
      if ('[]?'.includes(key) && column !== 'name') return false;
      if (!begin(keyboard)) return true;
      typeField(cellPath(storey, column), key, sessionStore.getState().system);
      return true;
  }
}

/** Opens the chosen cell with its value, a law with its panel. */
export function open(keyboard: Keyboard): boolean {
  const { storey, column } = keyboard.cell;
  if (column === 'law') {
    if (begin(keyboard)) keyboard.openLaw(storey);
    return true;
  }
  if (!isTyped(column)) return false;
  if (!begin(keyboard)) return true;
  openField(cellPath(storey, column), sessionStore.getState().system);
  return true;
}

/**
 * An edit begins: the cell is the reader's own from here on, and on an empty sheet its storey is made. False where the storey takes
 * nothing there; the line above says why.
 */
function begin({ cell, ensureStorey }: Keyboard): boolean {
  const { storey, column } = cell;
  if (sessionStore.getState().selection === null) choose(storey, column);
  ensureStorey();
  return column === 'law' || takes(documentStore.getState().project.frame.storeys[storey], column);
}

function altKeyOn(event: KeyboardEvent, storey: number): boolean {
  if (event.key === 'Delete') remove(storey);
  else if (event.key === 'ArrowUp') event.shiftKey ? move(storey, true) : add(storey, 'above');
  else if (event.key === 'ArrowDown') event.shiftKey ? move(storey, false) : add(storey, 'below');
  else return false;
  return true;
}

/** Tab walks through the columns that are typed and leaves the sheet after the last one. */
function tab(event: KeyboardEvent, keyboard: Keyboard, commit: () => void): boolean {
  const { storey, column } = keyboard.cell;
  const walked = keyboard.inputs.filter(isTyped);
  const next = walked[walked.indexOf(column as (typeof walked)[number]) + (event.shiftKey ? -1 : 1)];
  commit();
  if (next === undefined || !isTyped(column)) return false;
  choose(storey, next);
  return true;
}

function go(keyboard: Keyboard, step: Step, extend: boolean): boolean {
  const { storey, column } = keyboard.cell;
  const { selection } = sessionStore.getState();
  const from = selection ?? { storey, column, anchorStorey: storey, anchorColumn: column };
  const ground = extend ? { ...keyboard.ground, columns: keyboard.inputs } : keyboard.ground;
  const next = moved(from, step, extend, ground);
  setSession({ selection: next, storey: next.storey });
  return true;
}
