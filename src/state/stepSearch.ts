import { autoStep, confirms, errorBetween } from '../core/dynamics/autoStep.ts';
import { autoStepWords } from '../core/dynamics/autoStepWords.ts';
import type { Evidence } from '../core/dynamics/evidence.ts';
import type { Run } from '../core/dynamics/run.ts';
import type { Ask } from './question.ts';
import type { Recent } from './recent.ts';

/** What the run at half the step says of the run that is shown. */
export interface Confirmed {
  /** null: one of the two ended early. */
  readonly stepError: number | null;
  readonly half: Run;
}

/** Which run of a motion is shown, and which is asked next behind it. A step that was typed is a search with one candidate. */
export interface StepSearch {
  /** Parts of the run that is shown, or must be asked for. */
  shown(ask: Ask): number;
  /** Parts of the run that is asked next, behind the answer; null: it is settled, or nothing more can come. */
  next(ask: Ask, editing: boolean): number | null;
  /** null while the run at half the step is out. */
  confirmed(ask: Ask): Confirmed | null;
  auto(ask: Ask): Evidence['auto'];
  /** The runs behind the answer that failed are asked no more. */
  failed(key: string): void;
  forgetFailures(): void;
}

/**
 * Where the runs of `step: "auto"` stand. The number of parts that did for a record is tried first, whatever changed in the frame, so that
 * a keystroke costs one run a motion. Behind it, while a cell is edited that run alone is confirmed; otherwise the whole search is
 * made from its beginning, so that the step which remains depends on the document and on nothing that was done before.
 */
export function stepSearch(runs: Recent<Run>): StepSearch {
  const remembered = new Map<string, number>();
  const failures = new Set<string>();
  const known = (ask: Ask) => (parts: number) => runs.get(ask.at(parts).key);

  function whole(ask: Ask) {
    return autoStep(ask.first, ask.most, known(ask), ask.least?.enough);
  }

  function shown(ask: Ask): number {
    if (ask.least === null) return ask.first;
    const found = whole(ask);
    let parts = found.kind === 'settled' ? found.parts : begin(ask);
    if (found.kind === 'ask') {
      const at = known(ask);
      for (; parts < ask.most; parts *= 2) {
        const [run, half] = [at(parts), at(2 * parts)];
        if (!run || !half || confirms(run, half)) break;
      }
    }
    remembered.set(ask.record, parts);
    return parts;
  }

  /** The number of parts that did last, within what may be tried. */
  function begin({ record, first, most }: Ask): number {
    return Math.min(most, Math.max(first, remembered.get(record) ?? first));
  }

  function confirmed(ask: Ask): Confirmed | null {
    const parts = shown(ask);
    const [run, half] = [known(ask)(parts), known(ask)(2 * parts)];
    return run && half ? { stepError: errorBetween(run, half), half } : null;
  }

  return {
    shown,
    confirmed,
    next(ask, editing) {
      const first = shown(ask);
      // A typed step whose run ended early has no step error: nothing is asked behind it.
      if (ask.least === null && known(ask)(first)?.ending) return null;
      const found = editing ? autoStep(first, ask.most, known(ask)) : whole(ask);
      return found.kind === 'settled' || failures.has(ask.at(found.parts).key) ? null : found.parts;
    },
    auto(ask) {
      if (ask.least === null) return null;
      const parts = shown(ask);
      const run = known(ask)(parts);
      const half = confirmed(ask)?.half;
      const converged = run && half ? confirms(run, half) && ask.least.enough : null;
      return { why: autoStepWords(parts, ask.at(parts).request.motion.interval, ask.least, converged), converged };
    },
    failed: (key) => void failures.add(key),
    forgetFailures: () => failures.clear(),
  };
}
