import type { Fault } from '../../core/fault.ts';
import { printQuantity, printShort, type Quantity, type System } from '../../core/units/quantities.ts';
import { readQuantity } from '../../core/units/read.ts';
import { faultAndMend } from '../../document/faultWords.ts';
import { fieldOf, readAt } from '../../document/fields.ts';
import type { Project, Typed } from '../../document/project.ts';
import { commitDraft, documentStore, setDraft } from '../../state/document.ts';
import { sessionStore } from '../../state/session.ts';

/** What a field measures; null where it holds words. */
export function quantityOf(path: string): Quantity | null {
  const { quantity } = fieldOf(path);
  return quantity === 'text' ? null : quantity;
}

/**
 * A typed value as it stands in its cell, without a unit: with the column's own decimals where they hold all of it, in
 * full where they do not.
 */
export function typedText(value: Typed, quantity: Quantity | null, system: System): string {
  if (value === null) return '';
  if (typeof value === 'string' || quantity === null) return String(value);
  const full = printShort(value, quantity, system);
  const even = printQuantity(value, quantity, system);
  return /e/i.test(full) || decimals(full) > decimals(even) ? full : even;
}

function decimals(text: string): number {
  const point = text.indexOf('.');
  return point < 0 ? 0 : text.length - point - 1;
}

/** The text of a field while it is not edited. */
export function shownText(project: Project, path: string, system: System): string {
  const value = readAt(project, path);
  // Hardening is a figure or two: 3, not 3.00.
  if (typeof value === 'number' && path.endsWith('.hardening')) return printShort(value, 'percent', system);
  return typedText(value, quantityOf(path), system);
}

/** What a text in a field is taken for: a number (SI), null, or the text itself where it cannot be read yet. */
function valueRead(path: string, text: string, system: System): Typed {
  const quantity = quantityOf(path);
  if (quantity === null) return text;
  const reading = readQuantity(text, quantity, system, committedNumber(path));
  if (reading.kind === 'value') return reading.value;
  return reading.kind === 'empty' ? null : text;
}

/** The committed number of a field, on which changes such as +10% build; null where it holds none. */
function committedNumber(path: string): number | null {
  const value = readAt(documentStore.getState().project, path);
  return typeof value === 'number' ? value : null;
}

/** The text of a field while it is edited: the draft, so that the answers follow each key. */
export function typeField(path: string, text: string, system: System): void {
  if (documentStore.getState().draft?.path !== path) commitOpenDraft();
  setDraft({ path, text, value: valueRead(path, text, system) });
}

/** Opens a field for editing with its value as it stands. */
export function openField(path: string, system: System): void {
  commitOpenDraft();
  const { project } = documentStore.getState();
  setDraft({ path, text: shownText(project, path, system), value: readAt(project, path) });
}

/** Makes what was typed into a field one undo step; nothing typed, or nothing changed, makes none. */
export function commitField(path: string, system: System): void {
  const { draft, project } = documentStore.getState();
  if (draft === null || draft.path !== path) return;
  const before = readAt(project, path);
  if (Object.is(before, draft.value)) setDraft(null);
  else commitDraft(stepLabel(project, path, draft.value, system));
}

/** Makes whatever field is being edited one undo step, so that nothing typed is lost when something else begins. */
export function commitOpenDraft(): void {
  const { draft } = documentStore.getState();
  if (draft !== null) commitField(draft.path, sessionStore.getState().system);
}

/** "storey 2 stiffness 455 to 470": how undo names the step. */
function stepLabel(project: Project, path: string, value: Typed, system: System): string {
  const quantity = quantityOf(path);
  const say = (entry: Typed) => {
    if (entry === null || entry === '') return 'nothing';
    return typeof entry === 'string' || quantity === null ? `"${entry}"` : printShort(entry, quantity, system);
  };
  return `${fieldOf(path).label(project)} ${say(readAt(project, path))} to ${say(value)}`;
}

/** Gives up the edit of a field. */
export function giveUpField(path: string): void {
  if (documentStore.getState().draft?.path === path) setDraft(null);
}

/** The readings of a text that can be taken two ways; none where it is clear. */
export function readingsOf(path: string, text: string, system: System): readonly { value: number; shown: string }[] {
  const quantity = quantityOf(path);
  if (quantity === null) return [];
  const reading = readQuantity(text, quantity, system, committedNumber(path));
  return reading.kind === 'ambiguous' ? reading.readings : [];
}

/** Whether the field waits for one of two readings to be chosen. */
export function isAmbiguous(path: string, system: System): boolean {
  const { draft } = documentStore.getState();
  return draft?.path === path && readingsOf(path, draft.text, system).length > 0;
}

/** Takes one reading of an ambiguous text. */
export function takeReading(path: string, value: number, system: System): void {
  const { project } = documentStore.getState();
  setDraft({ path, text: typedText(value, quantityOf(path), system), value });
  if (Object.is(readAt(project, path), value)) setDraft(null);
  else commitDraft(stepLabel(project, path, value, system));
}

/** What is wrong with a field as it stands, with the mend; null: nothing. */
export function wordsOf(project: Project, path: string, system: System, fault: Fault | undefined): string | null {
  const value = readAt(project, path);
  const quantity = quantityOf(path);
  if (typeof value === 'string' && quantity !== null) {
    const reading = readQuantity(value, quantity, system, null);
    if (reading.kind === 'ambiguous') {
      return `${value} reads as ${reading.readings.map((entry) => entry.shown).join(' or ')}: type it without the comma`;
    }
    if (reading.kind === 'unreadable') return `${reading.why}: ${reading.mend}`;
  }
  return fault === undefined ? null : faultAndMend(fault, system);
}
