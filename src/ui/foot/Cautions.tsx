import type { Caution } from '../../core/checks/cautions.ts';
import { never } from '../../core/fault.ts';
import { useResults } from '../../state/results.ts';
import { setSession } from '../../state/session.ts';
import { CautionMark } from '../controls/Icon.tsx';
import { Popover } from '../controls/Popover.tsx';
import { useOldAnswers } from './oldAnswers.ts';

/** What to look at, worst first, and the duty that always stands there. A click goes to the cause. */
export function Cautions() {
  const answers = useResults((state) => state.answers);
  const old = useOldAnswers();
  const cautions = answers?.cautions ?? [];
  return (
    <section className={`foot cautions ${old ? 'old' : ''}`} aria-label="Cautions">
      <h2 className="foot-head">Cautions {cautions.length > 0 && cautions.length}</h2>
      <ul className="facts">
        {old && answers !== null && <li className="as-of">as of the last finished run</li>}
        {cautions.slice(0, 4).map((caution) => (
          <CautionItem key={caution.code + caution.text} caution={caution} />
        ))}
        {answers !== null && cautions.length === 0 && <li>none</li>}
      </ul>
      {cautions.length > 1 && (
        <Popover button="all" label={`All ${cautions.length} cautions`} align="right">
          <ul className="caution-list">
            {cautions.map((caution) => (
              <CautionItem key={caution.code + caution.text} caution={caution} />
            ))}
          </ul>
        </Popover>
      )}
      <span className="at-end">The local code governs. A licensed engineer must check this work.</span>
    </section>
  );
}

function CautionItem({ caution }: { readonly caution: Caution }) {
  return (
    <li>
      <button type="button" className="caution" onClick={() => goTo(caution)}>
        <CautionMark />
        {caution.text}
      </button>
    </li>
  );
}

/** Goes to what a caution is about. */
function goTo({ cause }: Caution): void {
  switch (cause.kind) {
    case 'storey':
      setSession({
        screen: 'sheet',
        storey: cause.storey,
        selection: { storey: cause.storey, column: 'stiffness', anchorStorey: cause.storey, anchorColumn: 'stiffness' },
      });
      return;
    case 'motion':
      setSession({ screen: 'motions', motion: cause.motion });
      return;
    case 'analysis':
      setSession({ dialog: 'analysis', analysisPart: 'Step' });
      return;
    case 'damping':
      setSession({ dialog: 'analysis', analysisPart: 'Damping' });
      return;
    case 'limit':
      setSession({ screen: 'sheet' });
      document.querySelector<HTMLElement>('.limit-cell input')?.focus();
      return;
    default:
      never(cause);
  }
}
