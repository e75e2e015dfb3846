import type { Run } from '../core/dynamics/run.ts';
import type { Jobs } from './jobs.ts';
import type { Lending } from './lending.ts';
import type { Question } from './question.ts';
import type { Recent } from './recent.ts';
import type { StepSearch } from './stepSearch.ts';

/** Runs behind the answer go after every other, and under names of their own. */
const PRIORITY = 10;
const PREFIX = 'half ';

export interface Behind {
  /** Asks what the search for a step, or the step error, wants next of each motion: one round. */
  gather(question: Question, editing: boolean): void;
  isBehind(name: string): boolean;
}

export interface BehindNeeds {
  readonly jobs: Jobs;
  readonly runs: Recent<Run>;
  readonly search: StepSearch;
  readonly lending: Lending;
  /** A round is over: everything that was asked in it has come or failed. */
  roundOver(): void;
}

/**
 * Half-step runs behind the answer, in rounds over all motions, so that what they say is taken up in one update of the whole suite. They
 * are kept with the other runs: a half-step run is the next candidate of the search, and is known when the step is halved.
 */
export function behindTheAnswer({ jobs, runs, search, lending, roundOver }: BehindNeeds): Behind {
  const over = () => {
    if (!jobs.any(PREFIX)) roundOver();
  };
  return {
    isBehind: (name) => name.startsWith(PREFIX),
    gather({ asks }, editing) {
      for (const ask of asks) {
        const parts = search.next(ask, editing);
        if (parts === null) continue;
        const one = ask.at(parts);
        if (!lending.ready(one.request.motion.samples)) continue;
        const done = (run: Run) => {
          runs.set(one.key, run);
          over();
        };
        const failed = () => {
          search.failed(one.key);
          over();
        };
        jobs.send(`${PREFIX}${ask.motion}`, one, PRIORITY, done, failed);
      }
    },
  };
}
