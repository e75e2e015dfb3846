import { useMemo, useState } from 'react';
import { AIM } from '../../core/dynamics/autoStep.ts';
import { methodOf } from '../../core/dynamics/methods.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import { useDocument } from '../../state/document.ts';
import { type Answers, useResults } from '../../state/results.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { Segmented } from '../controls/Segmented.tsx';
import { TableView } from '../plots/TableView.tsx';
import { modeEvidence, motionEvidence, type StepGroup, stepGroups } from './evidenceTables.ts';
import { shortSeconds } from './shortSeconds.ts';

const TITLE = 'How good are these numbers?';

/** How far the numbers can be trusted: by motion, by mode, and what each figure says. */
export function EvidenceDialog({ onClose }: { readonly onClose: () => void }) {
  const answers = useResults((state) => state.answers);
  if (answers === null) {
    return (
      <Dialog title={TITLE} onClose={onClose} width={480}>
        <p>There are no answers yet: step error, energy balance and cost of each run stand here after the first one.</p>
      </Dialog>
    );
  }
  return <EvidenceOf answers={answers} onClose={onClose} />;
}

function EvidenceOf({ answers, onClose }: { readonly answers: Answers; readonly onClose: () => void }) {
  const current = useResults((state) => state.status === 'current');
  const system = useSession((state) => state.system);
  const motions = useDocument((state) => state.project.motions);
  const names = useMemo(() => motions.map(({ name }) => name), [motions]);
  const groups = useMemo(() => stepGroups(answers, names), [answers, names]);
  const table = useMemo(() => motionEvidence(answers, names), [answers, names]);
  return (
    <Dialog
      title={TITLE}
      onClose={onClose}
      width={answers.case.analysis.step === 'auto' ? 1360 : 1080}
      foot={
        <>
          <Button onClick={() => setSession({ dialog: 'analysis' })}>Method and step</Button>
          <Button onClick={() => setSession({ dialog: 'bench' })}>Compare schemes</Button>
          <Button kind="primary" onClick={onClose}>
            Close
          </Button>
        </>
      }
    >
      <div className="evidence-dialog">
        {!current && (
          <p className="out-of-date" role="status">
            These are the numbers of the last finished run, and no longer those of the sheet.
          </p>
        )}
        <p className="evidence-sentence">{answers.evidenceSentence}</p>
        <section aria-labelledby="evidence-motions">
          <h3 id="evidence-motions">By motion</h3>
          <TableView table={table} system={system} height={232} />
          <p className="quiet small">
            Step error: twice the largest change of a storey's peak drift when the step is halved, over the largest
            drift of the run; the aim is under {printQuantity(AIM, 'percent', 'si', 0)} %. Energy imbalance: the largest
            distance between input and the sum of what became of it, over the largest input. A linear frame takes one
            solve a step.
          </p>
        </section>
        {groups.length > 0 && <ModesOf answers={answers} groups={groups} />}
      </div>
    </Dialog>
  );
}

function ModesOf({ answers, groups }: { readonly answers: Answers; readonly groups: readonly StepGroup[] }) {
  const system = useSession((state) => state.system);
  const coarsest = groups[groups.length - 1];
  const [wanted, setWanted] = useState<string | null>(null);
  const group = groups.find(({ step }) => String(step) === wanted) ?? coarsest;
  const table = useMemo(() => modeEvidence(answers.modes, group.evidence), [answers.modes, group]);
  const { name, source } = methodOf(answers.case.analysis.method);
  const yielding = answers.case.frame.storeys.some(({ law }) => law.kind !== 'elastic');
  return (
    <section aria-labelledby="evidence-modes">
      <div className="evidence-head">
        <h3 id="evidence-modes">By mode</h3>
        {groups.length > 1 ? (
          <Segmented
            label="Step of the modes"
            value={String(group.step)}
            segments={groups.map(({ step, letters }) => ({
              value: String(step),
              label: `${shortSeconds(step)} s, ${letters.join(' ')}`,
            }))}
            onChange={setWanted}
          />
        ) : (
          <span className="quiet small">at a step of {shortSeconds(group.step)} s</span>
        )}
      </div>
      <TableView table={table} system={system} height={232} />
      <p className="quiet small">
        What {name} makes of a free vibration in each mode
        {yielding && ' of the initial stiffness'}, in closed form: how much longer its period comes out, how much of its
        amplitude a cycle loses beside physical damping (below zero: the scheme takes less than that), and the same as a
        ratio of critical. None: the mode does not swing at this step. {source}; Hughes, The Finite Element Method, 9.1
        and 9.2 (from memory).
      </p>
    </section>
  );
}
