export type {
  DarZarroukSummary,
  EarthModel,
  FitBounds,
  FitProgress,
  FitResult,
  FitSettings,
  FitStatus,
  FixedParameter,
  Interval,
  LayerCountFit,
  LayeredEarth,
  Reading,
  Spread,
} from './types';
export { ENGINE_VERSION } from './engine-version';
export { InversionError, type InversionErrorCode } from './inversion-error';
export { apparentResistivity } from './spread/apparent-resistivity';
export { checkSpread, type SpreadFault } from './spread/check-spread';
export { effectiveDepth } from './spread/effective-depth';
export { electrodeDistances, type ElectrodeDistances } from './spread/electrode-distances';
export { geometricFactor } from './spread/geometric-factor';
export { IDEAL_SCHLUMBERGER_DEPTH, plottingSpacing } from './spread/plotting-spacing';
export { createForwardOperator, type ForwardOperator } from './operator/forward-operator';
export { compiledKernel } from './operator/compiled/compiled-kernel';
export { createOperatorCache, type OperatorCache } from './operator/operator-cache';
export { fitEarth } from './fit/fit-earth';
export { hasCells } from './fit/smooth/has-cells';
export { fitLayered, type FitOptions } from './fit/fit-layered';
export { fitLine } from './line/fit-line';
export type {
  LateralScales,
  LineBorehole,
  LineContact,
  LineCountFit,
  LineFitResult,
  LineSettings,
  LineSounding,
} from './line/line-types';
export { fitSmooth } from './fit/smooth/fit-smooth';
export { FIT_STATUS_MESSAGES, fitStatusMessage } from './fit/fit-status';
export { createRandomStream, type RandomStream } from './random';
export { compareResults, type ResultComparison, type ResultDifference } from './compare/compare-results';
export type { BedDifference } from './compare/bed-differences';
export { compareFits, type FitComparison, type FitPairComparison } from './compare/compare-fits';
export { describeDoubt, type DoubtItem } from './uncertainty/equivalence';
export {
  DETERMINATION_SOURCE,
  DETERMINATION_WORDS,
  determinationOf,
  type Determination,
} from './uncertainty/determination';
export { chiSquaredPoint, chiSquaredSurvival } from './uncertainty/chi-squared';
export { darZarrouk, type DarZarrouk, type DarZarroukPart } from './hydro/dar-zarrouk';
export { mailletQuantity, type MailletQuantity } from './hydro/maillet-quantities';
export { deriveWithRange, type DerivedQuantity, type DerivedValue } from './hydro/derived-quantity';
export { rangeOf, type ValueRange } from './hydro/range-of';
export {
  ARCHIE_SETS,
  archieBulk,
  archieCautions,
  archiePorosity,
  archieWater,
  bulkFormationFactor,
  formationFactor,
  porosityOf,
  type ArchieParameters,
} from './hydro/archie';
export {
  aquiferWaterResistivity,
  conductivityAt,
  conductivityAt25,
  dissolvedSolids,
  waterConductivity,
  waterResistivity,
} from './hydro/water-conductivity';
export {
  PROTECTIVE_CLASSES,
  PROTECTIVE_CLASSES_NOTE,
  protectiveCapacity,
  protectiveClass,
  type ProtectiveClass,
} from './hydro/protective-capacity';
export {
  calibrateTransmissivity,
  transmissivity,
  type PumpedWell,
  type TransmissivityCalibration,
  type TransmissivityEstimate,
} from './hydro/transmissivity';
export { depthOfInvestigation, type DepthOfInvestigation } from './uncertainty/depth-of-investigation';
export {
  layeredDepthOfInvestigation,
  type LayeredDepthOfInvestigation,
} from './uncertainty/layered-depth-of-investigation';
export {
  detectability,
  type Detectability,
  type DetectabilityInput,
  type PlannedReading,
  type TellingApart,
} from './uncertainty/detectability';
export { ensembleRange } from './uncertainty/ensemble/ensemble-range';
export type {
  EnsemblePrior,
  EnsembleProgress,
  EnsembleResult,
  EnsembleStatus,
  Quantiles,
  SampleSettings,
  TargetAnswer,
  TargetBed,
} from './uncertainty/ensemble/ensemble-types';
export { sampleEnsemble } from './uncertainty/ensemble/sample-ensemble';
export type { SampleOptions } from './uncertainty/ensemble/stop-check';
