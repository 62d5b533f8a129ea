/** |found/expected − 1|. */
export function relativeError(found: number, expected: number): number {
  return Math.abs(found / expected - 1);
}

export function median(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)]!;
}
