import { ROLE_NAMES, roleSchema, type Role } from '../../server/contract/roles';

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

export const ROLE_LABELS = Object.fromEntries(
  roleSchema.options.map((role) => [role, capital(ROLE_NAMES[role])]),
) as Record<Role, string>;

/** What each role does, in one line. */
export const ROLE_NOTES: Record<Role, string> = {
  lead: 'everything a geophysicist does; members and settings',
  geophysicist: 'soundings, readings, runs, interpretations, submits for review',
  hydrogeologist: 'boreholes and water levels; accepts or asks for changes',
  analyst: 'computes runs again, begins interpretations as drafts',
  guest: 'reads',
};

export const ROLE_OPTIONS = (Object.keys(ROLE_LABELS) as Role[]).map((value) => ({
  value,
  label: `${ROLE_LABELS[value]}: ${ROLE_NOTES[value]}`,
}));

/** Who may do what others can only look at; the server's table of rights says the same. */
export const WHO_ASKS_FOR_RUNS = 'a lead or a geophysicist';
export const WHO_BEGINS_INTERPRETATIONS = 'a lead, a geophysicist or an archive analyst';
