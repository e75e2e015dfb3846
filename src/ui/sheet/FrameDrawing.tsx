import { useLayoutEffect, useMemo, useRef } from 'react';
import { printQuantity, type System, unitOf } from '../../core/units/quantities.ts';
import { followCursor, MARK } from './cursor.ts';
import { bearingMiddle, bearingPath, columnEnds, columnPath, columnWidths, type Ends, px } from './drawing.ts';
import type { Span } from './layout.ts';
import type { Rows } from './rows.ts';

export interface FrameDrawingProps {
  readonly span: Span;
  readonly rows: Rows;
  readonly height: number;
  /** From the ground up; null where not typed. */
  readonly heights: readonly (number | null)[];
  readonly stiffnesses: readonly (number | null)[];
  /** Storeys over the limit: their columns in the colour of the limit. */
  readonly over: readonly boolean[];
  readonly governing: number;
  /** The first storey is an isolator: bearings stand in the place of its columns. */
  readonly isolated: boolean;
  readonly sway: number;
  readonly system: System;
  /** The sheet is empty: three storeys that are not there yet, dashed. */
  readonly ghost: boolean;
}

/** Where the two columns stand at rest and how far the floors may sway [px]. */
export function bayOf(
  width: number,
  gutter: number,
): { readonly left: number; readonly right: number; readonly room: number } {
  const labels = 58;
  const slab = 9;
  const free = width + gutter - 4 - labels - 2 * slab;
  const bay = Math.round(free * 0.5333);
  const room = Math.floor((free - bay) / 2);
  const left = labels + slab + room;
  return { left, right: left + bay, room };
}

/** The building through the rows: slabs on the row lines, columns in double curvature, swaying at the cursor. */
export function FrameDrawing(props: FrameDrawingProps) {
  const { span, rows, height, heights, stiffnesses, over, governing, isolated, sway, system, ghost } = props;
  const sky = height - rows.total;
  const gutter = span.width < 190 ? 16 : 24;
  const { left, right } = bayOf(span.width, gutter);
  const columns = useRef<SVGGElement>(null);
  const slabs = useRef<SVGGElement>(null);
  const dots = useRef<SVGGElement>(null);
  const roof = useRef<SVGGElement>(null);
  const widths = useMemo(() => columnWidths(stiffnesses), [stiffnesses]);
  const floors = useMemo(() => [height, ...rows.tops.map((top) => sky + top)], [rows, sky, height]);

  useLayoutEffect(
    () =>
      followCursor((pose, marks) => {
        const count = rows.heights.length;
        const known = pose !== null && pose.length === count;
        const reach = span.width;
        const at = (floor: number) => {
          const moved = known && floor > 0 ? (pose[floor - 1] ?? 0) * rows.scale * sway : 0;
          return Math.max(-reach, Math.min(reach, moved));
        };
        const paths = columns.current?.children ?? [];
        const plates = slabs.current?.children ?? [];
        for (let storey = 0; storey < count; storey++) {
          const foot = at(storey);
          const head = at(storey + 1);
          const low = floors[storey] ?? 0;
          const high = floors[storey + 1] ?? 0;
          const path = isolated && storey === 0 ? bearingPath : columnPath;
          paths[storey]?.setAttribute(
            'd',
            path(left + foot, low, left + head, high) + path(right + foot, low, right + head, high),
          );
          plates[storey]?.setAttribute('x', px(left - 9 + head));
          const mark = marks.length === count ? (marks[storey] ?? MARK.none) : MARK.none;
          const ends =
            isolated && storey === 0 ? bearingMiddle(foot, head, low, high) : columnEnds(foot, head, low, high);
          writeDots(dots.current?.children[storey], mark, left, right, ends);
        }
        const displaced = known ? (pose[count - 1] ?? 0) : 0;
        writeRoof(roof.current, left, at(count), floors[count] ?? 0, known ? displaced : null, system);
      }),
    [rows, floors, left, right, sway, span.width, system, isolated],
  );

  if (ghost) return <GhostFrame span={span} rows={rows} height={height} left={left} right={right} />;
  let level = 0;
  const levels = [0, ...heights.map((own) => (level = level + (own ?? Number.NaN)))];
  return (
    <svg
      className="sheet-svg"
      style={{ left: span.x }}
      width={span.width}
      height={height}
      role="img"
      aria-label={`The frame at the time cursor, sway times ${sway}`}
    >
      <path
        d={floors
          .slice(1)
          .map((y) => `M0 ${y}H${span.width}`)
          .join('')}
        className="s-rule"
      />
      <path
        d={`M${left} ${height}V${floors.at(-1) ?? 0}M${right} ${height}V${floors.at(-1) ?? 0}`}
        className="s-ink3"
        strokeWidth="0.8"
        strokeDasharray="2 3"
      />
      <g ref={columns} fill="none">
        {widths.map((width, storey) => (
          <path
            key={storey}
            className={over[storey] && storey === governing ? 's-signal' : 's-ink'}
            strokeWidth={isolated && storey === 0 ? 1.4 : Math.round(width * 100) / 100}
          />
        ))}
      </g>
      <g ref={slabs} className="f-ink">
        {rows.tops.map((top, storey) => (
          <Slab key={storey} y={sky + top} width={right - left + 18} thick={rows.toScale ? 5 : 3} />
        ))}
      </g>
      <path d={`M${left - 6} ${height - 3}h12v5h-12zM${right - 6} ${height - 3}h12v5h-12z`} className="f-ink" />
      <g ref={dots} strokeWidth="1.2">
        {rows.heights.map((size, storey) => (
          <g key={storey} className={over[storey] && storey === governing ? 'dots s-signal' : 'dots s-ink'}>
            {[0, 1, 2, 3].map((end) => (
              <circle key={end} r={size < 28 ? 2 : 2.9} />
            ))}
          </g>
        ))}
      </g>
      <g>
        {floors.map((y, floor) => (
          <g key={floor}>
            <path d={`M2 ${y - 6}h8l-4 6z`} className="s-ink3" />
            <text x="13" y={y - 3} className="halo">
              {levelText(levels[floor] ?? Number.NaN, floor, system)}
            </text>
          </g>
        ))}
      </g>
      <g ref={roof} className="s-accent">
        <path />
        <text className="accent" stroke="none" />
      </g>
    </svg>
  );
}

