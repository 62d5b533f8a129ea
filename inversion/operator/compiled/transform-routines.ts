import { DOUBLE, i32, increase, loop, pair, PAIR, routine, set, type Code, type Local } from './assembler';

const ONE = pair.twice(1);
const TWO = pair.twice(2);

/** decay[g] = e(2 + e), e = decay[g − perOctave], from the end of the first octave on, as `fillDecay`; `octave` and `length` in bytes. */
const fillDecay = (to: Local, from: Local, e: Local, decay: Local, octave: Local, length: Local): Code => [
  ...set(to, i32.add(decay, octave)),
  ...set(from, decay),
  ...loop(to, i32.add(decay, length), PAIR, [
    ...set(e, pair.load(from)),
    ...pair.store(to, pair.mul(e, pair.add(TWO, e))),
    ...increase(from, i32.value(PAIR)),
  ]),
];

/** 1/(over − te/ρ). */
const perDenominator = (over: Code, t: Code, e: Code, perRho: Code): Code =>
  pair.div(ONE, pair.sub(over, pair.mul(pair.mul(t, e), perRho)));

/** (t·over − ρe)/D. */
const raised = (t: Code, over: Code, rho: Code, e: Code, perD: Code): Code =>
  pair.mul(pair.sub(pair.mul(t, over), pair.mul(rho, e)), perD);

/** One layer of `transformAtNodes`. Addresses, `length` of a column and `octave` are in bytes; `values` are ρ, h. */
export const layerTransform = routine(
  'layerTransform',
  ['values', 'decay', 'transform', 'length', 'octave'],
  ['at', 'from'],
  ['e', 't', 'over', 'rho', 'perRho'],
  ({ values, decay, transform, length, octave, at, from, e, t, over, rho, perRho }) => [
    ...fillDecay(at, from, e, decay, octave, length),
    ...set(rho, pair.loadTwice(values)),
    ...set(perRho, pair.div(ONE, rho)),
    ...set(at, i32.value(0)),
    ...loop(at, length, PAIR, [
      ...set(e, pair.load(i32.add(decay, at))),
      ...set(t, pair.load(i32.add(transform, at))),
      ...set(over, pair.add(TWO, e)),
      ...pair.store(i32.add(transform, at), raised(t, over, rho, e, perDenominator(over, t, e, perRho))),
    ]),
  ],
);

/** One layer of `transformAndDerivatives`: the chain factor to `pass`, the two derivatives to `byRho` and `byThickness`. */
export const layerDerivatives = routine(
  'layerDerivatives',
  ['values', 'decay', 'transform', 'length', 'octave', 'lambda', 'pass', 'byRho', 'byThickness'],
  ['at', 'from'],
  ['e', 't', 'over', 'rho', 'perRho', 'thickness', 'perD', 'perD2', 'sech', 'ttPerRho'],
  (locals) => {
    const { values, decay, transform, length, octave, lambda, pass, byRho, byThickness, at, from } = locals;
    const { e, t, over, rho, perRho, thickness, perD, perD2, sech, ttPerRho } = locals;
    const twiceTe = pair.mul(pair.mul(TWO, t), e);
    return [
      ...fillDecay(at, from, e, decay, octave, length),
      ...set(rho, pair.loadTwice(values)),
      ...set(thickness, pair.loadTwice(i32.add(values, i32.value(DOUBLE)))),
      ...set(perRho, pair.div(ONE, rho)),
      ...set(at, i32.value(0)),
      ...loop(at, length, PAIR, [
        ...set(e, pair.load(i32.add(decay, at))),
        ...set(t, pair.load(i32.add(transform, at))),
        ...set(over, pair.add(TWO, e)),
        ...set(perD, perDenominator(over, t, e, perRho)),
        ...set(perD2, pair.mul(perD, perD)),
        ...set(sech, pair.mul(pair.mul(pair.twice(4), pair.add(ONE, e)), perD2)),
        ...set(ttPerRho, pair.mul(pair.mul(t, t), perRho)),
        ...pair.store(i32.add(pass, at), sech),
        ...pair.store(
          i32.add(byRho, at),
          pair.mul(
            pair.mul(pair.negated(e), pair.sub(pair.mul(over, pair.add(rho, ttPerRho)), twiceTe)),
            perD2,
          ),
        ),
        ...pair.store(
          i32.add(byThickness, at),
          pair.mul(
            pair.mul(pair.mul(pair.load(i32.add(lambda, at)), thickness), sech),
            pair.sub(rho, ttPerRho),
          ),
        ),
        ...pair.store(i32.add(transform, at), raised(t, over, rho, e, perD)),
      ]),
    ];
  },
);

/** One layer of `chainFromSurface`: both derivatives × chain, then chain × pass. */
export const chainLayer = routine(
  'chainLayer',
  ['chain', 'pass', 'byRho', 'byThickness', 'length'],
  ['at'],
  ['factor'],
  ({ chain, pass, byRho, byThickness, length, at, factor }) => {
    const multiplied = (base: Code): Code =>
      pair.store(i32.add(base, at), pair.mul(pair.load(i32.add(base, at)), factor));
    return loop(at, length, PAIR, [
      ...set(factor, pair.load(i32.add(chain, at))),
      ...multiplied(byRho),
      ...multiplied(byThickness),
      ...pair.store(i32.add(chain, at), pair.mul(factor, pair.load(i32.add(pass, at)))),
    ]);
  },
);

/** The end of `chainFromSurface`: column = chain × ρ of the half-space, which stands at `halfSpace`. */
export const chainEnd = routine(
  'chainEnd',
  ['chain', 'halfSpace', 'column', 'length'],
  ['at'],
  ['rho'],
  ({ chain, halfSpace, column, length, at, rho }) => [
    ...set(rho, pair.loadTwice(halfSpace)),
    ...loop(at, length, PAIR, pair.store(i32.add(column, at), pair.mul(pair.load(i32.add(chain, at)), rho))),
  ],
);
