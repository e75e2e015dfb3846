import { useMemo } from 'react';
import { printQuantity, type Quantity, type System, unitOf } from '../../core/units/quantities.ts';
import { type Axis, linesOf } from './axis.ts';
import { COLUMN_QUANTITIES, type InputColumn } from './columns.ts';
import { px } from './drawing.ts';
import type { SheetLayout, Span } from './layout.ts';

export interface HeadsProps {
  readonly layout: SheetLayout;
  readonly columns: readonly InputColumn[];
  readonly system: System;
  readonly sway: number | null;
  readonly toScale: boolean;
  /** Ductility and residual drift stand on the row. */
  readonly yielding: boolean;
  /** Some storey has a typed strength. */
  readonly strengths: boolean;
  /** "mean of 7"; null: no answers. */
  readonly suite: string | null;
  readonly statistic: string;
  readonly letter: string | null;
  readonly factor: number;
  readonly driftAxis: Axis;
  readonly limit: number | null;
  /** The word "limit" stands at the right of its cell. */
  readonly beside: boolean;
  readonly shearAxis: Axis | null;
  readonly accelerationAxis: Axis | null;
}

const HEADS: Readonly<Record<InputColumn, string>> = {
  name: 'Storey',
  height: 'Height',
  mass: 'Weight',
  stiffness: 'Stiffness',
  law: 'Law',
  strength: 'Strength',
  hardening: 'Hardening',
  gravity: 'Gravity',
  coefficient: 'At 1 m/s',
  exponent: 'Exp.',
};

/** The heads of the columns in three tiers: caption, name, unit or axis numbers. For the eye: the grid names its own columns. */
export function Heads(props: HeadsProps) {
  const { layout, columns, system, sway, toScale, suite, statistic, letter, factor, driftAxis, limit } = props;
  const { narrow, inputs, frame, answers, drift, shear, acceleration } = layout;
  const unit = (quantity: Quantity) => unitOf(quantity, system);
  const scaleWords = toScale ? (narrow ? 'To scale' : 'The frame, heights to scale') : 'Heights not to scale';
  const times = factor === 1 ? '' : ` × ${factor}`;
  return (
    <div className="heads" aria-hidden="true">
      <div className="tier1" style={{ left: inputs.x, width: inputs.width }}>
        You type
      </div>
      <div className="tier1" style={{ left: frame.x, width: frame.width }}>
        {scaleWords}
        {sway !== null && `, sway × ${sway}`}
      </div>
      <div className="tier1 answered" style={{ left: answers.x, width: answers.width }}>
        <span>{narrow ? 'Answers' : 'The storey answers'}</span>
        {suite !== null && <Legend suite={suite} letter={letter} strengths={props.strengths && shear !== null} />}
      </div>
      <div className="tier-cells" style={{ left: inputs.x }}>
        {columns.map((column) => {
          const quantity = COLUMN_QUANTITIES[column];
          return (
            <div
              key={column}
              className={`head-cell ${quantity === null ? 'words' : ''}`}
              style={{ gridColumn: column, gridRow: 1 }}
            >
              <span>{HEADS[column]}</span>
              <span className="unit">{quantity === null ? '' : column === 'exponent' ? 'damper' : unit(quantity)}</span>
            </div>
          );
        })}
        <HeadCell column="frame" kind="plot" name={`Level, ${unit('length')}`} />
        <HeadCell column="drift" kind="plot" name={`${narrow ? 'Peak drift' : 'Peak drift ratio'}${times}, %`} />
        <HeadCell column="mean" kind="result" name={statistic} unit={unit('percent')} />
        <HeadCell column="ratio" kind="result" name="Of limit" unit="ratio" />
        {props.yielding && (
          <>
            <HeadCell column="ductility" kind="result" name="Ductility" unit="ratio" />
            <HeadCell column="residual" kind="result" name="Resid." unit={unit('percent')} />
          </>
        )}
        {!narrow && <HeadCell column="shear" kind="plot" name="Storey shear" />}
        <HeadCell column="force" kind="result" name={narrow ? 'Shear' : statistic} unit={unit('force')} />
        {!narrow && (
          <HeadCell
            column="acceleration"
            kind="plot"
            name={acceleration !== null && acceleration.width < 60 ? 'Accel.' : 'Floor accel.'}
          />
        )}
        <HeadCell column="g" kind="result" name={narrow ? 'Accel.' : statistic} unit={unit('acceleration')} />
      </div>
      <AxisNumbers span={drift} axis={driftAxis} keepFree={limit} after={props.beside ? 62 : 30} />
      {shear !== null && props.shearAxis !== null && <AxisNumbers span={shear} axis={props.shearAxis} />}
      {acceleration !== null && props.accelerationAxis !== null && (
        <AxisNumbers span={acceleration} axis={props.accelerationAxis} />
      )}
    </div>
  );
}

