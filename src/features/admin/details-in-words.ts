import { ROLE_NAMES, roleSchema } from '../../../server/contract/roles';

const UUID = /^[0-9a-f]{8}-[0-9a-f-]{27}$/;

/** "role guest; fields name, note; run 55b9ee2e": what has no name is told by the first part of its id, "from" before "to". */
export const detailsInWords = (details: Readonly<Record<string, unknown>>): string =>
  Object.entries(details)
    .filter(([, value]) => value !== null)
    .toSorted(([a], [b]) => Number(a === 'to') - Number(b === 'to'))
    .map(([key, value]) => `${keyInWords(key)} ${roleInWords(value) ?? valueInWords(value)}`)
    .join('; ');

function roleInWords(value: unknown): string | null {
  const role = roleSchema.safeParse(value);
  return role.success ? ROLE_NAMES[role.data] : null;
}

const keyInWords = (key: string): string =>
  key.replace(/Id$/, '').replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);

function valueInWords(value: unknown): string {
  if (Array.isArray(value)) return value.map(valueInWords).join(', ');
  if (typeof value === 'object' && value !== null) return JSON.stringify(value);
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const text = String(value);
  return UUID.test(text) ? text.slice(0, 8) : text;
}
