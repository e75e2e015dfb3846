import type { InputColumn } from './columns.ts';

/** Where the parts of the sheet stand [px], from the left edge of the page. */
export interface SheetLayout {
  /** Under 1200 px: the law is a glyph, shear and acceleration are numbers only. */
  readonly narrow: boolean;
  readonly margin: number;
  /** Width of the page: the window's, or 900 px with a sideways scroll. */
  readonly width: number;
  readonly inputs: Span;
  readonly frame: Span;
  /** The answer side: everything right of the gutter. */
  readonly answers: Span;
  readonly drift: Span;
  /** Null where the plot is folded away and only its number stands. */
  readonly shear: Span | null;
  readonly acceleration: Span | null;
  /** Tracks of a row as a CSS grid with named lines. */
  readonly tracks: string;
}

export interface Span {
  readonly x: number;
  readonly width: number;
}

const NARROW_UNDER = 1200;
const SCROLLS_UNDER = 900;

interface Sizes {
  readonly inputs: number;
  readonly gapFrame: number;
  readonly frame: number;
  readonly gutter: number;
  readonly drift: number;
  readonly mean: number;
  readonly ratio: number;
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
  gap: 14,
  shear: 0,
  force: 54,
  acceleration: 0,
  g: 44,
};

/** Shares of the input side a column takes. */
const SHARES: Readonly<Record<'wide' | 'narrow', Readonly<Record<InputColumn, number>>>> = {
  wide: { name: 168, height: 76, mass: 92, stiffness: 104, law: 116, gravity: 96 },
  narrow: { name: 112, height: 62, mass: 74, stiffness: 78, law: 34, gravity: 74 },
};

function total(sizes: Sizes): number {
  const { inputs, gapFrame, frame, gutter, drift, mean, ratio, gap, shear, force, acceleration, g } = sizes;
  return inputs + gapFrame + frame + gutter + drift + mean + ratio + gap + shear + force + gap + acceleration + g;
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

/**
 * The layout of the sheet for a window of a width.
 *
 * @param available  width the page may take [px]
 * @param window     width of the window, which alone decides the form, so that a scroll bar cannot flip it [px]
 * @param columns    input columns shown, from left to right
 */
export function layoutOf(available: number, window: number, columns: readonly InputColumn[]): SheetLayout {
  const narrow = window < NARROW_UNDER;
  const margin = narrow ? 16 : 24;
  const width = Math.max(available, SCROLLS_UNDER);
  const room = width - 2 * margin;
  let sizes: Sizes;
  if (narrow) sizes = stretch(NARROW, room - total(NARROW));
  else if (room >= total(WIDE)) sizes = stretch(WIDE, room - total(WIDE));
  else {
    const share = Math.max(0, (room - total(TIGHT)) / (total(WIDE) - total(TIGHT)));
    const mixed = between(share);
    sizes = { ...mixed, drift: room - total(mixed) };
  }

  const shares = SHARES[narrow ? 'narrow' : 'wide'];
  const widths = split(
    sizes.inputs,
    columns.map((column) => shares[column]),
  );
  const inputs = { x: margin, width: sizes.inputs };
  const frame = { x: inputs.x + inputs.width + sizes.gapFrame, width: sizes.frame };
  const drift = { x: frame.x + frame.width + sizes.gutter, width: sizes.drift };
  const shearX = drift.x + drift.width + sizes.mean + sizes.ratio + sizes.gap;
  const accelerationX = shearX + sizes.shear + sizes.force + sizes.gap;
  const tracks = [
    ...columns.map((column, index) => `[${column}] ${widths[index]}px`),
    `${sizes.gapFrame}px [frame] ${sizes.frame}px ${sizes.gutter}px`,
    `[drift] ${sizes.drift}px [mean] ${sizes.mean}px [ratio] ${sizes.ratio}px ${sizes.gap}px`,
    `[shear] ${sizes.shear}px [force] ${sizes.force}px ${sizes.gap}px [acceleration] ${sizes.acceleration}px [g] ${sizes.g}px`,
  ].join(' ');
  return {
    narrow,
    margin,
    width,
    inputs,
    frame,
    answers: { x: drift.x, width: width - margin - drift.x },
    drift,
    shear: narrow ? null : { x: shearX, width: sizes.shear },
    acceleration: narrow ? null : { x: accelerationX, width: sizes.acceleration },
    tracks,
  };
}
