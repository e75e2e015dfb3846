import type { Run } from '../core/dynamics/run.ts';
import type { Fault } from '../core/fault.ts';
import type { Swaying } from '../core/frame/stiffening.ts';
import { type Case, caseOf } from '../document/case.ts';
import type { Project } from '../document/project.ts';
import type { Engine } from '../engine/protocol.ts';
import { isNonlinear } from '../engine/weight.ts';
import { answersOf, type FoundRun, stepErrorsOf } from './answer.ts';
import { type MotionRun, type ResultsState, resultsStore } from './answers.ts';
import { behindTheAnswer } from './behind.ts';
import { changedSince } from './changed.ts';
import { chosenMotionOf } from './chosen.ts';
import { documentStore, effectiveProject } from './document.ts';
import { expectedTimes } from './expected.ts';
import { jobsWith } from './jobs.ts';
import { lendingTo } from './lending.ts';
import { type Ask, type Question, questionOf, type RunAsk, withHistories } from './question.ts';
import { recentRuns } from './recent.ts';
import { sessionStore } from './session.ts';
import { standingFrame } from './standing.ts';
import { stepSearch } from './stepSearch.ts';
import { timer } from './timer.ts';

/** Waiting times [ms]; the tests choose their own. */
export interface Pace {
  /** A rerun expected to take longer waits for a pause in the typing, once there is typing: the first change never waits. */
  readonly quick: number;
  readonly pause: number;
  /** A rerun expected to take longer waits for F9. */
  readonly long: number;
  /** Running is shown after so long. */
  readonly shown: number;
  /** The evidence starts when nothing was typed for so long. */
  readonly evidence: number;
  /** The same while a cell is edited: the next key's answer must not wait for a half-step run [ms]. */
  readonly typing: number;
}

const PACE: Pace = { quick: 50, pause: 120, long: 3000, shown: 400, evidence: 200, typing: 250 };

export interface Follower {
  runNow(): void;
  stop(): void;
  end(): void;
}

/**
 * Follows the document (draft included) and the chosen motion, asks the engine for the runs that are not known, and keeps the
 * results store: answers change in one update, when all runs of a question are in.
 */
