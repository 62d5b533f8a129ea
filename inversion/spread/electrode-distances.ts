import type { Spread } from '../types';

/** The four distances of a spread, m; null = at infinity. */
export interface ElectrodeDistances {
  readonly am: number | null;
  readonly an: number | null;
  readonly bm: number | null;
  readonly bn: number | null;
}

/**
 * AM, AN, BM, BN of a spread in m. `null` when `halfMN` was not recorded: then M and N coincide in the gradient limit.
 *
 * The axial dipole–dipole stands in the order B A M N (A beside M), so that its K is +π a n(n+1)(n+2);
 * a crew that kept the order A B M N reads V < 0 and K < 0 on the same ground.
 */
export function electrodeDistances(spread: Spread): ElectrodeDistances | null {
  switch (spread.type) {
    case 'schlumberger': {
      if (spread.halfMN === null) return null;
      const near = spread.halfAB - spread.halfMN;
      const far = spread.halfAB + spread.halfMN;
      return { am: near, an: far, bm: far, bn: near };
    }
    case 'half-schlumberger':
      if (spread.halfMN === null) return null;
      return { am: spread.halfAB - spread.halfMN, an: spread.halfAB + spread.halfMN, bm: null, bn: null };
    case 'wenner':
      return { am: spread.spacing, an: 2 * spread.spacing, bm: 2 * spread.spacing, bn: spread.spacing };
    case 'pole-pole':
      return { am: spread.spacing, an: null, bm: null, bn: null };
    case 'dipole-dipole': {
      const { dipole, n } = spread;
      return { am: n * dipole, an: (n + 1) * dipole, bm: (n + 1) * dipole, bn: (n + 2) * dipole };
    }
    case 'electrodes':
      return { am: spread.am, an: spread.an, bm: spread.bm, bn: spread.bn };
  }
}

/** 1/near − 1/far in 1/m without cancellation; a null distance adds nothing. */
function inverseDifference(near: number | null, far: number | null): number {
  if (near === null) return far === null ? 0 : -1 / far;
  if (far === null) return 1 / near;
  return (far - near) / (near * far);
}

/** 1/AM − 1/AN − 1/BM + 1/BN in 1/m. */
export function inverseDistanceBracket(d: ElectrodeDistances): number {
  return inverseDifference(d.am, d.an) - inverseDifference(d.bm, d.bn);
}
