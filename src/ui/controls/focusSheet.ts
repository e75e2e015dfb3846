/**
 * Puts the focus on the chosen cell of the sheet, where the keys go on, or on the step whose screen is shown: for what takes away
 * the control that held it.
 */
export function focusSheet(): void {
  const place =
    document.querySelector<HTMLElement>('[role="grid"] [tabindex="0"]') ??
    document.querySelector<HTMLElement>('.step[aria-current]');
  place?.focus({ preventScroll: true });
}
