import { differenceInCalendarDays, format } from 'date-fns';
import { isHeldRange } from '../../inversion/held-range';
import { asGiven, groupDigits, significant, threeDigits, withMinus } from '../../inversion/three-digits';

const DASH = '\u2013';

/** Words for a bound that the data do not give, and for a range of no width: the value was held, and nothing is told of it. */
export const NOT_BOUNDED = 'not bounded';
export const HELD = 'held';

/** `digits` significant figures, plain decimals, groups apart from 10 000 on: 0.0123, 12.4, 1240, 12 400. */
export function formatSignificant(value: number, digits = 3): string {
  return significant(value, digits);
}

/** A number as a person gave it, groups apart: 0.1, 7000, 12 400. */
export const formatGiven = asGiven;

/** A length that a person gave, in m without unit, as it was written; a conversion of units may leave further digits. */
export function formatGivenLength(metres: number): string {
  return formatGiven(Number(metres.toPrecision(6)));
}

/** A fixed number of decimals, for columns that line up on the point. */
export function formatFixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return DASH;
  const text = Math.abs(value).toFixed(decimals);
  return Number(text) === 0 ? text : withMinus(value, groupDigits(text));
}

/** Resistivity in Ω·m, no unit. */
export const formatResistivity = threeDigits;

/** Length in m, no unit. */
export const formatLength = threeDigits;

/** χ²/N, no unit. */
export const formatMisfit = threeDigits;

export function withUnit(text: string, unit: string): string {
  return `${text}\u00a0${unit}`;
}

/** 2.94 → "2.9 %". */
export function formatPercent(value: number, decimals = 1): string {
  return Number.isFinite(value) ? `${formatFixed(value, decimals)}\u00a0%` : DASH;
}

export type Bounds = readonly [number | null, number | null];

/** "1.20–3.40", "at least 1.20", "at most 3.40", "not bounded" or "held"; ends that read alike are one number. */
export function formatRange(bounds: Bounds): string {
  const [low, high] = bounds;
  if (isHeldRange(bounds)) return HELD;
  if (low === null) return high === null ? NOT_BOUNDED : `at most ${threeDigits(high)}`;
  if (high === null) return `at least ${threeDigits(low)}`;
  const [from, to] = [threeDigits(low), threeDigits(high)];
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
