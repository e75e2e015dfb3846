import { useRef } from 'react';
import { never } from '../../core/fault.ts';
import { useSession } from '../../state/session.ts';
import { type SquareKind, usePanelChoice } from './choice.ts';
import { DampingByPeriod } from './DampingByPeriod.tsx';
import { ForceDrift } from './ForceDrift.tsx';
import { ModeShapes } from './ModeShapes.tsx';
import type { SquareLayout } from './SquareFrame.tsx';
import { StoreyEnergy } from './StoreyEnergy.tsx';
import { StoreyProfile } from './StoreyProfile.tsx';
import { useTokens } from './tokens.ts';
import { useNarrow } from './useNarrow.ts';
import { useShownRun } from './useShownRun.ts';
import { useSize } from './useSize.ts';
import './plots.css';

const GAP = 30;
const FIRST_SIZE = { width: 660, height: 384 };

/** The two square panels under the answers: what each shows is chosen in its head. */
export function SquarePanels() {
  const section = useRef<HTMLElement>(null);
  const narrow = useNarrow();
  const { width, height } = useSize(section) ?? FIRST_SIZE;
  const kinds = usePanelChoice((choice) => choice.square);
  const half = Math.floor((width - GAP) / 2);
  return (
    <section ref={section} className="square-panels" data-part="plots" aria-label="Plots">
      {kinds.map((kind, slot) => {
        const left = slot === 0 ? 0 : width - half;
        const layout = { slot, left, width: half, height, narrow };
        return <Square key={left} kind={kind} layout={layout} />;
      })}
    </section>
  );
}

function Square({ kind, layout }: { readonly kind: SquareKind; readonly layout: SquareLayout }) {
  const tokens = useTokens();
  const system = useSession((state) => state.system);
  const { shown, old } = useShownRun();
  const common = { layout, tokens, system, old };
  switch (kind) {
    case 'force':
      return <ForceDrift {...common} shown={shown} />;
    case 'modes':
      return <ModeShapes layout={layout} tokens={tokens} system={system} />;
    case 'damping':
      return <DampingByPeriod {...common} />;
    case 'profile':
    case 'ductility':
    case 'residual':
      return <StoreyProfile {...common} kind={kind} />;
    case 'storey-energy':
      return <StoreyEnergy {...common} shown={shown} />;
    default:
      return never(kind);
  }
}
