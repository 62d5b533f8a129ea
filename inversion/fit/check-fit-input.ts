import { requireEarth } from '../earth/check-earth';
import { InversionError } from '../inversion-error';
import { magnitudeFault } from '../magnitudes';
import { requireSpread } from '../spread/require-spread';
import type { FitSettings, Reading } from '../types';

export const MOST_LAYERS = 8;
/** A shift held closer than this is none. */
const LEAST_SHIFT_SIGMA = 1e-9;

function requireReadings(readings: readonly Reading[]): void {
  if (readings.length === 0)
    throw new InversionError('no-readings', 'there are no readings; a fit needs at least one', ['readings']);
  readings.forEach((reading, i) => {
    requireSpread(reading.spread, ['readings', i, 'spread']);
    for (const [field, of] of [
      ['apparentResistivity', 'resistivity'],
      ['relativeError', 'relativeError'],
    ] as const) {
      const fault = magnitudeFault(reading[field], of);
      if (fault)
        throw new InversionError(
          'reading-value',
          `${field} of reading ${i + 1} is ${reading[field]}; ${fault}`,
          ['readings', i, field],
        );
    }
  });
}

function requireBounds({ bounds }: FitSettings): void {
  for (const key of ['resistivity', 'thickness'] as const) {
    const [low, high] = bounds[key];
    if (!(low > 0 && high > low && Number.isFinite(high)))
      throw new InversionError(
        'bounds',
        `the ${key} bounds are ${low} to ${high}; they must be two numbers above 0, the lower one first`,
        ['settings', 'bounds', key],
      );
    const fault = magnitudeFault(low, key) ?? magnitudeFault(high, key);
    if (fault)
      throw new InversionError('bounds', `the ${key} bounds are ${low} to ${high}; ${fault}`, [
        'settings',
        'bounds',
        key,
      ]);
  }
}

function requireStart({ start, layers }: FitSettings): void {
  if (!start) return;
  requireEarth(start, ['settings', 'start']);
  if (layers !== 'auto' && start.resistivity.length !== layers)
    throw new InversionError(
      'earth-shape',
      `the start has ${start.resistivity.length} layers; it must have ${layers}`,
      ['settings', 'start', 'resistivity'],
    );
}

function requireFixed({ fixed, layers, bounds }: FitSettings): void {
  fixed.forEach(({ on, index, value }, i) => {
    const path = ['settings', 'fixed', i];
    if (layers === 'auto')
      throw new InversionError('fixed-parameter', 'a fixed value needs a stated layer count', path);
    const count = on === 'resistivity' ? layers : layers - 1;
    if (!(Number.isInteger(index) && index >= 0 && index < count))
      throw new InversionError(
        'fixed-parameter',
        count > 0
          ? `fixed ${on} index is ${index}; it must be a whole number from 0 to ${count - 1}`
          : `fixed ${on} index is ${index}; one layer has no thickness to fix`,
        [...path, 'index'],
      );
    const before = fixed.findIndex((one) => one.on === on && one.index === index);
    if (before < i)
      throw new InversionError(
        'fixed-parameter',
        `${on} ${index} is fixed twice, at ${fixed[before]!.value} and at ${value}; a value can be fixed once`,
        path,
      );
    const [low, high] = bounds[on];
    if (!(value >= low && value <= high))
      throw new InversionError(
        'fixed-parameter',
        `fixed ${on} is ${value}; it must lie within the bounds ${low} to ${high}`,
        [...path, 'value'],
      );
  });
}

function requirePriors({ priors, layers }: FitSettings): void {
  priors.forEach(({ on, index, value, sigma }, i) => {
    const path = ['settings', 'priors', i];
    const refuse = (message: string, field?: string) => {
      throw new InversionError('prior', message, field === undefined ? path : [...path, field]);
    };
    if (layers === 'auto') return refuse('a prior needs a stated layer count');
    const count = on === 'resistivity' ? layers : layers - 1;
    if (!(Number.isInteger(index) && index >= 0 && index < count))
      return refuse(
        count > 0
          ? `${on} index of the prior is ${index}; it must be a whole number from 0 to ${count - 1}`
          : `a model of one layer has no ${on} to know beforehand`,
        'index',
      );
    for (const [field, number, of] of [
      ['value', value, on === 'resistivity' ? 'resistivity' : 'thickness'],
      ['sigma', sigma, on === 'depth' ? 'thickness' : 'relativeError'],
    ] as const) {
      const fault = magnitudeFault(number, of);
      if (fault) refuse(`${field} of the prior is ${number}; ${fault}`, field);
    }
  });
}

function requireBranchShiftSigma({ branchShiftSigma }: FitSettings): void {
  if (branchShiftSigma !== undefined && !(branchShiftSigma >= LEAST_SHIFT_SIGMA && branchShiftSigma <= 1))
    throw new InversionError(
      'branch-shift',
      `branchShiftSigma is ${branchShiftSigma}; it must be from ${LEAST_SHIFT_SIGMA} to 1`,
      ['settings', 'branchShiftSigma'],
    );
}

/** Throws `InversionError` with the path of the first input that no kind of fit can use. */
export function requireReadingsAndBounds(readings: readonly Reading[], settings: FitSettings): void {
  requireReadings(readings);
  requireBounds(settings);
  requireBranchShiftSigma(settings);
}

/** Throws `InversionError` with the path of the first input that a layered fit cannot use. */
export function requireFitInput(readings: readonly Reading[], settings: FitSettings): void {
  requireReadingsAndBounds(readings, settings);
  const { layers } = settings;
  if (layers !== 'auto' && !(Number.isInteger(layers) && layers >= 1 && layers <= MOST_LAYERS))
    throw new InversionError('layer-count', `layers is ${layers}; it must be 1 to ${MOST_LAYERS} or "auto"`, [
      'settings',
      'layers',
    ]);
  requireFixed(settings);
  requirePriors(settings);
  requireStart(settings);
}
