import type { z } from 'zod';
import { spreadTypeSchema } from '../contract/spread';
import { LineRefusal } from './line-refusal';

type Path = readonly PropertyKey[];

/** The value at a path, or undefined where the line does not reach. */
function valueAt(line: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, key) => (typeof value === 'object' && value !== null ? Reflect.get(value, key) : undefined),
    line,
  );
}

function show(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (typeof value === 'number') return String(value);
  const text = JSON.stringify(value);
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

/** What was found is told apart, so the words "Invalid input" and "received …" go. */
function plain(message: string): string {
  return message.replace(/^Invalid input: /, '').replace(/, received .*$/, '');
}

/** What an issue allows; a union's own words say nothing, so its branches are named. */
function allowed(issue: z.core.$ZodIssue): string {
  if (issue.code === 'unrecognized_keys') return 'no such field is known here';
  if (issue.code !== 'invalid_union') return plain(issue.message);
  if (issue.errors.length === 0) return `expected one of ${spreadTypeSchema.options.join(', ')}`;
  return issue.errors.map((branch) => plain(branch[0]?.message ?? '')).join(' or ');
}

/** Where the fault is: an unknown field itself, not what holds it. */
function placeOf(issue: z.core.$ZodIssue): Path {
  return issue.code === 'unrecognized_keys' ? [...issue.path, issue.keys[0]!] : issue.path;
}

function spell(path: Path): string {
  return path.reduce<string>(
    (text, key) =>
      typeof key === 'number' ? `${text}[${key}]` : text === '' ? String(key) : `${text}.${String(key)}`,
    '',
  );
}

/** The parsed line, or a `LineRefusal` that names the first fault: where, what is allowed, what was found. */
export function parseLine<T extends z.ZodType>(schema: T, line: unknown): z.infer<T> {
  const parsed = schema.safeParse(line);
  if (parsed.success) return parsed.data;
  const issue = parsed.error.issues[0]!;
  const path = placeOf(issue);
  const where = path.length === 0 ? 'the line' : spell(path);
  throw new LineRefusal(
    'invalid-line',
    `${where}: ${allowed(issue)}; found ${show(valueAt(line, path))}`,
    path.map((key) => (typeof key === 'symbol' ? String(key) : key)),
  );
}
