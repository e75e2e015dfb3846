import type { Ending } from '../dynamics/run.ts';
import { never } from '../fault.ts';
import type { Storey } from '../frame/frame.ts';

/** Why a run did not come to its end, in one sentence without place and full stop. */
export function endingReason({ status, storey }: Ending, storeys: readonly Storey[]): string {
  switch (status) {
    case 'collapsed':
      return storey < 0
        ? 'stopped as collapsed: a storey passed the drift ratio at which a run is stopped'
        : `stopped as collapsed: storey ${storey + 1}, ${storeys[storey].name}, passed the drift ratio at which a run is stopped`;
    case 'diverged':
      return 'diverged: the numbers left the finite range';
    case 'cancelled':
      return 'stopped before its end';
    default:
      return never(status);
  }
}
