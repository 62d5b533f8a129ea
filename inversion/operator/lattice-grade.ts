/** How finely and how far a lattice of wavenumbers λ_g = 2^(g/perOctave) in 1/m covers a spread. */
export interface LatticeGrade {
  readonly name: string;
  /** nodes to a factor of two */
  readonly perOctave: number;
  /** highest node, counted from 1/nearest */
  readonly highest: number;
  /** lowest node, counted from 1/farthest, for responses that fall like 1/c³ and for those that fall like 1/c */
  readonly lowestNeutral: number;
  readonly lowestCharged: number;
  /** design depths reach 10^this × the spread, for the two kinds */
  readonly deepestNeutral: number;
  readonly deepestCharged: number;
  readonly depthsPerDecade: number;
  /** Tikhonov row of the design, in units of the image response */
  readonly ridge: number;
}

/**
 * For every number that is shown; residual of the design 1e-13. Nodes reach from 3e-5 (neutral) or 1e-8 (charged) of 1/farthest to
 * 97/nearest, 16.6 a decade. Design depths go beyond the slowest exponential, so that the uncounted images of a nearly
 * insulating base (10⁹ of them at a contrast of 10⁹) add nothing. The ridge lifts the design off the rounding floor.
 */
export const EXACT_LATTICE: LatticeGrade = {
  name: 'exact',
  perOctave: 5,
  highest: 33,
  lowestNeutral: -75,
  lowestCharged: -133,
  deepestNeutral: 6,
  deepestCharged: 8.5,
  depthsPerDecade: 25,
  ridge: 1e-14,
};

/**
 * For the search alone, at a quarter of the nodes: residual of the design below 2e-5, far below the errors of readings.
 */
export const QUICK_LATTICE: LatticeGrade = {
  name: 'quick',
  perOctave: 2,
  highest: 10,
  lowestNeutral: -10,
  lowestCharged: -34,
  deepestNeutral: 4,
  deepestCharged: 6,
  depthsPerDecade: 12,
  ridge: 1e-9,
};
