/** A number for an SVG attribute: a tenth of a pixel is enough. */
export function px(value: number): string {
  return String(Math.round(value * 10) / 10);
}

/** A column in double curvature between two floors: vertical at both ends. */
export function columnPath(xFoot: number, yFoot: number, xHead: number, yHead: number): string {
  const reach = 0.3833 * (yFoot - yHead);
  return `M${px(xFoot)} ${px(yFoot)}C${px(xFoot)} ${px(yFoot - reach)} ${px(xHead)} ${px(yHead + reach)} ${px(xHead)} ${px(yHead)}`;
}

/** Half the width of a bearing's plates and half its thickness [px]. */
const PLATE = 11;
const PAD = 7;

/**
 * A bearing between the ground and the floor it carries: a pad of layers between two plates, sheared by what the floor moves, on a
 * pedestal, under a stub of the floor.
 */
export function bearingPath(xFoot: number, yFoot: number, xHead: number, yHead: number): string {
  const middle = (yFoot + yHead) / 2;
  const pad = Math.min(PAD, 0.3 * (yFoot - yHead));
  const at = (share: number) => ({ x: xFoot + share * (xHead - xFoot), y: middle + pad - 2 * pad * share });
  const layer = (share: number, half: number) => {
    const { x, y } = at(share);
    return `M${px(x - half)} ${px(y)}H${px(x + half)}`;
  };
  const sides = [-1, 1].map(
    (side) =>
      `M${px(xFoot + side * (PLATE - 3))} ${px(middle + pad)}L${px(xHead + side * (PLATE - 3))} ${px(middle - pad)}`,
  );
  const stands = `M${px(xFoot)} ${px(yFoot)}V${px(middle + pad)}M${px(xHead)} ${px(yHead)}V${px(middle - pad)}`;
  return [layer(0, PLATE), layer(1, PLATE), layer(1 / 3, PLATE - 3), layer(2 / 3, PLATE - 3), ...sides, stands].join(
    '',
  );
}

/** Where a storey's marks stand on a column: away from its rest across, and down the sheet, foot and head [px]. */
export type Ends = readonly (readonly [x: number, y: number])[];

/** At both ends of a column, as far inside the storey as its row allows. */
export function columnEnds(xFoot: number, xHead: number, yFoot: number, yHead: number): Ends {
  const inset = Math.min(6, (yFoot - yHead) / 5);
  return [
    [xFoot, yFoot - inset],
    [xHead, yHead + inset],
  ];
}

/** In the middle of a bearing. */
export function bearingMiddle(xFoot: number, xHead: number, yFoot: number, yHead: number): Ends {
  const middle = [(xFoot + xHead) / 2, (yFoot + yHead) / 2] as const;
  return [middle, middle];
}

/** Upright ticks of one row as one path. */
export function ticksPath(xs: readonly number[], top: number, bottom: number): string {
  return xs.map((x) => `M${px(x)} ${px(top)}V${px(bottom)}`).join('');
}

/** The triangle under a bar that marks the drift at the cursor. */
export function markPath(x: number, top: number): string {
  return `M${px(x)} ${px(top)}l4 6h-8z`;
}

/** Line widths of the columns [px]: 1.2 for the softest storey, 3.4 for the stiffest, 2.4 where all are alike. */
export function columnWidths(stiffnesses: readonly (number | null)[]): number[] {
  const known = stiffnesses.filter((value): value is number => value !== null && value > 0);
  const least = Math.min(...known);
  const span = Math.max(...known) - least;
  return stiffnesses.map((value) =>
    value === null || !(value > 0) || !(span > 0) ? 2.4 : 1.2 + (2.2 * (value - least)) / span,
  );
}

/**
 * The largest whole number up to 20 that keeps the sway inside its room.
 *
 * @param peak   largest floor displacement of the suite [m]
 * @param scale  [px/m]
 * @param room   [px]
 */
export function swayFactor(peak: number, scale: number, room: number): number {
  if (!(peak > 0)) return 20;
  return Math.min(20, Math.max(1, Math.floor(room / (peak * scale))));
}
