/** Thresholds of the checks of readings: value, the inequality it stands in, and why. */
export const READING_TOLERANCES = {
  /** sheet-mismatch: |written/computed − 1| > this; two digits on the sheet round by less. */
  sheetMismatch: 0.02,
  /** Differences are told beyond this many standard errors of the difference: one sound pair in twenty is past it. */
  standardErrors: 2,
  /** steep-rise: no layered earth raises ln ρa faster than ln spacing for these spreads. */
  steepestRise: 1,
  /** wide-mn: AB/2 ≤ this × MN/2. */
  wideMn: 5,
  /** branch-jump over a gap: at least this in ln ρa. */
  gapJump: 0.1,
  /**
   * branch-jump over a gap: what a layered earth may bend by there, in ln ρa per squared gap in ln spacing. The 99 % point
   * of 4 000 random earths of 2–5 beds, 10–10 000 Ω·m, over gaps of 1.33, 1.5 and 2 times the spacing is 2.3–2.7.
   */
  gapBend: 2.7,
  /** far-from-trend: residual beyond this many standard errors of the residual, plus the bend allowed below. */
  trendStandardErrors: 4,
  /**
   * far-from-trend: what a layered earth may leave the polynomial through its neighbours by, in ln ρa per product of the
   * two distances in ln spacing to the nearest ones. The 99.9 % points of 1 000 random earths of 2–5 beds, 10–10 000 Ω·m,
   * at 1.2, 1.33, 1.5 and 2 times the spacing, Wenner and Schlumberger: cubic ≤ 2.3, quadratic ≤ 3.1.
   */
  cubicBend: 2.3,
  quadraticBend: 3.1,
} as const;
