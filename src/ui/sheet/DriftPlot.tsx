import { memo, type PointerEvent, useEffect, useMemo, useRef } from 'react';
import { setSession, useSession } from '../../state/session.ts';
import type { AnswerRows, MotionDrift } from './answerRows.ts';
import { type Axis, linesOf } from './axis.ts';
import { followCursor } from './cursor.ts';
import { markPath, px, ticksPath } from './drawing.ts';
import type { Span } from './layout.ts';
import type { Rows } from './rows.ts';

/** How the answers stand to the document: as they are, or grey because it has moved on. */
export type Standing = 'current' | 'old';

export interface DriftPlotProps {
  readonly span: Span;
  readonly rows: Rows;
  /** Height of the sheet, sky included [px]. */
  readonly height: number;
  readonly axis: Axis;
  readonly answers: AnswerRows | null;
  readonly limit: number | null;
  readonly standing: Standing;
  /** Motions of a run under way that are in so far. */
  readonly arrived: readonly MotionDrift[];
  readonly chosenMotion: string | null;
  /** Storey heights [m] and the factor on the drift, for the mark at the cursor. */
  readonly storeyHeights: readonly (number | null)[];
  readonly factor: number;
  readonly letters: Readonly<Record<string, string>>;
}

/** Peak drift of every storey on the storey's own row: bar, motions, limit. */
export function DriftPlot(props: DriftPlotProps) {
  const { span, rows, height, axis, answers, limit, standing, arrived, chosenMotion, storeyHeights, factor } = props;
  const scale = span.width / axis.end;
  const sky = height - rows.total;
  const isolated = answers?.isolator != null;
  const marks = useRef<SVGGElement>(null);
  const limitX = limit === null ? null : limit * scale;

  useEffect(
    () =>
      followCursor((pose) => {
        const paths = marks.current?.children ?? [];
        for (let storey = 0; storey < paths.length; storey++) {
          const tall = storeyHeights[storey];
          const path = paths[storey];
          if (path === undefined) continue;
          if (pose === null || pose.length !== paths.length || typeof tall !== 'number' || (isolated && storey === 0)) {
            path.setAttribute('d', '');
            continue;
          }
          const drift = Math.abs((pose[storey] ?? 0) - (storey > 0 ? (pose[storey - 1] ?? 0) : 0));
          const x = ((100 * factor * drift) / tall) * scale;
          const middle = sky + (rows.tops[storey] ?? 0) + (rows.heights[storey] ?? 0) / 2;
          path.setAttribute('d', x > span.width + 2 ? '' : markPath(x, middle + half(rows.heights[storey] ?? 0) + 2));
        }
      }),
    [rows, sky, scale, span.width, storeyHeights, factor, isolated],
  );

  const current = standing === 'current' && answers !== null;
  const first = isolated ? 1 : 0;
  const overlay = { rows, sky, scale, width: span.width };
  return (
    <svg
      className="sheet-svg"
      style={{ left: span.x }}
      width={span.width}
      height={height}
      role="img"
      aria-label="Peak drift ratio of every storey against the limit; the numbers stand beside it"
    >
      <Lines axis={axis} scale={scale} height={height} />
      {answers !== null &&
        rows.heights.map((size, storey) =>
          isolated && storey === 0 ? null : (
            <DriftRow
              key={storey}
              middle={sky + (rows.tops[storey] ?? 0) + size / 2}
              size={size}
              width={span.width}
              bar={answers.drift === null ? null : (answers.drift[storey] ?? 0) * scale}
              limitX={limitX}
              over={answers.over[storey] ?? false}
              old={standing === 'old'}
              ticks={ticksOf(arrived.length > 0 ? [] : answers.motions, storey, scale, chosenMotion)}
              arrived={ticksOf(arrived, storey, scale, null)}
              chosen={current ? placeOf(answers.motions, storey, scale, chosenMotion) : null}
            />
          ),
        )}
      {answers?.isolator != null && (
        <text
          x="6"
          y={sky + (rows.tops[0] ?? 0) + (rows.heights[0] ?? 0) / 2 + 4}
          className={answers.isolator.over ? 'signal halo' : 'halo'}
        >
          {answers.isolator.words}
        </text>
      )}
      {answers !== null && current && <Failures {...props} answers={answers} scale={scale} sky={sky} />}
      {answers !== null && <Lit motions={answers.motions} first={first} {...overlay} />}
      <g ref={marks} fill="var(--accent)">
        {rows.heights.map((_, storey) => (
          <path key={storey} />
        ))}
      </g>
      {limitX !== null && limitX <= span.width + 1 && (
        <path
          d={`M${px(limitX)} -8V${isolated ? sky + (rows.tops[0] ?? 0) : height}`}
          className="s-signal"
          strokeWidth="1.5"
          strokeDasharray={answers === null ? '6 3' : undefined}
        />
      )}
      {answers !== null && <Touch motions={answers.motions} first={first} {...overlay} />}
    </svg>
  );
}

