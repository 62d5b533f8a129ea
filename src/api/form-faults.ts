import type { FormFault } from '../ui/form-errors';
import { ApiError, messageOf } from './api-error';

const AREAS = new Set(['body', 'query', 'path']);

/** A refused request as the faults a form shows: each with its field, or the one sentence. */
export function formFaults(error: unknown, labels: Readonly<Record<string, string>> = {}): FormFault[] {
  if (error === null || error === undefined) return [];
  if (!(error instanceof ApiError) || error.faults.length === 0) return [{ message: messageOf(error) }];
  return error.faults.map((fault) => {
    const path = fault.path.filter((part, i) => i > 0 || !AREAS.has(String(part)));
    const field = path
      .map((part) => (typeof part === 'number' ? String(part + 1) : (labels[part] ?? part)))
      .join(' ');
    const message =
      fault.allowed === undefined
        ? fault.message
        : `${fault.message.replace(/\.$/, '')}. Allowed: ${fault.allowed}.`;
    return field === '' ? { message } : { field, message };
  });
}
