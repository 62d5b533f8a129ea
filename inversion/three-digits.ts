/** A positive number for a sentence, three significant digits, as the tables write it. */
export function threeDigits(value: number): string {
  const text = value.toPrecision(3);
  return value >= 999.5 ? String(Number(text)) : text;
}

/** The same with its unit, which no line break parts from it. */
export function amount(value: number, unit: string): string {
  return `${threeDigits(value)}\u00a0${unit}`;
}
