import { type KeyboardEvent, useEffect, useId, useLayoutEffect, useRef, useState } from 'react';
import { cellFacts } from '../../document/cellFacts.ts';
import { faultAndMend } from '../../document/faultWords.ts';
import { fieldOf } from '../../document/fields.ts';
import type { Typed } from '../../document/project.ts';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { sessionStore, useSession } from '../../state/session.ts';
import { IconButton } from '../controls/Button.tsx';
import { NumberField } from '../controls/NumberField.tsx';
import { placeBeside } from '../controls/placeBeside.ts';
import { Segmented } from '../controls/Segmented.tsx';
import { isolate } from './commands.ts';
import { LawDrawing } from './LawDrawing.tsx';
import { LawGlyph } from './LawGlyph.tsx';
import { chooseLaw, commitShape, type Scope, sameFor } from './lawCommands.ts';
import { LAWS, type LawKind, sourceOf } from './lawWords.ts';
import './lawPanel.css';

export interface LawPanelProps {
  /** From 0 at the ground. */
  readonly storey: number;
  readonly onClose: () => void;
}

/** Inputs of a law: its key in the project file, its name, and what it means. */
const INPUTS = {
  strength: 'Strength',
  hardening: 'Hardening',
  exponent: 'n',
  beta: 'beta',
  gamma: 'gamma',
  ratio: 'Flag over strength',
} as const;
type Key = keyof typeof INPUTS;

const KEYS: Readonly<Record<LawKind, readonly Key[]>> = {
  elastic: [],
  bilinear: ['strength', 'hardening'],
  'peak-oriented': ['strength', 'hardening'],
  'bouc-wen': ['strength', 'hardening', 'exponent', 'beta', 'gamma'],
  flag: ['strength', 'hardening', 'ratio'],
};

/** Numbers whose names say little, in a few words. */
const ABOUT: Readonly<Partial<Record<LawKind, string>>> = {
  'bouc-wen':
    'n, from 1: the higher, the sharper the yield. beta + gamma = 1, one typed settles the other; gamma 0.5 unloads as stiff as it began, less unloads stiffer.',
  flag: 'Flag over strength: how far the unloading line runs below the loading one, over the strength; at most 1 - hardening, so that it comes back.',
};

/** The law of a storey: chosen in plain words, its numbers, and its backbone and cycles as they are typed. */
export function LawPanel({ storey, onClose }: LawPanelProps) {
  const panel = useRef<HTMLDivElement>(null);
  const heading = useId();
  const project = useDocument(effectiveProject);
  const system = useSession((state) => state.system);
  const faults = useResults((state) => state.faults);
  const [selected] = useState(() => selectedStoreys(storey));
  const [scope, setScope] = useState<Scope>(selected.length > 1 ? 'selected' : 'this');
  const row = project.frame.storeys[storey];
  const all = project.frame.storeys.map((_, i) => i);
  const scopes: Readonly<Record<Scope, readonly number[]>> = { this: [storey], selected, all };
  useBeside(panel, storey, onClose);
  if (row === undefined) return null;
  const { law, name } = row;
  const path = `frame.storeys[${storey}].law`;
  const says = ABOUT[law.kind];
  const keys = KEYS[law.kind];
  const drawable = above0(row.stiffness) && !faults.some(({ where }) => where.startsWith(path));
  const others = faults.filter(({ where }) => where === path || where === `frame.storeys[${storey}].role`);
  return (
    <div
      ref={panel}
      className="menu popover law-panel"
      role="dialog"
      aria-labelledby={heading}
      popover="manual"
      tabIndex={-1}
      onKeyDown={(event) => panelKey(event, panel.current, onClose)}
    >
      <header>
        <h2 id={heading}>
          Law of storey {storey + 1}
          {name === '' ? '' : `, ${name}`}
        </h2>
        <IconButton icon="close" size="low" label="Close" keys="Esc" onClick={onClose} />
      </header>
      <Segmented<LawKind>
        className="law-choice"
        label="Law"
        value={law.kind}
        segments={LAWS.map(({ kind, name: words, words: about }) => ({
          value: kind,
          name: `${words}: ${about}`,
          label: (
            <>
              <LawGlyph kind={kind} />
              <b>{words}</b>
              <span>{about}</span>
            </>
          ),
        }))}
        onChange={(kind) => chooseLaw(kind, storey, scopes[scope])}
      />
      <LawDrawing project={project} storey={storey} system={system} drawable={drawable} />
      <div className="law-inputs">
        {keys.length === 0 && <span className="quiet">Nothing to type: the stiffness is all of it.</span>}
        {keys.map((key) => (
          <div key={key} className="law-input" title={fieldOf(`${path}.${key}`).hint(system)}>
            <span aria-hidden="true">{INPUTS[key]}</span>
            <NumberField
              path={`${path}.${key}`}
              label={`Storey ${storey + 1}, ${INPUTS[key]}`}
              width={key === 'strength' ? 76 : 56}
              unit={key === 'strength' || key === 'hardening'}
              onCommit={(place) => commitShape(place, key, key === 'strength' ? [storey] : scopes[scope], system)}
            />
          </div>
        ))}
      </div>
      {says !== undefined && <p className="law-facts quiet">{says}</p>}
      <p className="law-facts">
        {others.length > 0 ? (
          <span className="field-words">{others.map((fault) => faultAndMend(fault, system)).join('; ')}</span>
        ) : (
          cellFacts(project, path, system)
        )}
        <span className="law-source">{sourceOf(law.kind)}</span>
      </p>
      <div className="law-scope">
        <span className="quiet">Same for</span>
        <Segmented<Scope>
          label="Same for"
          value={scope}
          segments={[
            { value: 'this', label: 'this storey' },
            ...(selected.length > 1 ? ([{ value: 'selected', label: `${selected.length} selected` }] as const) : []),
            { value: 'all', label: `all ${all.length}`, disabled: all.length < 2 },
          ]}
          onChange={(next) => {
            setScope(next);
            sameFor(storey, scopes[next]);
          }}
        />
        <span className="quiet small">strength stays each storey's own</span>
      </div>
      {(storey === 0 || row.role === 'isolator') && (
        <div className="law-scope">
          <label className="check">
            <input type="checkbox" checked={row.role === 'isolator'} onChange={() => isolate(storey)} />
            Isolator
          </label>
          {row.role === 'isolator' ? (
            <>
              <span className="quiet">displacement at most</span>
              <NumberField path="limits.isolator" label="Allowable isolator displacement" width={64} />
              <span className="quiet small">its law and damper damp it</span>
            </>
          ) : (
            <span className="quiet small">
              bearings between the ground and the first floor, with a limit of their own
            </span>
          )}
        </div>
      )}
    </div>
  );
}

