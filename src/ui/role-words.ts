import type { Role } from '../../server/contract/roles';

export const ROLE_LABELS: Record<Role, string> = {
  lead: 'Lead',
  geophysicist: 'Geophysicist',
  hydrogeologist: 'Hydrogeologist',
  analyst: 'Archive analyst',
  guest: 'Guest',
};

/** What each role does, in one line. */
export const ROLE_NOTES: Record<Role, string> = {
  lead: 'everything a geophysicist does; members and settings',
  geophysicist: 'soundings, readings, runs, interpretations, submits for review',
  hydrogeologist: 'boreholes and water levels; accepts or asks for changes',
  analyst: 'reproduces runs and proposes drafts',
  guest: 'reads',
};

export const ROLE_OPTIONS = (Object.keys(ROLE_LABELS) as Role[]).map((value) => ({
  value,
  label: `${ROLE_LABELS[value]}: ${ROLE_NOTES[value]}`,
}));
