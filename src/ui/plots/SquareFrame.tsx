import type { ReactNode } from 'react';
import type { Table } from '../../core/report/table.ts';
import type { MenuItem } from '../controls/Menu.tsx';
import { chooseSquare, SQUARES, type SquareKind } from './choice.ts';
import { PanelMenu } from './PanelMenu.tsx';
import { MARGIN, type Size } from './template.ts';

/** Where the parts of a square panel stand [px]: head, key, and the axes inside of their margins. */
export interface SquareLayout {
  readonly slot: number;
  readonly left: number;
  readonly width: number;
  readonly height: number;
  readonly narrow: boolean;
}

/** The plot reaches so far left of the panel: the numbers of its axis stand there. */
const OUT = 12;

/** Size of the plot with its margins. */
export function plotSize({ width, height, narrow }: SquareLayout): Size {
  return { width: width + OUT + MARGIN.r, height: height - plotTop(narrow) - (narrow ? 4 : 18) };
}

function plotTop(narrow: boolean): number {
  return (narrow ? 28 : 48) - MARGIN.t;
}

export interface SquareFrameProps {
  readonly layout: SquareLayout;
  readonly kind: SquareKind;
  /** What is shown and in which units, beside the name. */
  readonly words: ReactNode;
  readonly legend?: ReactNode;
  /** What can be chosen of it, in the menu of its name. */
  readonly options?: readonly MenuItem[];
  readonly table: (() => Table) | null;
  /** What is shown is no longer the document's. */
  readonly old?: boolean;
  readonly children: ReactNode;
}

/** One of the two panels under the answers: name, what it shows, key, plot. */
export function SquareFrame({ layout, kind, words, legend, options, table, old = false, children }: SquareFrameProps) {
  const { slot, left, width, narrow } = layout;
  const name = SQUARES.find((entry) => entry.kind === kind)?.name ?? '';
  const size = plotSize(layout);
  return (
    <div className={`square ${old ? 'old' : ''}`} style={{ left, width }}>
      <div className="square-head">
        <PanelMenu
          label={name}
          choices={SQUARES}
          value={kind}
          onChoose={(next) => chooseSquare(slot, next)}
          options={options}
          table={table}
        >
          {name}
        </PanelMenu>
        <span className="quiet small">{words}</span>
      </div>
      {!narrow && <div className="square-key">{legend}</div>}
      <div className="square-plot" style={{ left: -OUT, top: plotTop(narrow), width: size.width, height: size.height }}>
        {children}
      </div>
    </div>
  );
}

/** A line of the key, as it is drawn. */
export function KeyLine({
  stroke,
  width = 1,
  dash,
}: {
  readonly stroke: string;
  readonly width?: number;
  readonly dash?: string;
}) {
  return (
    <svg width="17" height="11" viewBox="0 0 17 11" aria-hidden="true">
      <path d="M0 6H16" stroke={`var(--${stroke})`} strokeWidth={width} strokeDasharray={dash} />
    </svg>
  );
}

/** An upright tick of the key, in the colour of the hand. */
export function KeyTick() {
  return (
    <svg width="7" height="11" viewBox="0 0 7 11" aria-hidden="true">
      <path d="M3.5 0V11" stroke="var(--accent)" strokeWidth="1.3" />
    </svg>
  );
}
