import { requireEarth } from '../earth/check-earth';
import { InversionError } from '../inversion-error';
import type { LayeredEarth } from '../types';

/** Which part of the earth to sum: the bounded layers (default), everything above a depth, or a run of layers. */
export type DarZarroukPart =
  { readonly aboveDepth: number } | { readonly fromLayer: number; readonly toLayer: number } | undefined;

/** Maillet's quantities of a stack of flat layers. */
export interface DarZarrouk {
  /** h/ρ of each part-layer, S */
  conductanceS: number[];
  /** hρ of each part-layer, Ω·m² */
  resistanceOhmM2: number[];
  totalThicknessM: number;
  totalConductanceS: number;
  totalResistanceOhmM2: number;
  /** ρ_L = H/S, Ω·m; null when nothing is summed */
  longitudinalOhmM: number | null;
  /** ρ_T = T/H, Ω·m; null when nothing is summed */
  transverseOhmM: number | null;
  /** √(ρ_T/ρ_L) ≥ 1; null when nothing is summed */
  anisotropy: number | null;
}

function stack(earth: LayeredEarth, part: DarZarroukPart): { rho: number; h: number }[] {
  const bounded = earth.thickness.map((h, i) => ({ rho: earth.resistivity[i]!, h }));
  if (!part) return bounded;
  if ('aboveDepth' in part) {
    if (!(part.aboveDepth > 0 && Number.isFinite(part.aboveDepth)))
      throw new InversionError(
        'earth-value',
        `aboveDepth is ${part.aboveDepth}; it must be a depth above 0 m`,
      );
    let top = 0;
    const all = [...bounded, { rho: earth.resistivity.at(-1)!, h: Infinity }];
    return all.flatMap(({ rho, h }) => {
      const kept = Math.min(h, part.aboveDepth - top);
      top += h;
      return kept > 0 ? [{ rho, h: kept }] : [];
    });
  }
  const { fromLayer, toLayer } = part;
  if (!(fromLayer >= 0 && fromLayer <= toLayer && toLayer < bounded.length))
    throw new InversionError(
      'layer-count',
      `layers ${fromLayer} to ${toLayer} were asked for; only the bounded layers 0 to ${bounded.length - 1} have a thickness`,
    );
  return bounded.slice(fromLayer, toLayer + 1);
}

/**
 * S = Σh/ρ (S), T = Σhρ (Ω·m²), ρ_L = H/S, ρ_T = T/H, anisotropy √(ρ_T/ρ_L) of the bounded layers, of all ground above a
 * depth (the half-space counted down to it), or of a run of bounded layers. Source: Maillet 1947, Geophysics 12, 529–556.
 */
export function darZarrouk(earth: LayeredEarth, part?: DarZarroukPart): DarZarrouk {
  requireEarth(earth);
  const layers = stack(earth, part);
  const conductanceS = layers.map(({ rho, h }) => h / rho);
  const resistanceOhmM2 = layers.map(({ rho, h }) => h * rho);
  const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);
  const totalThicknessM = sum(layers.map(({ h }) => h));
  const totalConductanceS = sum(conductanceS);
  const totalResistanceOhmM2 = sum(resistanceOhmM2);
  const empty = layers.length === 0;
  return {
    conductanceS,
    resistanceOhmM2,
    totalThicknessM,
    totalConductanceS,
    totalResistanceOhmM2,
    longitudinalOhmM: empty ? null : totalThicknessM / totalConductanceS,
    transverseOhmM: empty ? null : totalResistanceOhmM2 / totalThicknessM,
    anisotropy: empty ? null : Math.sqrt((totalResistanceOhmM2 * totalConductanceS) / totalThicknessM ** 2),
  };
}
