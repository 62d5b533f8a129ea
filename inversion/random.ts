import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { skipN } from 'pure-rand/utils/skipN';
import { cos } from './math/circular';
import { log } from './math/logarithm';

/** A seeded stream of numbers; it advances with each call. */
export interface RandomStream {
  /** uniform on [0, 1) */
  readonly uniform: () => number;
  /** standard normal, Box–Muller */
  readonly normal: () => number;
  /** uniform whole number on [0, count) */
  readonly below: (count: number) => number;
}

/** The first values of small seeds resemble one another, so this many are thrown away. */
const DISCARDED = 64;

/** A generator (xoroshiro128+) from a whole seed 0 … 2³² − 1. The same seed gives the same stream. */
export function createRandomStream(seed: number): RandomStream {
  const generator = xoroshiro128plus(seed | 0);
  skipN(generator, DISCARDED);
  const uniform = () => uniformFloat64(generator);
  const normal = () => {
    const radius = Math.sqrt(-2 * log(1 - uniform()));
    return radius * cos(2 * Math.PI * uniform());
  };
  return { uniform, normal, below: (count) => Math.floor(uniform() * count) };
}
