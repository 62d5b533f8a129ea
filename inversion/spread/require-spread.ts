import { InversionError } from '../inversion-error';
import type { Spread } from '../types';
import { checkSpread } from './check-spread';

/** Throws the fault of a spread that cannot be used; `path` says where it stands. */
export function requireSpread(spread: Spread, path: readonly (string | number)[] = []): void {
  const fault = checkSpread(spread);
  if (fault) throw new InversionError(fault.code, fault.message, [...path, fault.field]);
}
