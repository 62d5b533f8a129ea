import type { Fault } from './contract/common';

/** The only place where an HTTP status is written for a failure. */
export const ERROR_STATUS = {
  'bad-request': 400,
  invalid: 422,
  unauthenticated: 401,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  'already-exists': 409,
  'wrong-state': 409,
  'version-required': 428,
  'too-large': 413,
  'unsupported-media': 415,
  'rate-limited': 429,
  unavailable: 503,
  internal: 500,
} as const;
export type ErrorCode = keyof typeof ERROR_STATUS;

export const ERROR_TITLE: Record<ErrorCode, string> = {
  'bad-request': 'The request is malformed',
  invalid: 'Some values are not allowed',
  unauthenticated: 'Not signed in',
  forbidden: 'Not allowed',
  'not-found': 'Not found',
  conflict: 'Changed by someone else',
  'already-exists': 'Already there',
  'wrong-state': 'Not possible in this state',
  'version-required': 'The version is missing',
  'too-large': 'Too large',
  'unsupported-media': 'Kind of content not accepted',
  'rate-limited': 'Too many attempts',
  unavailable: 'Not available just now',
  internal: 'Something went wrong here',
};

export interface AppErrorDetails {
  faults?: Fault[];
  current?: unknown;
  retryAfterS?: number;
}

/** A failure that the caller is told about. `message` is a sentence for people. */
export class AppError extends Error {
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly details: AppErrorDetails = {},
  ) {
    super(message);
    this.name = 'AppError';
  }
}

export const notFound = (what: string): AppError => new AppError('not-found', `${what} was not found.`);

/** A write that named an older version; `current` is the row as it now stands. */
export const changedMeanwhile = (what: string, current: unknown): AppError =>
  new AppError('conflict', `Someone else changed ${what} meanwhile.`, { current });

const CONSTRAINT_MESSAGES: Record<string, string> = {
  app_user_email_unique: 'An account with this e-mail address is there already.',
  sounding_name_unique: 'A sounding of this name is in the survey already.',
  line_name_unique: 'A line of this name is in the survey already.',
  borehole_name_unique: 'A borehole of this name is in the survey already.',
  sounding_line_fk: 'This line is not in the survey.',
  interpretation_one_accepted: 'Another interpretation of this sounding was accepted meanwhile.',
  data_revision_number_unique: 'Someone else saved readings at the same moment. Save again.',
  run_number_unique: 'Someone else asked for a run at the same moment. Ask again.',
};

const SQLSTATE_CODES: Record<string, ErrorCode> = {
  '23505': 'already-exists',
  '23503': 'invalid',
  '23514': 'invalid',
  '22021': 'invalid',
  '22P05': 'invalid',
  '40001': 'conflict',
  '40P01': 'conflict',
  '53300': 'unavailable',
  '57P01': 'unavailable',
  '57P02': 'unavailable',
  '57P03': 'unavailable',
  '08006': 'unavailable',
  '08001': 'unavailable',
  ECONNREFUSED: 'unavailable',
  ECONNRESET: 'unavailable',
  EPIPE: 'unavailable',
  ETIMEDOUT: 'unavailable',
  EHOSTUNREACH: 'unavailable',
};

// what PostgreSQL says to U+0000 in text and in JSON
const UNTYPABLE = new Set(['22021', '22P05']);

/** A PostgreSQL failure told by SQLSTATE and constraint name; null when it is not one we know how to tell. */
export function errorOfPostgres(error: unknown): AppError | null {
  if (!(error instanceof Error) || !('code' in error))
    return isLostConnection(error) ? lostConnection() : null;
  const code = SQLSTATE_CODES[String(error.code)];
  if (!code) return isLostConnection(error) ? lostConnection() : null;
  if (code === 'unavailable') return lostConnection();
  if (UNTYPABLE.has(String(error.code)))
    return new AppError('invalid', 'Text must not hold the character NUL (U+0000).');
  const constraint = 'constraint' in error ? String(error.constraint) : '';
  const message = CONSTRAINT_MESSAGES[constraint];
  if (code === 'invalid' && !message) return null;
  return new AppError(code, message ?? 'This clashes with what is stored already.');
}

const lostConnection = (): AppError =>
  new AppError(
    'unavailable',
    'The database cannot be reached just now. Nothing was lost; try again in a moment.',
  );

const isLostConnection = (error: unknown): boolean =>
  error instanceof Error &&
  /Connection terminated|timeout acquiring a connection|Timeout acquiring/i.test(error.message);
