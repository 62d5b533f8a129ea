import { logEarth } from '../fit/starting-models';
import { exp } from '../math/exponential';
import { threeDigits } from '../three-digits';
import { TOLERANCES } from '../tolerances';
import type { LayeredEarth } from '../types';
import { depthOf } from '../uncertainty/quantities';
import { deviationAt, type PlaceCovariance } from './line-doubt';
import type { LinePlace } from './line-layout';
import type { LineBorehole, LineContact } from './line-types';

/** A contact further than this many standard deviations from what the line says without it is told. */
const CONTRADICTED = 3;
/** Up to this share of its variance the line says something of its own about a contact. */
const OWN_WORD = 1 - 1e-6;

/** What a line found at a borehole. */
export interface BoredPlace {
  readonly borehole: LineBorehole;
  readonly earth: LayeredEarth;
  readonly covariance: PlaceCovariance;
}

/**
 * Distance of a contact from what the line says without it, in standard deviations: (D − D₀)/(σ √(1 − v/σ²)) with v the
 * variance of D after the fit (the studentised residual; Cook & Weisberg 1982, from memory).
 */
function tension({ earth, covariance }: BoredPlace, { boundary, depth, sigma }: LineContact): number {
  const quantity = depthOf(earth.resistivity.length, boundary);
  const parameters = logEarth(earth);
  const value = exp(quantity.value(parameters));
  const deviation = (value * deviationAt(quantity, parameters, covariance)) / sigma;
  const share = deviation * deviation;
  return share < OWN_WORD ? Math.abs(value - depth) / (sigma * Math.sqrt(1 - share)) : 0;
}

function contradictions(bored: readonly BoredPlace[]): string[] {
  return bored.flatMap((place) =>
    place.borehole.contacts
      .filter((contact) => tension(place, contact) > CONTRADICTED)
      .map(
        ({ boundary, depth, sigma }) =>
          `The borehole at x = ${place.borehole.x} m met the base of bed ${boundary + 1} at ${threeDigits(depth)} ± ${threeDigits(sigma)} m, which the readings and ties around it do not bear out: check which bed the contact belongs to.`,
      ),
  );
}

function samePlaces(places: readonly LinePlace[]): string[] {
  const shared = places.flatMap(({ x, sounding }, s) =>
    sounding && places.some((other, o) => o < s && other.sounding && other.x === x) ? [x] : [],
  );
  if (shared.length === 0) return [];
  return [
    `Soundings share the place x = ${[...new Set(shared)].join(', ')} m: they are tied as if they stood 1 m apart, each with a ground of its own.`,
  ];
}

/** Plain sentences about a whole line. */
export function lineWarnings(
  places: readonly LinePlace[],
  bored: readonly BoredPlace[],
  misfitProbability: number | null,
): string[] {
  const improbable = misfitProbability !== null && misfitProbability < TOLERANCES.misfitProbability;
  return [
    ...(improbable
      ? [
          'The misfit of the whole line is larger than the stated errors explain: a bed may end or step along it, or errors are larger than stated. The intervals are not rescaled.',
        ]
      : []),
    ...samePlaces(places),
    ...contradictions(bored),
  ];
}
