/** How long another page of this browser is given to let go of the document, as one that is being reloaded does [ms]. */
const LETTING_GO = 500;

/** Whether this page alone has the document: true for the first page of this browser, and until it is closed. */
export async function aloneInBrowser(): Promise<boolean> {
  if (!('locks' in navigator)) return true;
  return new Promise((resolve) => {
    const waiting = AbortSignal.timeout(LETTING_GO);
    const held = () => {
      resolve(true);
      return new Promise<never>(() => {});
    };
    navigator.locks.request('swaybook', { signal: waiting }, held).catch(() => resolve(false));
  });
}

/** Calls back when the page is hidden or left; returns how to stop that. */
export function onLeavePage(leave: () => void): () => void {
  const hidden = () => {
    if (document.visibilityState === 'hidden') leave();
  };
  window.addEventListener('pagehide', leave);
  document.addEventListener('visibilitychange', hidden);
  return () => {
    window.removeEventListener('pagehide', leave);
    document.removeEventListener('visibilitychange', hidden);
  };
}
