import { useMemo } from 'react';
import type { Mode } from '../../core/frame/modes.ts';
import type { Table } from '../../core/report/table.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { levelsOf } from './levels.ts';
import { Plot } from './Plot.tsx';
import type { PlotSpec } from './plotly.ts';
import { plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import { axis, baseLayout, type Size } from './template.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';

export interface ModeShapesProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
}

/** Widths of a shape take so much of the panel each [px]. */
const ROOM = 88;

/**
 * The first modes side by side, on the levels of the building, with period and share of the mass. They are those of the frame
 * as it stands, and so never out of date with the runs.
 */
export function ModeShapes({ layout, tokens, system }: ModeShapesProps) {
  const modes = useResults((state) => state.modes);
  const project = useDocument(effectiveProject);
  const size = plotSize(layout);
  const { width, height } = size;
  const levels = useMemo(() => levelsOf(project.frame.storeys.map((row) => row.height)), [project.frame.storeys]);
  const spec = useMemo(
    () =>
      modes === null || levels === null || levels.length !== modes.length + 1
        ? null
        : () => modesPlot(modes, levels, { width, height }, tokens, system),
    [modes, levels, width, height, tokens, system],
  );
  const unit = axisUnitOf('length', system, 0).unit;
  return (
    <SquareFrame
      layout={layout}
      kind="modes"
      words={`level in ${unit}; period, share of the mass`}
      legend={<span>shapes to their largest floor</span>}
      table={modes === null || levels === null ? null : () => modesTable(modes, levels)}
    >
      <Plot spec={spec} label={sentence(modes)} />
      {modes === null && <p className="nothing quiet small">No frame that stands yet.</p>}
    </SquareFrame>
  );
}

function modesPlot(
  modes: readonly Mode[],
  levels: readonly number[],
  size: Size,
  tokens: Tokens,
  system: System,
): PlotSpec {
  const most = Math.max(2, Math.floor((size.width - 52) / ROOM));
  const shown = modes.slice(0, Math.min(most, modes.length));
  const unit = axisUnitOf('length', system, 0);
  const y = levels.map(unit.onAxis);
  const top = y[y.length - 1];
  const base = baseLayout(tokens, size, { b: 38 });
  // Each shape swings by 1 about a place of its own, 2.4 from the next.
  const place = (i: number) => 2.4 * i;
  const aside = shown.length === 1 ? 2.45 : 1.25;
  const ticks = ticksBetween(0, top, 5);
  const dot = y.length > 30 ? 2.5 : 5;
  return {
    data: shown.map((mode, i) => {
      const floors = shapeOf(mode);
      return {
        type: 'scatter',
        mode: 'lines+markers',
        x: floors.map((value) => place(i) + value),
        y,
        text: floors.map(
          (value, floor) =>
            `mode ${i + 1}, ${floor === 0 ? 'ground' : `floor ${floor}`}: ${printQuantity(value, 'ratio', system, 2)}`,
        ),
        hovertemplate: '%{text}<extra></extra>',
        line: { color: i === 0 ? tokens.ink : tokens.ink2, width: i === 0 ? 2 : 1.2 },
        marker: { size: dot, color: i === 0 ? tokens.ink : tokens.ink2 },
        cliponaxis: false,
      };
    }),
    layout: {
      ...base,
      xaxis: {
        ...axis(
          tokens,
          [-aside, place(shown.length - 1) + aside],
          { at: shown.map((_, i) => place(i)), decimals: 0 },
          null,
        ),
        zeroline: false,
        showticklabels: true,
        tickangle: 0,
        gridcolor: tokens.rule,
        griddash: 'dot',
        ticktext: shown.map(
          ({ period, effectiveMassRatio }, i) =>
            `T<sub>${i + 1}</sub> ${printQuantity(period, 'time', system, 2)} s<br>${printQuantity(effectiveMassRatio, 'percent', system, 0)} %`,
        ),
      },
      yaxis: {
        ...axis(tokens, [0, 1.02 * top], ticks, tickWords(unit, ticks)),
        zerolinecolor: tokens.ink3,
      },
    },
  };
}

/** A shape from the ground up, to its largest floor. */
function shapeOf({ shape }: Mode): number[] {
  const largest = shape.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  return [0, ...Array.from(shape, (value) => value / largest)];
}

function modesTable(modes: readonly Mode[], levels: readonly number[]): Table {
  const floors = levels.length - 1;
  const down = Array.from({ length: floors }, (_, row) => floors - row);
  return {
    id: 'mode-shapes',
    title: 'Mode shapes, 1 at the roof',
    columns: [
      { key: 'floor', name: 'Floor', quantity: 'count', values: down },
      { key: 'level', name: 'Level', quantity: 'length', values: down.map((floor) => levels[floor]) },
      ...modes.map(({ shape, period }, i) => ({
        key: `mode${i + 1}`,
        name: `Mode ${i + 1}, ${printQuantity(period, 'time', 'si', 3)} s`,
        quantity: 'ratio' as const,
        decimals: 3,
        values: down.map((floor) => shape[floor - 1]),
      })),
    ],
  };
}

function sentence(modes: readonly Mode[] | null): string {
  const first = modes?.[0];
  if (first === undefined) return 'Mode shapes: no frame that stands yet';
  return `Mode shapes: the first period is ${printQuantity(first.period, 'time', 'si', 2)} s with ${printQuantity(first.effectiveMassRatio, 'percent', 'si', 0)} percent of the mass`;
}
