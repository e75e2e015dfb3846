import { documentStore, redo, undo } from '../state/document.ts';
import { resultsStore, runNow, stop } from '../state/results.ts';
import { chosenMotion } from '../state/selectors.ts';
import { sessionStore, setSession } from '../state/session.ts';
import { nextPart } from './parts.ts';

export interface AppActions {
  readonly open: () => void;
  readonly save: () => void;
}

/** What text is typed into, and lists whose letters choose: a checkbox or a slider has no undo of its own to keep. */
const TEXT_LIKE =
  'input:not([type="checkbox"], [type="radio"], [type="range"], [type="button"], [type="file"]), textarea, select';

/** Keys that work anywhere. Fields keep the ones they need for themselves. */
export function appKey(event: KeyboardEvent, actions: AppActions): void {
  if (event.defaultPrevented || document.querySelector('dialog[open]') !== null) return;
  if (take(event, actions)) event.preventDefault();
}

function take(event: KeyboardEvent, actions: AppActions): boolean {
  const field = event.target instanceof HTMLElement && event.target.matches(TEXT_LIKE);
  const control = event.ctrlKey || event.metaKey;
  if (control && event.shiftKey && /^Digit[123]$/.test(event.code)) {
    setSession({ screen: event.code === 'Digit2' ? 'motions' : 'sheet' });
    return true;
  }
  if (control) return controlKey(event, actions, field);
  if (event.altKey) return false;
  switch (event.key) {
    case 'F6':
      nextPart(event.shiftKey);
      return true;
    case 'F9':
      runNow();
      return true;
    case 'Escape':
      if (field || resultsStore.getState().status !== 'running') return false;
      stop();
      return true;
    case '?':
      if (field) return false;
      setSession({ dialog: 'keys' });
      return true;
    case '[':
    case ']':
      if (field) return false;
      nextMotion(event.key === ']' ? 1 : -1);
      return true;
    default:
      return false;
  }
}

function controlKey(event: KeyboardEvent, actions: AppActions, field: boolean): boolean {
  const key = event.key.toLowerCase();
  if (key === 's') actions.save();
  else if (key === 'o') actions.open();
  else if (key === 'z' && !field) travel(event.shiftKey ? 'redo' : 'undo');
  else if (key === 'y' && !field) travel('redo');
  else return false;
  return true;
}

/** Undo and redo, each named in a toast: what comes back may stand on another screen. */
function travel(way: 'undo' | 'redo'): void {
  const { undoes, redoes } = documentStore.getState();
  const label = way === 'undo' ? undoes : redoes;
  if (label === null) return;
  if (way === 'undo') undo();
  else redo();
  setSession({ toast: way === 'undo' ? `Taken back: ${label}` : `Done again: ${label}` });
}

function nextMotion(step: number): void {
  const used = documentStore.getState().project.motions.filter((motion) => motion.used);
  if (used.length === 0) return;
  const at = used.findIndex((motion) => motion.name === (sessionStore.getState().motion ?? chosenMotion()));
  const next = used[(at + step + used.length) % used.length];
  if (next !== undefined) setSession({ motion: next.name });
}
