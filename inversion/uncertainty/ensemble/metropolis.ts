import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import type { MoveName } from './ensemble-types';
import { copyGround, type Ground } from './ground';
import type { GroundSpace } from './ground-space';
import type { LogLikelihood } from './likelihood';

/** What is sampled: prior × likelihood. */
export interface Model {
  readonly space: GroundSpace;
  readonly logLikelihood: LogLikelihood;
  /** The likelihood proper, where `logLikelihood` is a quick one near to it that rules at β < 1 and sorts out trials at β = 1. */
  readonly logExact?: LogLikelihood;
}

/** A way to a trial ground. */
export interface Move {
  readonly name: MoveName;
  /** share of the trials */
  readonly weight: number;
  /** Writes `layers` and `values` of the trial; returns ln q(from|to) − ln q(to|from), or −Infinity where it finds none. */
  readonly propose: (from: Ground, to: Ground, random: RandomStream) => number;
}

/**
 * Whether a trial that the quick likelihood has let pass also passes with the exact one: chance min(1, (L′/Lq′)/(L/Lq)), L exact and
 * Lq quick. Both stages together leave the exact posterior as it is, however far off the quick one may be.
 * Source: Christen & Fox 2005, J. Comput. Graph. Statist. 14, 795–810 (from memory).
 */
export function passesExactly(
  logExact: LogLikelihood,
  current: Ground,
  trial: Ground,
  random: RandomStream,
): boolean {
  trial.logExact = logExact(trial);
  const gain = trial.logExact - trial.logLikelihood - (current.logExact - current.logLikelihood);
  return gain >= 0 || log(random.uniform()) < gain;
}

/**
 * One Metropolis–Hastings–Green step at inverse temperature `beta`: accepted with chance
 * min(1, (L′/L)^β · prior′/prior · q(from|to)/q(to|from)); `current` then becomes the trial. Returns whether it did.
 * Source: Green 1995, Biometrika 82, 711–732 (from memory).
 */
export function metropolisStep(
  { space, logLikelihood, logExact }: Model,
  move: Move,
  beta: number,
  current: Ground,
  trial: Ground,
  random: RandomStream,
): boolean {
  trial.logMixture = NaN;
  const ratio = move.propose(current, trial, random);
  if (ratio === -Infinity) return false;
  trial.logPrior = space.logPrior(trial);
  if (trial.logPrior === -Infinity) return false;
  trial.logLikelihood = logLikelihood(trial);
  const gain =
    beta * (trial.logLikelihood - current.logLikelihood) + trial.logPrior - current.logPrior + ratio;
  if (!(gain >= 0 || log(random.uniform()) < gain)) return false;
  if (logExact && beta === 1 && !passesExactly(logExact, current, trial, random)) return false;
  copyGround(trial, current);
  return true;
}

/** The move whose share of the weights `chance` (0 to 1) falls in. */
export function pickMove(moves: readonly Move[], chance: number): number {
  let left = chance * moves.reduce((sum, move) => sum + move.weight, 0);
  for (let i = 0; i < moves.length - 1; i++) {
    left -= moves[i]!.weight;
    if (left < 0) return i;
  }
  return moves.length - 1;
}
