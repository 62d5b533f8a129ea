import { formatGiven, withUnit } from './format';

export type ParsedNumber = { value: number; fault: null } | { value: null; fault: string | null };

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
const SPACES = /[\s\u00a0\u2009\u202f]/g;

/**
 * Reads a number as people write it: "1e3", a decimal point or comma, groups of digits apart by spaces, a true minus.
 * An empty text is no value and no fault; a text with two kinds of decimal sign is refused rather than guessed.
 */
export function parseNumber(text: string): ParsedNumber {
  const trimmed = text.trim();
  if (trimmed === '') return { value: null, fault: null };
  const signs = trimmed.match(/[.,]/g) ?? [];
  if (signs.length > 1)
    return { value: null, fault: `Found “${trimmed}”: use one decimal point or comma and no other` };
  const plain = trimmed.replace(SPACES, '').replace(',', '.').replace('\u2212', '-').replace('\u2013', '-');
  const value = NUMBER.test(plain) ? Number(plain) : Number.NaN;
  if (!Number.isFinite(value))
    return { value: null, fault: `Found “${trimmed}”: write a number, such as 12.5 or 12,5` };
  return { value, fault: null };
}

export interface NumberLimits {
  min?: number | undefined;
  max?: number | undefined;
  /** The value must lie above this, not on it. */
  above?: number | undefined;
  /** The value must lie below this, not on it. */
  below?: number | undefined;
  integer?: boolean | undefined;
}

/** The fault of a number against its limits, in words, or null. */
export function limitFault(value: number, limits: NumberLimits, unit = ''): string | null {
  const say = (bound: number) => (unit === '' ? formatGiven(bound) : withUnit(formatGiven(bound), unit));
  if (limits.integer === true && !Number.isInteger(value)) return `Found ${value}: write a whole number`;
  if (limits.above !== undefined && value <= limits.above)
    return `Found ${value}: must be above ${say(limits.above)}`;
  if (limits.min !== undefined && value < limits.min)
    return `Found ${value}: must be at least ${say(limits.min)}`;
  if (limits.below !== undefined && value >= limits.below)
    return `Found ${value}: must be below ${say(limits.below)}`;
  if (limits.max !== undefined && value > limits.max)
    return `Found ${value}: must be at most ${say(limits.max)}`;
  return null;
}
