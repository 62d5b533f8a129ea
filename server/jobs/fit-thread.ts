import { performance } from 'node:perf_hooks';
import type { MessagePort } from 'node:worker_threads';
import { compiledKernel, createOperatorCache, fitEarth, InversionError } from '../../inversion/index';
import type { FitResult } from '../contract/fit-result';
import type { RunInput } from '../contract/runs';
import { progressReport } from './fit-progress';

export interface FitOrder {
  readonly input: RunInput;
  readonly progress: MessagePort;
}

/** Errors lose their class on the way between threads, so a refused input is told as data. */
export type FitAnswer =
  { readonly result: FitResult; readonly durationMs: number } | { readonly refusal: string };

const REPORT_EVERY_MS = 250;
/** Soundings of a survey share their spacings. */
const operators = createOperatorCache({ kernel: compiledKernel() });

/** The body of a computing thread: one fit, with its progress told at most four times a second. */
export default function computeFit({ input, progress }: FitOrder): FitAnswer {
  const startedAt = performance.now();
  let reportedAt = startedAt;
  try {
    const result = fitEarth(input.readings, input.settings, {
      operators,
      onProgress(state) {
        const now = performance.now();
        if (now - reportedAt < REPORT_EVERY_MS) return;
        reportedAt = now;
        progress.postMessage(progressReport(state, input.settings));
      },
    });
    return { result, durationMs: performance.now() - startedAt };
  } catch (error) {
    if (error instanceof InversionError) return { refusal: error.message };
    throw error;
  } finally {
    progress.close();
  }
}
