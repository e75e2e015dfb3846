/** The ground motion and what it does in time: drawn by the panels room. */
export function GroundStack() {
  return <section data-part="strip" aria-label="Ground motion" />;
}
