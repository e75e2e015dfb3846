import { lazy } from 'react';

/** Parts of the sheet that a first view does without. */
const parts = {
  law: () => import('./LawPanel.tsx'),
  paste: () => import('./PasteDialog.tsx'),
  mends: () => import('./Mends.tsx'),
};

export const LawPanel = lazy(() => parts.law().then((module) => ({ default: module.LawPanel })));
export const PasteDialog = lazy(() => parts.paste().then((module) => ({ default: module.PasteDialog })));
export const Mends = lazy(() => parts.mends().then((module) => ({ default: module.Mends })));

/** Fetches them once the page is at rest, so that none is waited for, nor missed when the line is gone. */
export function fetchLater(): void {
  setTimeout(() => {
    // What does not come now is asked for again when it is needed, and its place says so.
    for (const part of Object.values(parts)) part().catch(() => undefined);
  }, AT_REST);
}

/** After the first answers and the plots [ms]. */
const AT_REST = 4000;
