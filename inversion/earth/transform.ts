import type { LayeredEarth } from '../types';
import { expm1 } from '../math/exponential';

/**
 * Resistivity transform T₁(λ) in Ω·m at one wavenumber λ in 1/m, from below:
 * T_N = ρ_N;  T_i = (T_{i+1} + ρ_i th)/(1 + T_{i+1} th/ρ_i),  th = tanh(λh_i) from exp(−2λh_i), which cannot overflow.
 * Source: Koefoed 1979, Geosounding Principles 1, the Pekeris recurrence.
 */
export function resistivityTransform(earth: LayeredEarth, lambda: number): number {
  const { resistivity, thickness } = earth;
  let t = resistivity[resistivity.length - 1]!;
  for (let i = thickness.length - 1; i >= 0; i--) {
    const em = expm1(-2 * lambda * thickness[i]!);
    const th = -em / (2 + em);
    const rho = resistivity[i]!;
    t = (t + rho * th) / (1 + (t * th) / rho);
  }
  return t;
}
