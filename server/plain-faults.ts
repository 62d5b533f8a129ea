import type { z } from 'zod';
import type { Fault } from './contract/common';
import { allowedWords, foundWords, plainIssue } from './contract/plain-issue';

/** How a schema is asked, so that its failure can be told by `faultsOfZod`. What a schema says itself goes before. */
export const IN_PLAIN_WORDS = { error: plainIssue, reportInput: true } as const;

/** All issues of a zod failure with their full path, what was found, and what is allowed; each unknown field is its own. */
export function faultsOfZod(error: z.ZodError, ...prefix: string[]): Fault[] {
  return error.issues.flatMap((issue) => {
    const found = foundWords(issue);
    // a message of the schema’s own says what is allowed
    const allowed = issue.message === plainIssue(issue) ? allowedWords(issue) : undefined;
    const places = issue.code === 'unrecognized_keys' ? issue.keys.map((key) => [key]) : [[]];
    return places.map((place) => ({
      path: [
        ...prefix,
        ...issue.path.map((part) => (typeof part === 'symbol' ? String(part) : part)),
        ...place,
      ],
      message: issue.message,
      ...(found !== undefined && { found }),
      ...(allowed !== undefined && { allowed }),
    }));
  });
}
