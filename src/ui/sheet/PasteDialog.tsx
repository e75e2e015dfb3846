import type { System } from '../../core/units/quantities.ts';

export interface PasteDialogProps {
  readonly text: string;
  readonly cell: { readonly storey: number; readonly column: string };
  readonly columns: readonly string[];
  readonly system: System;
  readonly onClose: () => void;
}

/** What a pasted block still needs to be told. */
export function PasteDialog(_: PasteDialogProps) {
  return null;
}
