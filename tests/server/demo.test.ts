import { describe, expect, it } from 'vitest';
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

  it('lets a run of four beds stand for the proposed site', async () => {
    const [standing] = await db('run')
      .join('run_note', 'run_note.run_id', 'run.id')
      .join('run_state', 'run_state.run_id', 'run.id')
      .join('computation', 'computation.id', 'run_state.computation_id')
      .join('sounding', 'sounding.id', 'run.sounding_id')
      .where('sounding.name', 'S-07')
      .orderByRaw('run_note.pinned DESC, run.number DESC')
      .select(db.raw(`jsonb_array_length(computation.result -> 'earth' -> 'resistivity') AS beds`));
    expect(standing.beds).toBe(4);
  });

  it('leaves no job for the queue', async () => {
    expect((await db.raw('SELECT count(*)::int AS n FROM graphile_worker.jobs')).rows[0].n).toBe(0);
  });

  it.each(PEOPLE)('lets $role sign in', async ({ email }) => {
    const answer = await server.nobody.post('/session', { email, password: DEMO_PASSWORD });
    expect(answer.status).toBe(200);
  });
});
