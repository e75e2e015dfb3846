import { command } from './command.ts';

const { exit, output, messages } = command(process.argv.slice(2));
for (const message of messages) process.stderr.write(`${message}\n`);
if (output !== undefined) process.stdout.write(`${JSON.stringify(output, null, 2)}\n`);
process.exitCode = exit;
