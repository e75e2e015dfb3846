/** Seconds with three figures that count: "0.0125". */
export function shortSeconds(seconds: number): string {
  return String(Number(seconds.toPrecision(3)));
}
