import type { Knex } from 'knex';
import type { PEOPLE } from '../../server/demo/scenario';

export type DemoRole = (typeof PEOPLE)[number]['role'];

export interface Screen {
  name: string;
  path: string;
  /** Who looks at it; null = nobody signed in. */
  role: DemoRole | null;
  /** A role and name that stand on the page once it is whole. */
  shows: { role: 'heading' | 'button' | 'table' | 'figure' | 'navigation'; name: string | RegExp };
}

async function idOf(db: Knex, table: string, where: Record<string, unknown>): Promise<string> {
  const row = await db(table).where(where).first<{ id: string } | undefined>('id');
  if (!row) throw new Error(`no row of ${table} has ${JSON.stringify(where)}`);
  return row.id;
}

const heading = (name: string | RegExp): Screen['shows'] => ({ role: 'heading', name });

/** Every screen of the product, as the demo fills it. */
export async function allScreens(db: Knex): Promise<Screen[]> {
  const surveyId = await idOf(db, 'survey', { name: 'Ostrel valley' });
  const site = await idOf(db, 'sounding', { name: 'S-07' });
  const unfitted = await idOf(db, 'sounding', { name: 'S-05' });
  const draft = await idOf(db, 'interpretation', { title: 'Rock near the middle of the line' });
  const draftSite = await idOf(db, 'sounding', { name: 'S-12' });
  const proposal = await idOf(db, 'interpretation', { title: 'Proposed site of the second well' });
  const runs = await db('run').where({ sounding_id: site }).orderBy('number').pluck<string[]>('id');
  const survey = `/surveys/${surveyId}`;
  return [
    { name: 'sign-in', path: '/sign-in', role: null, shows: heading('Sign in') },
    {
      name: 'forgot-password',
      path: '/forgot-password',
      role: null,
      shows: { role: 'button', name: 'Send the letter' },
    },
    { name: 'surveys', path: '/', role: 'hydrogeologist', shows: heading('Waiting for you') },
    { name: 'survey', path: survey, role: 'lead', shows: { role: 'navigation', name: /^Plan of/ } },
    {
      name: 'soundings',
      path: `${survey}/soundings`,
      role: 'geophysicist',
      shows: { role: 'table', name: 'Soundings' },
    },
    { name: 'boreholes', path: `${survey}/boreholes`, role: 'hydrogeologist', shows: heading(/^BH-1/) },
    { name: 'members', path: `${survey}/members`, role: 'lead', shows: heading('What each role does') },
    {
      name: 'field-sheet',
      path: `/soundings/${site}/readings`,
      role: 'geophysicist',
      shows: { role: 'table', name: 'Readings' },
    },
    {
      name: 'bench',
      path: `/soundings/${site}/bench`,
      role: 'geophysicist',
      shows: heading(/^Run [A-Z]/),
    },
    {
      name: 'bench-without-runs',
      path: `/soundings/${unfitted}/bench`,
      role: 'geophysicist',
      shows: heading('Ledger'),
    },
    {
      name: 'side-by-side',
      path: `/soundings/${site}/side-by-side?runs=${runs.slice(0, 2).join(',')}`,
      role: 'hydrogeologist',
      shows: heading(/^[A-Z] and [A-Z]$/),
    },
    {
      name: 'interpretations',
      path: `/soundings/${site}/interpretations`,
      role: 'hydrogeologist',
      shows: heading('Interpretations'),
    },
    {
      name: 'interpretation',
      path: `/soundings/${site}/interpretations/${proposal}`,
      role: 'hydrogeologist',
      shows: heading('Proposed site of the second well'),
    },
    {
      name: 'interpretation-editor',
      path: `/soundings/${draftSite}/interpretations/${draft}`,
      role: 'geophysicist',
      shows: { role: 'button', name: 'Save changes' },
    },
    {
      name: 'settings',
      path: '/settings',
      role: 'guest',
      shows: { role: 'button', name: 'Sign out everywhere' },
    },
    { name: 'admin-people', path: '/admin', role: 'admin', shows: { role: 'table', name: /./ } },
    {
      name: 'admin-surveys',
      path: '/admin?view=surveys',
      role: 'admin',
      shows: { role: 'table', name: /./ },
    },
    { name: 'admin-mail', path: '/admin?view=mail', role: 'admin', shows: heading('Administration') },
    { name: 'admin-events', path: '/admin?view=events', role: 'admin', shows: { role: 'table', name: /./ } },
    {
      name: 'not-found',
      path: '/no-such-page',
      role: 'guest',
      shows: heading('Nothing stands at this address'),
    },
    { name: 'no-permission', path: '/admin', role: 'guest', shows: heading('Your role does not allow this') },
  ];
}
