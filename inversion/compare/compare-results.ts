/** One place where two results of the same request do not agree to the last bit. */
export interface ResultDifference {
  /** keys joined by dots, e.g. `earth.resistivity.0` */
  path: string;
  before: unknown;
  after: unknown;
}

export interface ResultComparison {
  verdict: 'identical' | 'differs';
  differences: ResultDifference[];
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function collect(before: unknown, after: unknown, path: string, found: ResultDifference[]): void {
  if (Object.is(before, after)) return;
  if (!isRecord(before) || !isRecord(after) || Array.isArray(before) !== Array.isArray(after)) {
    found.push({ path, before, after });
    return;
  }
  const keys = new Set([...Object.keys(before), ...Object.keys(after)]);
  for (const key of keys) collect(before[key], after[key], path === '' ? key : `${path}.${key}`, found);
}

/**
 * Exact comparison of two results of the same request: every number to the last bit, every text and status.
 * A missing entry counts as undefined. The order of object keys does not matter; the order of lists does.
 */
export function compareResults(before: object, after: object): ResultComparison {
  const differences: ResultDifference[] = [];
  collect(before, after, '', differences);
  return { verdict: differences.length === 0 ? 'identical' : 'differs', differences };
}
