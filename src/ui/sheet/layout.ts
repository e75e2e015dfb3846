import type { InputColumn } from './columns.ts';

/** Where the parts of the sheet stand [px], from the left edge of the page. */
export interface SheetLayout {
  /** Under 1200 px: the law is a glyph, shear and acceleration are numbers only. */
  readonly narrow: boolean;
  readonly margin: number;
  /** Width of the page: the window's, or more with a sideways scroll where the columns ask for it. */
  readonly width: number;
  /** Whether the page is wider than what is seen of it. */
  readonly sideways: boolean;
  readonly inputs: Span;
  readonly frame: Span;
  /** The answer side: everything right of the gutter. */
  readonly answers: Span;
  readonly drift: Span;
  /** Null where the plot is folded away and only its number stands. */
  readonly shear: Span | null;
  readonly acceleration: Span | null;
  /** Whether the name of a law stands beside its glyph. */
  readonly lawNames: boolean;
  /** The names of the storeys have little room. */
  readonly tight: boolean;
  /** Signs a column has room for. */
  readonly signs: Readonly<Partial<Record<InputColumn, number>>>;
  /** Tracks of a row as a CSS grid with named lines. */
  readonly tracks: string;
}

export interface Span {
  readonly x: number;
  readonly width: number;
}

/** Window from which the wide form is shown. */
export const WIDE_FROM = 1200;
const SCROLLS_UNDER = 900;
/** Window from which ductility and residual drift stand on the row by themselves. */
export const ROOMY_FROM = 1560;

interface Sizes {
  readonly inputs: number;
  readonly gapFrame: number;
  readonly frame: number;
  readonly gutter: number;
  readonly drift: number;
  readonly mean: number;
  readonly ratio: number;
  readonly ductility: number;
  readonly residual: number;
  readonly gap: number;
  readonly shear: number;
  readonly force: number;
  readonly acceleration: number;
  readonly g: number;
}

/** Measured at 1600 px, the tightest wide form at 1200 px, and the narrow form at 1024 px. */
const WIDE: Sizes = {
  inputs: 556,
  gapFrame: 16,
  frame: 296,
  gutter: 24,
  drift: 270,
  mean: 46,
  ratio: 58,
  ductility: 0,
  residual: 0,
  gap: 22,
  shear: 86,
  force: 52,
  acceleration: 66,
  g: 38,
};
const TIGHT: Sizes = { ...WIDE, inputs: 388, frame: 196, drift: 190, shear: 60, acceleration: 48 };
const NARROW: Sizes = {
  inputs: 360,
  gapFrame: 12,
  frame: 178,
  gutter: 16,
  drift: 202,
  mean: 44,
  ratio: 54,
  ductility: 0,
  residual: 0,
  gap: 14,
  shear: 0,
  force: 54,
  acceleration: 0,
  g: 44,
};

/** Ductility and residual drift take their room from the plots beside them; the drift keeps what is left. */
const YIELDING = { ductility: 56, residual: 44, gap: 16, shear: 66, acceleration: 50 };
const LEAST_DRIFT = 140;
const LEAST_FRAME = 150;

/** Width of an input column: the least that its numbers fit in, and what it likes to have. The law: its glyph alone, with its name. */
const COLUMNS: Readonly<Record<InputColumn, readonly [least: number, usual: number]>> = {
  name: [84, 126],
  height: [44, 52],
  mass: [52, 64],
  stiffness: [56, 72],
  law: [34, 112],
  strength: [58, 68],
  hardening: [58, 62],
  gravity: [58, 72],
  coefficient: [58, 72],
  exponent: [46, 56],
};
/** The name of a law is cut off below. */
const NAMED_LAW = 112;
/** Room beside the figures of a cell, and the width of a figure [px]. */
const CELL_EDGE = 9;
const FIGURE = 7.4;

function total(sizes: Sizes): number {
  const { inputs, gapFrame, frame, gutter, drift, mean, ratio, ductility, residual, gap } = sizes;
  const { shear, force, acceleration, g } = sizes;
  return (
    inputs +
    gapFrame +
    frame +
    gutter +
    drift +
    mean +
    ratio +
    ductility +
    residual +
    gap +
    shear +
    force +
    gap +
    acceleration +
    g
  );
}

/** Whole pixels in proportion to the shares, rounded on the running sum. */
function split(width: number, shares: readonly number[]): number[] {
  const all = shares.reduce((sum, share) => sum + share, 0);
  let run = 0;
  let before = 0;
  return shares.map((share) => {
    run += share;
    const edge = Math.round((width * run) / all);
    const size = edge - before;
    before = edge;
    return size;
  });
}

/** Room beyond a form's own width goes to the inputs, the frame and the drift plot. */
function stretch(sizes: Sizes, extra: number): Sizes {
  const [inputs = 0, frame = 0, drift = 0] = split(extra, [2, 3, 5]);
  return { ...sizes, inputs: sizes.inputs + inputs, frame: sizes.frame + frame, drift: sizes.drift + drift };
}

function between(share: number): Sizes {
  const mix = (from: number, to: number) => Math.round(from + share * (to - from));
  return {
    ...WIDE,
    inputs: mix(TIGHT.inputs, WIDE.inputs),
    frame: mix(TIGHT.frame, WIDE.frame),
    shear: mix(TIGHT.shear, WIDE.shear),
    acceleration: mix(TIGHT.acceleration, WIDE.acceleration),
    drift: 0,
  };
}

