import { requireEarth } from '../earth/check-earth';
import { InversionError } from '../inversion-error';
import type { LayeredEarth } from '../types';
import { requireValue } from './require-value';

/**
 * Which part of the earth to sum: the bounded layers (default), all ground between two depths or above one (the half-space
 * counted down to it), or a run of bounded layers.
 */
export type DarZarroukPart =
  | { readonly aboveDepth: number }
  | { readonly fromDepth: number; readonly toDepth: number }
  | { readonly fromLayer: number; readonly toLayer: number }
  | undefined;

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

type PartLayers = { rho: number; h: number }[];

function betweenDepths(earth: LayeredEarth, fromDepth: number, toDepth: number): PartLayers {
  if (!(fromDepth >= 0 && toDepth > fromDepth && Number.isFinite(toDepth)))
    throw new InversionError(
      'hydro-value',
      `depths ${fromDepth} to ${toDepth} m were asked for; they must be two depths from 0 m down, the upper one first`,
    );
  let top = 0;
  return earth.resistivity.flatMap((rho, i) => {
    const base = top + (earth.thickness[i] ?? Infinity);
    const kept = Math.min(base, toDepth) - Math.max(top, fromDepth);
    top = base;
    return kept > 0 ? [{ rho, h: kept }] : [];
  });
}

function stack(earth: LayeredEarth, part: DarZarroukPart): PartLayers {
  if (part && 'aboveDepth' in part) {
    requireValue(part.aboveDepth, 'aboveDepth', 'm');
    return betweenDepths(earth, 0, part.aboveDepth);
  }
  if (part && 'toDepth' in part) return betweenDepths(earth, part.fromDepth, part.toDepth);
  const bounded = earth.thickness.map((h, i) => ({ rho: earth.resistivity[i]!, h }));
  if (!part) return bounded;
  const { fromLayer, toLayer } = part;
  if (!(fromLayer >= 0 && fromLayer <= toLayer && toLayer < bounded.length))
    throw new InversionError(
      'layer-count',
      `layers ${fromLayer} to ${toLayer} were asked for; only the bounded layers 0 to ${bounded.length - 1} have a thickness`,
    );
  return bounded.slice(fromLayer, toLayer + 1);
}

/**
 * S = Σh/ρ (S), T = Σhρ (Ω·m²), ρ_L = H/S, ρ_T = T/H, anisotropy √(ρ_T/ρ_L) of the bounded layers or of the part
 * asked for. Source: Maillet 1947, Geophysics 12, 529–556.
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
    anisotropy: empty ? null : Math.sqrt(totalResistanceOhmM2 * totalConductanceS) / totalThicknessM,
  };
}
