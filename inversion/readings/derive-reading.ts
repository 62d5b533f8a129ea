import { InversionError } from '../inversion-error';
import { checkSpread } from '../spread/check-spread';
import { geometricFactor } from '../spread/geometric-factor';
import { plottingSpacing } from '../spread/plotting-spacing';
import type { Spread } from '../types';
import type { DerivedFieldReading, FieldReading } from './field-reading';
import { hypot } from '../math/hypot';

/** Why no ρa follows from a reading; `field` names the value to look at. */
export interface ReadingFault {
  readonly field: string;
  readonly message: string;
  readonly allowed: string;
}

export type DerivationOutcome =
  | { readonly derived: DerivedFieldReading; readonly fault: null }
  | { readonly derived: null; readonly fault: ReadingFault };

/** V/I in Ω where both were read, else the sheet's R; null when neither is there or I = 0. */
export function resistanceOf(reading: FieldReading): number | null {
  const { voltageMv, currentMa, resistanceOhm } = reading;
  if (voltageMv !== null && currentMa !== null) return currentMa === 0 ? null : voltageMv / currentMa;
  return resistanceOhm;
}

/**
 * K in m with the sign that belongs to the reading, or null where MN was not recorded.
 *
 * A crew that keeps the order A B M N along a dipole–dipole reads V < 0, and K < 0 on the same ground; in the order
 * B A M N both are positive. The order is not on the sheet, so the sign of R tells it. Every other spread has one order.
 */
export function signedGeometricFactor(spread: Spread, resistanceOhm: number | null): number | null {
  const factor = geometricFactor(spread);
  if (factor === null || spread.type !== 'dipole-dipole' || resistanceOhm === null) return factor;
  return resistanceOhm < 0 ? -Math.abs(factor) : Math.abs(factor);
}

/** Own error and floor added in quadrature, both relative. */
export const totalRelativeError = (own: number | null, floor: number): number => hypot(own ?? 0, floor);

const failed = (field: string, message: string, allowed: string): DerivationOutcome => ({
  derived: null,
  fault: { field, message, allowed },
});

/**
 * K, R, ρa and the error of one reading, or the reason why there is none.
 *
 * ρa = K·V/I; V and I come before R, and R before the ρa of the sheet, which alone serves where MN was not recorded.
 * `errorFloor` is relative. ρa must come out positive.
 */
export function tryDeriveReading(reading: FieldReading, errorFloor: number): DerivationOutcome {
  const { spread, currentMa, sheetApparentResistivityOhmM: sheetValue } = reading;
  const spreadFault = checkSpread(spread);
  if (spreadFault) return failed(spreadFault.field, spreadFault.message, 'electrodes that measure a voltage');
  if (currentMa === 0)
    return failed('current', 'no current flowed, so there is nothing to divide by', 'a current other than 0');
  const resistanceOhm = resistanceOf(reading);
  const factor = signedGeometricFactor(spread, resistanceOhm);
  const computed = factor !== null && resistanceOhm !== null ? factor * resistanceOhm : null;
  const value = computed ?? sheetValue;
  if (value === null)
    return factor === null && resistanceOhm !== null
      ? failed('halfMN', 'K cannot be computed without MN/2', 'MN/2, or ρa as written on the sheet')
      : failed(missingField(reading), 'no ρa follows from this row', 'V and I, or R, or ρa');
  if (!(value > 0) || !Number.isFinite(value))
    return failed(
      reading.voltageMv !== null && currentMa !== null ? 'voltage' : 'resistance',
      `K·V/I gives ${Number(value.toPrecision(4))} Ω·m with K = ${Number((factor ?? 0).toPrecision(4))} m`,
      'values whose ρa is above 0; look at the signs of V and I and the order of the electrodes',
    );
  return {
    derived: {
      plottingSpacingM: plottingSpacing(spread),
      geometricFactorM: factor,
      resistanceOhm,
      apparentResistivityOhmM: value,
      relativeError: totalRelativeError(reading.standardError, errorFloor),
    },
    fault: null,
  };
}

function missingField(reading: FieldReading): string {
  if (reading.voltageMv !== null) return 'current';
  if (reading.currentMa !== null) return 'voltage';
  return 'apparentResistivity';
}

/** As `tryDeriveReading`, for readings that were accepted before. Throws `InversionError` ('reading-value') otherwise. */
export function deriveReading(reading: FieldReading, errorFloor: number): DerivedFieldReading {
  const { derived, fault } = tryDeriveReading(reading, errorFloor);
  if (fault)
    throw new InversionError('reading-value', `${fault.message}; give ${fault.allowed}`, [fault.field]);
  return derived;
}
