/** What the screen and the note print under Cautions: subject, fact, number. Wording rules stand in DEVELOPERS.md. */
export interface Caution {
  /** Stable name, e.g. `limit-exceeded`. */
  readonly code: string;
  /** The sentence, with numbers, without a full stop. */
  readonly text: string;
  /** Where a click on it goes. */
  readonly cause:
    | { readonly kind: 'storey'; readonly storey: number }
    | { readonly kind: 'motion'; readonly motion: string }
    | { readonly kind: 'analysis' }
    | { readonly kind: 'damping' }
    | { readonly kind: 'limit' };
}
