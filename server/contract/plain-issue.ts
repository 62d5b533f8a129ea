import type { z } from 'zod';
import { asGiven } from '../../inversion/three-digits';

/** What zod tells of one issue, before or after it has its message. */
type Told = z.core.$ZodRawIssue | z.core.$ZodIssue;
type Limit = Extract<Told, { code: 'too_small' | 'too_big' }>;

const KIND_WORDS: Record<string, string> = {
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  tuple: 'a list',
  object: 'an object with named fields',
  null: 'nothing',
};

const FORMAT_WORDS: Record<string, string> = {
  email: 'an e-mail address, such as name@example.org',
  date: 'a date as year, month and day, such as 2024-03-09',
  datetime: 'a moment in UTC, such as 2024-03-09T14:30:00Z',
  uuid: 'an id as the server gives it',
};

const counted = (count: string, one: string, many: string): string =>
  `${count} ${count === '1' ? one : many}`;

/** A length, a number of entries, or the value itself, with its unit. */
function amount({ origin }: Limit, value: unknown): string {
  const number = typeof value === 'number' ? asGiven(value) : String(value);
  if (origin === 'string') return counted(number, 'character', 'characters');
  if (origin === 'array') return counted(number, 'entry', 'entries');
  return number;
}

/** What would be allowed in the place of what an issue is about; follows “must be” or “must have”. */
export function allowedWords(issue: Told): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      return KIND_WORDS[issue.expected];
    case 'too_small':
      return `${(issue.inclusive ?? true) ? 'at least' : 'above'} ${amount(issue, issue.minimum)}`;
    case 'too_big':
      return `${(issue.inclusive ?? true) ? 'at most' : 'below'} ${amount(issue, issue.maximum)}`;
    case 'invalid_value':
      return issue.values.map(String).join(', ');
    case 'invalid_format':
      return FORMAT_WORDS[issue.format];
    case 'invalid_union':
      return unionWords(issue);
    default:
      return undefined;
  }
}

/** The choices of a union: values of the field that tells its branches apart, else what each branch would take. */
function unionWords(issue: Extract<Told, { code: 'invalid_union' }>): string | undefined {
  if (issue.errors.length === 0)
    return 'options' in issue && Array.isArray(issue.options)
      ? issue.options.map(String).join(', ')
      : undefined;
  const branches = issue.errors.flatMap(([first]) => (first ? (allowedWords(first) ?? []) : []));
  return branches.length > 0 ? branches.join(' or ') : undefined;
}

/** What is wrong, as a fragment that follows the name of the field; goes to zod as its map of errors. */
export function plainIssue(issue: Told): string {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.input === undefined) return 'is missing';
      return `is not ${KIND_WORDS[issue.expected] ?? 'of the kind asked for'}`;
    case 'too_small':
      return limitWords(
        issue,
        Number(issue.minimum) <= 1 ? 'is empty' : 'is too short',
        'too few',
        'too small',
      );
    case 'too_big':
      return limitWords(issue, 'is too long', 'too many', 'too large');
    case 'invalid_value':
    case 'invalid_union':
      return issue.input === undefined ? 'is missing' : 'is none of what can be chosen';
    case 'invalid_format':
      return `is not ${FORMAT_WORDS[issue.format]?.split(/,| as /)[0] ?? 'written as asked for'}`;
    case 'unrecognized_keys':
      return 'is no known field';
    default:
      return 'is not allowed';
  }
}

function limitWords({ origin }: Limit, text: string, entries: string, number: string): string {
  if (origin === 'string') return text;
  return origin === 'array' ? `has ${entries} entries` : `is ${number}`;
}

const SHOWN_CHARACTERS = 60;

const isOfNumbers = (list: unknown[]): list is number[] =>
  list.length > 0 && list.every((entry) => typeof entry === 'number');

function textOf(value: unknown): string {
  if (value === null) return 'nothing';
  if (typeof value === 'string') return value;
  if (Array.isArray(value)) return isOfNumbers(value) ? `[${value.join(', ')}]` : 'a list';
  return typeof value === 'object' ? 'an object' : String(value as number | boolean);
}

/** A value, short; of lists only those of numbers are told entry by entry. */
export function shown(value: unknown): string {
  const text = textOf(value);
  return text.length > SHOWN_CHARACTERS ? `${text.slice(0, SHOWN_CHARACTERS - 1)}…` : text;
}

/** What stood there, short. Of a text that is refused for its length only the length, so that no password is repeated. */
export function foundWords(issue: Told): string | undefined {
  const { input } = issue;
  if (input === undefined || issue.code === 'custom' || issue.code === 'unrecognized_keys') return undefined;
  if (issue.code === 'too_small' || issue.code === 'too_big')
    return typeof input === 'string' || Array.isArray(input) ? amount(issue, input.length) : shown(input);
  if (issue.code === 'invalid_type' && issue.expected === 'string' && input !== null)
    return KIND_WORDS[typeof input];
  return shown(issue.code === 'invalid_union' ? discriminating(issue) : input);
}

/** The value that chooses among the branches of a union, where a field does. */
function discriminating({ input, discriminator }: Extract<Told, { code: 'invalid_union' }>): unknown {
  return typeof discriminator === 'string' && typeof input === 'object' && input !== null
    ? (Reflect.get(input, discriminator) ?? null)
    : input;
}
