import type { z } from 'zod';
import { allowedWords } from '../../server/contract/plain-issue';

type RawIssue = z.core.$ZodRawIssue;

/** What a person can do about an issue of a form; a message that the contract states itself goes before it. */
export function plainIssue(issue: RawIssue): string {
  const allowed = allowedWords(issue);
  switch (issue.code) {
    case 'invalid_type':
      return isEmpty(issue.input) ? 'Must not be empty' : `Must be ${allowed ?? 'of another kind'}`;
    case 'too_small':
      return issue.origin === 'string' && Number(issue.minimum) <= 1 ? 'Must not be empty' : mustWords(issue);
    case 'too_big':
      return mustWords(issue);
    case 'invalid_format':
      return allowed === undefined ? 'Is not written as asked for' : `Write ${allowed}`;
    case 'invalid_value':
      return isEmpty(issue.input) ? 'Choose one' : `Choose one of: ${allowed}`;
    default:
      return 'Is not allowed';
  }
}

const isEmpty = (input: unknown): boolean =>
  input === undefined || input === null || input === '' || Number.isNaN(input);

function mustWords(issue: Extract<RawIssue, { code: 'too_small' | 'too_big' }>): string {
  const verb = issue.origin === 'string' || issue.origin === 'array' ? 'have' : 'be';
  return `Must ${verb} ${allowedWords(issue)}`;
}
