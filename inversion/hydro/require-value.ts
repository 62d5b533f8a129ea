import { InversionError } from '../inversion-error';

/** Throws unless `value` lies in (above, most]; `name` and `unit` go into the sentence. */
export function requireValue(value: number, name: string, unit: string, above = 0, most = Infinity): void {
  if (value > above && value <= most && Number.isFinite(value)) return;
  const allowed = most === Infinity ? `above ${above}` : `above ${above} and at most ${most}`;
  throw new InversionError(
    'hydro-value',
    `${name} is ${value}; it must be a number ${allowed}${unit === '' ? '' : ` ${unit}`}`,
    [name],
  );
}
