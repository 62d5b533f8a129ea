export type DecimalMark = '.' | ',';
export type SheetNumber = { value: number; message: null } | { value: null; message: string };

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
const GROUPED = /^[+-]?\d{1,3}( \d{3})+([.,]\d*)?$/;
const SPACES = /[\s\u00a0\u2009\u202f]+/g;

const refuse = (message: string): SheetNumber => ({ value: null, message });

/**
 * Reads a number as a crew writes it: decimal point or comma, thousands apart by spaces, 1e3, a true minus.
 * Two decimal signs are refused rather than guessed. `decimalMark` fixes the sign that a whole file uses, so that
 * 1,234 in a file with points is not taken for 1.234.
 */
export function parseSheetNumber(text: string, decimalMark?: DecimalMark): SheetNumber {
  const plain = text
    .trim()
    .replace(SPACES, ' ')
    .replace(/[\u2212\u2013]/g, '-');
  const signs = plain.match(/[.,]/g) ?? [];
  if (signs.length > 1) return refuse('has more than one decimal sign');
  if (decimalMark && signs[0] && signs[0] !== decimalMark)
    return refuse(
      `has a decimal ${signs[0] === ',' ? 'comma' : 'point'} where the file uses a ${decimalMark === ',' ? 'comma' : 'point'}`,
    );
  if (plain.includes(' ') && !GROUPED.test(plain)) return refuse('is not a number');
  const written = plain.replaceAll(' ', '').replace(',', '.');
  const value = NUMBER.test(written) ? Number(written) : Number.NaN;
  return Number.isFinite(value) ? { value, message: null } : refuse('is not a number');
}

/** Twelve digits: a value that went through another unit and back is the same value again. */
export const scaleNumber = (value: number, scale: number): number =>
  scale === 1 ? value : Number((value * scale).toPrecision(12));

/** The written form of a stored value; parsing it with the same scale gives the stored value back. */
export const writeNumber = (stored: number, scale: number): string =>
  String(scale === 1 ? stored : Number((stored / scale).toPrecision(15)));
