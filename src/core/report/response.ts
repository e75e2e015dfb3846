import type { Statistic } from '../checks/statistic.ts';
import { endingWords } from '../checks/verdict.ts';
import type { Ending, Run } from '../dynamics/run.ts';
import type { Storey } from '../frame/frame.ts';
import { type ReportRun, type ReportSource, yields } from './source.ts';

const RESPONSE_FORMAT = 'swaybook-response';
const RESPONSE_VERSION = 1;

/**
 * The response file: plain SI numbers, ground up, under the keys of the project-file page. Null wherever the suite is not
 * complete; `ductility` is absent for elastic storeys. An isolator has its own limit, a displacement [m]: `limit` and
 * `ratio` stand in `envelope.floors[0].displacement`, null where none is typed, and are null in `envelope.storeys[0]`.
 */
export function responseOf({ prepared, runs, envelope }: Pick<ReportSource, 'prepared' | 'runs' | 'envelope'>) {
  const { frame, modes } = prepared;
  const at = (statistic: Statistic | null, i: number) => spread(statistic, i, envelope.motions);
  return {
    format: RESPONSE_FORMAT,
    version: RESPONSE_VERSION,
    modes: modes.map(({ period, shape, participation, effectiveMass, effectiveMassRatio }) => ({
      period,
      shape: [...shape],
      participation,
      effectiveMass,
      effectiveMassRatio,
    })),
    runs: runs.map((one) => runOf(one, frame.storeys)),
    envelope: {
      storeys: frame.storeys.map((_, i) => {
        const drift = at(envelope.drift, i);
        return {
          mean: drift.mean,
          median: drift.median,
          max: drift.max,
          ...limitOf(envelope, i),
          governing: drift.governing,
          shear: at(envelope.shear, i),
          overturning: at(envelope.overturning, i),
          ...(yields(frame.storeys[i]) ? { ductility: at(envelope.ductility, i) } : {}),
          residualDrift: at(envelope.residualDrift, i),
        };
      }),
      floors: frame.storeys.map((_, i) => ({
        displacement: {
          ...at(envelope.displacement, i),
          ...(i === 0 && envelope.isolator !== null ? envelope.isolator : {}),
        },
        acceleration: at(envelope.acceleration, i),
      })),
      measure: envelope.measure,
      factor: envelope.factor,
      ...(envelope.incomplete.length > 0 ? { incomplete: envelope.incomplete } : {}),
      ...(envelope.leftOut.length > 0 ? { leftOut: envelope.leftOut } : {}),
    },
  };
}

function runOf({ motion, run, stepError }: ReportRun, storeys: readonly Storey[]) {
  const { method, step, steps, ending, floors, energy } = run;
  const answers = run.storeys;
  return {
    motion,
    method,
    step,
    steps,
    completed: ending === null,
    ...(ending === null ? {} : { reason: reasonOf(run, ending) }),
    storeys: storeys.map((storey, i) => ({
      peakDrift: answers.peakDrift[i],
      peakDriftRatio: answers.peakDriftRatio[i],
      peakTime: answers.peakTime[i],
      residualDrift: answers.residualDrift[i],
      peakShear: answers.peakShear[i],
      peakOverturning: answers.peakOverturning[i],
      ...(yields(storey) ? { ductility: answers.ductility[i] } : {}),
      dissipated: answers.dissipated[i],
    })),
    floors: storeys.map((_, i) => ({
      peakDisplacement: floors.peakDisplacement[i],
      peakVelocity: floors.peakVelocity[i],
      peakAcceleration: floors.peakAcceleration[i],
    })),
    base: { peakShear: answers.peakShear[0], peakOverturning: answers.peakOverturning[0] },
    energy,
    stepError,
  };
}

/** Storeys are counted from 1 at the ground; null where no single one is to blame. */
function reasonOf(run: Run, ending: Ending) {
  return {
    storey: ending.storey < 0 ? null : ending.storey + 1,
    time: ending.time,
    why: endingWords(run),
  };
}

/** What a storey is compared with: the drift limit; nothing for an isolator. */
function limitOf({ limit, ratio, isolator }: ReportSource['envelope'], i: number) {
  if (i === 0 && isolator !== null) return { limit: null, ratio: null };
  return { limit, ratio: ratio === null ? null : ratio[i] };
}

/** One place of a statistic, with the governing motion by name; nulls where there is none. */
function spread(statistic: Statistic | null, i: number, motions: readonly string[]) {
  return statistic === null
    ? { mean: null, median: null, max: null, governing: null }
    : {
        mean: statistic.mean[i],
        median: statistic.median[i],
        max: statistic.max[i],
        governing: motions[statistic.governing[i]],
      };
}
