import type { Fault } from '../../core/fault.ts';
import { printQuantity, printRatio, type System, unitOf } from '../../core/units/quantities.ts';
import { fieldOf, readAt } from '../../document/fields.ts';
import type { Project } from '../../document/project.ts';
import { useDocument } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { quantityOf, readingsOf, shownText, takeReading, wordsOf } from '../controls/field.ts';
import { COLUMN_NAMES, cellPath, isInput, isTyped } from './columns.ts';

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
  const exists = storey < project.frame.storeys.length;
  if (!isTyped(column)) {
    return (
      <>
        <span className="quiet">
          Storey {storey + 1}, {name}
        </span>
        <span className="fact">elastic: laws that yield come with a later version</span>
      </>
    );
  }
  const quantity = exists ? quantityOf(path) : null;
  const text = !exists ? '' : (draft?.text ?? shownText(project, path, system));
  const fault = faults.find((entry) => entry.where === path);
  const readings = exists ? readingsOf(path, text, system) : [];
  const typed = exists && (draft !== null || readAt(project, path) !== null);
  const wrong = typed && readings.length === 0 && text !== '' ? wordsOf(project, path, system, fault) : null;
  const unit = exists && quantity !== null ? unitOf(quantity, system) : unitOfColumn(column, system);
  return (
    <>
      <span className="quiet">
        Storey {storey + 1}, {name}
      </span>
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
      {wrong !== null && <span className="wrong">{wrong}</span>}
      {readings.length === 0 && wrong === null && (
        <span className="fact">{factOf(project, storey, column, system, draft?.text ?? null)}</span>
      )}
    </>
  );
}

function unitOfColumn(column: string, system: System): string | null {
  if (column === 'height') return unitOf('length', system);
  if (column === 'mass') return unitOf('weight', system);
  if (column === 'stiffness') return unitOf('stiffness', system);
  return column === 'gravity' ? unitOf('force', system) : null;
}

/** One fact that follows from a cell; where the text is no plain number, first the value as it is read. */
function factOf(project: Project, storey: number, column: string, system: System, typed: string | null): string {
  const path = cellPath(storey, column);
  if (storey >= project.frame.storeys.length) return fieldOf(path).hint(system);
  const value = readAt(project, path);
  const facts: string[] = [];
  const quantity = quantityOf(path);
  if (typed !== null && typeof value === 'number' && quantity !== null && !/^[\d\s.,]*$/.test(typed)) {
    facts.push(`read as ${printQuantity(value, quantity, system)} ${unitOf(quantity, system)}`);
  }
  if (typeof value === 'number' && column !== 'name') facts.push(comparison(project, storey, column, value, system));
  if (value === null) facts.push(fieldOf(path).hint(system));
  return facts.filter((fact) => fact !== '').join('; ');
}

function comparison(project: Project, storey: number, column: string, value: number, system: System): string {
  const { storeys } = project.frame;
  if (column === 'height') {
    let level = 0;
    for (const row of storeys.slice(0, storey + 1)) level += typeof row.height === 'number' ? row.height : Number.NaN;
    return Number.isFinite(level)
      ? `its floor at +${printQuantity(level, 'length', system)} ${unitOf('length', system)}`
      : '';
  }
  const above = readOther(project, storey + 1, column);
  if (above !== null) return `${printRatio(value / above)} of the storey above`;
  const below = readOther(project, storey - 1, column);
  return below === null ? '' : `${printRatio(value / below)} of the storey below`;
}

function readOther(project: Project, storey: number, column: string): number | null {
  if (storey < 0 || storey >= project.frame.storeys.length) return null;
  const value = readAt(project, cellPath(storey, column));
  return typeof value === 'number' && value > 0 ? value : null;
}
