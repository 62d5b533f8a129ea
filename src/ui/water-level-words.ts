import { formatGivenLength, withUnit } from './format';

/** A water level by its depth, as it was written: "1.9 m below ground", "0.4 m above ground" for one that rises over it. */
export function waterLevelWords(depthM: number): string {
  return `${withUnit(formatGivenLength(Math.abs(depthM)), 'm')} ${depthM < 0 ? 'above' : 'below'} ground`;
}
