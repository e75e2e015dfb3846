import { type KeyboardEvent, useRef } from 'react';
import { AIM } from '../../core/dynamics/autoStep.ts';
import type { Accuracy } from '../../core/dynamics/modeAccuracy.ts';
import type { MethodChoice } from '../../core/dynamics/run.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import { edit } from '../../state/document.ts';
import type { BenchRow, SchemeBenchState } from '../../state/schemeBench.ts';
import { setSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { methodWords } from '../foot/analysisWords.ts';
import { Sideways } from '../plots/Sideways.tsx';
import { methodKey } from './benchChoice.ts';
import { shortSeconds } from './shortSeconds.ts';
import '../plots/table.css';

export interface BenchTableProps {
  readonly bench: SchemeBenchState;
  readonly modes: readonly Mode[] | null;
  /** What the analysis holds now. */
  readonly inUse: { readonly method: MethodChoice; readonly parts: number } | null;
  readonly old: boolean;
}

/** Every scheme at every step: its error, its cost, and what it makes of the first and the highest mode. */
export function BenchTable({ bench: { rows, reference, motion }, modes, inUse, old }: BenchTableProps) {
  const body = useRef<HTMLTableSectionElement>(null);
  const schemes = groupsOf(rows);
  const caption =
    reference === null
      ? `Schemes and steps under ${motion}`
      : `Errors under ${motion} against ${methodWords(reference.method)} at 1/${reference.parts} of the interval; bold: under ${printQuantity(AIM, 'percent', 'si', 0)} %; time as measured once`;
  const onKeyDown = (event: KeyboardEvent) => {
    const way = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (way === 0) return;
    const buttons = [...(body.current?.querySelectorAll<HTMLElement>('button:not(:disabled)') ?? [])];
    const at = buttons.indexOf(document.activeElement as HTMLElement);
    if (at < 0) return;
    buttons[Math.min(buttons.length - 1, Math.max(0, at + way))]?.focus();
    event.preventDefault();
  };
  return (
    <Sideways>
      {/* biome-ignore lint/a11y/useSemanticElements: a section would be one more landmark */}
      <div
        className={`table-view bench-table ${old ? 'old' : ''}`}
        role="region"
        aria-label="Schemes side by side"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: a part that scrolls must be reachable by keyboard
        tabIndex={0}
      >
        <table>
          <caption>{caption}</caption>
          <thead>
            <tr>
              <th scope="col" rowSpan={2} className="words">
                Scheme
              </th>
              <th scope="col" rowSpan={2}>
                Step, s
              </th>
              <th scope="colgroup" colSpan={2} className="over">
                Error of the peaks, %
              </th>
              <th scope="colgroup" colSpan={2} className="over">
                Cost
              </th>
              <th scope="colgroup" colSpan={2} className="over">
                First mode{periodWords(modes?.[0])}, %
              </th>
              <th scope="colgroup" colSpan={2} className="over">
                Highest mode{periodWords(modes?.at(-1))}, %
              </th>
              <td rowSpan={2} className="head-space" />
            </tr>
            <tr>
              <th scope="col">Drift</th>
              <th scope="col">Floor accel.</th>
              <th scope="col">Solves</th>
              <th scope="col">Time, ms</th>
              <th scope="col">Damping added</th>
              <th scope="col">Period longer</th>
              <th scope="col">Damping added</th>
              <th scope="col">Period longer</th>
            </tr>
          </thead>
          <tbody ref={body} onKeyDown={onKeyDown}>
            {schemes.map((group) =>
              group.map((row, i) => (
                <tr key={row.step} className={isInUse(row, inUse) ? 'in-use' : i === 0 ? 'first' : ''}>
                  {i === 0 && (
                    <th scope="rowgroup" rowSpan={group.length} className="words scheme">
                      {methodWords(row.method)}
                      <span className="quiet small">{nameWords(row)}</span>
                    </th>
                  )}
                  <th scope="row" className="step-size">
                    {shortSeconds(row.step)}
                  </th>
                  <Result row={row} />
                  <Modal accuracy={row.first} />
                  <Modal accuracy={row.highest} />
                  <td className="use">
                    {(row.state === 'done' || isInUse(row, inUse)) && (
                      <Button
                        kind="text"
                        size="low"
                        aria-label={`Use this: ${methodWords(row.method)}, step ${shortSeconds(row.step)} s`}
                        aria-pressed={isInUse(row, inUse)}
                        onClick={() => !isInUse(row, inUse) && takeRow(row)}
                      >
                        {isInUse(row, inUse) ? 'in use' : 'Use this'}
                      </Button>
                    )}
                  </td>
                </tr>
              )),
            )}
          </tbody>
        </table>
      </div>
    </Sideways>
  );
}

function groupsOf(rows: readonly BenchRow[]): BenchRow[][] {
  const groups = new Map<string, BenchRow[]>();
  for (const row of rows) {
    const key = methodKey(row.method);
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  return [...groups.values()];
}

function isInUse(row: BenchRow, inUse: BenchTableProps['inUse']): boolean {
  return inUse !== null && row.parts === inUse.parts && methodKey(row.method) === methodKey(inUse.method);
}

/** Scheme and step into the analysis, as one undo step. */
function takeRow({ method, parts }: BenchRow): void {
  const label = `${methodWords(method)}, ${parts === 1 ? 'a step a sample' : `${parts} parts of the interval`}`;
  commitOpenDraft();
  edit(label, (project) => ({ ...project, analysis: { ...project.analysis, method, step: { parts } } }));
  setSession({ toast: `In use: ${label}` });
}

function periodWords(mode: Mode | undefined): string {
  return mode === undefined ? '' : ` of ${printQuantity(mode.period, 'time', 'si', mode.period < 0.1 ? 3 : 2)} s`;
}

/** The name that a scheme goes by beside its numbers, where it has one. */
function nameWords({ method, name }: BenchRow): string {
  return method.kind === 'newmark' && !name.startsWith('Newmark') ? name.replace(' (Newmark)', '') : '';
}

function Result({ row: { state, result, limit, why } }: { readonly row: BenchRow }) {
  if (state === 'unstable') {
    return <Words>not stable: the step must stay under {shortSeconds(limit ?? 0)} s</Words>;
  }
  if (state === 'failed') return <Words>failed: {why}</Words>;
  if (result === null) return <Words>waits</Words>;
  const { ending, error, accelerationError, solves, took } = result;
  return (
    <>
      {ending === null ? (
        <>
          <Share value={error} />
          <Share value={accelerationError} />
        </>
      ) : (
        <td colSpan={2} className="words signal">
          {ending.status.replace('-', ' ')} at {printQuantity(ending.time, 'time', 'si')} s
        </td>
      )}
      <td>{printQuantity(solves, 'count', 'si')}</td>
      <td>
        {took < 0.95 ? printQuantity(took, 'ratio', 'si', 1) : printQuantity(took, 'ratio', 'si', took < 9.5 ? 1 : 0)}
      </td>
    </>
  );
}

function Words({ children }: { readonly children: React.ReactNode }) {
  return (
    <td colSpan={4} className="words quiet">
      {children}
    </td>
  );
}

function Share({ value }: { readonly value: number | null }) {
  if (value === null) return <td className="none">none</td>;
  const words = value > 0 && value < 0.00005 ? 'under 0.01' : printQuantity(value, 'percent', 'si', 2);
  return <td className={value < AIM ? 'fine' : ''}>{words}</td>;
}

/** Null: the mode does not swing at this step. */
function Modal({ accuracy: { addedDamping, periodElongation } }: { readonly accuracy: Accuracy }) {
  if (addedDamping === null || periodElongation === null) {
    return (
      <td colSpan={2} className="none">
        does not swing
      </td>
    );
  }
  return (
    <>
      <td>{printQuantity(addedDamping, 'percent', 'si', 2)}</td>
      <td>{printQuantity(periodElongation, 'percent', 'si', 2)}</td>
    </>
  );
}
