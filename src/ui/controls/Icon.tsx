import type { ReactNode } from 'react';

/** Line icons on a 16 px square, drawn with the current colour. */
const SHAPES = {
  undo: <path d="M3 6.5h6.5a3.5 3.5 0 0 1 0 7H6M5.8 3.5l-3 3 3 3" />,
  redo: <path d="M13 6.5H6.5a3.5 3.5 0 0 0 0 7H10M10.2 3.5l3 3-3 3" />,
  keys: (
    <>
      <rect x="1.5" y="4" width="13" height="8.5" rx="1" />
      <path d="M4 6.8h.01M6.7 6.8h.01M9.3 6.8h.01M12 6.8h.01M5 10h6" />
    </>
  ),
  theme: (
    <>
      <circle cx="8" cy="8" r="5.5" />
      <path d="M8 2.5a5.5 5.5 0 0 1 0 11Z" fill="currentColor" stroke="none" />
    </>
  ),
  blank: <path d="M3.5 1.8h6l3 3v9.4h-9ZM9.5 1.8v3h3" />,
  open: <path d="M1.8 12.8V3.4h4l1.4 1.8h6v2M1.8 12.8l2-5.6h10.6l-2 5.6Z" />,
  save: <path d="M8 2.2v7.6M4.9 6.9 8 10l3.1-3.1M2.4 10.6v3h11.2v-3" />,
  table: (
    <>
      <rect x="1.8" y="2.8" width="12.4" height="10.4" rx="1" />
      <path d="M1.8 6.3h12.4M1.8 9.8h12.4M6 6.3v6.9" />
    </>
  ),
  record: <path d="M1.2 8h2l1.1-3 1.6 7 2-10 1.8 9 1.4-5 .9 2h2.8" />,
  more: (
    <>
      <circle cx="8" cy="3.4" r="1.1" fill="currentColor" stroke="none" />
      <circle cx="8" cy="8" r="1.1" fill="currentColor" stroke="none" />
      <circle cx="8" cy="12.6" r="1.1" fill="currentColor" stroke="none" />
    </>
  ),
  close: <path d="M3.5 3.5l9 9M12.5 3.5l-9 9" />,
  play: <path d="M4.5 3 12.5 8l-8 5Z" fill="currentColor" />,
  pause: <path d="M5.2 3.2v9.6M10.8 3.2v9.6" strokeWidth="2.4" />,
  down: <path d="M4 6.2 8 10.2l4-4" />,
  check: <path d="M3 8.6 6.4 12 13 4.4" />,
  plus: <path d="M8 3v10M3 8h10" />,
} satisfies Record<string, ReactNode>;

export type IconName = keyof typeof SHAPES;

export function Icon({ name, size = 16 }: { readonly name: IconName; readonly size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
    >
      {SHAPES[name]}
    </svg>
  );
}

/** The triangle of a caution; solid beside the verdict, in outline in lists. */
export function CautionMark({ solid = false, size = 12 }: { readonly solid?: boolean; readonly size?: number }) {
  return (
    <svg width={size} height={(size * 11) / 12} viewBox="0 0 12 11" aria-hidden="true" style={{ flex: 'none' }}>
      {solid ? (
        <>
          <path d="M6 .5 11.6 10.5H.4Z" fill="var(--signal)" />
          <path d="M6 3.8v3.4M6 8v1.2" stroke="var(--on-signal)" strokeWidth="1.4" />
        </>
      ) : (
        <>
          <path d="M6 .8 11.4 10.2H.6Z" fill="none" stroke="var(--signal)" strokeWidth="1.4" strokeLinejoin="round" />
          <path d="M6 4v3.2M6 8.2v.9" stroke="var(--signal)" strokeWidth="1.3" />
        </>
      )}
    </svg>
  );
}
