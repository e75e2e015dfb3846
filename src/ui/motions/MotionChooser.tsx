import { type KeyboardEvent, useRef } from 'react';
import type { MotionEntry } from '../../document/project.ts';
import { setSession } from '../../state/session.ts';
import { letterOf } from '../controls/letters.ts';
import { Select } from '../controls/Select.tsx';

/** From so many motions on the chooser is a list. */
const LIST_FROM = 13;

export interface MotionChooserProps {
  readonly motions: readonly MotionEntry[];
  /** Name of the chosen one. */
  readonly chosen: string | null;
  /** Names of those whose run ended early. */
  readonly incomplete: readonly string[];
}

/** Rows that the letters take, seven to a row. */
export function chipRows(motions: number): number {
  return motions >= LIST_FROM ? 1 : Math.max(1, Math.ceil(motions / 7));
}

/** Which motion is shown: a letter each, or a list where there are many. */
export function MotionChooser({ motions, chosen, incomplete }: MotionChooserProps) {
  if (motions.length >= LIST_FROM) {
    return (
      <Select
        label="Motion shown"
        className="motion-list"
        value={chosen ?? ''}
        options={motions.map((entry, i) => ({
          value: entry.name,
          label: `${letterOf(i)}  ${entry.name}${standing(entry, incomplete)}`,
          disabled: !entry.used,
        }))}
        onChange={(motion) => setSession({ motion })}
      />
    );
  }
  return <MotionLetters motions={motions} chosen={chosen} incomplete={incomplete} />;
}

function MotionLetters({ motions, chosen, incomplete }: MotionChooserProps) {
  const group = useRef<HTMLDivElement>(null);
  const go = (from: number, step: number) => {
    for (let i = 1; i <= motions.length; i++) {
      const at = (from + step * i + motions.length * i) % motions.length;
      const entry = motions[at];
      if (!entry.used) continue;
      setSession({ motion: entry.name });
      (group.current?.children[at] as HTMLElement | undefined)?.focus();
      return;
    }
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const at = motions.findIndex(({ name }) => name === chosen);
    if (event.key === 'ArrowRight' || event.key === 'ArrowDown') go(at, 1);
    else if (event.key === 'ArrowLeft' || event.key === 'ArrowUp') go(at, -1);
    else if (event.key === 'Home') go(-1, 1);
    else if (event.key === 'End') go(motions.length, -1);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div ref={group} className="chips" role="radiogroup" aria-label="Motion shown" onKeyDown={onKeyDown}>
      {motions.map((entry, i) => {
        const on = entry.name === chosen;
        const broken = incomplete.includes(entry.name);
        return (
          // biome-ignore lint/a11y/useSemanticElements: a radio input cannot hold the drawn letter of the look
          <button
            key={entry.name}
            type="button"
            role="radio"
            className={`chip ${entry.used ? '' : 'left-out'} ${broken ? 'broken' : ''}`}
            aria-checked={on}
            aria-disabled={!entry.used}
            aria-label={`${letterOf(i)}, ${entry.name}${standing(entry, incomplete)}`}
            tabIndex={on ? 0 : -1}
            onClick={() => entry.used && setSession({ motion: entry.name })}
            onPointerEnter={() => setSession({ lit: entry.name })}
            onPointerLeave={() => setSession({ lit: null })}
          >
            {letterOf(i)}
          </button>
        );
      })}
    </div>
  );
}

function standing(entry: MotionEntry, incomplete: readonly string[]): string {
  if (!entry.used) return ', left out';
  return incomplete.includes(entry.name) ? ', did not finish' : '';
}
