import type { LayeredEarth } from '../types';
import { darZarrouk, type DarZarroukPart } from './dar-zarrouk';
import type { DerivedQuantity } from './derived-quantity';

const SOURCE = 'Maillet 1947, Geophysics 12, 529–556';

/** Maillet's quantities that a part of the ground has, and how each is told. */
const MAILLET = {
  conductance: { key: 'totalConductanceS', unit: 'S', formula: 'S = Σ h/ρ' },
  resistance: { key: 'totalResistanceOhmM2', unit: 'Ω·m²', formula: 'T = Σ hρ' },
  longitudinal: { key: 'longitudinalOhmM', unit: 'Ω·m', formula: 'ρ_L = H/S' },
  transverse: { key: 'transverseOhmM', unit: 'Ω·m', formula: 'ρ_T = T/H' },
  anisotropy: { key: 'anisotropy', unit: '', formula: 'λ = √(ρ_T/ρ_L)' },
} as const;

export type MailletQuantity = keyof typeof MAILLET;

/** One of Maillet's quantities of a part of the ground, ready for `deriveWithRange` over earths. */
export function mailletQuantity(name: MailletQuantity, part?: DarZarroukPart): DerivedQuantity<LayeredEarth> {
  const { key, unit, formula } = MAILLET[name];
  return { unit, formula, source: SOURCE, of: (earth) => darZarrouk(earth, part)[key] };
}
