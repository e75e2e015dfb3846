import type { ReactNode } from 'react';
import type { Fault } from '../../core/fault.ts';
import { faultWords } from '../../document/faultWords.ts';
import type { AnalysisPart } from '../../state/session.ts';
import { useSession } from '../../state/session.ts';

export interface SectionProps {
  readonly title: AnalysisPart;
  /** What it decides, and where it comes from. */
  readonly about: ReactNode;
  readonly children: ReactNode;
}

/** One subject of a dialog: its name and meaning at the left, what is typed at the right. */
export function Section({ title, about, children }: SectionProps) {
  return (
    <section className="subject" aria-label={title}>
      <div>
        <h3>{title}</h3>
        <div className="quiet small about">{about}</div>
      </div>
      <div className="subject-body">{children}</div>
    </section>
  );
}

/** A label, its field, and what it means. */
export function Line({
  label,
  children,
  means,
}: {
  readonly label: ReactNode;
  readonly children: ReactNode;
  readonly means?: ReactNode;
}) {
  return (
    <div className="line">
      <span className="line-label">{label}</span>
      <span className="line-field">{children}</span>
      {means !== undefined && <span className="quiet small line-means">{means}</span>}
    </div>
  );
}

/** Facts that stand in sight beside what is typed. */
export function Facts({ facts }: { readonly facts: readonly (readonly [name: string, value: ReactNode])[] }) {
  return (
    <dl className="facts-in-sight">
      {facts.map(([name, value]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

/** The faults at some places of the document that no field shows by itself. */
export function Faults({
  faults,
  under,
  shown = [],
}: {
  readonly faults: readonly Fault[];
  /** The fault stands at this place or below it. */
  readonly under: string;
  /** Places whose fields show their own. */
  readonly shown?: readonly string[];
}) {
  const here = faults.filter(({ where }) => where.startsWith(under) && !shown.includes(where));
  const system = useSession((state) => state.system);
  if (here.length === 0) return null;
  return (
    <ul className="subject-faults">
      {here.map((fault) => {
        const { message, mend } = faultWords(fault, system);
        return (
          <li key={fault.where + message}>
            {message}. {mend}.
          </li>
        );
      })}
    </ul>
  );
}