function levelText(level: number, floor: number, system: System): string {
  if (floor === 0) return `±${printQuantity(0, 'length', system)}`;
  return Number.isFinite(level) ? `+${printQuantity(level, 'length', system)}` : '';
}

/** The dots at a storey's column ends: none before it yields, open once it has, filled while it is past yield. */
function writeDots(group: Element | undefined, mark: number, left: number, right: number, ends: Ends): void {
  if (group === undefined) return;
  if (group.getAttribute('data-mark') !== String(mark)) group.setAttribute('data-mark', String(mark));
  if (mark === MARK.none) return;
  for (const [side, rest] of [left, right].entries()) {
    for (const [end, [x, y]] of ends.entries()) {
      const dot = group.children[2 * side + end];
      dot?.setAttribute('cx', px(rest + x));
      dot?.setAttribute('cy', px(y));
    }
  }
}

/** The roof's way from rest, with its number; nothing while there is no history. */
function writeRoof(
  group: SVGGElement | null,
  rest: number,
  moved: number,
  y: number,
  roof: number | null,
  system: System,
): void {
  const path = group?.children[0];
  const text = group?.children[1];
  if (path === undefined || text === undefined) return;
  if (roof === null) {
    path.setAttribute('d', '');
    text.textContent = '';
    return;
  }
  path.setAttribute(
    'd',
    `M${px(rest + moved)} ${y - 9}H${px(rest)}M${px(rest)} ${y - 13}V${y}M${px(rest + moved)} ${y - 13}v8`,
  );
  const left = moved <= 0;
  text.setAttribute('x', px(left ? rest + 6 : rest + moved + 6));
  text.setAttribute('y', px(y - 6));
  text.textContent = `roof ${printQuantity(roof, 'displacement', system)} ${unitOf('displacement', system)}`;
}

function Slab({ y, width, thick }: { readonly y: number; readonly width: number; readonly thick: number }) {
  return <rect y={y - thick / 2} width={width} height={thick} />;
}

/** Where a building will stand: three dashed storeys. */
function GhostFrame({
  span,
  rows,
  height,
  left,
  right,
}: Pick<FrameDrawingProps, 'span' | 'rows' | 'height'> & { readonly left: number; readonly right: number }) {
  const first = rows.total;
  const floors = [first, first + 50, first + 100].map((above) => height - above);
  return (
    <svg
      className="sheet-svg"
      style={{ left: span.x }}
      width={span.width}
      height={height}
      role="img"
      aria-label="An empty frame"
    >
      <path
        d={`M${left} ${height}V${floors[2]}M${right} ${height}V${floors[2]}`}
        className="s-ink3"
        strokeWidth="1.2"
        strokeDasharray="4 4"
      />
      <path
        d={floors.map((y) => `M${left - 9} ${y}H${right + 9}`).join('')}
        className="s-ink3"
        strokeWidth="1.6"
        strokeDasharray="4 4"
      />
      <path d={`M${left - 6} ${height - 3}h12v5h-12zM${right - 6} ${height - 3}h12v5h-12z`} className="f-ink" />
      <path d={`M2 ${height - 6}h8l-4 6z`} className="s-ink3" />
      <text x="13" y={height - 3} className="halo">
        ±0.00
      </text>
    </svg>
  );
}
