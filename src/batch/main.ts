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

function outcomeOf([name, ...rest]: readonly string[]): Outcome {
  if (name === undefined) return misused(['no verb is named']);
  if (name === 'help' || name === '--help' || name === '-h') return { exit: 0, messages: usage() };
  if (!Object.hasOwn(VERBS, name)) return misused([`${name}: there is no such verb`]);
  const verb = VERBS[name];
  const { line, faults } = readCommandLine(rest, verb.flags);
  return faults.length > 0 ? misused(faults) : verb.run(line);
}

const { exit, output, messages } = outcomeOf(process.argv.slice(2));
for (const message of exit === 2 ? [...messages, ...usage()] : messages) process.stderr.write(`${message}\n`);
if (output !== undefined) process.stdout.write(`${JSON.stringify(output, null, 2)}\n`);
process.exitCode = exit;
