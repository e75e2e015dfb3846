/** Where one panel of the time stack stands, from its top [px]. */
export interface Band {
  readonly label: number;
  readonly top: number;
  readonly height: number;
}

export interface StackGeometry {
  readonly height: number;
  /** The time axis: where it begins, from the left edge of the stack, and how wide it is [px]. */
  readonly axisX: number;
  readonly axisWidth: number;
  readonly strip: Band;
  readonly panels: readonly Band[];
  /** Base line of the numbers of the time axis. */
  readonly numbers: number;
}

/** The labels at the left and the gap behind them [px]. */
const AXIS_X = 196;

/** Room under the play button that a second row of letters may take [px]. */
const SPARE = 4;

/** Measured at 1600 x 1000 and 1024 x 1000 px; what a window is taller by is shared out. */
const WIDE = { total: 384, strip: 88, panels: [78, 64, 78], gaps: [10, 14, 12, 12], shares: [0.28, 0.28, 0.2, 0.24] };
const NARROW = { total: 214, strip: 84, panels: [78], gaps: [11, 14], shares: [0.5, 0.5] };

/**
 * The bands of the time stack.
 *
 * @param width     of the stack [px]
 * @param height    that it may take [px]; less than the look's own is not taken
 * @param narrow    two panels in all instead of four
 * @param chipRows  rows of motion letters under the name of the record
 */
export function stackGeometry(width: number, height: number, narrow: boolean, chipRows: number): StackGeometry {
  const form = narrow ? NARROW : WIDE;
  const extra = Math.max(0, height - form.total);
  const share = (i: number) => Math.round(extra * form.shares[i]);
  // A second row of letters needs room that the strip's band does not have.
  const rows = Math.max(0, chipRows - 1) * 24;
  let y = form.gaps[0];
  const strip: Band = { label: y - 4, top: y, height: form.strip + share(0) + Math.max(0, rows - share(0) - SPARE) };
  y += strip.height;
  const panels = form.panels.map((own, i): Band => {
    const top = y + form.gaps[i + 1];
    const shrink = i === 0 ? Math.max(0, rows - share(0) - SPARE) : 0;
    const band = { label: top - 2, top, height: own + share(i + 1) - shrink };
    y = top + band.height;
    return band;
  });
  return {
    height: form.total + extra,
    axisX: AXIS_X,
    axisWidth: Math.max(120, width - AXIS_X),
    strip,
    panels,
    numbers: y + 15,
  };
}
