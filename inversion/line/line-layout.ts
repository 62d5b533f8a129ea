import { createLayeredProblem, type LayeredProblem } from '../fit/layered-problem';
import { createResidualSystem, type ResidualSystem } from '../fit/residual-system';
import { soundingCurve, type SoundingCurve } from '../fit/starting-models';
import { createForwardOperator, type ForwardOperator } from '../operator/forward-operator';
import { createOperatorCache, type OperatorCache } from '../operator/operator-cache';
import type { GaussianPrior, Reading } from '../types';
import { lateralTie } from './lateral-ties';
import type { LineBorehole, LineContact, LineSettings, LineSounding } from './line-types';
import type { LineProblem } from './line-problem';

/** A sounding of a line, ready to be fitted with any count. */
export interface PlacedSounding {
  /** in the list that was given */
  readonly index: number;
  readonly x: number;
  readonly readings: readonly Reading[];
  readonly operator: ForwardOperator;
  readonly system: ResidualSystem;
  readonly curve: SoundingCurve;
}

/** A place on the line: a sounding, or a borehole, which is a place with no readings whose depths are known. */
export type LinePlace =
  | { readonly x: number; readonly sounding: PlacedSounding }
  | { readonly x: number; readonly sounding: null; readonly borehole: LineBorehole };

const priorOf = ({ boundary, depth, sigma }: LineContact): GaussianPrior => ({
  on: 'depth',
  index: boundary,
  value: depth,
  sigma,
});

/** Soundings and boreholes from the least x to the greatest; at one x as they were given, soundings first. */
export function placesOf(
  soundings: readonly LineSounding[],
  settings: LineSettings,
  operators: OperatorCache = createOperatorCache(),
): LinePlace[] {
  const placed = soundings.map(({ x, readings }, index): LinePlace => {
    const operator = operators.operatorFor(readings.map(({ spread }) => spread));
    const system = createResidualSystem(operator, readings, settings);
    const sounding = { index, x, readings, operator, system, curve: soundingCurve(readings) };
    return { x, sounding };
  });
  const bored = settings.boreholes.map((borehole): LinePlace => ({
    x: borehole.x,
    sounding: null,
    borehole,
  }));
  return [...placed, ...bored].sort((a, b) => a.x - b.x);
}

/** The fit of all places with one count. A borehole ties its contacts to its neighbours through the ties of its place. */
export function lineProblem(
  places: readonly LinePlace[],
  layers: number,
  settings: LineSettings,
): LineProblem {
  const nowhere = createForwardOperator([]);
  const { bounds, fixed } = settings;
  const nodes = places.map((place): LayeredProblem => {
    if (place.sounding)
      return createLayeredProblem(place.sounding.system, layers, settings, settings.branchShiftSigma);
    const priors = place.borehole.contacts.map(priorOf);
    return createLayeredProblem(createResidualSystem(nowhere, [], { priors }), layers, {
      bounds,
      fixed,
      priors,
    });
  });
  const ties = places.slice(1).map((place, s) => lateralTie(place.x - places[s]!.x, settings.lateral));
  return { layers, nodes, ties, known: { misfits: new WeakMap(), slopes: new WeakMap() } };
}

/**
 * What a sounding knows by itself when it looks for its starting models: its settings, and the contacts of the boreholes next
 * to it, their σ widened by how far the boundary may wander on the way: σ² + (D/perDepth)².
 */
export function loneProblem(
  places: readonly LinePlace[],
  at: number,
  layers: number,
  settings: LineSettings,
): LayeredProblem {
  const { sounding } = places[at]!;
  const { readings, operator } = sounding!;
  const contacts = [at - 1, at + 1].flatMap((o) => {
    const place = places[o];
    if (!place || place.sounding) return [];
    const { perDepth } = lateralTie(Math.abs(place.x - places[at]!.x), settings.lateral);
    return place.borehole.contacts.map((contact): GaussianPrior => {
      const wander = contact.depth / perDepth;
      return { ...priorOf(contact), sigma: Math.sqrt(contact.sigma * contact.sigma + wander * wander) };
    });
  });
  const priors = [...settings.priors, ...contacts.filter(({ index }) => index < layers - 1)];
  const lone = { ...settings, priors };
  return createLayeredProblem(
    createResidualSystem(operator, readings, lone),
    layers,
    lone,
    settings.branchShiftSigma,
  );
}
