import { createRandomStream } from '../inversion';
import {
  answeredTargets,
  calibrationTrial,
  evenness,
  ranksOfTruth,
  reliability,
  type AnsweredTarget,
} from '../inversion/reference/calibration-trials';
import { chiSquaredSurvival } from '../inversion/uncertainty/chi-squared';
import { drawPosterior } from '../inversion/uncertainty/ensemble/draw-posterior';
import { unknownCountSpace } from '../inversion/uncertainty/ensemble/ground-space';

/** Trials of each sampler, unless the command line says otherwise. */
const TRIALS = 300;
const QUESTIONS = 20;
const BINS = [
  [0.1, 0.3],
  [0.4, 0.6],
  [0.7, 0.9],
] as const;
const LEAST_ANSWERS = 400;
const LIMIT = 0.01;

let failures = 0;

function judge(right: boolean, words: string): void {
  if (!right) failures++;
  console.log(`${right ? 'holds ' : 'FAILS '} ${words}`);
}

/** Ranks of the truth, and answers to target questions with what was true. */
function calibrate(layers: number | 'unknown', trials: number): AnsweredTarget[] {
  const ranks: number[][] = [];
  const answers: AnsweredTarget[] = [];
  let short = 0;
  for (let trial = 0; trial < trials; trial++) {
    const random = createRandomStream(20_261_201 + trial);
    const one = calibrationTrial(layers, 1000 + trial);
    if (!(one.drawn.rHat < 1.01)) short++;
    ranksOfTruth(one, random).forEach((rank, quantity) => (ranks[quantity] ??= []).push(rank));
    answers.push(...answeredTargets(one, QUESTIONS, random));
  }
  const chances = ranks.map(evenness);
  const worst = Math.min(1, Math.min(...chances) * chances.length);
  judge(
    worst > LIMIT,
    `${layers} layers: ranks of ${chances.length} quantities over ${trials} trials are even, worst p ${worst.toFixed(3)} after Bonferroni (${short} with R-hat from 1.01 up)`,
  );
  console.log(`       each: ${chances.map((chance) => chance.toFixed(3)).join(' ')}`);
  return answers;
}

function reportReliability(answers: readonly AnsweredTarget[]): void {
  for (let tenth = 0; tenth < 10; tenth++) {
    const above = tenth === 9 ? Infinity : (tenth + 1) / 10;
    const { count, mean, cameTrue, standardError } = reliability(answers, tenth / 10, above);
    console.log(
      `       from ${tenth / 10} up: ${count} answers, mean ${mean.toFixed(3)}, came true ${cameTrue.toFixed(3)} ± ${standardError.toFixed(3)}`,
    );
  }
  for (const [low, high] of BINS) {
    const { count, mean, cameTrue } = reliability(answers, low, high);
    judge(
      count >= LEAST_ANSWERS && Math.abs(mean - cameTrue) <= 0.05,
      `target answers of ${low} to ${high}: ${count}, mean ${mean.toFixed(3)}, came true ${cameTrue.toFixed(3)}`,
    );
  }
}

/** With the likelihood off, the layer counts come back even. */
function reportPrior(): void {
  const space = unknownCountSpace({ resistivity: [1, 1e4], thickness: [0.2, 200] });
  const { chains, effectiveSampleSize } = drawPosterior(
    { space, logLikelihood: () => 0 },
    { draws: 20_000, seed: 1, report: () => undefined },
  );
  const shares = Array.from({ length: 8 }, () => 0);
  for (const { layers, size } of chains)
    for (const count of layers) shares[count - 1]! += 1 / (size * chains.length);
  const sum = shares.reduce((total, share) => total + (share - 0.125) ** 2 / 0.125, 0) * effectiveSampleSize;
  const p = chiSquaredSurvival(sum, 7);
  judge(p > LIMIT, `likelihood off: the layer counts are even, p ${p.toFixed(3)}`);
}

const trials = Number(process.argv[2] ?? TRIALS);
reportPrior();
reportReliability([...calibrate(3, trials), ...calibrate('unknown', trials)]);
process.exitCode = failures === 0 ? 0 : 1;
