/** A positive number for a sentence: three digits, whole from 1000 up. */
export function threeDigits(value: number): string {
  return value >= 999.5 ? String(Math.round(value)) : value.toPrecision(3);
}
