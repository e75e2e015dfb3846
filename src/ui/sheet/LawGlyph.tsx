import type { LawRow } from '../../document/project.ts';

type Kind = LawRow['kind'];

/** Force against drift of each law, on 18 x 12 px: what a cycle encloses. */
const SHAPES: Readonly<Record<Kind, string>> = {
  elastic: 'M2 11 16 1',
  bilinear: 'M1 11 5.5 3 17 1 12.5 9Z',
  'peak-oriented': 'M1 11 4 6.5 11.5 2 17 1 13.5 6 6.5 10.5Z',
  'bouc-wen': 'M1 11C3 5 4.500 2 17 1C15 7 13.500 10 1 11Z',
  flag: 'M1 11 3.500 7.500 2.500 9.500M1 11 6 9.800 8 6.200 9 6 10 5.800 12 2.200 17 1 13.800 5.200 10 5.800M9 6 4.200 6.800 1 11',
};

/** A law as a small drawing of its cycle. */
export function LawGlyph({ kind }: { readonly kind: Kind }) {
  return (
    <svg className="law-glyph" width="18" height="12" viewBox="0 0 18 12" aria-hidden="true">
      <path
        d={SHAPES[kind]}
        fill="none"
        stroke="currentColor"
        strokeWidth="1.2"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
    </svg>
  );
}
