import { hypot } from '../math/hypot';

/**
 * Strengths q_n of the images of any number of layers whose thicknesses are whole multiples of one unit d:
 * T₁(λ) = ρ₁ + Σ_{n ≥ 1} q_n exp(−2nλd), by dividing polynomials in x = exp(−2λd). Exact arithmetic on the coefficients,
 * no integration: an independent check of recurrence and operator.
 *
 * From below, T = A(x)/B(x). With t = tanh(λ m d) = (1 − x^m)/(1 + x^m) a layer of m units turns this into
 * A' = A(1 + x^m) + ρB(1 − x^m),  B' = B(1 + x^m) + A(1 − x^m)/ρ.
 */
export function imageStrengths(
  resistivity: readonly number[],
  units: readonly number[],
  terms: number,
): Float64Array {
  let a = [resistivity.at(-1)!];
  let b = [1];
  for (let i = units.length - 1; i >= 0; i--) {
    const rho = resistivity[i]!;
    const shift = units[i]!;
    const top = Array.from({ length: a.length + shift }, (_, k) => {
      const here = a[k] ?? 0;
      const moved = a[k - shift] ?? 0;
      return here + moved + rho * ((b[k] ?? 0) - (b[k - shift] ?? 0));
    });
    const bottom = top.map((_, k) => {
      const here = b[k] ?? 0;
      const moved = b[k - shift] ?? 0;
      return here + moved + ((a[k] ?? 0) - (a[k - shift] ?? 0)) / rho;
    });
    const scale = bottom[0]!;
    a = top.map((value) => value / scale);
    b = bottom.map((value) => value / scale);
  }
  const quotient = new Float64Array(terms);
  for (let n = 0; n < terms; n++) {
    let value = a[n] ?? 0;
    for (let k = 1; k < b.length && k <= n; k++) value -= b[k]! * quotient[n - k]!;
    quotient[n] = value / b[0]!;
  }
  return quotient;
}

/** 2πV/I in Ω at distance r from image strengths (`quotient[0]` = ρ₁) and their unit d in m. */
export function potentialFromImages(r: number, strengths: Float64Array, unit: number): number {
  let sum = 0;
  for (let n = strengths.length - 1; n >= 0; n--) sum += strengths[n]! / hypot(r, 2 * n * unit);
  return sum;
}
