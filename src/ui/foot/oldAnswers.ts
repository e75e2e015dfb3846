import { useResults } from '../../state/results.ts';

/** Whether the answers in sight are those of the last finished run, and a newer one is missing or visibly on its way. */
export function useOldAnswers(): boolean {
  return useResults(({ status, slow }) => status === 'stale' || (status === 'running' && slow));
}
