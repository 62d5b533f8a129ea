import type { FitResult, FitSettings, FitStatus, Reading } from '../types';

/** One sounding of a line. */
export interface LineSounding {
  /** place along the line, m; in any order */
  readonly x: number;
  readonly readings: readonly Reading[];
}

/** How far beds are expected to change over 100 m of line, as standard deviations that grow as the root of the distance. */
export interface LateralScales {
  /** of ln ρ of a bed */
  readonly resistivity: number;
  /** of ln D of the base of a bed */
  readonly depth: number;
}

/** What a borehole on the line saw: the base of layer `boundary` (from 0) at `depth` ± `sigma` metres. */
export interface LineContact {
  readonly boundary: number;
  readonly depth: number;
  readonly sigma: number;
}

export interface LineBorehole {
  /** place along the line, m */
  readonly x: number;
  readonly contacts: readonly LineContact[];
}

/** Settings of a layered fit, which hold for every sounding, and what ties the soundings. */
export interface LineSettings extends Omit<FitSettings, 'kind' | 'targetMisfit'> {
  readonly kind: 'layered';
  readonly lateral: LateralScales;
  readonly boreholes: readonly LineBorehole[];
}

/** One layer count of an automatic choice, over the whole line. */
export interface LineCountFit {
  layers: number;
  status: FitStatus;
  chi2PerReading: number;
  /** parameters that the readings settle: Σ trace of the hat matrices, at most soundings × (2N − 1) */
  effectiveParameters: number;
  /** χ² + p ln N over all readings, p the effective parameters */
  bic: number;
  /** χ² below its 95 % point for N − p degrees of freedom; null where N − p < 2 */
  withinNoise: boolean | null;
  chosen: boolean;
}

export interface LineFitResult {
  status: FitStatus;
  layers: number;
  chi2PerReading: number;
  effectiveParameters: number;
  /** chance of a χ² this large over the whole line; null = not testable */
  misfitProbability: number | null;
  /** one a sounding, in the order in which they were given */
  soundings: FitResult[];
  layerCounts: LineCountFit[] | null;
  warnings: string[];
  iterations: number;
  engine: string;
}
