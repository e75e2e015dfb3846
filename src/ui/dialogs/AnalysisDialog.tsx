import { useEffect, useRef } from 'react';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { type AnalysisPart, sessionStore, setSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { DampingSection } from './DampingSection.tsx';
import { LimitSection } from './LimitSection.tsx';
import { MethodSection } from './MethodSection.tsx';
import { PDeltaSection } from './PDeltaSection.tsx';
import { StepSection } from './StepSection.tsx';

/** How the response is computed and what it is held against. Each change counts at once, as one undo step. */
export function AnalysisDialog({ onClose }: { readonly onClose: () => void }) {
  const project = useDocument(effectiveProject);
  const modes = useResults((state) => state.modes);
  const stiffening = useResults((state) => state.stiffening);
  const faults = useResults((state) => state.faults);
  const sections = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const { analysisPart } = sessionStore.getState();
    if (analysisPart === null || sections.current === null) return;
    setSession({ analysisPart: null });
    beginAt(analysisPart, sections.current);
  }, []);
  const close = () => {
    commitOpenDraft();
    onClose();
  };
  const leaveFor = (dialog: 'bench' | 'evidence') => {
    commitOpenDraft();
    setSession({ dialog });
  };
  return (
    <Dialog
      title="Analysis"
      onClose={close}
      width={780}
      foot={
        <>
          <span className="quiet small foot-words">
            Changes count at once, and the answers follow; undo takes each back.
          </span>
          <Button onClick={() => leaveFor('evidence')}>Evidence</Button>
          <Button onClick={() => leaveFor('bench')}>Compare schemes</Button>
          <Button kind="primary" onClick={close}>
            Close
          </Button>
        </>
      }
    >
      <div ref={sections}>
        <MethodSection analysis={project.analysis} frame={modes && { modes, stiffening }} faults={faults} />
        <StepSection project={project} modes={modes} faults={faults} />
        <DampingSection frame={project.frame} modes={modes} faults={faults} />
        <PDeltaSection pDelta={project.frame.pDelta} faults={faults} />
        <LimitSection
          limits={project.limits}
          isolated={project.frame.storeys[0]?.role === 'isolator'}
          motions={project.motions}
          faults={faults}
        />
      </div>
    </Dialog>
  );
}

/** Brings a section to the top and the focus to its first field, of a choice to what is chosen. */
function beginAt(part: AnalysisPart, sections: HTMLElement): void {
  const section = sections.querySelector(`section[aria-label="${part}"]`);
  const first = section?.querySelector<HTMLElement>('input, select, textarea');
  const chosen = first?.matches('[type=radio]') ? section?.querySelector<HTMLElement>('[type=radio]:checked') : null;
  (chosen ?? first)?.focus({ preventScroll: true });
  section?.scrollIntoView({ block: 'start' });
}
