import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { RunInput } from '../contract/runs';

/** SHA-256 (hex) of the canonical JSON (RFC 8785) of the engine's version, the readings and the settings with their seed. */
export function computationKey(engine: string, input: RunInput): string {
  const canonical = canonicalize({ engine, readings: input.readings, settings: input.settings });
  return createHash('sha256')
    .update(canonical ?? '')
    .digest('hex');
}
