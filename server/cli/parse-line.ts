import type { z } from 'zod';
import type { Fault } from '../contract/common';
import { shown } from '../contract/plain-issue';
import { faultsOfZod, IN_PLAIN_WORDS } from '../plain-faults';
import { LineRefusal } from './line-refusal';

function spell(path: Fault['path']): string {
  const text = path.map((key) => (typeof key === 'number' ? `[${key}]` : `.${key}`)).join('');
  return text === '' ? 'the line' : text.replace(/^\./, '');
}

/** The value at a path, or undefined where the line does not reach. */
function valueAt(line: unknown, path: Fault['path']): unknown {
  return path.reduce<unknown>(
    (value, key) => (typeof value === 'object' && value !== null ? Reflect.get(value, key) : undefined),
    line,
  );
}

function sentence({ path, message, found, allowed }: Fault, line: unknown): string {
  const value = valueAt(line, path);
  // a line holds no secret, so what a rule of the schema's own refused is shown as well
  const told = found ?? shown(value);
  const parts = [`${spell(path)} ${message}`];
  // quotes tell a text from a number
  if (value !== undefined) parts.push(`found ${told === value ? JSON.stringify(told) : told}`);
  if (allowed !== undefined && !message.includes(allowed)) parts.push(`allowed: ${allowed}`);
  return parts.join('; ');
}

/** The parsed line, or a `LineRefusal` that names the first fault: where, what was found, what is allowed. */
export function parseLine<T extends z.ZodType>(schema: T, line: unknown): z.infer<T> {
  const parsed = schema.safeParse(line, IN_PLAIN_WORDS);
  if (parsed.success) return parsed.data;
  const fault = faultsOfZod(parsed.error)[0]!;
  throw new LineRefusal('invalid-line', sentence(fault, line), fault.path);
}
