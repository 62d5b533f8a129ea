import { MOST_LAYERS, requireFitInput } from '../../fit/check-fit-input';
import { InversionError } from '../../inversion-error';
import { magnitudeFault } from '../../magnitudes';
import type { Reading } from '../../types';
import type { EnsemblePrior, SampleSettings, TargetBed } from './ensemble-types';

export const MOST_DRAWS = 1_000_000;

type Path = readonly (string | number)[];

function requireRange(range: readonly [number, number], of: keyof EnsemblePrior, path: Path): void {
  const [low, high] = range;
  const fault =
    low < high ? (magnitudeFault(low, of) ?? magnitudeFault(high, of)) : 'the lower one must come first';
  if (fault)
    throw new InversionError('bounds', `the ${of} range is ${low} to ${high}; ${fault}`, [...path, of]);
}

function requirePrior(prior: EnsemblePrior, path: Path): void {
  for (const key of ['resistivity', 'thickness'] as const) requireRange(prior[key], key, path);
}

function requireTarget({ resistivity, minThickness, topAbove }: TargetBed): void {
  const path = ['settings', 'target'];
  requireRange(resistivity, 'resistivity', path);
  for (const [field, value] of [
    ['minThickness', minThickness],
    ['topAbove', topAbove],
  ] as const)
    if (!(value >= 0 && Number.isFinite(value)))
      throw new InversionError('target-bed', `${field} is ${value} m; it must be a number from 0 up`, [
        ...path,
        field,
      ]);
}

/** Throws `InversionError` with the path of the first input that cannot be sampled. */
export function requireSampleInput(readings: readonly Reading[], settings: SampleSettings): void {
  const { layers, prior, narrow, wide, target, draws, seed } = settings;
  requirePrior(prior, ['settings', 'prior']);
  if (narrow) requirePrior(narrow, ['settings', 'narrow']);
  if (wide) requirePrior(wide, ['settings', 'wide']);
  if (target) requireTarget(target);
  if (!(Number.isInteger(draws) && draws >= 1 && draws <= MOST_DRAWS))
    throw new InversionError(
      'sample-draws',
      `draws is ${draws}; it must be a whole number from 1 to ${MOST_DRAWS}`,
      ['settings', 'draws'],
    );
  if (layers !== 'unknown' && !(Number.isInteger(layers) && layers >= 1 && layers <= MOST_LAYERS))
    throw new InversionError(
      'layer-count',
      `layers is ${layers}; it must be 1 to ${MOST_LAYERS} or "unknown"`,
      ['settings', 'layers'],
    );
  requireFitInput(readings, {
    kind: 'layered',
    layers: layers === 'unknown' ? 'auto' : layers,
    seed,
    bounds: prior,
    fixed: [],
    priors: settings.priors ?? [],
    outlierTolerant: false,
  });
}
