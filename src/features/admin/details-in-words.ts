/** "role guest, fields name, note". */
export const detailsInWords = (details: Readonly<Record<string, unknown>>): string =>
  Object.entries(details)
    .filter(([, value]) => value !== null)
    .map(([key, value]) => `${key} ${valueInWords(value)}`)
    .join('; ');

function valueInWords(value: unknown): string {
  if (Array.isArray(value)) return value.map(valueInWords).join(', ');
  if (typeof value === 'object' && value !== null) return JSON.stringify(value);
  return String(value);
}
