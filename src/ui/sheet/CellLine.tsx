import type { Fault } from '../../core/fault.ts';
import { printQuantity, type System, unitOf } from '../../core/units/quantities.ts';
import { cellFacts } from '../../document/cellFacts.ts';
import { faultAndMend } from '../../document/faultWords.ts';
import { fieldOf, readAt } from '../../document/fields.ts';
import type { Project } from '../../document/project.ts';
import { documentStore, useDocument } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { quantityOf, readingsOf, takeReading, wordsOf } from '../controls/field.ts';
import { fullText } from './cellText.ts';
import {
  COLUMN_NAMES,
  COLUMN_QUANTITIES,
  cellOf,
  cellPath,
  type InputColumn,
  isInput,
  isTyped,
  takes,
} from './columns.ts';
import { LAWS } from './lawWords.ts';

export interface CellLineProps {
  readonly project: Project;
  readonly system: System;
  readonly cell: { readonly storey: number; readonly column: string };
  readonly faults: readonly Fault[];
  readonly onEdit: () => void;
}

/** The chosen cell again, larger: its text, its unit, the value as it will be read, and one fact that follows from it. */
export function CellLine({ project, system, cell, faults, onEdit }: CellLineProps) {
  const { storey, column } = cell;
  const path = cellPath(storey, column);
  const draft = useDocument((state) => (state.draft?.path === path ? state.draft : null));
  if (!isInput(column)) {
    return <span className="quiet">Storey {storey + 1}</span>;
  }
  const name = COLUMN_NAMES[column];
  const row = project.frame.storeys[storey];
  const exists = row !== undefined;
  const place = (
    <span className="quiet">
      Storey {storey + 1}, {name}
    </span>
  );
  if (!isTyped(column)) {
    const fault = faults.find(({ where }) => where.startsWith(path) && cellOf(where)?.column === 'law');
    return (
      <>
        {place}
        <Button size="medium" className="cell-echo law-echo" tabIndex={-1} onClick={onEdit}>
          {LAWS.find(({ kind }) => kind === row?.law.kind)?.name ?? 'Elastic'}
        </Button>
        {fault === undefined ? (
          <span className="fact">{cellFacts(project, path, system) || 'Enter chooses another law'}</span>
        ) : (
          <Wrong words={faultAndMend(fault, system)} />
        )}
      </>
    );
  }
  if (exists && !takes(row, column)) {
    const why =
      column === 'hardening'
        ? 'the storey is elastic: type a strength first'
        : 'no damper: type its force at 1 m/s first';
    return (
      <>
        {place}
        <span className="fact">none; {why}</span>
      </>
    );
  }
  const quantity = exists ? quantityOf(path) : null;
  const text = !exists ? '' : (draft?.text ?? fullText(row, column, system));
  const fault =
    faults.find((entry) => entry.where === path) ?? (draft === null ? undefined : faults.find(brokenByEdit));
  const readings = exists ? readingsOf(path, text, system) : [];
  const typed = exists && (draft !== null || readAt(project, path) !== null);
  const wrong = typed && readings.length === 0 && text !== '' ? wordsOf(project, path, system, fault) : null;
  const unit = exists && quantity !== null ? unitOf(quantity, system) : unitOfColumn(column, system);
  return (
    <>
      {place}
      <button
        type="button"
        className="field cell-echo"
        tabIndex={-1}
        aria-label={`Edit storey ${storey + 1}, ${name}`}
        onClick={onEdit}
      >
        {text}
      </button>
      {unit !== null && <span className="unit cell-unit">{unit}</span>}
      {readings.length > 0 && (
        <span className="mends" data-keeps-edit="">
          <span className="wrong">two ways to read it:</span>
          {readings.map((reading) => (
            <Button
              key={reading.shown}
              size="low"
              data-reading=""
              onClick={() => takeReading(path, reading.value, system)}
            >
              {reading.shown}
            </Button>
          ))}
        </span>
      )}
      {wrong !== null && <Wrong words={wrong} />}
      {readings.length === 0 && wrong === null && (
        <span className="fact">{factOf(project, storey, column, system, draft?.text ?? null)}</span>
      )}
    </>
  );
}

function Wrong({ words }: { readonly words: string }) {
  return (
    <span className="wrong" title={words}>
      {words}
    </span>
  );
}

/** A storey that what is being typed makes unstable: said where it is typed, wherever that is. */
function brokenByEdit({ code }: Fault): boolean {
  return code === 'unstable-under-gravity';
}

function unitOfColumn(column: InputColumn, system: System): string | null {
  const quantity = COLUMN_QUANTITIES[column];
  return quantity === null ? null : unitOf(quantity, system);
}

/** What follows from a cell; where the text is no plain number, first the value as it is read. */
function factOf(project: Project, storey: number, column: string, system: System, typed: string | null): string {
  const path = cellPath(storey, column);
  if (storey >= project.frame.storeys.length) return fieldOf(path).hint(system);
  const value = readAt(project, path);
  const facts: string[] = [];
  const quantity = quantityOf(path);
  if (typed !== null && typeof value === 'number' && quantity !== null && !/^[\d\s.,]*$/.test(typed)) {
    facts.push(`read as ${printQuantity(value, quantity, system)} ${unitOf(quantity, system)}`);
  }
  if (typed !== null && column === 'strength') facts.push(madeBilinear(project, storey));
  if (typeof value === 'number') facts.push(cellFacts(project, path, system));
  if (value === null) facts.push(hint(project, storey, column, system));
  return facts.filter((fact) => fact !== '').join('; ');
}

function hint(project: Project, storey: number, column: string, system: System): string {
  if (column === 'strength' && project.frame.storeys[storey]?.law.kind === 'elastic') {
    return 'none: a strength makes the storey bilinear';
  }
  return fieldOf(cellPath(storey, column)).hint(system);
}

/** A strength typed into an elastic storey makes it yield: said while it is typed, with the hardening that comes with it. */
function madeBilinear(project: Project, storey: number): string {
  const before = documentStore.getState().project.frame.storeys[storey]?.law;
  const law = project.frame.storeys[storey]?.law;
  if (before?.kind !== 'elastic' || law === undefined || law.kind === 'elastic') return '';
  return `makes it bilinear, hardening ${printQuantity(Number(law.hardening), 'percent', 'si', 0)} %`;
}
