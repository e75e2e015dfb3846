import { useMemo } from 'react';
import { backbone, type Loop, typicalCycle } from '../../core/dynamics/laws/path.ts';
import type { Law } from '../../core/frame/frame.ts';
import { yieldDrift } from '../../core/frame/storeyFacts.ts';
import { printQuantity, type System, unitOf } from '../../core/units/quantities.ts';
import type { Project } from '../../document/project.ts';
import { px } from './drawing.ts';

export interface LawDrawingProps {
  readonly project: Project;
  readonly storey: number;
  readonly system: System;
  /** The numbers of the law are all there and in range. */
  readonly drawable: boolean;
}

const WIDTH = 240;
const HEIGHT = 172;
const MIDDLE_X = WIDTH / 2;
const MIDDLE_Y = HEIGHT / 2;
/** Half of what the curves take up [px]. */
const REACH_X = MIDDLE_X - 10;
const REACH_Y = MIDDLE_Y - 16;

/** Cycles are drawn up to so many yield drifts: far enough that a law shows its kind. */
const DUCTILITY = 4;

/** Backbone and growing cycles of a storey's law, as its numbers are typed. */
export function LawDrawing({ project, storey, system, drawable }: LawDrawingProps) {
  const row = project.frame.storeys[storey];
  const curves = useMemo(() => {
    if (row === undefined || !drawable || typeof row.stiffness !== 'number') return null;
    // Without a fault every number of the law is there.
    const law = row.law as Law;
    return {
      law,
      stiffness: row.stiffness,
      cycle: typicalCycle(law, row.stiffness, DUCTILITY),
      spine: backbone(law, row.stiffness, DUCTILITY),
    };
  }, [row, drawable]);
  if (curves === null) {
    return (
      <div className="law-drawing">
        <p className="quiet small">Drawn as soon as stiffness and law are typed.</p>
      </div>
    );
  }
  const { law, stiffness, cycle, spine } = curves;
  const [endX, endY] = [largest(cycle.drift), largest(cycle.force)];
  const x = (drift: number) => MIDDLE_X + (drift / endX) * REACH_X;
  const y = (force: number) => MIDDLE_Y - (force / endY) * REACH_Y;
  const drift = law.kind === 'elastic' ? null : yieldDrift(law.strength, stiffness);
  const limit = limitOf(project, storey);
  const reached = printQuantity(DUCTILITY, 'count', 'si');
  const words = law.kind === 'elastic' ? 'force against drift, elastic' : `cycles to 2 and ${reached} yield drifts`;
  return (
    <div className="law-drawing">
      <svg width={WIDTH} height={HEIGHT} role="img" aria-label={`Force and drift of the ${law.kind} law: ${words}`}>
        <path d={`M0 ${MIDDLE_Y}H${WIDTH}M${MIDDLE_X} 0V${HEIGHT}`} className="s-rule" />
        {limit !== null && limit < endX && law.kind !== 'elastic' && (
          <>
            <path
              d={`M${px(x(limit))} 0V${HEIGHT}M${px(x(-limit))} 0V${HEIGHT}`}
              className="s-signal"
              strokeDasharray="6 3"
            />
            <text x={px(x(limit) - 4)} y={HEIGHT - 3} className="signal end halo">
              limit
            </text>
          </>
        )}
        <path d={pathOf(cycle, x, y)} className="s-suite" strokeWidth="1" strokeLinejoin="round" />
        <path d={pathOf(spine, x, y)} className="s-ink" strokeWidth="1.8" strokeLinejoin="round" />
        {drift !== null && law.kind !== 'elastic' && (
          <>
            <path
              d={`M${px(x(drift))} ${MIDDLE_Y}V${px(y(law.strength))}H${MIDDLE_X}`}
              className="s-accent"
              strokeDasharray="2 2"
            />
            <text x={px(x(drift) + 3)} y={MIDDLE_Y + 13} className="accent halo">
              {printQuantity(drift, 'drift', system, system === 'si' ? 1 : 2)} {unitOf('drift', system)}
            </text>
            <text x={MIDDLE_X - 4} y={px(y(law.strength) + 4)} className="accent end halo">
              {printQuantity(law.strength, 'force', system)} {unitOf('force', system)}
            </text>
          </>
        )}
      </svg>
    </div>
  );
}

function pathOf({ drift, force }: Loop, x: (drift: number) => number, y: (force: number) => number): string {
  let path = '';
  for (let i = 0; i < drift.length; i++) path += `${i === 0 ? 'M' : 'L'}${px(x(drift[i]))} ${px(y(force[i]))}`;
  return path;
}

function largest(values: Float64Array): number {
  let most = 0;
  for (const value of values) most = Math.max(most, Math.abs(value));
  return most;
}

/** The drift that the limit allows this storey [m]: an isolator has its own. */
function limitOf({ limits, frame }: Project, storey: number): number | null {
  const row = frame.storeys[storey];
  if (row?.role === 'isolator') return typeof limits.isolator === 'number' ? limits.isolator : null;
  return typeof limits.drift === 'number' && typeof row?.height === 'number' ? limits.drift * row.height : null;
}
