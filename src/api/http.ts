import type { z } from 'zod';
import { problemSchema } from '../../server/contract/common';
import { ApiError } from './api-error';

export const API_ROOT = '/api/v1';

export type SendMethod = 'POST' | 'PUT' | 'PATCH' | 'DELETE';

export interface SendOptions {
  /** Version of the row that was edited; sent as If-Match. */
  version?: number;
  signal?: AbortSignal;
}

/** GET; the answer is parsed by `schema`. */
export async function getJson<S extends z.ZodType>(
  path: string,
  schema: S,
  options: { signal?: AbortSignal } = {},
): Promise<z.output<S>> {
  const response = await ask(path, { method: 'GET', signal: options.signal ?? null });
  return read(response, schema);
}

/** POST, PUT, PATCH or DELETE with a JSON body; `schema` null where the answer has no content. */
export async function sendJson<S extends z.ZodType | null>(
  method: SendMethod,
  path: string,
  body: unknown,
  schema: S,
  options: SendOptions = {},
): Promise<S extends z.ZodType ? z.output<S> : null> {
  const { data } = await sendJsonWithStatus(method, path, body, schema, options);
  return data;
}

/** As `sendJson`, where the status tells something: 201 made anew, 200 there already. */
export async function sendJsonWithStatus<S extends z.ZodType | null>(
  method: SendMethod,
  path: string,
  body: unknown,
  schema: S,
  options: SendOptions = {},
): Promise<{ status: number; data: S extends z.ZodType ? z.output<S> : null }> {
  const headers: Record<string, string> = {};
  if (body !== undefined) headers['Content-Type'] = 'application/json';
  if (options.version !== undefined) headers['If-Match'] = `"${options.version}"`;
  const response = await ask(path, {
    method,
    headers,
    body: body === undefined ? null : JSON.stringify(body),
    signal: options.signal ?? null,
  });
  const data = schema === null ? null : await read(response, schema);
  return { status: response.status, data: data as S extends z.ZodType ? z.output<S> : null };
}

/** POST of a file with text fields; the status tells 201 made anew, 200 there already. */
export async function sendForm<S extends z.ZodType>(
  path: string,
  form: FormData,
  schema: S,
): Promise<{ status: number; data: z.output<S> }> {
  const response = await ask(path, { method: 'POST', body: form });
  return { status: response.status, data: await read(response, schema) };
}

/** `queryText({ page: 2, search: '' })` → "?page=2"; absent and empty values are left out. */
export function queryText(values: Record<string, string | number | undefined>): string {
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(values))
    if (value !== undefined && value !== '') search.set(key, String(value));
  const text = search.toString();
  return text === '' ? '' : `?${text}`;
}

async function ask(path: string, init: RequestInit): Promise<Response> {
  const headers = new Headers(init.headers);
  headers.set('Accept', 'application/json, application/problem+json');
  let response: Response;
  try {
    response = await fetch(`${API_ROOT}${path}`, { ...init, headers, credentials: 'same-origin' });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiError(
      'unreachable',
      'The server cannot be reached. What you wrote is still here; try again when the connection is back.',
      { status: 0 },
    );
  }
  if (!response.ok) throw await problemOf(response);
  return response;
}

async function read<S extends z.ZodType>(response: Response, schema: S): Promise<z.output<S>> {
  const body: unknown = await response.json().catch(() => undefined);
  const parsed = schema.safeParse(body);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new ApiError(
    'unexpected-answer',
    `The server’s answer was not understood (${issue?.path.join('.') || 'body'}: ${issue?.message ?? 'not JSON'}). Load the page again; a newer version may have been installed.`,
    { status: response.status },
  );
}

async function problemOf(response: Response): Promise<ApiError> {
  const body: unknown = await response.json().catch(() => undefined);
  const parsed = problemSchema.safeParse(body);
  const retryAfter = Number(response.headers.get('Retry-After') ?? Number.NaN);
  const retryAfterS = Number.isFinite(retryAfter) ? retryAfter : undefined;
  const status = response.status;
  if (!parsed.success)
    return new ApiError('no-answer', `The server did not answer as expected (status ${status}).`, {
      status,
      retryAfterS,
    });
  const { code, detail, faults, current } = parsed.data;
  return new ApiError(code, detail, { status, faults, current, retryAfterS });
}
