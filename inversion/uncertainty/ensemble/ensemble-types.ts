import type { EarthModel, GaussianPrior } from '../../types';

/** Closed ranges in Ω·m and m. With an unknown count `thickness` is the range of the depths of boundaries. */
export interface EnsemblePrior {
  readonly resistivity: readonly [number, number];
  readonly thickness: readonly [number, number];
}

/** A wanted bed: ρ in `resistivity` (Ω·m), at least `minThickness` m thick, its top no deeper than `topAbove` m. */
export interface TargetBed {
  readonly resistivity: readonly [number, number];
  readonly minThickness: number;
  readonly topAbove: number;
}

export interface SampleSettings {
  readonly layers: number | 'unknown';
  readonly prior: EnsemblePrior;
  /** what else is known beforehand; needs a stated count */
  readonly priors?: readonly GaussianPrior[] | undefined;
  /** kept samples, all chains together */
  readonly draws: number;
  readonly seed: number;
  readonly target?: TargetBed | undefined;
  /** the priors that the answer to the target question is tried under; absent = derived, see `prior-range.ts` */
  readonly narrow?: EnsemblePrior | undefined;
  readonly wide?: EnsemblePrior | undefined;
}

export type EnsembleStatus = 'finished' | 'chain-too-short';

export type MoveName =
  'difference' | 'mixture' | 'birth' | 'death' | 'relocation' | 'boundary' | 'resistivity' | 'equivalence';

/** Quantiles of the samples, in the unit of the quantity. */
export interface Quantiles {
  p5: number;
  p16: number;
  p50: number;
  p84: number;
  p95: number;
}

/** Chance of each cell of depth and resistivity; the cells of one depth add up to 1 where every ρ lies within the edges. */
export interface ResistivityDensity {
  /** m, centres of cells even in ln */
  depths: number[];
  /** Ω·m, edges of cells even in ln; one more than a row of `share` has entries */
  resistivityEdges: number[];
  /** one row a depth */
  share: number[][];
}

/** The answer to a target question under one prior. */
export interface TargetChance {
  probability: number;
  /** Monte-Carlo error of it, from the effective sample size of the answer itself */
  standardError: number;
  /** the same question before the data */
  before: number;
  prior: { resistivity: [number, number]; thickness: [number, number] };
}

export interface TargetAnswer extends TargetChance {
  narrow: TargetChance;
  wide: TargetChance;
  /** the answers under the three priors lie more than 0.1 apart */
  priorDecides: boolean;
  words: string;
}

export interface EnsembleResult {
  status: EnsembleStatus;
  message: string;
  /** accepted share of all trial moves, and of each kind */
  acceptance: number;
  acceptanceByMove: { move: MoveName; tried: number; acceptance: number }[];
  /** worst of the monitored quantities; rank-normalised split R-hat */
  rHat: number;
  /** least of the monitored quantities */
  effectiveSampleSize: number;
  draws: number;
  /** moves from one kept sample to the next */
  thinning: number;
  /** null where the count is unknown: layers of one number are not the same ground there */
  quantiles: { resistivity: Quantiles[]; thickness: Quantiles[]; depth: Quantiles[] } | null;
  /** of 1, 2, … 8 layers; null where the count is stated */
  layerCountProbability: number[] | null;
  /** m, centres of cells even in ln depth */
  depths: number[];
  resistivityAtDepth: Quantiles[];
  /** boundaries expected per unit of ln depth, in each cell */
  interfaceDensity: number[];
  /** chance of at least one boundary in each cell */
  interfaceChance: number[];
  density: ResistivityDensity;
  /** every so-manieth sample, at most 500, for whatever is derived from a ground */
  earths: EarthModel[];
  target: TargetAnswer | null;
  engine: string;
}

/** Where a running sampler stands. */
export interface EnsembleProgress {
  readonly stage: 'tempering' | 'sampling';
  /** 0 to 1 of the stage */
  readonly share: number;
}
