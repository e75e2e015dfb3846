/** The dialog that is open, if any: made by the panels room. */
export function Dialogs() {
  return null;
}
