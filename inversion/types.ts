/**
 * Shapes and conventions of the inversion module, stated once.
 *
 * Units: lengths m, resistivity Ω·m, conductance S, errors relative (0.03 = 3 %).
 * Matrices are row-major Float64Array. residualᵢ = (ln predictedᵢ − ln observedᵢ)/σᵢ;
 * `jacobian[i * n + j]` = ∂residualᵢ/∂parameterⱼ. Parameters are lnρ₁…lnρ_N, lnh₁…lnh_{N−1}, then ln shifts of branches.
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

/** The same earth as a fresh result that its receiver owns. */
export interface EarthModel {
  resistivity: number[];
  thickness: number[];
}

/** One reading as the fit sees it. `relativeError` is used as given. */
export interface Reading {
  readonly spread: Spread;
  /** Ω·m, > 0 */
  readonly apparentResistivity: number;
  /** standard error of ln ρa, > 0 */
  readonly relativeError: number;
  /** name of the group, such as an MN, that may stand shifted as a whole */
  readonly branch?: string | undefined;
}

/** Closed interval [low, high]; null = unbounded on that side. */
export type Interval = [number | null, number | null];

/** Bounds of the search, in Ω·m and m; they hold for every layer. */
export interface FitBounds {
  readonly resistivity: readonly [number, number];
  readonly thickness: readonly [number, number];
}

/** A value held during a fit; `index` counts layers from 0 at the surface. */
export interface FixedParameter {
  readonly on: 'resistivity' | 'thickness';
  readonly index: number;
  readonly value: number;
}

/** What is known beforehand of a value or of the depth of the base of layer `index`, as a Gaussian. */
export interface GaussianPrior {
  readonly on: 'resistivity' | 'thickness' | 'depth';
  readonly index: number;
  /** Ω·m or m */
  readonly value: number;
  /** standard deviation: of the logarithm for resistivity and thickness, in m for a depth */
  readonly sigma: number;
}

/** Few free layers; the smoothest of many; many with few steps. */
export type FitKind = 'layered' | 'smooth' | 'stepped';

export interface FitSettings {
  readonly kind: FitKind;
  /** layered: a count, or 'auto' for the fewest within the noise; smooth and stepped: cells, 'auto' for the usual grid */
  readonly layers: number | 'auto';
  readonly seed: number;
  readonly bounds: FitBounds;
  readonly fixed: readonly FixedParameter[];
  readonly priors: readonly GaussianPrior[];
  /** standard deviation of the ln shift of each branch but the one with most readings; absent = no shifts */
  readonly branchShiftSigma?: number | undefined;
  /** lets readings far off the ground count for less */
  readonly outlierTolerant: boolean;
  /** χ²/N that a smooth or stepped fit aims at; absent = 1 */
  readonly targetMisfit?: number | undefined;
  /** a model to start from, beside the seeded starts */
  readonly start?: LayeredEarth | undefined;
}

/** Why a fit stopped; the sentences stand in `fit/fit-status.ts`. */
export type FitStatus =
  | 'converged-gradient'
  | 'converged-step'
  | 'converged-decrease'
  | 'iteration-limit'
  | 'no-descent'
  | 'target-reached'
  | 'target-out-of-reach';

/** The factor by which the readings of a branch stand above what the ground of the whole fit gives. */
export interface BranchShift {
  branch: string;
  readings: number;
  factor: number;
  /** 95 % of the factor */
  interval: [number, number];
  /** true for the branch that the others are measured by */
  held: boolean;
}

/** A reading that an outlier-tolerant fit lets count for less than half. */
export interface DownWeighted {
  /** in the list of readings, from 0 */
  index: number;
  residual: number;
  /** 1 = counted in full */
  weight: number;
}

/** One layer count of an automatic choice. */
export interface LayerCountFit {
  layers: number;
  status: FitStatus;
  chi2PerReading: number;
  /** χ² + p ln N */
  bic: number;
  /** χ² + 2p + 2p(p + 1)/(N − p − 1); null where N − p − 1 < 1 */
  aicc: number | null;
  /** χ² below its 95 % point for N − p degrees of freedom; null where N − p < 2 */
  withinNoise: boolean | null;
  chosen: boolean;
  earth: EarthModel;
}

/** Maillet's quantities of the bounded layers: S in siemens, T in Ω·m². */
export interface DarZarroukSummary {
  conductanceS: number[];
  resistanceOhmM2: number[];
  /** factors of the two above, as `factors` of a result; null = not determined */
  conductanceFactor: (number | null)[];
  resistanceFactor: (number | null)[];
  totalConductanceS: number;
  totalResistanceOhmM2: number;
  anisotropy: number | null;
}

/** What a fit returns: plain data, one entry a reading or a layer, in order. */
export interface FitResult {
  status: FitStatus;
  earth: EarthModel;
  chi2PerReading: number;
  rmsPercent: number;
  predicted: number[];
  residuals: number[];
  geometricFactor: (number | null)[];
  /** 95 %; null = the bounds of the fit end it, not the readings */
  intervals: { resistivity: Interval[]; thickness: Interval[]; depth: Interval[] };
  /** of one standard deviation: the larger of the 68 % reach and the 95 % reach to the power 1/1.96; null = not determined */
  factors: { resistivity: (number | null)[]; thickness: (number | null)[]; depth: (number | null)[] };
  correlation: (number | null)[][];
  misfitProbability: number | null;
  darZarrouk: DarZarroukSummary;
  warnings: string[];
  layerCounts: LayerCountFit[] | null;
  /** of a layered fit with a stated count: how well one layer fewer does, found by a short search; else null */
  oneFewer: { layers: number; chi2PerReading: number; withinNoise: boolean | null } | null;
  /** smooth and stepped: whether χ²/N came down to the target; null for a layered fit */
  reachedTarget: boolean | null;
  shifts: BranchShift[];
  downWeighted: DownWeighted[];
  starts: number;
  iterations: number;
  /** damping of the last step; null in results of engines that did not tell it */
  damping: number | null;
  engine: string;
}

/** Where a running fit stands. */
export interface FitProgress {
  readonly layers: number;
  readonly start: number;
  readonly starts: number;
  readonly iteration: number;
  readonly chi2PerReading: number;
}
