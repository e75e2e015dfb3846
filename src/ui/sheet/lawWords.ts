import type { LawRow } from '../../document/project.ts';

export type LawKind = LawRow['kind'];

/** The laws, each in a few plain words. */
export const LAWS: readonly { readonly kind: LawKind; readonly name: string; readonly words: string }[] = [
  { kind: 'elastic', name: 'Elastic', words: 'never yields' },
  { kind: 'bilinear', name: 'Bilinear', words: 'unloads as stiff as it began; steel, friction' },
  {
    kind: 'peak-oriented',
    name: 'Peak-oriented',
    words: 'aims back at its largest drift; concrete',
  },
  { kind: 'bouc-wen', name: 'Bouc-Wen', words: 'yields by and by, along a round curve' },
  { kind: 'flag', name: 'Flag', words: 'yields and comes back; post-tensioned' },
];

/** Where each law comes from, as its own file in the calculation says it (from memory there). */
const SOURCES: Readonly<Record<LawKind, string>> = {
  elastic: '',
  bilinear: 'Source: Prager (1956), kinematic hardening',
  'peak-oriented': 'Source: Clough and Johnston (1966); partial unloading, Mahin and Bertero (1976)',
  'bouc-wen': 'Source: Wen (1976)',
  flag: 'Source: Christopoulos, Filiatrault and Folz (2002)',
};

/** "Source: Wen (1976)"; empty for the elastic law, which needs none. */
export function sourceOf(kind: LawKind): string {
  return SOURCES[kind];
}

/** The law that a text names, however it is written: "Peak oriented", "boucwen"; null: none. */
export function lawNamed(text: string): LawKind | null {
  const letters = (name: string) => name.toLowerCase().replace(/[^a-z]/g, '');
  return LAWS.find(({ kind }) => letters(kind) === letters(text))?.kind ?? null;
}
