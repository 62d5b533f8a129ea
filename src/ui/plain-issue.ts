import type { z } from 'zod';

type RawIssue = z.core.$ZodRawIssue;

/** What a person can do about an issue of a form; a message that the contract states itself goes before it. */
export function plainIssue(issue: RawIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return isEmpty(issue.input) ? 'Must not be empty' : 'Is not of the kind asked for';
    case 'too_small':
      return tooSmall(issue);
    case 'too_big':
      return tooBig(issue);
    case 'invalid_format':
      return FORMAT_WORDS[issue.format] ?? 'Is not written as asked for';
    case 'invalid_value':
      return isEmpty(issue.input) ? 'Choose one' : `Choose one of: ${issue.values.map(String).join(', ')}`;
    default:
      return 'Is not allowed';
  }
}

const FORMAT_WORDS: Record<string, string> = {
  email: 'Write an e-mail address, such as name@example.org',
  date: 'Write a date as year, month and day, such as 2024-03-09',
};

const isEmpty = (input: unknown): boolean =>
  input === undefined || input === null || input === '' || Number.isNaN(input);

function tooSmall(issue: Extract<RawIssue, { code: 'too_small' }>): string {
  const { minimum, inclusive = true } = issue;
  if (issue.origin === 'string')
    return Number(minimum) <= 1 ? 'Must not be empty' : `Must have at least ${minimum} characters`;
  if (issue.origin === 'array') return `Must have at least ${minimum} entries`;
  return `Must be ${inclusive ? 'at least' : 'above'} ${minimum}`;
}

function tooBig(issue: Extract<RawIssue, { code: 'too_big' }>): string {
  const { maximum, inclusive = true } = issue;
  if (issue.origin === 'string') return `Must have at most ${maximum} characters`;
  if (issue.origin === 'array') return `Must have at most ${maximum} entries`;
  return `Must be ${inclusive ? 'at most' : 'below'} ${maximum}`;
}
