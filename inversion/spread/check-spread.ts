import { LARGEST_DISTANCE_RATIO, magnitudeFault } from '../magnitudes';
import { TOLERANCES } from '../tolerances';
import type { Spread } from '../types';
import { electrodeDistances, inverseDistanceBracket, type ElectrodeDistances } from './electrode-distances';

/** Why a spread cannot be used, with the field at fault. */
export interface SpreadFault {
  readonly code: 'spread-length' | 'spread-halfmn' | 'spread-cancels';
  readonly field: string;
  readonly message: string;
}

const LENGTH_FIELDS: Record<Spread['type'], readonly string[]> = {
  schlumberger: ['halfAB', 'halfMN'],
  'half-schlumberger': ['halfAB', 'halfMN'],
  wenner: ['spacing'],
  'pole-pole': ['spacing'],
  'dipole-dipole': ['dipole', 'n'],
  electrodes: ['am', 'an', 'bm', 'bn'],
};
const MAY_BE_NULL = new Set(['halfMN', 'am', 'an', 'bm', 'bn']);

function lengthFault(spread: Spread): SpreadFault | null {
  const values: ReadonlyMap<string, unknown> = new Map(Object.entries(spread));
  for (const field of LENGTH_FIELDS[spread.type]) {
    const value = values.get(field);
    if (value === null && MAY_BE_NULL.has(field)) continue;
    const fault = magnitudeFault(value, field === 'n' ? 'separation' : 'length');
    if (!fault) continue;
    return {
      code: 'spread-length',
      field,
      message: `${field} is ${String(value)}; ${fault}${MAY_BE_NULL.has(field) ? ' or null' : ''}`,
    };
  }
  return null;
}

function cancels(d: ElectrodeDistances): boolean {
  const scale = [d.am, d.an, d.bm, d.bn].reduce<number>((sum, r) => (r === null ? sum : sum + 1 / r), 0);
  return Math.abs(inverseDistanceBracket(d)) <= TOLERANCES.bracketCancellation * scale;
}

function tooFarApart(d: ElectrodeDistances): boolean {
  const finite = [d.am, d.an, d.bm, d.bn].filter((r) => r !== null);
  return Math.max(...finite) > LARGEST_DISTANCE_RATIO * Math.min(...finite);
}

/** null when the spread can be used; otherwise the first fault, with what was found and what is allowed. */
export function checkSpread(spread: Spread): SpreadFault | null {
  const fault = lengthFault(spread);
  if (fault) return fault;
  if ('halfMN' in spread && spread.halfMN !== null && spread.halfMN >= spread.halfAB) {
    return {
      code: 'spread-halfmn',
      field: 'halfMN',
      message: `halfMN is ${spread.halfMN} m; it must be below halfAB (${spread.halfAB} m)`,
    };
  }
  const distances = electrodeDistances(spread);
  if (distances && cancels(distances)) {
    return {
      code: 'spread-cancels',
      field: spread.type === 'electrodes' ? 'am' : 'halfMN',
      message:
        '1/AM − 1/AN − 1/BM + 1/BN cancels, so these electrodes measure no voltage on uniform ground and K is unbounded; check the four distances',
    };
  }
  if (distances && tooFarApart(distances)) {
    return {
      code: 'spread-length',
      field: spread.type === 'electrodes' ? 'am' : LENGTH_FIELDS[spread.type].at(-1)!,
      message: `the longest distance between these electrodes is more than ${LARGEST_DISTANCE_RATIO} times the shortest; check them`,
    };
  }
  return null;
}
