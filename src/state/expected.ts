/** Milliseconds a storey-step on the whole pool before anything was measured: about 10 ns on each of two workers. */
const FIRST_RATE = 5e-6;
/** Rounds of fewer storey-steps measure the messages rather than the march. */
const MEASURABLE = 5e5;

/** How long a round of runs is expected to take, learned from the rounds before it. */
export interface Expected {
  /** [ms] */
  of(weight: number): number;
  learn(weight: number, took: number): void;
}

export function expectedTime(): Expected {
  let rate = FIRST_RATE;
  return {
    of: (weight) => weight * rate,
    learn(weight, took) {
      if (weight >= MEASURABLE) rate = (rate + took / weight) / 2;
    },
  };
}
