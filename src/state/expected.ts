/** Milliseconds a storey-step of a linear frame on the whole pool before anything was measured: about 10 ns on each of two workers. */
const FIRST_RATE = 5e-6;
/** Rounds of fewer storey-steps measure the messages rather than the march. */
const MEASURABLE = 5e5;

/** How long a round of runs is expected to take, learned from the rounds before it. */
export interface Expected {
  /** [ms] */
  of(weight: number): number;
  learn(weight: number, took: number): void;
}

function expectedTime(): Expected {
  let rate = FIRST_RATE;
  return {
    of: (weight) => weight * rate,
    learn(weight, took) {
      if (weight >= MEASURABLE) rate = (rate + took / weight) / 2;
    },
  };
}

/** One a kind of frame: what a storey that yields costs says nothing about one that does not. */
export interface ExpectedByKind {
  readonly linear: Expected;
  readonly nonlinear: Expected;
}

export function expectedTimes(): ExpectedByKind {
  return { linear: expectedTime(), nonlinear: expectedTime() };
}
