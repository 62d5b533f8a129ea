import type { Spread } from '../types';
import { createForwardOperator, type ForwardOperator } from './forward-operator';
import { plainKernel, type KernelMaker } from './lattice-kernel';

/** Forward operators kept by their list of spreads. */
export interface OperatorCache {
  readonly operatorFor: (spreads: readonly Spread[]) => ForwardOperator;
}

export interface OperatorCacheOptions {
  /** what computes; `compiledKernel()` where the host may compile */
  readonly kernel?: KernelMaker;
  /** operators that are kept */
  readonly limit?: number;
}

/**
 * A cache that its owner holds and hands on: soundings of one survey share their spacings. The least recently asked-for
 * operator leaves first. An operator depends on its spreads alone, so a cached one gives the same bits as a new one.
 */
export function createOperatorCache({
  kernel = plainKernel,
  limit = 64,
}: OperatorCacheOptions = {}): OperatorCache {
  const kept = new Map<string, ForwardOperator>();
  return {
    operatorFor: (spreads) => {
      const key = JSON.stringify(spreads);
      const operator = kept.get(key) ?? createForwardOperator(spreads, kernel);
      kept.delete(key);
      kept.set(key, operator);
      if (kept.size > limit) kept.delete(kept.keys().next().value!);
      return operator;
    },
  };
}