export function follow(
  engine: Engine,
  samplesOf: (digest: string) => Float64Array | undefined,
  pace: Pace = PACE,
): Follower {
  const runs = recentRuns<Run>();
  const search = stepSearch(runs);
  const times = expectedTimes();
  const jobs = jobsWith(engine, tick);
  const lending = lendingTo(engine, samplesOf);
  const behind = behindTheAnswer({ jobs, runs, search, lending, roundOver });
  const failures = new Map<string, Fault>();
  let project: Project | null = null;
  let openedLast = sessionStore.getState().opened;
  let question: Question | null = null;
  let swaying: Swaying | null = null;
  /** Run with histories, and the key of what it was computed from. */
  let full: { readonly key: string; readonly run: Run } | null = null;
  let startedAt: number | null = null;
  let asked = { at: 0, weight: 0 };
  let changedAt = Number.NEGATIVE_INFINITY;
  const timers = { pause: timer(), shown: timer(), tick: timer(), evidence: timer() };
  const set = (change: Partial<ResultsState>) => resultsStore.setState(change);

  function documentChanged(): void {
    const now = effectiveProject(documentStore.getState());
    if (now === project) return;
    project = now;
    const result = caseOf(now);
    const { opened } = sessionStore.getState();
    // What was computed of another building is never shown under this one, however stale.
    if (opened !== openedLast) set({ answers: null, chosen: null, stepErrors: null });
    openedLast = opened;
    timers.evidence.clear();
    timers.pause.clear();
    failures.clear();
    search.forgetFailures();
    const nothing = now.frame.storeys.length === 0 || !now.motions.some((motion) => motion.used);
    question = result.ok && !nothing ? questionOf(result.value) : null;
    swaying = standingFrame(now, result);
    cancelUnwanted();
    if (nothing) {
      rest({ status: 'empty', answers: null, chosen: null, stepErrors: null, changed: null, faults: faultsOf(result) });
    } else if (!result.ok) {
      rest({ status: 'stale', faults: result.faults });
    }
    if (question && !publish()) plan(question);
  }

  /** The run of a motion that is shown: at its step, or at the one that the search for a step has come to. */
  function shownOf(ask: Ask): RunAsk {
    return ask.at(search.shown(ask));
  }

  function missingOf({ asks }: Question): { readonly ask: Ask; readonly one: RunAsk }[] {
    return asks.map((ask) => ({ ask, one: shownOf(ask) })).filter(({ one }) => !runs.has(one.key));
  }

  function expected({ case: { frame } }: Question) {
    return times[isNonlinear(frame) ? 'nonlinear' : 'linear'];
  }

  /** Runs at once, after a pause in the typing, or not before F9. */
  function plan(asking: Question): void {
    const time = expected(asking).of(missingOf(asking).reduce((sum, { one }) => sum + one.weight, 0));
    if (time > pace.long && resultsStore.getState().answers) {
      jobs.keep(() => false);
      rest({ status: 'stale', waits: true, faults: [] });
      return;
    }
    begin(asking);
    const now = performance.now();
    const typing = now - changedAt < pace.pause;
    changedAt = now;
    if (time <= pace.quick || !typing) submit(asking);
    else timers.pause.set(pace.pause, () => submit(asking));
  }

  function begin(asking: Question): void {
    if (startedAt === null) {
      startedAt = Date.now();
      timers.shown.set(pace.shown, () => {
        set({ slow: true });
        showProgress();
      });
    }
    const progress = { done: doneOf(asking), of: asking.asks.length, startedAt };
    set({ status: 'running', waits: false, faults: [], changed: changedSince(), progress, ...swayingNow() });
  }

  function submit(asking: Question): void {
    const missing = missingOf(asking);
    const lost = missing.filter(({ one }) => !lending.ready(one.request.motion.samples));
    if (lost.length > 0) {
      rest({ status: 'stale', faults: lost.map(({ ask }) => samplesLost(ask)) });
      return;
    }
    asked = { at: performance.now(), weight: missing.reduce((sum, { one }) => sum + one.weight, 0) };
    const chosen = chosenMotionOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
    // Histories come after the answers: a run that keeps them takes twice as long, and only the panels wait for it.
    for (const { ask, one } of missing) {
      jobs.send(
        `run ${ask.motion}`,
        one,
        0,
        (run) => take(one, run),
        (why) => failed(ask, one, why),
      );
    }
    const first = asking.asks.find((ask) => ask.motion === chosen);
    if (first && runs.has(shownOf(first).key)) askHistories(first);
  }

  /** What comes for a question that has passed is kept but shows nowhere. */
  function take({ key }: RunAsk, run: Run): void {
    if (run.histories) full = { key, run };
    runs.set(key, run.histories ? { ...run, histories: null } : run);
    tick();
    settle();
  }

  function failed({ motion }: Ask, { key }: RunAsk, message: string): void {
    failures.set(key, {
      code: 'run-failed',
      where: `motions.${motion}`,
      message: `the run under ${motion} failed: ${message}`,
      mend: 'Run it again with F9; keep the project in a file first',
    });
    settle();
  }

  /** The question is over when each of its runs is in or has failed. */
  function settle(): void {
    if (!question || resultsStore.getState().status !== 'running') return;
    const open = missingOf(question).filter(({ one }) => !failures.has(one.key));
    if (open.length > 0 || publish()) return;
    const faults = question.asks.flatMap((ask) => failures.get(shownOf(ask).key) ?? []);
    if (faults.length > 0) rest({ status: 'stale', waits: true, faults });
  }

  /** The whole answer in one update; false while a run is missing. The histories of the chosen motion may still be on their way. */
  function publish(): boolean {
    if (!question) return false;
    const found = foundOf(question);
    if (!found) return false;
    const took = asked.weight > 0 ? performance.now() - asked.at : (resultsStore.getState().answers?.took ?? 0);
    const answers = answersOf(question, { runs: found, samplesOf, took, at: Date.now() });
    const ask = chosenAsk(answers.envelope);
    expected(question).learn(asked.weight, took);
    asked = { at: 0, weight: 0 };
    const stepErrors = stepErrorsOf(found);
    rest({ status: 'current', answers, faults: [], changed: null, stepErrors, chosen: chosenRun(ask) });
    forgetMotions(question.case);
    if (ask) askHistories(ask);
    gatherSoon();
    return true;
  }

  /** All runs of the question with what is known behind them; null while one is missing. */
  function foundOf({ asks }: Question): FoundRun[] | null {
    const found: FoundRun[] = [];
    for (const ask of asks) {
      const run = runs.get(shownOf(ask).key);
      if (!run) return null;
      const confirmed = search.confirmed(ask);
      const { stepError = null, half = null } = confirmed ?? {};
      found.push({ motion: ask.motion, run, stepError, half, auto: search.auto(ask) });
    }
    return found;
  }

  /** False where they cannot come: the histories failed before. */
  function askHistories(ask: Ask): boolean {
    const one = shownOf(ask);
    if (full?.key === one.key || failures.has(one.key) || !lending.ready(one.request.motion.samples)) return false;
    jobs.send(
      'histories',
      { ...one, request: withHistories(one.request) },
      0,
      (run) => {
        take(one, run);
        chosenChanged();
      },
      (why) => failed(ask, one, why),
    );
    return true;
  }

  function chosenAsk(envelope = resultsStore.getState().answers?.envelope): Ask | undefined {
    const answers = envelope ? { envelope } : null;
    const chosen = chosenMotionOf(documentStore.getState(), sessionStore.getState(), { answers });
    return question?.asks.find((ask) => ask.motion === chosen);
  }

  function chosenRun(ask: Ask | undefined): MotionRun | null {
    return ask && full?.key === shownOf(ask).key ? { motion: ask.motion, run: full.run } : null;
  }

  /** Another motion was chosen, or its histories came. */
  function chosenChanged(): void {
    const { status, chosen } = resultsStore.getState();
    if (status !== 'current' || !question) return;
    const ask = chosenAsk();
    const run = chosenRun(ask);
    if (run) {
      if (run.run !== chosen?.run || run.motion !== chosen.motion) set({ chosen: run });
    } else if (ask && askHistories(ask) && expected(question).of(shownOf(ask).weight) > pace.quick) {
      set({ chosen: null });
    }
  }

  function gatherSoon(): void {
    const editing = documentStore.getState().draft !== null;
    timers.evidence.set(editing ? pace.typing : pace.evidence, () => question && behind.gather(question, editing));
  }

  /** What a round behind the answer has brought, in one update: step errors, and finer runs where the search went on. */
  function roundOver(): void {
    const { status, answers } = resultsStore.getState();
    if (status !== 'current' || !question || !answers) return;
    const found = foundOf(question);
    if (!found) return;
    const { took, at } = answers;
    const now = answersOf(question, { runs: found, samplesOf, took, at });
    const ask = chosenAsk(now.envelope);
    set({ stepErrors: stepErrorsOf(found), answers: now, chosen: chosenRun(ask) });
    if (ask) askHistories(ask);
    behind.gather(question, documentStore.getState().draft !== null);
  }

  /** Nothing is under way any more: the state in which the store rests. */
  function rest(change: Partial<ResultsState> & Pick<ResultsState, 'status'>): void {
    startedAt = null;
    timers.shown.clear();
    timers.tick.clear();
    timers.pause.clear();
    const changed = change.status === 'stale' ? changedSince() : null;
    set({ slow: false, waits: false, progress: null, arrived: [], changed, ...swayingNow(), ...change });
  }

  function swayingNow(): Pick<ResultsState, 'modes' | 'stiffening'> {
    return { modes: swaying?.modes ?? null, stiffening: swaying?.stiffening ?? 1 };
  }

  function tick(): void {
    if (resultsStore.getState().slow && !timers.tick.waits()) timers.tick.set(100, showProgress);
  }

  function showProgress(): void {
    if (!question || startedAt === null) return;
    const arrived = question.asks.flatMap((ask) => {
      const run = runs.get(shownOf(ask).key);
      return run ? [{ motion: ask.motion, run }] : [];
    });
    set({ arrived, progress: { done: doneOf(question), of: question.asks.length, startedAt } });
  }

  function doneOf({ asks }: Question): number {
    const share = (ask: Ask) => (runs.has(shownOf(ask).key) ? 1 : jobs.share(`run ${ask.motion}`));
    return asks.reduce((sum, ask) => sum + share(ask), 0);
  }

  /** The engine lets go of samples that are in the document no more. */
  function forgetMotions({ motions }: Case): void {
    lending.keepOnly(new Set((project?.motions ?? motions).map((motion) => motion.samples)));
  }

  function cancelUnwanted(): void {
    const wanted = new Set(question?.asks.map((ask) => shownOf(ask).key));
    jobs.keep((name, key) => wanted.has(key) && !behind.isBehind(name));
  }

  const leave = [
    documentStore.subscribe(documentChanged),
    sessionStore.subscribe((now, before) => {
      if (now.motion !== before.motion) chosenChanged();
    }),
  ];
  documentChanged();

  return {
    runNow() {
      if (!question || resultsStore.getState().status === 'current') return;
      failures.clear();
      timers.pause.clear();
      if (publish()) return;
      begin(question);
      submit(question);
    },
    stop() {
      if (resultsStore.getState().status !== 'running') return;
      jobs.keep(() => false);
      rest({ status: 'stale', waits: true });
    },
    end() {
      for (const off of leave) off();
      for (const one of Object.values(timers)) one.clear();
      jobs.keep(() => false);
    },
  };
}

function faultsOf(result: ReturnType<typeof caseOf>): readonly Fault[] {
  return result.ok ? [] : result.faults;
}

function samplesLost({ motion }: Ask): Fault {
  return {
    code: 'samples-missing',
    where: `motions.${motion}`,
    message: `the samples of ${motion} are not in this browser's store`,
    mend: 'Load its record again, or open the project file that holds it',
  };
}
