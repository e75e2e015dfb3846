import { misused, type Verb } from './verb.ts';

/** A verb that a later version brings: it is refused, never passed over. */
export function notYet(name: string, usage: string): Verb {
  return {
    usage,
    summary: 'not available yet',
    flags: { out: 'value' },
    run: () => misused([`${name}: not available yet in this version`]),
  };
}
