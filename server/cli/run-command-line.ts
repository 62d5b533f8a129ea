import type { Readable, Writable } from 'node:stream';
import { answerLines } from './answer-lines';
import { printSchema } from './print-schema';
import { USAGE } from './usage';

/** Runs one command; returns the exit status: 0 all answered, 1 some line was refused, 2 not a command. */
export async function runCommandLine(
  args: readonly string[],
  input: Readable,
  output: Writable,
  errors: Writable,
): Promise<number> {
  const [command, ...rest] = args;
  const excess = rest[command === 'schema' ? 1 : 0];
  if (excess !== undefined) {
    errors.write(`"${excess}" was not expected after ${command}.\n\n${USAGE}`);
    return 2;
  }
  switch (command) {
    case 'forward': {
      const { answerForward } = await import('./answer-forward');
      return answerLines(input, output, answerForward());
    }
    case 'fit': {
      const { answerFit } = await import('./answer-fit');
      return answerLines(input, output, answerFit());
    }
    case 'fit-line': {
      const { answerFitLine } = await import('./answer-fit-line');
      return answerLines(input, output, answerFitLine());
    }
    case 'sample': {
      const { answerSample } = await import('./answer-sample');
      return answerLines(input, output, answerSample());
    }
    case 'schema':
      return printSchema(rest[0], output, errors);
    case 'help':
    case '--help':
      output.write(USAGE);
      return 0;
    default:
      errors.write(command === undefined ? USAGE : `"${command}" is not a command.\n\n${USAGE}`);
      return 2;
  }
}
