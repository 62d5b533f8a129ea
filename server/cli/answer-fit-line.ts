import { compiledKernel, createOperatorCache, fitLine } from '../../inversion';
import { fitLineRequestSchema, type FitLineAnswer } from '../contract/fit-line';
import { parseLine } from './parse-line';

/** Answers `fit-line` lines; soundings with the same spreads share one operator. */
export function answerFitLine(): (line: unknown) => FitLineAnswer {
  const operators = createOperatorCache({ kernel: compiledKernel() });
  return (line) => {
    const { id, soundings, settings } = parseLine(fitLineRequestSchema, line);
    const { soundings: fitted, ...whole } = fitLine(soundings, settings, { operators });
    return { id, ...whole, soundings: fitted.map((result, i) => ({ id: soundings[i]!.id, ...result })) };
  };
}
