import { ApiError } from './api-error';

const MAX_RETRIES = 2;

/** A refusal stays a refusal; only a lost connection or a server at fault is worth asking again. */
export function shouldRetry(failures: number, error: unknown): boolean {
  if (failures >= MAX_RETRIES) return false;
  if (!(error instanceof ApiError)) return false;
  return error.status === 0 || error.status >= 500;
}
