/** Every threshold of the module: value, the inequality it stands in, and why. */
export const TOLERANCES = {
  /** A spread is refused when |1/AM − 1/AN − 1/BM + 1/BN| ≤ this × (1/AM + 1/AN + 1/BM + 1/BN): K would be noise. */
  bracketCancellation: 1e-9,
  /** Predicted/observed below this: the log residual goes on along its tangent, so that a ρa ≤ 0 keeps a finite, falling misfit. */
  logResidualFloor: 1e-3,
  /** converged-gradient: max |Jᵀr|ⱼ/‖Jⱼ‖ of the free parameters ≤ this × √χ²; below it rounding decides the next step. */
  gradient: 1e-6,
  /** χ² below this counts as this in the line above: the readings are met exactly. */
  exactFit: 1e-12,
  /** converged-step: max |Δ ln parameter| ≤ this. */
  step: 1e-8,
  /** converged-decrease: χ² fell by less than this × χ² in each of the last three accepted steps. */
  decrease: 1e-6,
  /** converged-decrease too: the linearised problem, undamped, promises a fall of χ² of no more than this × χ². */
  promise: 1e-10,
  /** no-descent: damping above this × its scale, and still no smaller χ². */
  damping: 1e9,
  /** Accepted and refused steps of one start together. */
  iterations: 120,
  /** A further start must lower χ² by this share to count as an improvement. */
  startImprovement: 0.05,
  /** A factor of one standard deviation above this says "not determined" (null). */
  factorLimit: 100,
  /** |correlation of ln h and ln ρ| above this is an equivalence. */
  equivalence: 0.95,
  /** Misfit probability below this is warned of. */
  misfitProbability: 0.01,
  /** A misfit that errors as stated would undercut with a chance below this is warned of as too small. */
  smallMisfitProbability: 0.005,
  /** A value within this (in ln) of a bound sits on it. */
  atBound: 1e-6,
} as const;
