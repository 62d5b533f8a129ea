/**
 * Shapes and conventions of the inversion module, stated once.
 *
 * Units: lengths m, resistivity Ω·m, conductance S, errors relative (0.03 = 3 %).
 * Matrices are row-major Float64Array. residualᵢ = (ln predictedᵢ − ln observedᵢ)/σᵢ;
 * `jacobian[i * n + j]` = ∂residualᵢ/∂parameterⱼ. Parameters are lnρ₁…lnρ_N, lnh₁…lnh_{N−1}.
 * Inputs are never mutated; the same input gives the same bits.
 */

/** Where the four electrodes stand. Distances in m; `halfMN: null` = not recorded (gradient limit); null distance = at infinity. */
export type Spread =
  | { readonly type: 'schlumberger'; readonly halfAB: number; readonly halfMN: number | null }
  | { readonly type: 'half-schlumberger'; readonly halfAB: number; readonly halfMN: number | null }
  | { readonly type: 'wenner'; readonly spacing: number }
  | { readonly type: 'pole-pole'; readonly spacing: number }
  | { readonly type: 'dipole-dipole'; readonly dipole: number; readonly n: number }
  | {
      readonly type: 'electrodes';
      readonly am: number | null;
      readonly an: number | null;
      readonly bm: number | null;
      readonly bn: number | null;
    };

/** A layered earth: `resistivity` ρ₁…ρ_N in Ω·m over `thickness` h₁…h_{N−1} in m; the last layer is unbounded. */
export interface LayeredEarth {
  readonly resistivity: readonly number[];
  readonly thickness: readonly number[];
}

/** One reading as the fit sees it. `relativeError` is used as given. */
export interface Reading {
  readonly spread: Spread;
  /** Ω·m, > 0 */
  readonly apparentResistivity: number;
  /** standard error of ln ρa, > 0 */
  readonly relativeError: number;
}

/** Closed interval [low, high]; null = unbounded on that side. */
export type Interval = readonly [number | null, number | null];
