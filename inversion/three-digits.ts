/** A positive number for a sentence, three significant digits, as the tables write it. */
export function threeDigits(value: number): string {
  const text = value.toPrecision(3);
  return value >= 999.5 ? String(Number(text)) : text;
}