/** Half the height of a motion's tick in a row [px]: 20 px ticks, 10 px where rows are low. */
function half(size: number): number {
  return size < 28 ? 6 : 10;
}

/** Places of the motions' ticks in a row [px], as text so that an unchanged row is not drawn again. */
function ticksOf(motions: readonly MotionDrift[], storey: number, scale: number, except: string | null): string {
  let places = '';
  // A run that broke off has no peak to show: its storey carries an X.
  for (const { motion, drift, finished } of motions) {
    if (finished && motion !== except) places += `${px((drift[storey] ?? 0) * scale)} `;
  }
  return places;
}

function placeOf(motions: readonly MotionDrift[], storey: number, scale: number, name: string | null): number | null {
  const drift = motions.find(({ motion, finished }) => finished && motion === name)?.drift[storey];
  return drift === undefined ? null : drift * scale;
}

const Lines = memo(function Lines({ axis, scale, height }: { axis: Axis; scale: number; height: number }) {
  const lines = linesOf(axis, axis.minor).map((value) => {
    const labelled = Math.abs(value / axis.major - Math.round(value / axis.major)) < 1e-9;
    return `M${px(value * scale)} ${labelled ? -4 : 0}V${height}`;
  });
  return (
    <>
      <path d={lines.join('')} className="s-hair" />
      <path d={`M0 -4V${height}`} className="s-ink3" />
    </>
  );
});

interface DriftRowProps {
  readonly middle: number;
  readonly size: number;
  readonly width: number;
  readonly bar: number | null;
  readonly limitX: number | null;
  readonly over: boolean;
  readonly old: boolean;
  readonly ticks: string;
  readonly arrived: string;
  readonly chosen: number | null;
}

const DriftRow = memo(function DriftRow(props: DriftRowProps) {
  const { middle, size, width, bar, limitX, over, old, ticks, arrived, chosen } = props;
  const tick = half(size);
  const body = size < 28 ? 4 : 6;
  const inside = (places: string) =>
    places === ''
      ? []
      : places
          .trim()
          .split(' ')
          .map(Number)
          .filter((x) => x <= width + 0.5);
  const end = bar === null ? 0 : Math.min(bar, width);
  const past = over && limitX !== null && end > limitX;
  const beyond = bar !== null && bar > width;
  return (
    <>
      {bar !== null && !old && (
        <rect className="f-mean drift-bar" x="0" y={middle - body} width={past ? limitX : end} height={2 * body} />
      )}
      {past && !old && (
        <rect x={limitX} y={middle - body} width={end - limitX} height={2 * body} fill="url(#over-hatch)" />
      )}
      {bar !== null && old && (
        <path d={`M0 ${middle - body}H${px(end)}V${middle + body}H0`} className="s-ink3" strokeDasharray="3 2" />
      )}
      <path
        d={ticksPath(inside(ticks), middle - tick, middle + tick)}
        className="s-ink3"
        opacity={old ? 0.45 : undefined}
      />
      {arrived !== '' && (
        <path d={ticksPath(inside(arrived), middle - tick, middle + tick)} className="s-ink" strokeWidth="1.5" />
      )}
      {chosen !== null && chosen <= width + 0.5 && (
        <path d={ticksPath([chosen], middle - tick - 1, middle + tick + 1)} className="s-accent" strokeWidth="2" />
      )}
      {bar !== null && !old && !beyond && (
        <path
          d={ticksPath([end], middle - body - 1, middle + body + 1)}
          className={over ? 's-signal' : 's-ink'}
          strokeWidth="3"
        />
      )}
      {beyond && (
        <path d={`M${width + 2} ${middle - 4}l6 4-6 4z`} className={over ? 'f-signal' : 'f-ink'}>
          <title>beyond the axis while a cell is edited</title>
        </path>
      )}
    </>
  );
});

