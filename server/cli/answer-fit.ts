import { compiledKernel, createOperatorCache, fitEarth } from '../../inversion';
import { fitRequestSchema } from '../contract/command-line';
import type { FitResult } from '../contract/fit-result';
import { parseLine } from './parse-line';

/** Answers `fit` lines; soundings with the same spreads share one operator. */
export function answerFit(): (line: unknown) => { id: string | number } & FitResult {
  const operators = createOperatorCache({ kernel: compiledKernel() });
  return (line) => {
    const { id, readings, settings } = parseLine(fitRequestSchema, line);
    return { id, ...fitEarth(readings, settings, { operators }) };
  };
}
