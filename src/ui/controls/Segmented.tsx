import { type KeyboardEvent, type ReactNode, useRef } from 'react';

export interface Segment<T extends string> {
  readonly value: T;
  readonly label: ReactNode;
  readonly disabled?: boolean;
  /** Accessible name where the label is short. */
  readonly name?: string;
}

export interface SegmentedProps<T extends string> {
  /** Accessible name of the group. */
  readonly label: string;
  readonly segments: readonly Segment<T>[];
  readonly value: T | null;
  readonly onChange: (value: T) => void;
  readonly className?: string;
  /** The segment under the pointer or the focus; null when it leaves. */
  readonly onHover?: (value: T | null) => void;
}

/** One of a few, side by side: one tab stop, arrows choose, Home and End. */
export function Segmented<T extends string>(props: SegmentedProps<T>) {
  const { label, segments, value, onChange, onHover, className = '' } = props;
  const group = useRef<HTMLDivElement>(null);
  const chosen = Math.max(
    0,
    segments.findIndex((segment) => segment.value === value),
  );
  /** The nearest segment that can be chosen, going on in the direction of the key. */
  const go = (index: number, onward = 1) => {
    let to = (index + segments.length) % segments.length;
    for (let i = 0; i < segments.length && segments[to]?.disabled; i++)
      to = (to + onward + segments.length) % segments.length;
    const segment = segments[to];
    if (segment === undefined || segment.disabled) return;
    onChange(segment.value);
    (group.current?.children[to] as HTMLElement | undefined)?.focus();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowRight' || event.key === 'ArrowDown') go(chosen + 1);
    else if (event.key === 'ArrowLeft' || event.key === 'ArrowUp') go(chosen - 1, -1);
    else if (event.key === 'Home') go(0);
    else if (event.key === 'End') go(segments.length - 1, -1);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div ref={group} className={`segments ${className}`} role="radiogroup" aria-label={label} onKeyDown={onKeyDown}>
      {segments.map((segment, index) => (
        // biome-ignore lint/a11y/useSemanticElements: a radio input cannot hold the drawn labels of the look
        <button
          key={segment.value}
          type="button"
          role="radio"
          aria-checked={segment.value === value}
          aria-label={segment.name}
          disabled={segment.disabled}
          tabIndex={index === chosen ? 0 : -1}
          onClick={() => onChange(segment.value)}
          onPointerEnter={onHover && (() => onHover(segment.value))}
          onPointerLeave={onHover && (() => onHover(null))}
        >
          {segment.label}
        </button>
      ))}
    </div>
  );
}
