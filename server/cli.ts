import { runCommandLine } from './cli/run-command-line';

process.exitCode = await runCommandLine(process.argv.slice(2), process.stdin, process.stdout, process.stderr);
