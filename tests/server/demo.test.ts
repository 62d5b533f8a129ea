import { describe, expect, it } from 'vitest';
import { soundingPageSchema } from '../../server/contract/soundings';
import { INTERPRETATIONS } from '../../server/demo/interpretations';
import { loadDemo } from '../../server/demo/load-demo';
import { DEMO_PASSWORD, PEOPLE, SOUNDINGS } from '../../server/demo/scenario';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { db, services } = server;

describe('the demo', () => {
  it('loads once, whole, with every kind of trouble and state it promises', async () => {
    const first = await loadDemo(services);
    expect(first.loaded).toBe(true);
    expect(first.accounts).toHaveLength(PEOPLE.length);
    expect((await loadDemo(services)).loaded).toBe(false);
    expect(await db('sounding').count('* as n').first()).toEqual({ n: String(SOUNDINGS.length) });
    expect(await db('borehole').count('* as n').first()).toEqual({ n: '4' });
    expect(await db('line').count('* as n').first()).toEqual({ n: '3' });
    expect(await db('run_state').whereNot('state', 'finished').first()).toBeUndefined();
    expect(await db('interpretation').distinct('state').orderBy('state').pluck('state')).toEqual([
      'accepted',
      'draft',
      'in-review',
    ]);
  }, 240_000);

  it('lets the run stand that a sounding is interpreted by, or else the automatic choice', async () => {
    const lead = await server.signIn(await db('app_user').where({ email: PEOPLE[0].email }).first());
    const { id } = await db('survey').first('id');
    const { items } = soundingPageSchema.parse((await lead.get(`/surveys/${id}/soundings`)).body);
    const standing = new Map(items.map(({ name, latestRun }) => [name, latestRun]));
    for (const { sounding, layers } of INTERPRETATIONS)
      expect([sounding, standing.get(sounding)?.layers]).toEqual([sounding, layers]);
    const newest = await db('run')
      .join('sounding', 'sounding.id', 'run.sounding_id')
      .where({ 'sounding.name': 'S-10' })
      .orderBy('run.number', 'desc')
      .first('run.id', 'run.number', db.raw("run.input -> 'settings' ->> 'layers' AS layers"));
    expect(newest).toMatchObject({ number: 2, layers: 'auto' });
    expect(standing.get('S-10')?.id).toBe(newest.id);
  });

  it('leaves no job for the queue', async () => {
    expect((await db.raw('SELECT count(*)::int AS n FROM graphile_worker.jobs')).rows[0].n).toBe(0);
  });

  it.each(PEOPLE)('lets $role sign in', async ({ email }) => {
    const answer = await server.nobody.post('/session', { email, password: DEMO_PASSWORD });
    expect(answer.status).toBe(200);
  });
});
