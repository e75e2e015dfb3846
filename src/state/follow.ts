import { stepErrorOf } from '../core/doors.ts';
import type { Run } from '../core/dynamics/run.ts';
import type { Fault } from '../core/fault.ts';
import { type Case, caseOf } from '../document/case.ts';
import type { Project } from '../document/project.ts';
import type { Engine, Reply, RunRequest } from '../engine/protocol.ts';
import { answersOf } from './answer.ts';
import { type MotionRun, type ResultsState, resultsStore } from './answers.ts';
import { changedSince } from './changed.ts';
import { chosenMotionOf } from './chosen.ts';
import { documentStore, effectiveProject } from './document.ts';
import { expectedTime } from './expected.ts';
import { type Ask, atHalfStep, type Question, questionOf, withHistories } from './question.ts';
import { recentRuns } from './recent.ts';
import { sessionStore } from './session.ts';
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

const PACE: Pace = { quick: 50, pause: 120, long: 3000, shown: 400, evidence: 200, typing: 800 };

const EVIDENCE_PRIORITY = 10;

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
  const errors = recentRuns<number>();
  const expected = expectedTime();
  /** Jobs with the engine: name of the job -> key of the run, and how far it is. */
  const underWay = new Map<string, { readonly key: string; share: number }>();
  const failures = new Map<string, Fault>();
  let project: Project | null = null;
  let question: Question | null = null;
  let modes: ResultsState['modes'] = null;
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
    timers.evidence.clear();
    timers.pause.clear();
    failures.clear();
    const nothing = now.frame.storeys.length === 0 || !now.motions.some((motion) => motion.used);
    question = result.ok && !nothing ? questionOf(result.value) : null;
    modes = result.ok && now.frame.storeys.length > 0 ? result.value.prepared.modes : null;
    cancelUnwanted();
    if (nothing) {
      rest({ status: 'empty', answers: null, chosen: null, stepErrors: null, changed: null, faults: faultsOf(result) });
    } else if (!result.ok) {
      rest({ status: 'stale', faults: result.faults });
    }
    if (question && !publish()) plan(question);
  }

  /** Runs at once, after a pause in the typing, or not before F9. */
  function plan(asking: Question): void {
    const missing = asking.asks.filter((ask) => !runs.has(ask.key));
    const time = expected.of(missing.reduce((sum, ask) => sum + ask.weight, 0));
    if (time > pace.long && resultsStore.getState().answers) {
      cancelAll();
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

  function begin({ asks }: Question): void {
    if (startedAt === null) {
      startedAt = Date.now();
      timers.shown.set(pace.shown, () => {
        set({ slow: true });
        showProgress();
      });
    }
    const progress = { done: doneOf(asks), of: asks.length, startedAt };
    set({ status: 'running', waits: false, faults: [], changed: changedSince(), progress, modes });
  }

  function submit(asking: Question): void {
    const missing = asking.asks.filter((ask) => !runs.has(ask.key));
    const lost = missing.filter((ask) => !ready(ask));
    if (lost.length > 0) {
      rest({ status: 'stale', faults: lost.map(samplesLost) });
      return;
    }
    asked = { at: performance.now(), weight: missing.reduce((sum, ask) => sum + ask.weight, 0) };
    const chosen = chosenMotionOf(documentStore.getState(), sessionStore.getState(), resultsStore.getState());
    // Histories come after the answers: a run that keeps them takes twice as long, and only the panels wait for it.
    for (const ask of missing) send(`run ${ask.motion}`, ask, ask.request, 0, (run) => take(ask, run));
    const first = asking.asks.find((ask) => ask.motion === chosen);
    if (first && runs.has(first.key)) askHistories(first);
  }

  /** Sends a job, unless the same one is under way; what comes for a question that has passed is kept but shows nowhere. */
  function send(job: string, ask: Ask, request: RunRequest, priority: number, done: (run: Run) => void): void {
    if (underWay.get(job)?.key === ask.key) return;
    const own = { key: ask.key, share: 0 };
    underWay.set(job, own);
    const onProgress = (share: number) => {
      own.share = share;
      tick();
    };
    void engine.run(job, request, { priority, onProgress }).then((reply: Reply<Run>) => {
      if (underWay.get(job) === own) underWay.delete(job);
      if (reply.status === 'done') done(reply.value);
      else if (reply.status === 'failed') failed(ask, reply.message);
    });
  }

  function take(ask: Ask, run: Run): void {
    if (run.histories) full = { key: ask.key, run };
    runs.set(ask.key, run.histories ? { ...run, histories: null } : run);
    tick();
    settle();
  }

  function failed(ask: Ask, message: string): void {
    failures.set(ask.key, {
      code: 'run-failed',
      where: `motions.${ask.motion}`,
      message: `the run under ${ask.motion} failed: ${message}`,
      mend: 'Run it again with F9; keep the project in a file first',
    });
    settle();
  }

  /** The question is over when each of its runs is in or has failed. */
  function settle(): void {
    if (!question || resultsStore.getState().status !== 'running') return;
    const open = question.asks.filter((ask) => !runs.has(ask.key) && !failures.has(ask.key));
    if (open.length > 0 || publish()) return;
    const faults = question.asks.flatMap((ask) => failures.get(ask.key) ?? []);
    if (faults.length > 0) rest({ status: 'stale', waits: true, faults });
  }

  /** The whole answer in one update; false while a run is missing. The histories of the chosen motion may still be on their way. */
  function publish(): boolean {
    if (!question) return false;
    const found: MotionRun[] = [];
    for (const { motion, key } of question.asks) {
      const run = runs.get(key);
      if (!run) return false;
      found.push({ motion, run });
    }
    const stepErrors = errorsOf(question);
    const took = asked.weight > 0 ? performance.now() - asked.at : (resultsStore.getState().answers?.took ?? 0);
    const answers = answersOf(question, { runs: found, stepErrors, samplesOf, took, at: Date.now() });
    const ask = chosenAsk(answers.envelope);
    expected.learn(asked.weight, took);
    asked = { at: 0, weight: 0 };
    rest({ status: 'current', answers, faults: [], changed: null, stepErrors, chosen: chosenRun(ask) });
    forgetMotions(question.case);
    if (ask) askHistories(ask);
    timers.evidence.set(documentStore.getState().draft === null ? pace.evidence : pace.typing, gatherEvidence);
    return true;
  }

  /** False where they cannot come: the histories failed before. */
  function askHistories(ask: Ask): boolean {
    if (full?.key === ask.key || failures.has(ask.key) || !ready(ask)) return false;
    send('histories', ask, withHistories(ask), 0, (run) => {
      take(ask, run);
      chosenChanged();
    });
    return true;
  }

  function chosenAsk(envelope = resultsStore.getState().answers?.envelope): Ask | undefined {
    const answers = envelope ? { envelope } : null;
    const chosen = chosenMotionOf(documentStore.getState(), sessionStore.getState(), { answers });
    return question?.asks.find((ask) => ask.motion === chosen);
  }

  function chosenRun(ask: Ask | undefined): MotionRun | null {
    return ask && full?.key === ask.key ? { motion: ask.motion, run: full.run } : null;
  }

  /** Another motion was chosen, or its histories came. */
  function chosenChanged(): void {
    const { status, chosen } = resultsStore.getState();
    if (status !== 'current') return;
    const ask = chosenAsk();
    const run = chosenRun(ask);
    if (run) {
      if (run.run !== chosen?.run || run.motion !== chosen.motion) set({ chosen: run });
    } else if (ask && askHistories(ask) && expected.of(ask.weight) > pace.quick) {
      set({ chosen: null });
    }
  }

  /** Half-step runs behind the answer, for the step errors. */
  function gatherEvidence(): void {
    for (const ask of question?.asks ?? []) {
      const run = runs.get(ask.key);
      const half = atHalfStep(ask);
      if (!run || run.ending || !half || errors.has(ask.key) || !ready(ask)) continue;
      send(`half ${ask.motion}`, ask, half, EVIDENCE_PRIORITY, (finer) => {
        errors.set(ask.key, finer.ending ? Number.NaN : stepErrorOf(run, finer));
        evidenceCame();
      });
    }
  }

  function evidenceCame(): void {
    const { status, answers } = resultsStore.getState();
    if (status !== 'current' || !question || !answers) return;
    const stepErrors = errorsOf(question);
    if (!stepErrors) return;
    const { runs: found, took, at } = answers;
    set({ stepErrors, answers: answersOf(question, { runs: found, stepErrors, samplesOf, took, at }) });
  }

  /** Step error a motion, once all that ran to their end have one. */
  function errorsOf({ asks }: Question): Readonly<Record<string, number>> | null {
    const known: Record<string, number> = {};
    for (const { key, motion } of asks) {
      if (runs.get(key)?.ending) continue;
      const error = errors.get(key);
      if (error === undefined) return null;
      known[motion] = error;
    }
    return known;
  }

  /** Nothing is under way any more: the state in which the store rests. */
  function rest(change: Partial<ResultsState> & Pick<ResultsState, 'status'>): void {
    startedAt = null;
    timers.shown.clear();
    timers.tick.clear();
    timers.pause.clear();
    const changed = change.status === 'stale' ? changedSince() : null;
    set({ slow: false, waits: false, progress: null, arrived: [], changed, modes, ...change });
  }

  function tick(): void {
    if (resultsStore.getState().slow && !timers.tick.waits()) timers.tick.set(100, showProgress);
  }

  function showProgress(): void {
    if (!question || startedAt === null) return;
    const arrived = question.asks.flatMap(({ motion, key }) => {
      const run = runs.get(key);
      return run ? [{ motion, run }] : [];
    });
    set({ arrived, progress: { done: doneOf(question.asks), of: question.asks.length, startedAt } });
  }

  function doneOf(asks: readonly Ask[]): number {
    const share = ({ key, motion }: Ask) => (runs.has(key) ? 1 : (underWay.get(`run ${motion}`)?.share ?? 0));
    return asks.reduce((sum, ask) => sum + share(ask), 0);
  }

  /** The engine has the samples, or is given them now. */
  function ready({ request }: Ask): boolean {
    const digest = request.motion.samples;
    if (engine.hasMotion(digest)) return true;
    const samples = samplesOf(digest);
    if (samples) engine.putMotion(digest, samples);
    given.add(digest);
    return samples !== undefined;
  }
  const given = new Set<string>();

  /** The engine lets go of samples that are in the document no more; undo gives them again. */
  function forgetMotions({ motions }: Case): void {
    const kept = new Set(project?.motions.map((motion) => motion.samples) ?? motions.map((motion) => motion.samples));
    for (const digest of given) {
      if (kept.has(digest)) continue;
      engine.dropMotion(digest);
      given.delete(digest);
    }
  }

  function cancelUnwanted(): void {
    const wanted = new Set(question?.asks.map((ask) => ask.key));
    for (const [job, { key }] of underWay) {
      if (wanted.has(key) && !job.startsWith('half ')) continue;
      underWay.delete(job);
      engine.cancel(job);
    }
  }

  function cancelAll(): void {
    for (const job of underWay.keys()) engine.cancel(job);
    underWay.clear();
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
      cancelAll();
      rest({ status: 'stale', waits: true });
    },
    end() {
      for (const off of leave) off();
      for (const one of Object.values(timers)) one.clear();
      cancelAll();
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
