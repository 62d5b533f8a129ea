import { expose } from 'comlink';
import { createForwardOperator, type ForwardOperator, type LayeredEarth, type Spread } from '../../inversion';

/** Spread lists whose operator is kept: making one costs far more than using it. */
const KEPT_OPERATORS = 6;
const operators = new Map<string, ForwardOperator>();

function operatorFor(spreads: readonly Spread[]): ForwardOperator {
  const key = JSON.stringify(spreads);
  const operator = operators.get(key) ?? createForwardOperator(spreads);
  // Set anew, the list used last stands last and the oldest is the first to go.
  operators.delete(key);
  operators.set(key, operator);
  if (operators.size > KEPT_OPERATORS) operators.delete(operators.keys().next().value ?? '');
  return operator;
}

const engine = {
  predictCurve(spreads: readonly Spread[], earth: LayeredEarth): Float64Array {
    return operatorFor(spreads).predict(earth);
  },
};

export type EngineWorker = typeof engine;

expose(engine);
