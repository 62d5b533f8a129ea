import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { EnsembleResult } from './ensemble-types';
import type { GroundSpace } from './ground-space';
import { quantilesOfAscending } from './sample-quantiles';
import type { SampledEarths } from './sampled-earths';

const DEPTH_CELLS = 64;
const RESISTIVITY_CELLS = 48;

export type DepthProfile = Pick<
  EnsembleResult,
  'depths' | 'resistivityAtDepth' | 'interfaceDensity' | 'interfaceChance' | 'density'
>;

interface Cells {
  /** Ω·m at the centre of each cell of each sample: `[cell * samples + sample]` */
  readonly resistivity: Float64Array;
  readonly boundaries: Float64Array;
  readonly touched: Float64Array;
}

/** Samples spread over cells of ln depth of width `width` from `low` on. */
function fillCells(
  { size, layers, parameters, stride }: SampledEarths,
  centres: readonly number[],
  low: number,
  width: number,
): Cells {
  const resistivity = new Float64Array(DEPTH_CELLS * size);
  const boundaries = new Float64Array(DEPTH_CELLS);
  const touched = new Float64Array(DEPTH_CELLS);
  for (let i = 0; i < size; i++) {
    const at = i * stride;
    const count = layers[i]!;
    let base = count > 1 ? parameters[at + count]! : Infinity;
    let layer = 0;
    let lastTouched = -1;
    for (let cell = 0; cell < DEPTH_CELLS; cell++) {
      while (base <= centres[cell]!) {
        layer++;
        base = layer < count - 1 ? base + parameters[at + count + layer]! : Infinity;
      }
      resistivity[cell * size + i] = parameters[at + layer]!;
    }
    let depth = 0;
    for (let j = count; j < 2 * count - 1; j++) {
      depth += parameters[at + j]!;
      const cell = Math.floor((log(depth) - low) / width);
      if (cell < 0 || cell >= DEPTH_CELLS) continue;
      boundaries[cell]!++;
      if (cell !== lastTouched) touched[cell]!++;
      lastTouched = cell;
    }
  }
  return { resistivity, boundaries, touched };
}

/** Share of the ascending values in each of the cells that `edges` bound; what lies on an edge counts to the cell above. */
function histogram(ascending: Float64Array, edges: readonly number[]): number[] {
  let value = 0;
  return edges.slice(1).map((edge, cell) => {
    const before = value;
    const last = cell === edges.length - 2;
    while (value < ascending.length && (last || ascending[value]! < edge)) value++;
    return (value - before) / ascending.length;
  });
}

/** The samples against depth, over the range of the prior's thicknesses or depths: quantiles, boundaries, density. */
export function depthProfile(space: GroundSpace, earths: SampledEarths): DepthProfile {
  const [low, high] = space.logBoundary;
  const width = (high - low) / DEPTH_CELLS;
  const [rhoLow, rhoHigh] = space.logResistivity;
  const depths = Array.from({ length: DEPTH_CELLS }, (_, cell) => exp(low + (cell + 0.5) * width));
  const edges = Array.from({ length: RESISTIVITY_CELLS + 1 }, (_, cell) =>
    exp(rhoLow + (cell / RESISTIVITY_CELLS) * (rhoHigh - rhoLow)),
  );
  const { resistivity, boundaries, touched } = fillCells(earths, depths, low, width);
  const rows = depths.map((_, cell) =>
    resistivity.subarray(cell * earths.size, (cell + 1) * earths.size).sort(),
  );
  return {
    depths,
    resistivityAtDepth: rows.map(quantilesOfAscending),
    interfaceDensity: Array.from(boundaries, (count) => count / earths.size / width),
    interfaceChance: Array.from(touched, (count) => count / earths.size),
    density: { depths, resistivityEdges: edges, share: rows.map((row) => histogram(row, edges)) },
  };
}
