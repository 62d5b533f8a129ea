import { compiledKernel, createOperatorCache, geometricFactor } from '../../inversion';
import { forwardRequestSchema, type ForwardAnswer } from '../contract/command-line';
import { parseLine } from './parse-line';

/** Answers `forward` lines; soundings with the same spreads share one operator. */
export function answerForward(): (line: unknown) => ForwardAnswer {
  const operators = createOperatorCache({ kernel: compiledKernel() });
  return (line) => {
    const { id, earth, spreads } = parseLine(forwardRequestSchema, line);
    return {
      id,
      apparentResistivity: Array.from(operators.operatorFor(spreads).predict(earth)),
      geometricFactor: spreads.map(geometricFactor),
    };
  };
}
