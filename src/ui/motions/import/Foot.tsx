import { useDocument } from '../../../state/document.ts';
import { type ImportFile, isReady } from '../../../state/importQueue.ts';
import { Button } from '../../controls/Button.tsx';
import { letterOf } from '../../controls/letters.ts';
import type { MendChoice } from './useMend.ts';
import { count, listed } from './words.ts';

export interface FootProps {
  readonly files: readonly ImportFile[];
  readonly mend: MendChoice | null;
  readonly onAdd: () => void;
  readonly onCancel: () => void;
}

/** Adds what is ready; mends first what stopped the file that is shown. */
export function Foot({ files, mend, onAdd, onCancel }: FootProps) {
  const before = useDocument((state) => state.project.motions.length);
  const ready = files.filter(isReady).length;
  const others = files.length - ready;
  const mending = mend !== null;
  return (
    <div className="import-foot">
      {mending && (
        <Button kind="primary" disabled={!mend.complete} onClick={mend.apply}>
          {mend.choice === 'leave-out' ? 'Leave it out' : 'Mend and read on'}
        </Button>
      )}
      {(!mending || ready > 0) && (
        <Button kind={mending ? 'plain' : 'primary'} disabled={ready === 0} onClick={onAdd}>
          {addWords(mending, ready)}
        </Button>
      )}
      <Button kind={mending ? 'text' : 'plain'} onClick={onCancel}>
        Cancel
      </Button>
      <span className="quiet import-foot-words">
        {!mending && ready > 0 && comeInAs(before, ready)}
        {!mending && ready > 0 && others > 0 && ` ${count(others, 'file')} ${others === 1 ? 'stays' : 'stay'} out.`}
      </span>
      <Keys mending={mending} adds={ready > 0} />
    </div>
  );
}

function addWords(mending: boolean, ready: number): string {
  if (mending) return `Add the other ${ready === 1 ? 'one' : ready}`;
  return ready === 0 ? 'Add records' : `Add ${count(ready, 'record')}`;
}

/** So many letters are named one by one. */
const NAMED = 4;

function comeInAs(before: number, ready: number): string {
  const letters = Array.from({ length: ready }, (_, i) => letterOf(before + i));
  const named = ready > NAMED ? `${letters[0]} to ${letters.at(-1)}` : listed(letters);
  return `${ready === 1 ? 'It comes' : 'They come'} in as ${named}, at a factor of 1.00.`;
}

function Keys({ mending, adds }: { readonly mending: boolean; readonly adds: boolean }) {
  return (
    <span className="small import-keys">
      {adds && (
        <>
          <kbd className="keycap">Ctrl</kbd> <kbd className="keycap">Enter</kbd> adds,{' '}
        </>
      )}
      {mending && (
        <>
          <kbd className="keycap">Enter</kbd> mends,{' '}
        </>
      )}
      <kbd className="keycap">Esc</kbd> cancels, <kbd className="keycap">F6</kbd> next part
    </span>
  );
}