function above0(value: Typed): boolean {
  return typeof value === 'number' && value > 0;
}

/** The storeys of the chosen block, where it holds the storey; else that one alone. */
function selectedStoreys(storey: number): readonly number[] {
  const { selection } = sessionStore.getState();
  if (selection === null) return [storey];
  const low = Math.min(selection.storey, selection.anchorStorey);
  const high = Math.max(selection.storey, selection.anchorStorey);
  if (storey < low || storey > high) return [storey];
  return Array.from({ length: high - low + 1 }, (_, i) => low + i);
}

const STOPS = 'button:not(:disabled):not([tabindex="-1"]), input:not(:disabled)';

/** Esc closes; Tab goes round in the panel; Enter on a law that is chosen is the end of it. */
function panelKey(event: KeyboardEvent, panel: HTMLElement | null, onClose: () => void): void {
  // Undo, redo and save are the app's.
  if (!event.ctrlKey && !event.metaKey) event.stopPropagation();
  const { target } = event;
  if (
    event.key === 'Escape' ||
    (event.key === 'Enter' && target instanceof Element && target.matches('.law-choice *'))
  ) {
    event.preventDefault();
    onClose();
    return;
  }
  if (event.key !== 'Tab' || panel === null) return;
  const stops = [...panel.querySelectorAll<HTMLElement>(STOPS)];
  const edge = event.shiftKey ? stops[0] : stops.at(-1);
  if (document.activeElement !== edge) return;
  event.preventDefault();
  (event.shiftKey ? stops.at(-1) : stops[0])?.focus();
}

/** Least distance to the edge of the window [px]. */
const MARGIN = 8;

/** Stands beside the cell of the law, starts at the law that is chosen, and gives the focus back to the cell. */
function useBeside(panel: React.RefObject<HTMLDivElement | null>, storey: number, onClose: () => void): void {
  useLayoutEffect(() => {
    const cell = document.querySelector<HTMLElement>(`[data-storey="${storey}"] [data-cell="law"]`);
    const element = panel.current;
    if (element === null || cell === null) return;
    element.showPopover();
    placeBeside(element, cell, 'left');
    element.querySelector<HTMLElement>('[role="radio"][aria-checked="true"]')?.focus();
    // A fault makes it taller: it moves up by as much as it would leave the window.
    const grown = new ResizeObserver(() => {
      const lowest = window.innerHeight - MARGIN - element.offsetHeight;
      if (element.offsetTop > lowest) element.style.top = `${Math.max(MARGIN, lowest)}px`;
    });
    grown.observe(element);
    return () => {
      grown.disconnect();
      const focused = document.activeElement;
      if (focused === document.body || element.contains(focused)) cell.focus({ preventScroll: true });
    };
  }, [panel, storey]);
  useEffect(() => {
    const outside = (event: PointerEvent) => {
      const target = event.target as Element;
      if (panel.current?.contains(target)) return;
      onClose();
    };
    document.addEventListener('pointerdown', outside, true);
    window.addEventListener('resize', onClose);
    return () => {
      document.removeEventListener('pointerdown', outside, true);
      window.removeEventListener('resize', onClose);
    };
  }, [panel, onClose]);
}
