import { memo, useMemo } from 'react';
import type { AnswerRows } from './answerRows.ts';
import { type Axis, linesOf } from './axis.ts';
import { px } from './drawing.ts';
import type { Span } from './layout.ts';
import type { Rows } from './rows.ts';

export interface SidePlotProps {
  readonly span: Span;
  readonly rows: Rows;
  readonly height: number;
  readonly axis: Axis;
  readonly answers: AnswerRows | null;
  readonly old: boolean;
}

/** Storey shear of the suite, one bar a row; the typed strength as a bracket on it. */
export const ShearPlot = memo(function ShearPlot({ span, rows, height, axis, answers, old }: SidePlotProps) {
  const scale = span.width / axis.end;
  const sky = height - rows.total;
  const shear = answers?.shear ?? null;
  return (
    <svg
      className="sheet-svg"
      style={{ left: span.x }}
      width={span.width}
      height={height}
      role="img"
      aria-label="Peak storey shear; the numbers stand beside it"
    >
      <AxisLines axis={axis} scale={scale} height={height} />
      {shear !== null &&
        rows.heights.map((size, storey) => {
          const end = Math.min((shear[storey] ?? 0) * scale, span.width + 4);
          const middle = sky + (rows.tops[storey] ?? 0) + size / 2;
          const body = size < 28 ? 4 : 6;
          return old ? (
            <path
              key={storey}
              d={`M0 ${middle - body}H${px(end)}v${2 * body}H0`}
              className="s-ink3"
              strokeDasharray="3 2"
            />
          ) : (
            <g key={storey}>
              <rect className="f-mean" y={middle - body} width={end} height={2 * body} />
              <path d={`M${px(end)} ${middle - body - 1}v${2 * body + 2}`} className="s-ink" strokeWidth="3" />
            </g>
          );
        })}
      {answers !== null && (
        <path
          d={answers.strengths
            .map((strength, storey) => bracket(strength, storey, rows, sky, scale, span.width))
            .join('')}
          className="s-accent"
          strokeWidth="1.3"
          opacity={old ? 0.45 : undefined}
        />
      )}
    </svg>
  );
});

/** The strength of a storey as a bracket that holds its bar; nothing where it lies beyond the axis. */
function bracket(
  strength: number | null,
  storey: number,
  rows: Rows,
  sky: number,
  scale: number,
  width: number,
): string {
  if (strength === null || strength * scale > width) return '';
  const size = rows.heights[storey] ?? 0;
  const reach = size < 28 ? 7 : 11;
  const top = sky + (rows.tops[storey] ?? 0) + size / 2 - reach;
  return `M${px(strength * scale - 4)} ${px(top)}h4v${2 * reach}h-4`;
}

/** Total floor acceleration as a line through the floor lines: each motion, the chosen one, the suite. */
export const AccelerationPlot = memo(function AccelerationPlot({
  span,
  rows,
  height,
  axis,
  answers,
  old,
  chosenMotion,
}: SidePlotProps & { readonly chosenMotion: string | null }) {
  const scale = span.width / axis.end;
  const sky = height - rows.total;
  const line = useMemo(
    () => (values: readonly number[], ground: number | undefined) => {
      const from = ground === undefined ? '' : `M${px(ground * scale)} ${height}`;
      const floors = values.map((value, floor) => {
        const pen = floor === 0 && ground === undefined ? 'M' : 'L';
        return `${pen}${px(value * scale)} ${sky + (rows.tops[floor] ?? 0)}`;
      });
      return from + floors.join('');
    },
    [rows, sky, scale, height],
  );
  const ground = answers?.ground ?? null;
  const suite = answers?.acceleration ?? null;
  const chosen = answers?.motions.find(({ motion }) => motion === chosenMotion);
  return (
    <svg
      className="sheet-svg"
      style={{ left: span.x }}
      width={span.width}
      height={height}
      role="img"
      aria-label="Peak floor acceleration; the numbers stand beside it"
    >
      <AxisLines axis={axis} scale={scale} height={height} />
      {answers !== null && (
        <g opacity={old ? 0.45 : undefined}>
          <path
            d={answers.motions.map(({ motion, acceleration }) => line(acceleration, ground?.motions[motion])).join('')}
            className="s-suite"
            strokeWidth="0.7"
            opacity="0.55"
          />
          {chosen !== undefined && (
            <path
              d={line(chosen.acceleration, ground?.motions[chosen.motion])}
              className="s-accent"
              strokeWidth="1.2"
            />
          )}
          {suite !== null && (
            <>
              <path d={line(suite, ground?.suite)} className="s-bar" strokeWidth="1.6" strokeLinejoin="round" />
              <g className="f-bar" stroke="var(--paper)">
                {ground !== null && <circle cx={px(ground.suite * scale)} cy={height} r="3.2" />}
                {suite.map((value, floor) => (
                  <circle
                    key={floor}
                    cx={px(value * scale)}
                    cy={sky + (rows.tops[floor] ?? 0)}
                    r={(rows.heights[floor] ?? 0) < 28 ? 2 : 3.2}
                  />
                ))}
              </g>
            </>
          )}
        </g>
      )}
    </svg>
  );
});

function AxisLines({ axis, scale, height }: { readonly axis: Axis; readonly scale: number; readonly height: number }) {
  return (
    <>
      <path
        d={linesOf(axis, axis.minor)
          .map((value) => `M${px(value * scale)} -4V${height}`)
          .join('')}
        className="s-hair"
      />
      <path d={`M0 -4V${height}`} className="s-ink3" />
    </>
  );
}
