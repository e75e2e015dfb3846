import { useEffect } from 'react';
import { resultsStore } from '../../state/results.ts';
import { chosenStorey } from '../../state/selectors.ts';
import { sessionStore, setTime } from '../../state/session.ts';

/** At first the cursor stands where the chosen storey drifts most; from then on it is the reader's. */
export function useCursorAtPeak(): void {
  useEffect(() => {
    let stop = () => {};
    const place = () => {
      const { chosen } = resultsStore.getState();
      const { time, playing } = sessionStore.getState();
      if (chosen === null) return;
      stop();
      const peak = chosen.run.storeys.peakTime[chosenStorey()];
      if (time === 0 && !playing && peak !== undefined) setTime(peak);
    };
    stop = resultsStore.subscribe(place);
    place();
    return () => stop();
  }, []);
}
