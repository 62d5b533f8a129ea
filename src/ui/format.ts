import { differenceInCalendarDays, format } from 'date-fns';

/** U+202F: groups digits and keeps a unit with its number without letting the line break. */
const THIN = '\u202f';
const DASH = '\u2013';
const MINUS = '\u2212';

/** Words for a bound that the data do not give. */
export const NOT_BOUNDED = 'not bounded';

/** `digits` significant figures, plain decimals, groups apart from 10 000 on: 0.0123, 12.4, 1240, 12 400. */
export function formatSignificant(value: number, digits = 3): string {
  if (!Number.isFinite(value)) return DASH;
  if (value === 0) return '0';
  const magnitude = Math.abs(value);
  // Rounding may carry into the next decade (9.996 → 10.0), so the decade is taken after it.
  const decade = Math.floor(Math.log10(Number(magnitude.toPrecision(digits))));
  const decimals = Math.max(0, digits - 1 - decade);
  if (decimals > 9) return withMinus(value, trimExponent(magnitude, digits));
  const rounded =
    decade >= digits
      ? Math.round(magnitude / 10 ** (decade - digits + 1)) * 10 ** (decade - digits + 1)
      : magnitude;
  return withMinus(value, groupDigits(rounded.toFixed(decimals)));
}

/** A number as a person gave it, groups apart: 0.1, 7000, 12 400. */
export function formatGiven(value: number): string {
  return Number.isFinite(value) ? withMinus(value, groupDigits(String(Math.abs(value)))) : DASH;
}

/** A fixed number of decimals, for columns that line up on the point. */
export function formatFixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return DASH;
  const text = Math.abs(value).toFixed(decimals);
  return Number(text) === 0 ? text : withMinus(value, groupDigits(text));
}

/** Resistivity in Ω·m, three significant figures, no unit. */
export function formatResistivity(value: number): string {
  return formatSignificant(value, 3);
}

/** χ² per reading, the same three significant figures wherever it stands. */
export function formatMisfit(chi2PerReading: number): string {
  return formatSignificant(chi2PerReading, 3);
}

/** Length in m, no unit: two significant figures below 10 m (3.1), three above (12.4). */
export function formatLength(value: number): string {
  return formatSignificant(value, Math.abs(value) < 9.95 ? 2 : 3);
}

export function withUnit(text: string, unit: string): string {
  return `${text}\u00a0${unit}`;
}

/** 2.94 → "2.9 %". */
export function formatPercent(value: number, decimals = 1): string {
  return Number.isFinite(value) ? `${formatFixed(value, decimals)}\u00a0%` : DASH;
}

export type Bounds = readonly [number | null, number | null];

/**
 * "1.2–3.4", "at least 1.2", "at most 3.4" or "not bounded". Each end has two significant figures (three from 100 on) and
 * as many more as it takes to tell the ends apart: 134–145, 3.9–36, 138.2–138.9.
 */
export function formatRange([low, high]: Bounds, formatValue?: (value: number) => string): string {
  const one = formatValue ?? ((value: number) => formatSignificant(value, leastDigits(value)));
  if (low === null) return high === null ? NOT_BOUNDED : `at most ${one(high)}`;
  if (high === null) return `at least ${one(low)}`;
  const end = formatValue ?? ((value: number) => formatSignificant(value, rangeDigits(value, high - low)));
  const [from, to] = [end(low), end(high)];
  return from === to ? from : `${from}${DASH}${to}`;
}

/** Relative error as a percentage of two significant figures: 0.03 → "3.0 %". */
export function formatRelativeError(relative: number): string {
  return `${formatSignificant(relative * 100, 2)}\u00a0%`;
}

/** "today 09:12", "yesterday 17:40", "3 Mar 14:05", "3 Mar 2024". Local time of the reader. */
export function formatMoment(moment: string | Date, now: Date = new Date()): string {
  const date = new Date(moment);
  const days = differenceInCalendarDays(now, date);
  if (days === 0) return `today ${format(date, 'HH:mm')}`;
  if (days === 1) return `yesterday ${format(date, 'HH:mm')}`;
  return format(date, date.getFullYear() === now.getFullYear() ? 'd MMM HH:mm' : 'd MMM yyyy');
}

/** "3 Mar 2024". A date without a time ("2024-03-03") is the same day everywhere. */
export function formatDay(day: string | Date): string {
  const isPlainDay = typeof day === 'string' && /^\d{4}-\d{2}-\d{2}$/.test(day);
  return format(isPlainDay ? new Date(`${day}T00:00`) : new Date(day), 'd MMM yyyy');
}

/** "11 ms", "1.4 s", "2 min 05 s". */
export function formatDuration(milliseconds: number): string {
  if (milliseconds < 999.5) return `${Math.round(milliseconds)}\u00a0ms`;
  const seconds = milliseconds / 1000;
  if (seconds < 59.95) return `${seconds.toFixed(1)}\u00a0s`;
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)}\u00a0min\u00a0${String(whole % 60).padStart(2, '0')}\u00a0s`;
}

/** "1 reading", "20 readings", "12 400 readings". */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${groupDigits(String(count))} ${count === 1 ? one : many}`;
}

/** Significant figures of one end so that the last of them is at most half the width of the range, 5 at most. */
function rangeDigits(end: number, width: number): number {
  if (end === 0 || width <= 0) return leastDigits(end);
  const needed = Math.floor(Math.log10(Math.abs(end))) - Math.floor(Math.log10(width / 2)) + 1;
  return Math.min(5, Math.max(leastDigits(end), needed));
}

const leastDigits = (end: number) => (Math.abs(end) < 99.5 ? 2 : 3);

function groupDigits(text: string): string {
  const [whole = '', decimals] = text.split('.');
  const grouped = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN);
  return decimals === undefined ? grouped : `${grouped}.${decimals}`;
}

function trimExponent(magnitude: number, digits: number): string {
  return magnitude.toExponential(digits - 1).replace('-', MINUS);
}

function withMinus(value: number, text: string): string {
  return value < 0 ? `${MINUS}${text}` : text;
}
