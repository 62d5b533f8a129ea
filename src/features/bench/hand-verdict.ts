import { chiSquaredSurvival } from '../../../inversion';
import type { FitResult } from '../../../server/contract/fit-result';
import type { Run } from '../../../server/contract/runs';
import { misfitWords } from '../../runs/misfit-words';
import { isRejected } from '../../runs/rejected-fit';
import { sameEarth } from './hand-model';
import { noiseLimit } from './noise-limit';
import type { ModelHandle } from './use-model';

type LayerCount = NonNullable<FitResult['layerCounts']>[number];

export interface ModelVerdict {
  /** Follows "This model". */
  words: string;
  rejects: boolean;
  /** What it is judged by. */
  title: string;
}

/** Fewest degrees of freedom at which a misfit can be tested. */
const TESTABLE = 2;

function verdict(chi2: number, degrees: number, title: string): ModelVerdict | null {
  if (!Number.isFinite(chi2) || degrees < TESTABLE) return null;
  const fit = { misfitProbability: chiSquaredSurvival(chi2, degrees) };
  return { words: misfitWords(fit) ?? '', rejects: isRejected(fit), title };
}

/** A model made by hand: nothing of it was fitted, so every reading is a degree of freedom. */
const verdictOfHand = (chi2PerReading: number, readings: number): ModelVerdict | null =>
  verdict(
    chi2PerReading * readings,
    readings,
    `Judged by χ² with N = ${readings} degrees of freedom, since no value of it was fitted`,
  );

/** A model of the ladder says what its row says of it. */
function verdictOfCount(count: LayerCount, readings: number): ModelVerdict | null {
  const limit = noiseLimit(count, readings);
  if (limit === null || count.withinNoise === null) return null;
  const title = `Judged by χ² with N − p = ${limit.degrees} degrees of freedom, as its row of the ladder is`;
  const judged = verdict(count.chi2PerReading * readings, limit.degrees, title);
  if (judged === null || judged.rejects || count.withinNoise) return judged;
  return { words: 'lies outside the noise of the readings', rejects: false, title };
}

/** Of the model that is shown where it is not the run's own; null before its curve is computed. */
export function verdictOf(
  { hand, isFromLadder }: Pick<ModelHandle, 'hand' | 'isFromLadder'>,
  run: Pick<Run, 'result'> | null,
  misfit: { chi2PerReading: number } | null,
  readings: number,
): ModelVerdict | null {
  if (hand === null || misfit === null) return null;
  if (!isFromLadder) return verdictOfHand(misfit.chi2PerReading, readings);
  const count = run?.result?.layerCounts?.find(({ earth }) => sameEarth(earth, hand));
  return count ? verdictOfCount(count, readings) : null;
}
