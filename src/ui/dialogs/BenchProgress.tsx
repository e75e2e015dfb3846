import type { SchemeBenchState } from '../../state/schemeBench.ts';

export interface BenchProgressProps {
  readonly bench: SchemeBenchState;
  /** The chosen motion in words; null: none is in use. */
  readonly of: string | null;
  /** Why it could not be run, in words. */
  readonly refused: string | null;
  /** The rows belong to another frame or motion. */
  readonly old: boolean;
}

/** How far it is: a line that always stands at the same place. */
export function BenchProgress({ bench: { status, progress, motion, rows }, of, refused, old }: BenchProgressProps) {
  const { done, of: all } = progress ?? { done: 0, of: 0 };
  return (
    <>
      <p className={`bench-words ${refused === null && !(old && status !== 'running') ? '' : 'signal'}`} role="status">
        {wordsOf()}
      </p>
      {status === 'running' && (
        <progress className="bench-bar" aria-label="Runs done" max={Math.max(1, all)} value={done} />
      )}
    </>
  );

  function wordsOf(): string {
    if (refused !== null) return `It cannot run: ${refused}`;
    if (of === null) return 'No motion is in use.';
    if (status === 'idle') return `Ready for ${of}`;
    if (status === 'running') return `Running under ${of}`;
    if (old) return `These rows belong to another frame or motion than the sheet holds now: ${motion}`;
    const [came, asked] = [
      rows.filter(({ state }) => state === 'done').length,
      rows.filter(({ stable }) => stable).length,
    ];
    const end = status === 'stopped' ? `Stopped after ${came} of ${asked} runs` : `${came} of ${asked} runs done`;
    return `${end}, under ${of}`;
  }
}
