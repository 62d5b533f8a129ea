import {
  createForwardOperator,
  type LayeredEarth,
  type RandomStream,
  type Reading,
} from '../../../inversion';

/** 2–5 layers, the first near the shortest spacing, each deeper one 1.6 to 3.6 times as thick; 3 to 1600 Ω·m. */
function randomGround(random: RandomStream): LayeredEarth {
  const layers = 2 + random.below(4);
  let thickness = 0.8;
  return {
    resistivity: Array.from({ length: layers }, () => 10 ** (0.5 + 2.7 * random.uniform())),
    thickness: Array.from({ length: layers - 1 }, (_, i) => {
      if (i > 0) thickness *= 1.6 + 2 * random.uniform();
      return thickness * (0.7 + 0.7 * random.uniform());
    }),
  };
}

/** A noisy sounding of a random ground; the error and the count of readings go round with its number. */
export function trialSounding(
  random: RandomStream,
  number: number,
): { truth: LayeredEarth; readings: Reading[] } {
  const truth = randomGround(random);
  const error = [0.01, 0.03, 0.05][number % 3]!;
  const count = [15, 19, 25, 31][number % 4]!;
  const spreads = Array.from({ length: count }, (_, i) => {
    const halfAB = 300 ** (i / (count - 1));
    return { type: 'schlumberger', halfAB, halfMN: Math.min(halfAB / 3, halfAB < 25 ? 0.5 : 5) } as const;
  });
  const clean = createForwardOperator(spreads).predict(truth);
  const readings = spreads.map((spread, i): Reading => ({
    spread,
    apparentResistivity: clean[i]! * Math.exp(error * random.normal()),
    relativeError: error,
  }));
  return { truth, readings };
}
