import type { Spread } from '../types';
import { geometricFactor } from './geometric-factor';

/**
 * ρa = K·V/I in Ω·m from a voltage and a current in the same prefix (mV and mA, or V and A), signs kept.
 * null when K is (`halfMN` not recorded): then ρa must come from the sheet.
 */
export function apparentResistivity(spread: Spread, voltage: number, current: number): number | null {
  const k = geometricFactor(spread);
  return k === null ? null : (k * voltage) / current;
}
