import { useId, useState } from 'react';
import { printQuantity } from '../../core/units/quantities.ts';
import { halvedStep, useMotion as withMotion } from '../../document/edits.ts';
import { edit, useDocument } from '../../state/document.ts';
import type { MotionRun } from '../../state/results.ts';
import { setSession, setTime } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { focusSheet } from '../controls/focusSheet.ts';
import { Popover } from '../controls/Popover.tsx';

export interface MendsProps {
  /** The run that did not reach its end. */
  readonly failed: MotionRun;
  readonly letter: string;
}

/** What can be done about a motion that did not finish. */
export function Mends({ failed, letter }: MendsProps) {
  const { motion, run } = failed;
  const { ending } = run;
  const step = useDocument((state) => state.project.analysis.step);
  const time = ending === null ? 0 : ending.time;
  const show = () => {
    const storey = ending !== null && ending.storey >= 0 ? { storey: ending.storey } : {};
    setSession({ motion, playing: false, ...storey });
    setTime(time);
  };
  const halve = () => {
    commitOpenDraft();
    edit('step halved', halvedStep);
  };
  return (
    <>
      <Button size="low" onClick={show}>
        Show {letter} at {printQuantity(time, 'time', 'si', 2)} s
      </Button>
      {step !== 'auto' && (
        <Button size="low" aria-label={`Halve the step and try ${letter}`} onClick={halve}>
          <span>
            Halve the step<span className="roomy"> and try {letter}</span>
          </span>
        </Button>
      )}
      <Popover
        // What was typed of one motion is never said of the next.
        key={motion}
        button={`Leave ${letter} out`}
        label={`Leave ${letter} out`}
        className="button plain low"
        align="right"
      >
        {(close) => <LeaveOut motion={motion} letter={letter} onDone={close} />}
      </Popover>
    </>
  );
}

interface LeaveOutProps {
  readonly motion: string;
  readonly letter: string;
  readonly onDone: () => void;
}

/** A motion is left out for a reason that somebody types (that it did not finish is none), and the note names both. */
function LeaveOut({ motion, letter, onDone }: LeaveOutProps) {
  const [reason, setReason] = useState('');
  const id = useId();
  const given = reason.trim() !== '';
  return (
    <form
      className="leave-out"
      onSubmit={(event) => {
        event.preventDefault();
        if (!given) return;
        commitOpenDraft();
        edit(`${motion} left out`, (project) => {
          const at = project.motions.findIndex(({ name }) => name === motion);
          return withMotion(project, at, false, reason.trim());
        });
        onDone();
        focusSheet();
      }}
    >
      <label htmlFor={id}>Why {letter} is left out; the note says so</label>
      <input id={id} className="field" value={reason} onChange={(event) => setReason(event.target.value)} />
      <Button kind="primary" size="medium" type="submit" disabled={!given}>
        Leave {letter} out
      </Button>
    </form>
  );
}
