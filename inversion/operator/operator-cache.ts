import type { Spread } from '../types';
import { createForwardOperator, type ForwardOperator } from './forward-operator';

/** Forward operators kept by their list of spreads. */
export interface OperatorCache {
  readonly operatorFor: (spreads: readonly Spread[]) => ForwardOperator;
}

/**
 * A cache that its owner holds and hands on: soundings of one survey share their spacings. The least recently asked-for
 * operator leaves first. An operator depends on its spreads alone, so a cached one gives the same bits as a new one.
 */
export function createOperatorCache(limit = 64): OperatorCache {
  const kept = new Map<string, ForwardOperator>();
  return {
    operatorFor: (spreads) => {
      const key = JSON.stringify(spreads);
      const operator = kept.get(key) ?? createForwardOperator(spreads);
      kept.delete(key);
      kept.set(key, operator);
      if (kept.size > limit) kept.delete(kept.keys().next().value!);
      return operator;
    },
  };
}
