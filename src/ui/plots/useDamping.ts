import { useMemo } from 'react';
import { useResults } from '../../state/results.ts';

/** Damping, modes and the ratios that they come out with, of the frame that the answers are of; null while there are none. */
export function useDamping() {
  const from = useResults((state) => state.answers?.case ?? null);
  return useMemo(
    () =>
      from === null
        ? null
        : { damping: from.frame.damping, modes: from.prepared.modes, ratios: from.prepared.dampingRatios },
    [from],
  );
}
