/** U+202F groups digits without letting the line break; U+2212 is the minus; U+2013 stands for no number. */
const THIN = '\u202f';
const MINUS = '\u2212';
const DASH = '\u2013';
const NO_BREAK = '\u00a0';

/** A number of more decimals than this, or of more digits, is written as a power. */
const MOST_DECIMALS = 9;
const MOST_DIGITS = 15;

/** Groups of three digits, from 10 000 on: "1240", "12 400". */
export function groupDigits(text: string): string {
  const [whole = '', decimals] = text.split('.');
  const grouped = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN);
  return decimals === undefined ? grouped : `${grouped}.${decimals}`;
}

export function withMinus(value: number, text: string): string {
  return value < 0 ? `${MINUS}${text}` : text;
}

/** A number as a person gave it, every digit of it: 0.1, 7000, 12 400, −10 000 000. */
export function asGiven(value: number): string {
  return Number.isFinite(value) ? withMinus(value, groupDigits(String(Math.abs(value)))) : DASH;
}

/** `digits` significant figures in plain decimals: 0.0123, 12.4, 1240, 12 400; a dash for what is no number. */
export function significant(value: number, digits: number): string {
  if (!Number.isFinite(value)) return DASH;
  if (value === 0) return '0';
  // rounding may carry into the next decade (9.996 → 10.0), so the decade is taken after it
  const power = Math.abs(value).toExponential(digits - 1);
  const decade = Number(power.split('e')[1]);
  const decimals = Math.max(0, digits - 1 - decade);
  if (decimals > MOST_DECIMALS || decade >= MOST_DIGITS) return withMinus(value, power.replace('-', MINUS));
  return withMinus(value, groupDigits(Number(power).toFixed(decimals)));
}

/** How every quantity is written, in sentences, tables and drawings alike: three significant figures. */
export function threeDigits(value: number): string {
  return significant(value, 3);
}

/** The same with its unit, which no line break parts from it. */
export function amount(value: number, unit: string): string {
  return `${threeDigits(value)}${NO_BREAK}${unit}`;
}

/** How every factor is written: "×÷ 1.14", the value divided and multiplied by it. */
export function timesOrDivided(factor: number): string {
  return `×÷${NO_BREAK}${threeDigits(factor)}`;
}
