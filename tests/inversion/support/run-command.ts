import { Readable, Writable } from 'node:stream';
import { runCommandLine } from '../../../server/cli/run-command-line';

export function sink(): { stream: Writable; text: () => string } {
  const chunks: string[] = [];
  const stream = new Writable({
    write: (chunk: Buffer, _encoding, done) => {
      chunks.push(chunk.toString());
      done();
    },
  });
  return { stream, text: () => chunks.join('') };
}

/** Runs a command over lines of input, here, and reads its answers. */
export async function runCommand(args: string[], input = '') {
  const [out, err] = [sink(), sink()];
  const status = await runCommandLine(args, Readable.from([input]), out.stream, err.stream);
  const answers: Record<string, unknown>[] = out
    .text()
    .split('\n')
    .filter((line) => line.startsWith('{"'))
    .map((line) => JSON.parse(line));
  return { status, answers, output: out.text(), errors: err.text() };
}

export const line = (value: object) => `${JSON.stringify(value)}\n`;
