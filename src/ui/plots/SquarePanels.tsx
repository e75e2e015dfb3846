/** The two square panels under the answers: drawn by the panels room. */
export function SquarePanels() {
  return <section data-part="plots" aria-label="Plots" />;
}
