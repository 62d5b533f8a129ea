import type { Spread } from '../types';
import { electrodeDistances, inverseDistanceBracket } from './electrode-distances';
import { requireSpread } from './require-spread';

/**
 * Signed geometric factor K in m, ρa = K·V/I.
 *
 * K = 2π / (1/AM − 1/BM − 1/AN + 1/BN); a term at infinity is dropped. Finite MN is always exact, never the
 * ideal-gradient shortcut πL²/MN. null when `halfMN` was not recorded. Throws `InversionError` for a refused spread.
 * Source: Singha et al. 2022, Electrical Imaging for Hydrogeology, eq. 6a.
 */
export function geometricFactor(spread: Spread): number | null {
  requireSpread(spread);
  switch (spread.type) {
    case 'schlumberger':
    case 'half-schlumberger': {
      const { halfAB: l, halfMN: b } = spread;
      if (b === null) return null;
      const k = (Math.PI * (l - b) * (l + b)) / (2 * b);
      return spread.type === 'schlumberger' ? k : 2 * k;
    }
    case 'wenner':
    case 'pole-pole':
      return 2 * Math.PI * spread.spacing;
    case 'dipole-dipole':
      return Math.PI * spread.dipole * spread.n * (spread.n + 1) * (spread.n + 2);
    case 'electrodes': {
      const distances = electrodeDistances(spread);
      return distances && (2 * Math.PI) / inverseDistanceBracket(distances);
    }
  }
}
