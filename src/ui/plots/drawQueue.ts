import { documentStore } from '../../state/document.ts';
import { resultsStore } from '../../state/results.ts';
import { whenIdle } from './whenIdle.ts';

type Draw = () => Promise<void>;

/** What waits to be drawn: one entry a plot, a newer one takes the place of the older. */
const waiting = new Map<object, Draw>();
let under = false;
let lastAsked = 0;

/** While a cell is edited the plots wait for so long a pause: the next key's answer goes first [ms]. */
const PAUSE = 350;

/** Draws at most one plot a frame, in the order in which they were first asked for; returns how to withdraw it. */
export function queueDraw(plot: object, draw: Draw): () => void {
  waiting.set(plot, draw);
  lastAsked = performance.now();
  if (!under) {
    under = true;
    void afterAnswers().then(next);
  }
  return () => {
    if (waiting.get(plot) === draw) waiting.delete(plot);
  };
}

let answersShown: Promise<void> | null = null;

/** Resolves once the first answers stand on the screen (or there are none to come) and the page has a moment to spare. */
function afterAnswers(): Promise<void> {
  answersShown ??= new Promise<void>((resolve) => {
    const spare = () => void whenIdle(resolve, 500);
    const painted = () => requestAnimationFrame(() => setTimeout(spare, 0));
    if (resultsStore.getState().status !== 'running') return painted();
    const stop = resultsStore.subscribe(({ status }) => {
      if (status === 'running') return;
      stop();
      painted();
    });
  });
  return answersShown.then(() => new Promise((resolve) => requestAnimationFrame(() => resolve())));
}

function next(): void {
  const [entry] = waiting;
  if (entry === undefined) {
    under = false;
    return;
  }
  const early = documentStore.getState().draft === null ? 0 : lastAsked + PAUSE - performance.now();
  if (early > 0) {
    setTimeout(next, early);
    return;
  }
  const [plot, draw] = entry;
  waiting.delete(plot);
  // The rest of the frame belongs to the answers: the plot is drawn after them, and the next one not before the next frame.
  setTimeout(() => {
    void draw().finally(() => requestAnimationFrame(next));
  }, 0);
}