/** The motions that did not finish: an X in the row of the storey that gave way, with their letters. */
function Failures({
  answers,
  rows,
  sky,
  scale,
  span,
  letters,
}: DriftPlotProps & { answers: AnswerRows; scale: number; sky: number }) {
  return rows.heights.map((size, storey) => {
    const names = answers.failed.filter((entry) => entry.storey === storey).map(({ motion }) => motion);
    if (names.length === 0) return null;
    const words = names.map((name) => letters[name] ?? name).join(' ');
    const drifts = answers.motions
      .filter(({ motion }) => names.includes(motion))
      .map(({ drift }) => drift[storey] ?? 0);
    const x = Math.min(Math.max(...drifts) * scale, span.width - 12 - 8 * words.length);
    const y = sky + (rows.tops[storey] ?? 0) + size / 2;
    return (
      <g key={storey}>
        <path d={`M${px(x - 4)} ${y - 4}l8 8m0-8l-8 8`} className="s-signal" strokeWidth="2" />
        <text x={px(x + 9)} y={y + 4} className="signal halo">
          {words}
        </text>
      </g>
    );
  });
}

interface OverlayProps {
  readonly motions: readonly MotionDrift[];
  readonly rows: Rows;
  readonly sky: number;
  readonly scale: number;
  readonly width: number;
  /** The lowest storey whose drift is shown: not an isolator. */
  readonly first: number;
}

/** The motion lit by hovering, in every row. */
function Lit({ motions, rows, sky, scale, width, first }: OverlayProps) {
  const lit = useSession((state) => state.lit);
  const found = motions.find(({ motion }) => motion === lit);
  if (found === undefined) return null;
  const path = rows.heights.map((size, storey) => {
    if (storey < first) return '';
    const x = (found.drift[storey] ?? 0) * scale;
    const middle = sky + (rows.tops[storey] ?? 0) + size / 2;
    return x > width ? '' : ticksPath([x], middle - half(size) - 1, middle + half(size) + 1);
  });
  return <path d={path.join('')} className="s-accent" strokeWidth="1.5" />;
}

/** Hovering near a tick lights its motion everywhere; a click chooses it. */
function Touch({ motions, rows, sky, scale, width, first }: OverlayProps) {
  const near = useMemo(
    () => (event: PointerEvent<SVGRectElement>) => {
      const box = event.currentTarget.getBoundingClientRect();
      const x = event.clientX - box.left;
      const y = event.clientY - box.top - sky;
      const storey = rows.tops.findIndex((top, index) => y >= top && y < top + (rows.heights[index] ?? 0));
      if (storey < 0) return null;
      let best: string | null = null;
      let least = 5;
      for (const { motion, drift } of storey < first ? [] : motions) {
        const away = Math.abs((drift[storey] ?? 0) * scale - x);
        if (away < least) {
          least = away;
          best = motion;
        }
      }
      return { storey, motion: best };
    },
    [motions, rows, sky, scale, first],
  );
  return (
    <rect
      className="touch"
      width={width}
      height={sky + rows.total}
      fill="transparent"
      onPointerMove={(event) => setSession({ lit: near(event)?.motion ?? null })}
      onPointerLeave={() => setSession({ lit: null })}
      onPointerDown={(event) => {
        const hit = near(event);
        if (hit !== null) setSession({ storey: hit.storey, ...(hit.motion === null ? {} : { motion: hit.motion }) });
      }}
    />
  );
}
