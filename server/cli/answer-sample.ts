import { compiledKernel, createOperatorCache, sampleEnsemble } from '../../inversion';
import { sampleRequestSchema, type SampleResult } from '../contract/sample';
import { parseLine } from './parse-line';

/** Answers `sample` lines; soundings with the same spreads share one operator. */
export function answerSample(): (line: unknown) => { id: string | number } & SampleResult {
  const operators = createOperatorCache({ kernel: compiledKernel() });
  return (line) => {
    const { id, readings, settings } = parseLine(sampleRequestSchema, line);
    return { id, ...sampleEnsemble(readings, settings, { operators }) };
  };
}
