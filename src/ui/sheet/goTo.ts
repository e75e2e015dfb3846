import { setSession } from '../../state/session.ts';
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
  else if (/^(analysis|limits|frame\.(damping|pDelta))/.test(where)) setSession({ dialog: 'analysis' });
  else focusSheet();
}
