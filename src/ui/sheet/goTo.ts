import { type AnalysisPart, setSession } from '../../state/session.ts';
import { focusSheet } from '../controls/focusSheet.ts';
import { cellOf } from './columns.ts';
import { choose } from './commands.ts';

/**
 * Takes the reader to the place of a fault: its cell on the sheet, the panel of a law where the cell does not show the number, the
 * analysis with its dialog, or the motions.
 *
 * @param openLaw  opens the panel of a storey's law
 */
export function goTo(where: string, openLaw: (storey: number) => void): void {
  const cell = cellOf(where);
  if (cell !== null) {
    choose(cell.storey, cell.column);
    if (cell.column === 'law') openLaw(cell.storey);
    // The cell is drawn with the columns that a fault unfolds.
    else requestAnimationFrame(focusSheet);
    return;
  }
  if (where.startsWith('motions[')) setSession({ screen: 'motions' });
  else {
    const part = partOf(where);
    if (part === null) focusSheet();
    else setSession({ dialog: 'analysis', analysisPart: part });
  }
}

/** The section of the analysis dialog that a path stands in; null: none. */
export function partOf(where: string): AnalysisPart | null {
  if (where.startsWith('analysis.method')) return 'Method';
  if (where.startsWith('analysis')) return 'Step';
  if (where.startsWith('frame.damping')) return 'Damping';
  if (where.startsWith('frame.pDelta')) return 'P-Delta';
  return where.startsWith('limits') ? 'Limit' : null;
}
