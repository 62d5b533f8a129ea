import { resistivityTransform } from '../earth/transform';
import { electrodeDistances, inverseDistanceBracket } from '../spread/electrode-distances';
import type { LayeredEarth, Spread } from '../types';
import { besselJ0 } from './bessel-j0';
import { cos } from '../math/circular';
import { pow10 } from '../math/power';

const GAUSS_POINTS = 24;
/** T₁ − ρ₁ has fallen by exp(−2 × 20) at λ = 20/h₁. */
const LAST_DECAY = 20;
const LOG_PANELS = 120;
const LOG_DECADES = 14;

interface Rule {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

/** Gauss–Legendre rule on [−1, 1] by Newton's method on the Legendre polynomial. */
function gaussLegendre(points: number): Rule {
  const nodes = new Float64Array(points);
  const weights = new Float64Array(points);
  for (let i = 0; i < points; i++) {
    let x = cos((Math.PI * (i + 0.75)) / (points + 0.5));
    let slope = 1;
    for (let pass = 0; pass < 100; pass++) {
      let before = 1;
      let value = x;
      for (let k = 2; k <= points; k++)
        [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
      slope = (points * (x * value - before)) / (x * x - 1);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-16) break;
    }
    nodes[i] = x;
    weights[i] = 2 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}

const RULE = gaussLegendre(GAUSS_POINTS);

/** Panel edges in 1/m: logarithmic towards zero, then the zeros of J₀(λr), as far as T₁ − ρ₁ lives. */
function panelEdges(r: number, end: number): number[] {
  const zeros = Array.from({ length: Math.floor((end * r) / Math.PI) + 2 }, (_, k) => (k + 0.75) * Math.PI);
  const first = zeros[0]!;
  const rising = Array.from(
    { length: LOG_PANELS },
    (_, k) => first * pow10(LOG_DECADES * (k / (LOG_PANELS - 1) - 1)),
  );
  return [0, ...rising, ...zeros.slice(1)].map((x) => x / r);
}

/**
 * 2πV/I in Ω at distance r: ρ₁/r + ∫₀^∞ (T₁(λ) − ρ₁) J₀(λr) dλ, Gauss–Legendre on panels between the zeros of J₀.
 * Slow: thousands of panels at r ≫ h₁. About 1e-13 of ρ₁/r.
 */
export function integratedPotential(r: number, earth: LayeredEarth): number {
  const rho1 = earth.resistivity[0]!;
  const h1 = earth.thickness[0];
  if (h1 === undefined) return rho1 / r;
  const end = LAST_DECAY / h1;
  const edges = panelEdges(r, end);
  let total = 0;
  for (let p = 0; p + 1 < edges.length; p++) {
    const a = edges[p]!;
    if (a >= end) break;
    const width = edges[p + 1]! - a;
    const parts = Math.max(1, Math.ceil((width * h1) / 0.5));
    const half = width / parts / 2;
    for (let part = 0; part < parts; part++) {
      const middle = a + (2 * part + 1) * half;
      for (let i = 0; i < GAUSS_POINTS; i++) {
        const lambda = middle + half * RULE.nodes[i]!;
        total +=
          RULE.weights[i]! * half * (resistivityTransform(earth, lambda) - rho1) * besselJ0(lambda * r);
      }
    }
  }
  return rho1 / r + total;
}

/** ρa in Ω·m of a spread with a recorded MN by direct integration: the slow path beside `createForwardOperator`. */
export function integratedApparentResistivity(spread: Spread, earth: LayeredEarth): number {
  const distances = electrodeDistances(spread);
  if (distances === null) throw new RangeError('direct integration needs a recorded halfMN');
  const { am, an, bm, bn } = distances;
  const signed = [
    [am, 1],
    [an, -1],
    [bm, -1],
    [bn, 1],
  ] as const;
  const seen = new Map<number, number>();
  const total = signed.reduce((sum, [r, sign]) => {
    if (r === null) return sum;
    const value = seen.get(r) ?? integratedPotential(r, earth);
    seen.set(r, value);
    return sum + sign * value;
  }, 0);
  return total / inverseDistanceBracket(distances);
}
