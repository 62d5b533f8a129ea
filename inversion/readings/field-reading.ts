import type { Spread } from '../types';

/** One reading as a crew wrote it down; what is absent on the sheet is null. */
export interface FieldReading {
  readonly spread: Spread;
  /** V between M and N, mV, sign as read */
  readonly voltageMv: number | null;
  /** I through A and B, mA, sign as read */
  readonly currentMa: number | null;
  /** V/I as the instrument shows it, Ω */
  readonly resistanceOhm: number | null;
  /** ρa as written on the sheet, Ω·m */
  readonly sheetApparentResistivityOhmM: number | null;
  /** the reading's own relative standard error, ≥ 0 */
  readonly standardError: number | null;
  /** reason for leaving the reading out; null = kept */
  readonly excluded: string | null;
}

/** What follows from a reading. */
export interface DerivedFieldReading {
  /** place on the axis that all spreads share, m */
  plottingSpacingM: number;
  /** K in m with its sign; null where MN was not recorded */
  geometricFactorM: number | null;
  /** V/I where both were read, else the sheet's R, Ω; null when ρa alone was written */
  resistanceOhm: number | null;
  /** Ω·m, > 0 */
  apparentResistivityOhmM: number;
  /** own error and floor in quadrature */
  relativeError: number;
}
