import { requireEarth } from '../earth/check-earth';
import { fitLayered } from '../fit/fit-layered';
import { InversionError } from '../inversion-error';
import { log } from '../math/logarithm';
import { createForwardOperator } from '../operator/forward-operator';
import type { EarthModel, FitBounds, LayeredEarth, Spread } from '../types';
import { createNuisance } from './nuisance';
import { chanceToTell } from './telling-apart';

/** A reading that is planned, with the standard error of ln ρa that it will have. */
export interface PlannedReading {
  readonly spread: Spread;
  readonly relativeError: number;
}

/** How well planned readings tell a true ground from another. */
export interface TellingApart {
  /** Σ (ln f_true − ln f_other)²/σ²: by so much, on average, χ² of the other ground exceeds that of the true one */
  deltaChi2: number;
  /** chance that a test at 95 % shows it */
  chance: number;
  /** the other ground as it was compared */
  other: EarthModel;
  /** the one candidate that adds most; null without candidates */
  next: { candidate: number; deltaChi2: number; chance: number } | null;
}

export interface Detectability {
  /** both grounds as they are stated; the same whichever is true */
  stated: TellingApart;
  /** the first is true, and every value of the second is fitted to its readings */
  firstTrue: TellingApart;
  /** the second is true, and every value of the first is fitted to its readings */
  secondTrue: TellingApart;
}

export interface DetectabilityInput {
  readonly first: LayeredEarth;
  readonly second: LayeredEarth;
  readonly readings: readonly PlannedReading[];
  /** further readings of which one can be added */
  readonly candidates?: readonly PlannedReading[];
  /** of the refitted values */
  readonly bounds: FitBounds;
}

interface Predictor {
  readonly predict: (earth: LayeredEarth) => Float64Array;
  /** row-major whitened ∂ ln ρa/∂ ln value */
  readonly slopes: (earth: LayeredEarth) => Float64Array;
  /** whitened ln a − ln b; 0 where a ground gives a ρa ≤ 0, which no sheet can hold */
  readonly difference: (a: Float64Array, b: Float64Array) => Float64Array;
}

function predictorOf(planned: readonly PlannedReading[]): Predictor {
  const operator = createForwardOperator(planned.map(({ spread }) => spread));
  const perSigma = planned.map(({ relativeError }) => 1 / relativeError);
  return {
    predict: operator.predict,
    slopes: (earth) => {
      const { predicted, jacobian } = operator.predictWithJacobian(earth);
      const columns = 2 * earth.resistivity.length - 1;
      return jacobian.map((value, at) => {
        const i = Math.floor(at / columns);
        return (value * perSigma[i]!) / predicted[i]!;
      });
    },
    difference: (a, b) =>
      a.map((value, i) => (value > 0 && b[i]! > 0 ? log(value / b[i]!) * perSigma[i]! : 0)),
  };
}

const sumOfSquares = (values: Float64Array): number => values.reduce((sum, value) => sum + value * value, 0);

/** The candidate with the largest gain in Δχ². */
function bestNext(deltaChi2: number, gains: readonly number[]): TellingApart['next'] {
  if (gains.length === 0) return null;
  const candidate = gains.reduce((best, gain, i) => (gain > gains[best]! ? i : best), 0);
  const total = deltaChi2 + gains[candidate]!;
  return { candidate, deltaChi2: total, chance: chanceToTell(total) };
}

/** Δχ² between two grounds as they stand; a candidate's gain is (difference)²/(1 + `variance`(candidate)). */
function tellApart(
  truth: LayeredEarth,
  other: LayeredEarth,
  planned: Predictor,
  extra: Predictor,
  variance: (candidate: number) => number,
): TellingApart {
  const deltaChi2 = sumOfSquares(planned.difference(planned.predict(truth), planned.predict(other)));
  const further = extra.difference(extra.predict(truth), extra.predict(other));
  const gains = Array.from(further, (d, i) => (d * d) / (1 + variance(i)));
  return {
    deltaChi2,
    chance: chanceToTell(deltaChi2),
    other: { resistivity: [...other.resistivity], thickness: [...other.thickness] },
    next: bestNext(deltaChi2, gains),
  };
}

/** The same after `other` has been fitted to what `truth` gives; a candidate's gain is that of a linear refit. */
function tellApartRefitted(
  { readings, bounds }: DetectabilityInput,
  truth: LayeredEarth,
  other: LayeredEarth,
  planned: Predictor,
  extra: Predictor,
): TellingApart {
  const predicted = planned.predict(truth);
  const { earth } = fitLayered(
    readings.map((reading, i) => ({ ...reading, apparentResistivity: predicted[i]! })),
    {
      kind: 'layered',
      layers: other.resistivity.length,
      seed: 1,
      bounds,
      fixed: [],
      priors: [],
      outlierTolerant: false,
    },
  );
  const columns = 2 * earth.resistivity.length - 1;
  const nuisance = createNuisance(planned.slopes(earth), readings.length, columns);
  const rows = extra.slopes(earth);
  return tellApart(truth, earth, planned, extra, (i) =>
    nuisance.variance(rows.subarray(i * columns, (i + 1) * columns)),
  );
}

/**
 * Whether planned readings tell two grounds apart, and which one further reading helps most.
 *
 * δ² = Σ (ln f₁ − ln f₂)²/σ² is the expected Δχ² of two stated grounds, alike both ways. A fit would move the values of a
 * wrong ground until it hides the difference as well as it can: `firstTrue` and `secondTrue` refit the other ground (of its own
 * layer count, within `bounds`) to noise-free readings of the true one, and what misfit is left is δ² there; 0 where the other
 * ground holds the true one as a special case. The chance is Φ(δ − 1.645). A candidate adds d²/σ², divided after a refit by
 * 1 + j C jᵀ for what the refitted values can take up of it (linear about the refitted ground).
 */
export function detectability(input: DetectabilityInput): Detectability {
  const { first, second, readings, candidates = [] } = input;
  requireEarth(first, ['first']);
  requireEarth(second, ['second']);
  if (readings.length === 0)
    throw new InversionError('no-readings', 'no reading is planned; it needs at least one', ['readings']);
  for (const [key, list] of [
    ['readings', readings],
    ['candidates', candidates],
  ] as const)
    list.forEach(({ relativeError }, i) => {
      if (!(relativeError > 0 && Number.isFinite(relativeError)))
        throw new InversionError(
          'reading-value',
          `relativeError is ${relativeError}; it must be a number above 0`,
          [key, i, 'relativeError'],
        );
    });
  const planned = predictorOf(readings);
  const extra = predictorOf(candidates);
  return {
    stated: tellApart(first, second, planned, extra, () => 0),
    firstTrue: tellApartRefitted(input, first, second, planned, extra),
    secondTrue: tellApartRefitted(input, second, first, planned, extra),
  };
}
