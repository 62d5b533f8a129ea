import type { TargetBed } from './ensemble-types';
import type { SampledEarths } from './sampled-earths';

/**
 * 1 for each sample that holds the wanted bed, else 0: a run of adjoining layers with ρ in [a, b] is one bed; it must be at least
 * `minThickness` thick and its top must lie at `topAbove` or higher. The half-space has no end.
 */
export function holdsBed(
  earths: SampledEarths,
  { resistivity: [a, b], minThickness, topAbove }: TargetBed,
): Float64Array {
  const { size, stride, layers, parameters } = earths;
  const holds = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    const at = i * stride;
    const count = layers[i]!;
    let depth = 0;
    let top = 0;
    let within = false;
    for (let layer = 0; layer < count && holds[i] === 0; layer++) {
      const rho = parameters[at + layer]!;
      const was = within;
      within = rho >= a && rho <= b;
      if (within && !was) top = depth;
      depth = layer < count - 1 ? depth + parameters[at + count + layer]! : Infinity;
      if (within && top <= topAbove && depth - top >= minThickness) holds[i] = 1;
    }
  }
  return holds;
}
