/** Calls back when the page has a moment to spare, at the latest after so long [ms]; returns how to withdraw it. */
export function whenIdle(run: () => void, latest: number): () => void {
  // Safari has no idle callbacks: a short wait stands in.
  if (typeof requestIdleCallback === 'undefined') {
    const waiting = setTimeout(run, 50);
    return () => clearTimeout(waiting);
  }
  const waiting = requestIdleCallback(run, { timeout: latest });
  return () => cancelIdleCallback(waiting);
}
