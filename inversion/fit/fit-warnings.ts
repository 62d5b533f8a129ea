import { log } from '../math/logarithm';
import { threeDigits } from '../three-digits';
import { TOLERANCES } from '../tolerances';
import { chiSquaredSurvival } from '../uncertainty/chi-squared';
import type { AllowedModel } from '../uncertainty/parameter-doubt';
import type { FitSettings, LayeredEarth, Reading } from '../types';
import { downWeighted, SET_ASIDE } from './tolerant-residual';

export interface FitWarningInput {
  readonly readings: readonly Reading[];
  readonly settings: FitSettings;
  readonly earth: LayeredEarth;
  readonly held: readonly boolean[];
  readonly predicted: readonly number[];
  readonly chi2: number;
  readonly freeParameters: number;
  readonly probability: number | null;
  /** a model that fits alike and lies outside of the best one's own intervals */
  readonly apart: AllowedModel | null;
}

/** "reading 4", "readings 1–3, 7": numbers that follow one another are joined. */
function list(numbers: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const number of numbers) {
    const run = runs.at(-1);
    if (run && run[1] === number - 1) run[1] = number;
    else runs.push([number, number]);
  }
  const words = runs.map(([from, to]) =>
    from === to ? `${from}` : `${from}${to === from + 1 ? ', ' : '–'}${to}`,
  );
  return `${numbers.length === 1 ? 'reading' : 'readings'} ${words.join(', ')}`;
}

/** The other ground, where the readings determine a model at all. */
function anotherGround({ apart, chi2, readings, freeParameters }: FitWarningInput): string[] {
  if (!apart || freeParameters > readings.length) return [];
  const { resistivity, thickness } = apart.earth;
  const perReading = (value: number) => threeDigits(value / readings.length);
  const over = thickness.length === 0 ? '' : ` over thicknesses ${thickness.map(threeDigits).join(', ')} m`;
  return [
    `Another model fits nearly as well (χ²/N ${perReading(chi2 + apart.excess)} against ${perReading(chi2)}): ${resistivity.map(threeDigits).join(', ')} Ω·m${over}. The intervals reach over both.`,
  ];
}

/** With too few readings to spare no chance can be told; a χ² improbable even for as many degrees as readings still can. */
function untestableMisfit(chi2: number, readings: number, freeParameters: number): string[] {
  if (chiSquaredSurvival(chi2, readings) >= TOLERANCES.misfitProbability) return [];
  return [
    `The misfit is larger than the stated errors explain (χ²/N ${threeDigits(chi2 / readings)}), though ${readings} ${readings === 1 ? 'reading' : 'readings'} for ${freeParameters} unknowns are too few to tell its chance. The intervals are not rescaled.`,
  ];
}

function improbableMisfit({ chi2, readings, freeParameters, probability }: FitWarningInput): string[] {
  if (probability === null) return untestableMisfit(chi2, readings.length, freeParameters);
  if (probability >= TOLERANCES.misfitProbability) return [];
  const scale = Math.sqrt(chi2 / (readings.length - freeParameters));
  const chance = probability < 1e-4 ? 'less than 0.01 %' : `${(100 * probability).toPrecision(2)} %`;
  return [
    `The misfit is larger than the stated errors explain (chance ${chance}). The intervals are not rescaled; were the errors alone at fault, each standard deviation would be ${scale.toFixed(2)} times as large.`,
  ];
}

/** A misfit too good for the stated errors; a ground of cells may come down to any target. */
function smallMisfit({ chi2, readings, settings, probability }: FitWarningInput): string[] {
  if (settings.kind !== 'layered' || probability === null) return [];
  const chance = 1 - probability;
  if (chance >= TOLERANCES.smallMisfitProbability) return [];
  const words = chance < 1e-4 ? 'less than 0.01 %' : `${(100 * chance).toPrecision(2)} %`;
  return [
    `χ²/N ${threeDigits(chi2 / readings.length)} is smaller than such errors would give (chance ${words}): the stated errors are probably too large, and the ranges too wide.`,
  ];
}

function valuesAtBounds({ earth, settings, held }: FitWarningInput): string[] {
  const layers = earth.resistivity.length;
  return (['resistivity', 'thickness'] as const).flatMap((key) =>
    earth[key].flatMap((value, i) => {
      if (held[key === 'resistivity' ? i : layers + i]) return [];
      const unit = key === 'resistivity' ? 'Ω·m' : 'm';
      return settings.bounds[key].flatMap((bound, side) =>
        Math.abs(log(value / bound)) <= TOLERANCES.atBound
          ? [
              `The ${key} of bed ${i + 1} ended on its ${side === 0 ? 'lower' : 'upper'} bound (${bound} ${unit}); a closer fit may lie beyond it.`,
            ]
          : [],
      );
    }),
  );
}

/** More than this share of readings set aside is no scatter of single errors. */
const MANY = 0.2;

/** The readings that an outlier-tolerant fit lets count for little, by name. */
function setAside({ readings, predicted, settings }: FitWarningInput): string[] {
  if (!settings.outlierTolerant) return [];
  const far = downWeighted(
    readings.map((reading, i) => log(predicted[i]! / reading.apparentResistivity) / reading.relativeError),
  );
  if (far.length === 0) return [];
  const named = list(far.map(({ index }) => index + 1));
  const count = far.length === 1 ? 'counts' : 'count';
  const words = `${named[0]!.toUpperCase()}${named.slice(1)} ${count} for little: more than ${SET_ASIDE} errors off this ground.`;
  return far.length <= MANY * readings.length
    ? [words]
    : [
        `${words} That is ${far.length} of ${readings.length}, too many for single errors: another ground or larger errors are likelier.`,
      ];
}

/** Plain sentences that stand beside a result. */
export function fitWarnings(input: FitWarningInput): string[] {
  const { readings, predicted, freeParameters } = input;
  const numbered = (test: (reading: Reading, i: number) => boolean) =>
    readings.flatMap((reading, i) => (test(reading, i) ? [i + 1] : []));
  const gradient = numbered((reading) => 'halfMN' in reading.spread && reading.spread.halfMN === null);
  const negative = numbered((_, i) => predicted[i]! <= 0);
  const warnings = [...improbableMisfit(input), ...smallMisfit(input)];
  if (gradient.length > 0)
    warnings.push(
      `MN was not recorded for ${list(gradient)}: the ideal gradient (MN → 0) was used, which is off by 1 % at MN/AB = 1/10 and 4 % at 1/5.`,
    );
  if (negative.length > 0)
    warnings.push(
      `The model predicts an apparent resistivity of zero or less for ${list(negative)}: the misfit there is linear, not logarithmic.`,
    );
  if (freeParameters > readings.length)
    warnings.push(
      `${readings.length} ${readings.length === 1 ? 'reading does' : 'readings do'} not determine ${freeParameters} unknowns: this is one of endlessly many models that fit.`,
    );
  return [...warnings, ...setAside(input), ...anotherGround(input), ...valuesAtBounds(input)];
}
