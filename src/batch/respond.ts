import { envelopeOf } from '../core/checks/envelope.ts';
import { endingWords } from '../core/checks/verdict.ts';
import { measuresOf, type PreparedFrame, runAtAutoStep, startRun, stepErrorOf } from '../core/doors.ts';
import type { Run, RunCase } from '../core/dynamics/run.ts';
import { csvOf, PLAIN_CSV } from '../core/report/csv.ts';
import { historiesTable } from '../core/report/histories.ts';
import { responseOf } from '../core/report/response.ts';
import type { ReportRun, ReportSource } from '../core/report/source.ts';
import { tablesOf } from '../core/report/tables.ts';
import { type Case, caseOf } from '../document/case.ts';
import type { OpenedProject } from '../document/file.ts';
import { safeFileNames } from './files.ts';
import { type OutFolder, openFolder } from './outFolder.ts';
import { projectAt } from './project.ts';
import { faultLines, misused, type Outcome, type Verb } from './verb.ts';

/** Computes a project's suite; writes the response file and the tables in coherent SI, and prints the envelope. */
export const respond: Verb = {
  usage: 'PROJECT --out FOLDER [--histories]',
  summary: "the suite's response: response.json and tables into FOLDER, the envelope printed",
  flags: { out: 'value', histories: 'switch' },
  run({ words, flags }) {
    const misuse: string[] = [];
    if (words.length !== 1) misuse.push(`respond: takes one PROJECT, ${words.length} are named`);
    const out = flags.get('out') ?? '';
    if (out === '') misuse.push('--out: wants the FOLDER to write into');
    if (misuse.length > 0) return misused(misuse);
    const [file] = words;
    const read = projectAt(file);
    if (!read.ok) return { exit: 1, messages: faultLines(file, read.faults) };
    const asked = caseOf(read.value.project);
    if (!asked.ok) return { exit: 1, messages: faultLines(file, asked.faults) };
    const folder = openFolder(out);
    if (!folder.ok) return { exit: 1, messages: faultLines(out, folder.faults) };
    return answer(file, read.value, asked.value, folder.value, flags.has('histories'));
  },
};

/** Histories are written motion by motion and let go; the response file comes last, so that it stands for a whole answer. */
function answer(file: string, read: OpenedProject, asked: Case, folder: OutFolder, histories: boolean): Outcome {
  const names = safeFileNames(asked.motions.map(({ name }) => name));
  const messages: string[] = [];
  const runs = asked.motions.map((motion, m): ReportRun => {
    const { name, interval, scale } = motion;
    const { frame, analysis } = asked;
    const runCase: RunCase = {
      frame,
      analysis,
      motion: { interval, scale, acceleration: samplesOf(read, motion.samples) },
    };
    const { run, stepError, stepWhy, atHalf } = answeredRun(asked.prepared, runCase, histories);
    if (run.histories !== null) {
      folder.write(`histories-${names[m]}.csv`, csvOf(historiesTable(name, run), PLAIN_CSV));
      if (run.histories.every > 1) {
        messages.push(
          `${file}: motion ${name}: so long that its histories hold each ${run.histories.every}th step only`,
        );
      }
    }
    if (stepWhy !== undefined) messages.push(`${file}: motion ${name}: step ${shortest(run.step)} s: ${stepWhy}`);
    if (atHalf !== undefined) messages.push(`${file}: motion ${name}: ${atHalf}`);
    if (run.ending !== null) messages.push(`${file}: motion ${name}: did not finish: ${endingWords(run)}`);
    return { motion: name, run: { ...run, histories: null }, stepError, ...(stepWhy === undefined ? {} : { stepWhy }) };
  });
  const source = sourceOf(read, asked, runs);
  for (const table of tablesOf(source)) folder.write(`${table.id}.csv`, csvOf(table, PLAIN_CSV));
  const response = responseOf(source);
  folder.write('response.json', `${JSON.stringify(response, null, 2)}\n`);
  return folder.faults.length > 0
    ? { exit: 1, messages: [...messages, ...folder.faults] }
    : { exit: 0, output: response.envelope, messages };
}

/** The run at the step that is typed, or at the one that halving comes to. */
function answeredRun(prepared: PreparedFrame, runCase: RunCase, histories: boolean): Answered {
  if (runCase.analysis.step === 'auto') {
    const { run, stepError, why, converged } = runAtAutoStep(prepared, runCase, { histories });
    const atHalf = 'no step that was tried is confirmed by its half: the answer is not converged';
    return { run, stepError, stepWhy: why, ...(converged ? {} : { atHalf }) };
  }
  const run = wholeRun(prepared, runCase, histories);
  if (run.ending !== null) return { run, stepError: null };
  const half = halfRun(prepared, runCase, run);
  if (half.ending === null) return { run, stepError: stepErrorOf(run, half) };
  return { run, stepError: null, atHalf: `does not finish at half the step: ${endingWords(half)}` };
}

/** A run, and what the one at half its step says against it, in words. */
type Answered = Pick<ReportRun, 'run' | 'stepError' | 'stepWhy'> & { readonly atHalf?: string };

function wholeRun(prepared: PreparedFrame, runCase: RunCase, histories: boolean): Run {
  const run = startRun(prepared, runCase, { histories });
  run.advance(Number.POSITIVE_INFINITY);
  return run.finish();
}

function halfRun(prepared: PreparedFrame, runCase: RunCase, run: Run): Run {
  const parts = 2 * Math.round(runCase.motion.interval / run.step);
  return wholeRun(prepared, { ...runCase, analysis: { ...runCase.analysis, step: { parts } } }, false);
}

function sourceOf(read: OpenedProject, asked: Case, runs: readonly ReportRun[]): ReportSource {
  const { project } = read;
  return {
    title: project.title,
    prepared: asked.prepared,
    motions: project.motions.map((entry) => {
      const { interval } = entry;
      const { peakAcceleration } = measuresOf({ interval, acceleration: samplesOf(read, entry.samples) });
      return { ...entry, scale: Number(entry.scale), peakAcceleration };
    }),
    runs,
    envelope: envelopeOf(runs, asked.limits, asked.leftOut, asked.frame),
    analysis: asked.analysis,
    limits: asked.limits,
  };
}

/** Without the last bits that a part of an interval gets wrong. */
function shortest(seconds: number): string {
  return String(Number(seconds.toPrecision(12)));
}

function samplesOf({ samples }: OpenedProject, digest: string): Float64Array {
  const found = samples.get(digest);
  if (found === undefined) throw new RangeError(`samples: none of digest ${digest}, expected those of every motion`);
  return found;
}
