import type { LayeredEarthModel } from '../../server/contract/fit-settings';

/** [low, high] of 95 %; null = not bounded on that side. */
export type Bounds = readonly [number | null, number | null];

/** One reading as the charts show it. */
export interface CurveReading {
  id: string;
  /** Of the spread, on the chart's x axis, m. */
  spacing: number;
  /** The spacing in words, as "AB/2 6.8 m". */
  label: string;
  /** MN/2 where the spread has one, m; readings of one MN are a branch of the curve. */
  halfMN?: number | undefined;
  /** Ω·m */
  apparentResistivity: number;
  /** Standard error of ln ρa; 0.03 = 3 %. */
  relativeError: number;
  excluded: boolean;
  /** Why it is left out, in the writer's words. */
  reason?: string | undefined;
}

export interface CurvePoint {
  /** m */
  spacing: number;
  /** Ω·m */
  apparentResistivity: number;
  /** The curve is not drawn through from the point before: another branch begins here. */
  startsBranch?: boolean | undefined;
}

/** `run` a computed fit, `hand` the model being moved now, `ghost` what stood before. */
export type CurveKind = 'run' | 'hand' | 'ghost';

export interface CurveLine {
  id: string;
  kind: CurveKind;
  /** Of the run; empty for a hand model without one. */
  letter: string;
  /** In words, as "4 beds, fitted". */
  name: string;
  /** In order of spacing within each branch. A curve may be denser than the readings. */
  points: readonly CurvePoint[];
  /** (ln predicted − ln measured)/σ, one a reading in the readings' order; null where there is none. */
  residuals?: readonly (number | null)[] | undefined;
  /** Predicted at each reading, Ω·m, in the readings' order. */
  predicted?: readonly (number | null)[] | undefined;
}

/** 95 % intervals of a model: one a layer for resistivity, one a boundary for depth. */
export interface EarthIntervals {
  resistivity: readonly Bounds[];
  depth: readonly Bounds[];
}

export interface BoreholeBed {
  top: number;
  base: number;
  label: string;
}

export interface BoreholeLog {
  name: string;
  beds: readonly BoreholeBed[];
  /** Depth of the water level in the hole, m. */
  waterLevel?: number | null;
}

/** A value of a layered earth that a fit does not move; `index` counts beds from 0 at the surface. */
export interface HeldValue {
  on: 'resistivity' | 'thickness';
  index: number;
}

/** One ground to draw as a column. */
export interface GroundColumn {
  id: string;
  /** The run's letter, or empty. */
  letter: string;
  name: string;
  earth: LayeredEarthModel;
  intervals?: EarthIntervals | null | undefined;
  /** Depth below which the data no longer move the model, m. */
  depthOfInvestigation?: number | null | undefined;
  /** The readings reject the model, so its intervals mean little. */
  isRejected?: boolean | undefined;
  /** A word for each bed, as the ground unit. */
  bedNotes?: readonly (string | null)[] | undefined;
  /** The layers are many cells of a fixed grid: drawn without ranges, and nothing to take hold of. */
  isCells?: boolean | undefined;
  /** Values held in a fit; the thickness of a bed stands at its base. */
  held?: readonly HeldValue[] | undefined;
}

/** Depths of the boundaries of a layered earth, m. */
export function boundaryDepths(earth: LayeredEarthModel): number[] {
  let depth = 0;
  return earth.thickness.map((thickness) => (depth += thickness));
}
