/** The parts of the screen that F6 walks through, in reading order. */
interface Part {
  readonly holds: (element: Element) => boolean;
  readonly enter: () => boolean;
}

const STOPS =
  'button:not(:disabled):not([tabindex="-1"]), input:not(:disabled), select:not(:disabled), a[href], [tabindex="0"]';

function region(name: string): Part {
  const selector = `[data-part="${name}"]`;
  return {
    holds: (element) => element.closest(selector) !== null,
    enter: () => {
      const place = document.querySelector(selector);
      const stop = place?.matches(STOPS) ? (place as HTMLElement) : place?.querySelector<HTMLElement>(STOPS);
      stop?.focus();
      return stop !== undefined && stop !== null;
    },
  };
}

const answers: Part = {
  holds: (element) => element.closest('.answer[data-cell]') !== null,
  enter: () => {
    const row = document.querySelector('.storey.chosen') ?? document.querySelector('.storey');
    const cell = row?.querySelector<HTMLElement>('.answer[data-cell="drift"]');
    cell?.focus();
    return cell !== null && cell !== undefined;
  },
};

const cells: Part = {
  ...region('cells'),
  holds: (element) => region('cells').holds(element) && !answers.holds(element),
};

const PARTS: readonly Part[] = [region('bar'), cells, answers, region('strip'), region('plots'), region('foot')];

/** Moves the focus to the first stop of the next part, or of the one before; parts that are not there are passed over. */
export function nextPart(back: boolean): void {
  const here = document.activeElement;
  const at = here === null ? -1 : PARTS.findIndex((part) => part.holds(here));
  for (let step = 1; step <= PARTS.length; step++) {
    const index = (at + (back ? -step : step) + 2 * PARTS.length) % PARTS.length;
    if (PARTS[index]?.enter()) return;
  }
}
