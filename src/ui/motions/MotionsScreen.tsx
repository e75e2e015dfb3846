import { useMemo } from 'react';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { useChosenMotion } from '../../state/selectors.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { letterOf } from '../controls/letters.ts';
import { MotionDetails } from './MotionDetails.tsx';
import { MotionTable } from './MotionTable.tsx';
import { useKnownMeasures } from './useKnownMeasures.ts';
import './motions.css';

/** The records of the suite: what was read, what is used, at which factor, and where each came from. */
export function MotionsScreen() {
  const project = useDocument(effectiveProject);
  const faults = useResults((state) => state.faults);
  const system = useSession((state) => state.system);
  const picked = useSession((state) => state.motion);
  const chosen = useChosenMotion();
  const { motions } = project;
  const measures = useKnownMeasures(motions);
  // A motion that is left out can be looked at here, though no histories are shown for it.
  const shown = motions.some(({ name }) => name === picked) ? picked : chosen;
  const at = motions.findIndex(({ name }) => name === shown);
  const used = motions.filter((motion) => motion.used).length;
  const words = useMemo(() => {
    if (motions.length === 0) return 'No records yet';
    const left = motions.length - used;
    return `${used} ${used === 1 ? 'record' : 'records'} in use${left === 0 ? '' : `, ${left} left out`}`;
  }, [motions.length, used]);
  return (
    <div className="page motions-page">
      <div className="motions-left">
        <div className="motions-tools">
          <Button kind="primary" onClick={() => setSession({ dialog: 'import' })}>
            Add records
          </Button>
          <span className="quiet small">Files can be dropped anywhere on this page.</span>
          <h2>{words}</h2>
        </div>
        {motions.length > 0 ? (
          <MotionTable motions={motions} measures={measures} faults={faults} system={system} shown={shown} />
        ) : (
          <p className="quiet">
            A record is a ground acceleration over time, in a text file as archives and loggers write it. Add one, and
            what was read is shown beside the file before it is taken.
          </p>
        )}
      </div>
      <div className="motions-right">
        {at >= 0 && <MotionDetails entry={motions[at]} letter={letterOf(at)} measures={measures} system={system} />}
      </div>
    </div>
  );
}
