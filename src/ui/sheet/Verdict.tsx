import { useEffect, useState } from 'react';
import { verdictOf } from '../../core/checks/verdict.ts';
import type { Fault } from '../../core/fault.ts';
import type { System } from '../../core/units/quantities.ts';
import { faultSentence, faultWords } from '../../document/faultWords.ts';
import type { Project } from '../../document/project.ts';
import { edit, useDocument } from '../../state/document.ts';
import { runNow, stop, useResults } from '../../state/results.ts';
import { useSession } from '../../state/session.ts';
import { Boundary } from '../controls/Boundary.tsx';
import { Button } from '../controls/Button.tsx';
import { focusSheet } from '../controls/focusSheet.ts';
import { CautionMark, Icon } from '../controls/Icon.tsx';
import { goTo } from './goTo.ts';
import { Mends } from './later.ts';

export interface VerdictProps {
  readonly letters: Readonly<Record<string, string>>;
  /** Opens the panel of a storey's law. */
  readonly onLaw: (storey: number) => void;
}

/** One sentence on what governs, or on why there is none; said aloud once a run. */
export function Verdict({ letters, onLaw }: VerdictProps) {
  const status = useResults((state) => state.status);
  const slow = useResults((state) => state.slow);
  const waits = useResults((state) => state.waits);
  const answers = useResults((state) => state.answers);
  const changed = useResults((state) => state.changed);
  const faults = useResults((state) => state.faults);
  const project = useDocument((state) => state.project);
  const system = useSession((state) => state.system);

  const why = <Why project={project} system={system} faults={faults} onLaw={onLaw} />;
  if (status === 'running' && slow) return <Running />;
  if (status === 'empty' || answers === null) {
    return <Line kind="quiet-verdict" headline="Nothing to check yet" detail={missing(project) ?? why} />;
  }
  if (status === 'stale') {
    return (
      <Line
        kind="old"
        headline={`Out of date${changed === null ? '' : `: ${inSentence(changed)}`}`}
        detail={waits ? '' : why}
      >
        {waits && (
          <Button kind="primary" size="medium" onClick={runAndGoOn}>
            Run {answers.case.motions.length} motions
          </Button>
        )}
        {waits && <span className="keycap">F9</span>}
      </Line>
    );
  }
  const { envelope, runs } = answers;
  const failed = runs.find(({ run }) => run.ending !== null);
  const verdict = verdictOf(envelope, runs);
  if (failed !== undefined && envelope.incomplete.length > 0) {
    return (
      <Line kind="over stopped" mark headline={verdict.headline} detail={verdict.detail}>
        <Boundary part="What can be done">
          <Mends failed={failed} letter={letters[failed.motion] ?? failed.motion} />
        </Boundary>
      </Line>
    );
  }
  const left = envelope.leftOut[0];
  return (
    <Line
      kind={verdict.over ? 'over' : ''}
      mark={verdict.over}
      met={!verdict.over}
      headline={verdict.headline}
      detail={verdict.detail}
    >
      {left !== undefined && envelope.leftOut.length === 1 && (
        <Button size="medium" onClick={() => bringBack(left)}>
          Bring {letters[left] ?? left} back
        </Button>
      )}
    </Line>
  );
}

/** What an answer still needs before anything can be wrong with it; null: nothing. */
function missing({ frame, motions }: Project): string | null {
  const storey = frame.storeys.length === 0;
  const record = !motions.some((motion) => motion.used);
  if (storey && record) return 'a storey and a record are missing';
  if (storey) return 'a storey is missing';
  return record ? 'a record is missing' : null;
}

/** A label as it stands inside a sentence. */
function inSentence(label: string): string {
  return label.charAt(0).toLowerCase() + label.slice(1);
}

/** The first thing to settle, as the way to it; how many there are; the whole of it, with the mend, where the line is short. */
function Why({ project, system, faults, onLaw }: WhyProps) {
  const first = faults[0];
  if (first === undefined) return <span className="detail">the answers are those of the last run</span>;
  const sentence = faultSentence(project, first, system);
  return (
    <button
      type="button"
      className="to-fault"
      title={`${sentence}. ${faultWords(first, system).mend}`}
      onClick={() => goTo(first.where, onLaw)}
    >
      <span className="detail">
        {faults.length > 1 && `${faults.length} things to settle, first: `}
        {sentence}
      </span>
    </button>
  );
}

interface WhyProps {
  readonly project: Project;
  readonly system: System;
  readonly faults: readonly Fault[];
  readonly onLaw: (storey: number) => void;
}

interface LineProps {
  readonly kind: string;
  readonly headline: string;
  readonly detail: React.ReactNode;
  readonly mark?: boolean;
  readonly met?: boolean;
  readonly children?: React.ReactNode;
}

function Line({ kind, headline, detail, mark = false, met = false, children }: LineProps) {
  return (
    <div className={`verdict ${kind}`}>
      <span className="headline">
        {mark && <CautionMark solid size={14} />}
        {met && <Icon name="check" />}
        {headline}
      </span>
      {typeof detail === 'string' ? (
        <span className="detail" title={detail}>
          {detail}
        </span>
      ) : (
        detail
      )}
      {children !== undefined && <span className="mends">{children}</span>}
    </div>
  );
}

function Running() {
  const progress = useResults((state) => state.progress);
  const changed = useResults((state) => state.changed);
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const clock = setInterval(() => setNow(Date.now()), 250);
    return () => clearInterval(clock);
  }, []);
  const done = progress?.done ?? 0;
  const of = progress?.of ?? 1;
  const share = of > 0 ? done / of : 0;
  const spent = progress === null ? 0 : Math.max(0, now - progress.startedAt) / 1000;
  const left = share > 0.05 ? `, about ${Math.ceil((spent * (1 - share)) / share)} s left` : '';
  return (
    <>
      <div className="verdict">
        <span className="headline">
          Running: {Math.floor(done)} of {of} motions
        </span>
        <span className="detail">
          {changed === null ? '' : `${inSentence(changed)}; `}
          {Math.round(100 * share)} %{left}
        </span>
        <span className="mends">
          <Button size="medium" onClick={stop}>
            Stop
          </Button>
          <span className="keycap">Esc</span>
        </span>
      </div>
      <div className="run-progress" role="progressbar" aria-label="Run" aria-valuenow={Math.round(100 * share)}>
        <i style={{ width: `${100 * share}%` }} />
      </div>
    </>
  );
}

/** The button goes with the answer that was asked for. */
function runAndGoOn(): void {
  runNow();
  focusSheet();
}

function bringBack(name: string): void {
  edit(`${name} brought back`, (project) => ({
    ...project,
    motions: project.motions.map((motion) => {
      if (motion.name !== name) return motion;
      const { reason: _, ...rest } = motion;
      return { ...rest, used: true };
    }),
  }));
  focusSheet();
}
