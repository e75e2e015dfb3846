import type { Envelope } from '../../core/checks/envelope.ts';
import { governingRow } from '../../core/checks/governingRow.ts';
import { printRatio } from '../../core/units/quantities.ts';

/** What governs in a few words, as the verdict says it at length: "isolator at 1.72", "7 did not finish". */
export function governingWords(envelope: Envelope): { readonly words: string; readonly over: boolean } {
  const { incomplete, ratio, governingStorey, isolator } = envelope;
  if (incomplete.length > 0) return { words: `${incomplete.length} did not finish`, over: true };
  const row = governingRow(envelope);
  const apart = isolator?.ratio ?? null;
  const isolatorGoverns = apart !== null && row === 0 && governingStorey !== 0;
  const governing = isolatorGoverns ? apart : row < 0 ? null : (ratio?.[row] ?? null);
  if (governing === null) return { words: '', over: false };
  return {
    words: `${isolatorGoverns ? 'isolator' : `storey ${row + 1}`} at ${printRatio(governing)}`,
    over: governing > 1,
  };
}
