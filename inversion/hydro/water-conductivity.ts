import type { DerivedQuantity } from './derived-quantity';
import { requireValue } from './require-value';

/** Ω·m of a water of 1 µS/cm. */
const OHM_M_AT_ONE_US_CM = 10_000;
/** share of EC₂₅ by which conductivity rises with each °C */
const PER_DEGREE = 0.02;
const REFERENCE_C = 25;
/** mg/L for each µS/cm at 25 °C, lowest and highest in use (Hem 1985; from memory) */
const TDS_FACTORS = [0.55, 0.75] as const;

function warming(temperatureC: number): number {
  requireValue(temperatureC, 'temperatureC', '°C', -5, 60);
  return 1 + PER_DEGREE * (temperatureC - REFERENCE_C);
}

/** ρ_w = 10 000/EC: resistivity in Ω·m of a water of `ecUsCm` µS/cm, at the temperature at which EC holds. */
export function waterResistivity(ecUsCm: number): number {
  requireValue(ecUsCm, 'ecUsCm', 'µS/cm');
  return OHM_M_AT_ONE_US_CM / ecUsCm;
}

/** EC = 10 000/ρ_w in µS/cm, the inverse of `waterResistivity`. */
export function waterConductivity(waterOhmM: number): number {
  requireValue(waterOhmM, 'waterOhmM', 'Ω·m');
  return OHM_M_AT_ONE_US_CM / waterOhmM;
}

/**
 * EC₂₅ = EC_T/(1 + 0.02(T − 25)) in µS/cm from EC measured at T °C: for comparing waters and for TDS.
 * The straight line serves ordinary groundwater from about 0 to 40 °C, within some 4 %; −5 < T ≤ 60 is taken.
 */
export function conductivityAt25(ecUsCm: number, temperatureC: number): number {
  requireValue(ecUsCm, 'ecUsCm', 'µS/cm');
  return ecUsCm / warming(temperatureC);
}

/** EC_T = EC₂₅(1 + 0.02(T − 25)) in µS/cm: what Archie's law needs is the water at the aquifer's own temperature. */
export function conductivityAt(ec25UsCm: number, temperatureC: number): number {
  requireValue(ec25UsCm, 'ec25UsCm', 'µS/cm');
  return ec25UsCm * warming(temperatureC);
}

/** Dissolved solids in mg/L, 0.55 to 0.75 × EC₂₅ in µS/cm: the factor hangs on the ions, so it is a range. */
export function dissolvedSolids(ec25UsCm: number): { low: number; high: number } {
  requireValue(ec25UsCm, 'ec25UsCm', 'µS/cm');
  return { low: TDS_FACTORS[0] * ec25UsCm, high: TDS_FACTORS[1] * ec25UsCm };
}

/** ρ_w at the aquifer's temperature from EC₂₅, ready for `deriveWithRange` over values of EC₂₅. */
export function aquiferWaterResistivity(temperatureC: number): DerivedQuantity<number> {
  return {
    unit: 'Ω·m',
    formula: 'ρ_w = 10 000/(EC₂₅(1 + 0.02(T − 25)))',
    source: 'unit conversion; 2 % a degree (Hem 1985)',
    of: (ec25UsCm) => waterResistivity(conductivityAt(ec25UsCm, temperatureC)),
  };
}