function HeadCell({ column, kind, name, unit = '' }: { column: string; kind: string; name: string; unit?: string }) {
  return (
    <div className={`head-cell ${kind}`} style={{ gridColumn: column, gridRow: 1 }}>
      <span>{name}</span>
      <span className="unit">{unit}</span>
    </div>
  );
}

interface AxisNumbersProps {
  readonly span: Span;
  readonly axis: Axis;
  /** A value whose place another thing takes: no number near it. */
  readonly keepFree?: number | null;
  /** How far to its right that thing reaches [px]. */
  readonly after?: number;
}

function AxisNumbers({ span, axis, keepFree = null, after = 30 }: AxisNumbersProps) {
  const scale = span.width / axis.end;
  const numbers = useMemo(() => {
    const lines = linesOf(axis, axis.major);
    // Every so many-th, so that no two touch.
    const widest = Math.max(...lines.map((value) => FIGURE * numberText(value).length));
    const every = Math.max(1, Math.ceil((widest + 6) / (axis.major * scale)));
    return [0, ...lines.filter((_, index) => (index + 1) % every === 0)];
  }, [axis, scale]);
  return (
    <svg className="axis-head" aria-hidden="true" style={{ left: span.x }} width={span.width} height="60">
      {numbers.map((value) =>
        keepFree !== null && (value - keepFree) * scale > -30 && (value - keepFree) * scale < after ? null : (
          <text key={value} x={px(value * scale)} y="49" className="middle">
            {numberText(value)}
          </text>
        ),
      )}
    </svg>
  );
}

/** Width of a figure of an axis [px]. */
const FIGURE = 6.2;

function numberText(value: number): string {
  return printQuantity(value, 'count', 'si', decimalsIn(value));
}

/** Decimals a number of an axis needs of its own: 0, 0.5, 1. */
function decimalsIn(value: number): number {
  const text = String(Number(value.toPrecision(6)));
  const point = text.indexOf('.');
  return point < 0 ? 0 : text.length - point - 1;
}

interface LegendProps {
  readonly suite: string;
  readonly letter: string | null;
  readonly strengths: boolean;
}

function Legend({ suite, letter, strengths }: LegendProps) {
  return (
    <>
      <span className="key">
        <svg aria-hidden="true" width="21" height="11" viewBox="0 0 21 11">
          <rect y="1" width="18" height="9" className="f-mean" />
          <path d="M18.5 0V11" className="s-ink" strokeWidth="3" />
        </svg>
        {suite}
      </span>
      <span className="key">
        <svg aria-hidden="true" width="9" height="11" viewBox="0 0 9 11">
          <path d="M1.5 0V11M5.5 0V11M7.5 0V11" className="s-ink3" />
        </svg>
        each motion
      </span>
      {letter !== null && (
        <>
          <span className="key">
            <svg aria-hidden="true" width="5" height="11" viewBox="0 0 5 11">
              <path d="M2 0V11" className="s-accent" strokeWidth="2" />
            </svg>
            {letter}
          </span>
          <span className="key">
            <svg aria-hidden="true" width="10" height="11" viewBox="0 0 10 11">
              <path d="M4.5 2.5l4 6.5h-8z" className="f-accent" />
            </svg>
            {letter} at the cursor
          </span>
        </>
      )}
      {strengths && (
        <span className="key">
          <svg aria-hidden="true" width="7" height="11" viewBox="0 0 7 11">
            <path d="M.5.6h4v10h-4" className="s-accent" strokeWidth="1.3" />
          </svg>
          strength typed
        </span>
      )}
    </>
  );
}
