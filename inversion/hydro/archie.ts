import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import { amount } from '../three-digits';
import type { DerivedQuantity } from './derived-quantity';
import { requireValue } from './require-value';

/** Archie's factor a and cementation exponent m of a clean, saturated rock. */
export interface ArchieParameters {
  readonly a: number;
  readonly m: number;
}

/** Parameter sets in use, as starting points; a survey's own cores come first. All from memory. */
export const ARCHIE_SETS = {
  archie: { a: 1, m: 2, source: 'Archie 1942, consolidated sandstone' },
  unconsolidated: { a: 1, m: 1.3, source: 'Archie 1942, loose sand' },
  humble: { a: 0.62, m: 2.15, source: 'Winsauer et al. 1952, the Humble formula (a = 0.65 is also printed)' },
} as const satisfies Record<string, ArchieParameters & { source: string }>;

const SOURCE = 'Archie 1942, Transactions AIME 146, 54–62';
/** Usual ranges of a and m (SEG wiki). */
const USUAL_A = [0.6, 1.5] as const;
const USUAL_M = [1.3, 3] as const;

function requireParameters({ a, m }: ArchieParameters): void {
  requireValue(a, 'a', '');
  requireValue(m, 'm', '');
}

/** F = a·φ^−m for a porosity 0 < φ ≤ 1. */
export function formationFactor(porosity: number, parameters: ArchieParameters): number {
  requireParameters(parameters);
  requireValue(porosity, 'porosity', '', 0, 1);
  return parameters.a * exp(-parameters.m * log(porosity));
}

/** φ = (a/F)^(1/m); null where F < a, which no porosity explains. */
export function porosityOf(factor: number, parameters: ArchieParameters): number | null {
  requireParameters(parameters);
  requireValue(factor, 'formationFactor', '');
  const porosity = exp(log(parameters.a / factor) / parameters.m);
  return porosity > 1 ? null : porosity;
}

/** F = ρ_bulk/ρ_w, ready for `deriveWithRange` over bulk resistivities in Ω·m. `waterOhmM` at the aquifer's temperature. */
export function bulkFormationFactor(waterOhmM: number): DerivedQuantity<number> {
  requireValue(waterOhmM, 'waterOhmM', 'Ω·m');
  return {
    unit: '',
    formula: 'F = ρ_bulk/ρ_w',
    source: SOURCE,
    of: (bulkOhmM) => {
      requireValue(bulkOhmM, 'bulkOhmM', 'Ω·m');
      return bulkOhmM / waterOhmM;
    },
  };
}

/** φ = (a·ρ_w/ρ_bulk)^(1/m) over bulk resistivities in Ω·m; null where it would exceed 1. */
export function archiePorosity(waterOhmM: number, parameters: ArchieParameters): DerivedQuantity<number> {
  const factor = bulkFormationFactor(waterOhmM);
  requireParameters(parameters);
  return {
    unit: '',
    formula: 'φ = (a·ρ_w/ρ_bulk)^(1/m)',
    source: SOURCE,
    of: (bulkOhmM) => porosityOf(factor.of(bulkOhmM)!, parameters),
  };
}

/** ρ_w = ρ_bulk/(a·φ^−m) in Ω·m over bulk resistivities in Ω·m: the water at the aquifer's own temperature. */
export function archieWater(porosity: number, parameters: ArchieParameters): DerivedQuantity<number> {
  const factor = formationFactor(porosity, parameters);
  return {
    unit: 'Ω·m',
    formula: 'ρ_w = ρ_bulk/(a·φ^−m)',
    source: SOURCE,
    of: (bulkOhmM) => {
      requireValue(bulkOhmM, 'bulkOhmM', 'Ω·m');
      return bulkOhmM / factor;
    },
  };
}

/** ρ_bulk = ρ_w·a·φ^−m in Ω·m over water resistivities in Ω·m. */
export function archieBulk(porosity: number, parameters: ArchieParameters): DerivedQuantity<number> {
  const factor = formationFactor(porosity, parameters);
  return {
    unit: 'Ω·m',
    formula: 'ρ_bulk = ρ_w·a·φ^−m',
    source: SOURCE,
    of: (waterOhmM) => {
      requireValue(waterOhmM, 'waterOhmM', 'Ω·m');
      return waterOhmM * factor;
    },
  };
}

const outside = (value: number, [low, high]: readonly [number, number]) => value < low || value > high;

/** What stands beside every number from Archie's law; clay first, since it is the usual reason why the law fails. */
export function archieCautions(
  parameters: ArchieParameters,
  bulkOhmM: number | null,
  waterOhmM: number | null,
): string[] {
  requireParameters(parameters);
  const { a, m } = parameters;
  const cautions = [
    'Archie’s law holds for clean rock filled with water. Clay conducts by itself: with clay the porosity comes out too high, and the water too conductive.',
  ];
  if (bulkOhmM !== null && waterOhmM !== null && bulkOhmM < a * waterOhmM)
    cautions.push(
      `The ground (${amount(bulkOhmM, 'Ω·m')}) is more conductive than its water alone allows (a·ρ_w = ${amount(a * waterOhmM, 'Ω·m')}): it holds clay or another conductor, or another water.`,
    );
  if (outside(a, USUAL_A))
    cautions.push(`a = ${a} lies outside of the usual ${USUAL_A[0]} to ${USUAL_A[1]}.`);
  if (outside(m, USUAL_M))
    cautions.push(`m = ${m} lies outside of the usual ${USUAL_M[0]} to ${USUAL_M[1]}.`);
  return cautions;
}