function formOf(narrow: boolean, room: number): Sizes {
  if (narrow) return stretch(NARROW, room - total(NARROW));
  if (room >= total(WIDE)) return stretch(WIDE, room - total(WIDE));
  const share = Math.max(0, (room - total(TIGHT)) / (total(WIDE) - total(TIGHT)));
  const mixed = between(share);
  return { ...mixed, drift: room - total(mixed) };
}

/** The form with ductility and residual drift on the row, as wide as it was. */
function withYielding(sizes: Sizes): Sizes {
  const { ductility, residual, gap, shear, acceleration } = YIELDING;
  const made = {
    ...sizes,
    ductility,
    residual,
    gap: Math.min(sizes.gap, gap),
    shear: Math.min(sizes.shear, shear),
    acceleration: Math.min(sizes.acceleration, acceleration),
  };
  return { ...made, drift: sizes.drift - (total(made) - total(sizes)) };
}

/** Widths of the input columns in a room, or in what they need at least. */
function widthsOf(room: number, columns: readonly InputColumn[], narrow: boolean): number[] {
  const sum = (all: readonly number[]) => all.reduce((a, b) => a + b, 0);
  const least = (named: boolean) => columns.map((key) => (key === 'law' && named ? NAMED_LAW : COLUMNS[key][0]));
  const named = !narrow && sum(least(true)) <= room;
  const lows = least(named);
  const usual = columns.map((key) => (key === 'law' && !named ? COLUMNS.law[0] : COLUMNS[key][1]));
  const free = room - sum(lows);
  if (free <= 0) return lows;
  const wishes = usual.map((size, index) => size - lows[index]);
  const wished = sum(wishes);
  const grown = split(Math.min(free, wished), wishes).map((size, index) => size + lows[index]);
  return free <= wished ? grown : split(free - wished, grown).map((size, index) => size + grown[index]);
}

/**
 * The layout of the sheet for a window of a width.
 *
 * @param available  width the page may take [px]
 * @param window     width of the window, which alone decides the form, so that a scroll bar cannot flip it [px]
 * @param columns    input columns shown, from left to right
 * @param yielding   whether ductility and residual drift stand on the row
 */
export function layoutOf(
  available: number,
  window: number,
  columns: readonly InputColumn[],
  yielding = false,
): SheetLayout {
  const narrow = window < WIDE_FROM;
  const margin = narrow ? 16 : 24;
  const form = formOf(narrow, Math.max(available, SCROLLS_UNDER) - 2 * margin);
  const sizes = yielding ? withYielding(form) : form;
  const widths = widthsOf(sizes.inputs, columns, narrow);
  const taken = widths.reduce((sum, size) => sum + size, 0);
  // More columns than the inputs have room for: the drift plot gives of its own, then the frame, then the page grows.
  const short = taken - sizes.inputs + Math.max(0, LEAST_DRIFT - sizes.drift);
  const driftGives = Math.min(Math.max(0, sizes.drift - LEAST_DRIFT), short);
  const frameGives = Math.min(Math.max(0, sizes.frame - LEAST_FRAME), short - driftGives);
  const driftWidth = Math.max(LEAST_DRIFT, sizes.drift - driftGives);
  const frameWidth = sizes.frame - frameGives;

  const inputs = { x: margin, width: taken };
  const frame = { x: inputs.x + inputs.width + sizes.gapFrame, width: frameWidth };
  const drift = { x: frame.x + frame.width + sizes.gutter, width: driftWidth };
  const shearX = drift.x + drift.width + sizes.mean + sizes.ratio + sizes.ductility + sizes.residual + sizes.gap;
  const accelerationX = shearX + sizes.shear + sizes.force + sizes.gap;
  const width = accelerationX + sizes.acceleration + sizes.g + margin;
  const tracks = [
    ...columns.map((column, index) => `[${column}] ${widths[index]}px`),
    `${sizes.gapFrame}px [frame] ${frame.width}px ${sizes.gutter}px`,
    `[drift] ${drift.width}px [mean] ${sizes.mean}px [ratio] ${sizes.ratio}px`,
    yielding ? `[ductility] ${sizes.ductility}px [residual] ${sizes.residual}px` : '',
    `${sizes.gap}px [shear] ${sizes.shear}px [force] ${sizes.force}px ${sizes.gap}px`,
    `[acceleration] ${sizes.acceleration}px [g] ${sizes.g}px`,
  ].join(' ');
  return {
    narrow,
    margin,
    width,
    sideways: width > available,
    inputs,
    frame,
    answers: { x: drift.x, width: width - margin - drift.x },
    drift,
    shear: narrow ? null : { x: shearX, width: sizes.shear },
    acceleration: narrow ? null : { x: accelerationX, width: sizes.acceleration },
    tight: (widths[0] ?? 0) < 120,
    lawNames: (widths[columns.indexOf('law')] ?? 0) >= NAMED_LAW,
    signs: Object.fromEntries(columns.map((key, i) => [key, Math.floor((widths[i] - CELL_EDGE) / FIGURE)])),
    tracks,
  };
}
