/** The records of the suite: made by the panels room. */
export function MotionsScreen() {
  return <div className="page" />;
}
