import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { Reading } from '../contract/readings';

/** SHA-256 of the canonical JSON (RFC 8785) of the readings, in order: equal content is the same revision. */
export function contentHash(readings: readonly Reading[]): string {
  const text = canonicalize(readings);
  if (text === undefined) throw new Error('readings have no canonical form');
  return createHash('sha256').update(text).digest('hex');
}
