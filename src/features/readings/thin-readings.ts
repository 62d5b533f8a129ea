/** More marks than this lie on one another and only make a drawing slow. */
const MOST_DRAWN = 400;

/** Every n-th item, the first and the last among them, so that at most a few hundred are drawn. */
export function thinReadings<T>(items: readonly T[]): { drawn: readonly T[]; every: number } {
  const every = Math.ceil(items.length / MOST_DRAWN);
  if (every <= 1) return { drawn: items, every: 1 };
  return { drawn: items.filter((_, i) => i % every === 0 || i === items.length - 1), every };
}
