import { createInterface } from 'node:readline';
import type { Readable, Writable } from 'node:stream';
import { InversionError } from '../../inversion';
import type { LineError } from '../contract/command-line';
import { LineRefusal } from './line-refusal';

const BYTE_ORDER_MARK = '\uFEFF';

function idOf(line: unknown): string | number | null {
  if (typeof line !== 'object' || line === null || !('id' in line)) return null;
  return typeof line.id === 'string' || typeof line.id === 'number' ? line.id : null;
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new LineRefusal('invalid-json', `the line is not one JSON object: ${reason}`, []);
  }
}

function refusal(error: unknown, id: LineError['id']): LineError {
  if (error instanceof LineRefusal || error instanceof InversionError)
    return { id, error: { code: error.code, message: error.message, path: [...error.path] } };
  throw error;
}

function answerOne(text: string, answer: (line: unknown) => object): { answered: object; refused: boolean } {
  let id: LineError['id'] = null;
  try {
    const line = parseJson(text);
    id = idOf(line);
    return { answered: answer(line), refused: false };
  } catch (error) {
    return { answered: refusal(error, id), refused: true };
  }
}

/** Resolves when the output takes more, or never will: its errors are dealt with where it is listened to. */
function roomAgain(output: Writable): Promise<void> {
  const events = ['drain', 'close', 'error'];
  return new Promise((resolve) => {
    const done = () => {
      for (const event of events) output.off(event, done);
      resolve();
    };
    for (const event of events) output.on(event, done);
  });
}

/**
 * Reads lines and writes one answer for each, in order, as they come; blank lines are skipped, CRLF and a byte order mark
 * are taken. Returns 0, or 1 when a line was refused. A reader that goes away ends the run quietly.
 */
export async function answerLines(
  input: Readable,
  output: Writable,
  answer: (line: unknown) => object,
): Promise<number> {
  let gone = false;
  output.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
    gone = true;
    input.destroy();
  });
  let status = 0;
  for await (const raw of createInterface({ input, crlfDelay: Infinity })) {
    if (gone) break;
    const text = raw.startsWith(BYTE_ORDER_MARK) ? raw.slice(1) : raw;
    if (text.trim() === '') continue;
    const { answered, refused } = answerOne(text, answer);
    if (refused) status = 1;
    if (!output.write(`${JSON.stringify(answered)}\n`) && !gone) await roomAgain(output);
  }
  return status;
}
