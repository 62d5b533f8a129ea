import type { RandomStream } from '../random';
import { checkSpread } from '../spread/check-spread';
import type { EarthModel, Spread } from '../types';
import { hypot } from '../math/hypot';
import { pow10 } from '../math/power';

/** 2–8 layers, thicknesses 0.2–60 m, resistivities over a contrast of 10 to 10⁴. */
export function randomEarth(random: RandomStream): EarthModel {
  const layers = 2 + random.below(7);
  const contrast = 1 + 3 * random.uniform();
  const lowest = 3 * random.uniform() - 0.5;
  return {
    resistivity: Array.from({ length: layers }, () => pow10(lowest + contrast * random.uniform())),
    thickness: Array.from({ length: layers - 1 }, () => pow10(-0.7 + 2.5 * random.uniform())),
  };
}

const KINDS = [
  'schlumberger',
  'half-schlumberger',
  'wenner',
  'pole-pole',
  'dipole-dipole',
  'electrodes',
] as const;

/** Four electrodes on random points of a square of side 2 m × `size`, none of them too close to cancelling. */
function randomElectrodes(random: RandomStream, size: number): Spread {
  for (;;) {
    const point = () => [size * (2 * random.uniform() - 1), size * (2 * random.uniform() - 1)] as const;
    const [a, b, m, n] = [point(), point(), point(), point()];
    const between = (p: readonly [number, number], q: readonly [number, number]) =>
      hypot(p[0] - q[0], p[1] - q[1]);
    const spread: Spread = {
      type: 'electrodes',
      am: between(a, m),
      an: between(a, n),
      bm: between(b, m),
      bn: between(b, n),
    };
    const bracket = 1 / spread.am! - 1 / spread.an! - 1 / spread.bm! + 1 / spread.bn!;
    if (checkSpread(spread) === null && Math.abs(bracket) * size > 0.1) return spread;
  }
}

/** A spread of the kind that `turn` comes to, of a spacing from 0.5 to 500 m. */
export function randomSpread(random: RandomStream, turn: number): Spread {
  const size = pow10(-0.3 + 3 * random.uniform());
  switch (KINDS[turn % KINDS.length]!) {
    case 'schlumberger':
      return { type: 'schlumberger', halfAB: size, halfMN: size / (2 + 98 * random.uniform()) };
    case 'half-schlumberger':
      return { type: 'half-schlumberger', halfAB: size, halfMN: size / (2 + 98 * random.uniform()) };
    case 'wenner':
      return { type: 'wenner', spacing: size };
    case 'pole-pole':
      return { type: 'pole-pole', spacing: size };
    case 'dipole-dipole': {
      const n = 1 + random.below(10);
      return { type: 'dipole-dipole', dipole: size / (n + 1), n };
    }
    case 'electrodes':
      return randomElectrodes(random, size);
  }
}
