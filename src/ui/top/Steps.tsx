import { printQuantity } from '../../core/units/quantities.ts';
import { useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { type SessionState, setSession, useSession } from '../../state/session.ts';
import { governingWords } from './governingWords.ts';

/** The steps of the work: Frame and Response are the two ends of one screen. */
export function Steps() {
  const screen = useSession((state) => state.screen);
  const storeys = useDocument((state) => state.project.frame.storeys.length);
  const motions = useDocument((state) => state.project.motions);
  const modes = useResults((state) => state.modes);
  const period = modes?.[0]?.period;
  const used = motions.filter((motion) => motion.used).length;
  const left = motions.length - used;
  return (
    <nav className="steps" aria-label="Steps">
      <Step name="Frame" screen="sheet" on={screen === 'sheet'}>
        <small>
          {storeys === 0 ? 'no storeys yet' : `${storeys} ${storeys === 1 ? 'storey' : 'storeys'}`}
          {period !== undefined && storeys > 0 && (
            <>
              , T<sub>1</sub> {printQuantity(period, 'time', 'si', 2)} s
            </>
          )}
        </small>
      </Step>
      <Step name="Motions" screen="motions" on={screen === 'motions'}>
        <small>
          {motions.length === 0 ? 'no records yet' : `${used} ${used === 1 ? 'record' : 'records'}`}
          {left > 0 && `, ${left} left out`}
        </small>
      </Step>
      <Step name="Response" screen="sheet" on={screen === 'sheet'}>
        <Governing />
      </Step>
    </nav>
  );
}

function Governing() {
  const answers = useResults((state) => state.answers);
  const status = useResults((state) => state.status);
  if (status === 'stale') return <small>out of date</small>;
  if (answers === null) return <small> </small>;
  const { words, over } = governingWords(answers.envelope);
  return <small className={over ? 'alarm' : ''}>{words}</small>;
}

interface StepProps {
  readonly name: string;
  readonly screen: SessionState['screen'];
  readonly on: boolean;
  readonly children: React.ReactNode;
}

function Step({ name, screen, on, children }: StepProps) {
  return (
    <button
      type="button"
      className="step"
      aria-current={on ? 'page' : undefined}
      onClick={() => setSession({ screen })}
    >
      <b>{name}</b>
      {children}
    </button>
  );
}
