import { useState } from 'react';
import type { RecordFault } from '../../../core/motion/reading.ts';
import { readQuantity } from '../../../core/units/read.ts';
import { answerRecord, type ImportFile, leaveRecordOut } from '../../../state/importQueue.ts';

/** What is being chosen for the first open fault of a file. */
export interface MendChoice {
  readonly fault: RecordFault;
  /** Id of the choice taken so far: the best one to begin with. */
  readonly choice: string;
  readonly choose: (id: string) => void;
  /** Text of a value that a choice asks for, in the file's unit. */
  readonly typed: string;
  readonly type: (text: string) => void;
  /** Other open faults that the same choice would settle. */
  readonly alike: readonly RecordFault[];
  readonly forAll: boolean;
  readonly setForAll: (all: boolean) => void;
  /** Whether all that the choice asks for is there. */
  readonly complete: boolean;
  readonly apply: () => void;
}

const LEAVE_OUT = 'leave-out';

export function useMend(file: ImportFile | undefined): MendChoice | null {
  const fault = file?.answer?.reading.faults[0];
  const place = file && fault ? `${file.id} ${fault.id}` : '';
  const [state, setState] = useState({ place, choice: null as string | null, typed: '', forAll: false });
  if (file === undefined || fault === undefined || file.leftOut) return null;
  const { choice: chosen, typed, forAll } = state.place === place ? state : { choice: null, typed: '', forAll: false };
  const set = (changed: Partial<typeof state>) => setState({ choice: chosen, typed, forAll, ...changed, place });
  const choice = fault.choices.find(({ id }) => id === chosen) ?? fault.choices[0];
  const alike = (file.answer?.reading.faults ?? []).filter(
    (other) => other !== fault && other.code === fault.code && !choice?.asksValue && hasChoice(other, choice?.id ?? ''),
  );
  const read = readQuantity(typed, 'ratio', 'si');
  const complete = choice !== undefined && (!choice.asksValue || read.kind === 'value');
  const apply = () => {
    if (!complete) return;
    if (choice.id === LEAVE_OUT) {
      leaveRecordOut(file.id, true);
      return;
    }
    const settled =
      choice.asksValue && read.kind === 'value' ? { choice: choice.id, value: read.value } : { choice: choice.id };
    const faults = forAll ? [fault, ...alike] : [fault];
    const mends = { ...file.answers.mends, ...Object.fromEntries(faults.map(({ id }) => [id, settled])) };
    answerRecord(file.id, { ...file.answers, mends });
  };
  return {
    fault,
    choice: choice?.id ?? '',
    choose: (id) => set({ choice: id }),
    typed,
    type: (text) => set({ typed: text }),
    alike,
    forAll: forAll && alike.length > 0,
    setForAll: (all) => set({ forAll: all }),
    complete,
    apply,
  };
}

function hasChoice({ choices }: RecordFault, id: string): boolean {
  return id !== LEAVE_OUT && choices.some((choice) => choice.id === id);
}
