import type { z } from 'zod';
import type { Fault } from '../../server/contract/common';

export interface ApiErrorDetails {
  /** HTTP status; 0 when no answer came. */
  status: number;
  faults?: readonly Fault[] | undefined;
  /** With "conflict": the row as it now stands. */
  current?: unknown;
  retryAfterS?: number | undefined;
}

/** A request that was refused, or that got no answer. `message` is a sentence for people. */
export class ApiError extends Error {
  readonly status: number;
  readonly faults: readonly Fault[];
  readonly current: unknown;
  readonly retryAfterS: number | undefined;

  constructor(
    readonly code: string,
    detail: string,
    details: ApiErrorDetails,
  ) {
    super(detail);
    this.name = 'ApiError';
    this.status = details.status;
    this.faults = details.faults ?? [];
    this.current = details.current;
    this.retryAfterS = details.retryAfterS;
  }
}

export const hasCode = (error: unknown, code: string): error is ApiError =>
  error instanceof ApiError && error.code === code;

/** The row as someone else left it, when `error` is a conflict that carries one; null otherwise. */
export function currentOf<S extends z.ZodType>(error: unknown, schema: S): z.output<S> | null {
  if (!hasCode(error, 'conflict')) return null;
  const parsed = schema.safeParse(error.current);
  return parsed.success ? parsed.data : null;
}

/** Any thrown thing as a sentence. */
export const messageOf = (error: unknown): string =>
  error instanceof Error ? error.message : 'Something unexpected happened.';
