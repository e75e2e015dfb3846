import { readCommandLine } from './commandLine.ts';
import { inspect } from './inspect.ts';
import { notYet } from './notYet.ts';
import { respond } from './respond.ts';
import { spectrum } from './spectrum.ts';
import { misused, type Outcome, type Verb } from './verb.ts';

const VERBS: Readonly<Record<string, Verb>> = {
  inspect,
  spectrum,
  respond,
  size: notYet('size', 'PROJECT --out FOLDER'),
  check: notYet('check', 'PROJECT'),
};

function usage(): string[] {
  const lines = Object.entries(VERBS).map(([name, verb]) => `  ${name} ${verb.usage}\n      ${verb.summary}`);
  return ['usage: npm run --silent batch -- VERB …', ...lines];
}

/** Runs the command of these words; a command line at fault gets all that is wrong with it, and the usage. */
export function command([name, ...rest]: readonly string[]): Outcome {
  if (name === 'help' || name === '--help' || name === '-h') return { exit: 0, messages: usage() };
  const outcome = name === undefined ? misused(['no verb is named']) : verbOutcome(name, rest);
  return outcome.exit === 2 ? { ...outcome, messages: [...outcome.messages, ...usage()] } : outcome;
}

function verbOutcome(name: string, rest: readonly string[]): Outcome {
  if (!Object.hasOwn(VERBS, name)) return misused([`${name}: there is no such verb`]);
  const verb = VERBS[name];
  const { line, faults } = readCommandLine(rest, verb.flags);
  return faults.length > 0 ? misused(faults) : verb.run(line);
}
