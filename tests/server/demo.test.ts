import { describe, expect, it } from 'vitest';
import type { FitResult } from '../../server/contract/fit-result';
import { soundingPageSchema } from '../../server/contract/soundings';
import { INTERPRETATIONS } from '../../server/demo/interpretations';
import { loadDemo } from '../../server/demo/load-demo';
import { BOREHOLES, DEMO_PASSWORD, PEOPLE, SOUNDINGS } from '../../server/demo/scenario';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { db, services } = server;

/** Every number in words but those of names and of the 95 % range. */
const numbersIn = (words: string): number[] =>
  [...words.replace(/BH-\d+|S-\d+|95 %/g, '').matchAll(/\d+(\.\d+)?/g)].map(([text]) => Number(text));

const depthsOf = (thickness: readonly number[]): number[] =>
  thickness.map((_, i) => thickness.slice(0, i + 1).reduce((sum, height) => sum + height, 0));

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

  /** Finished runs of a sounding of the demo by their count of beds. */
  async function resultsOf(sounding: string): Promise<Map<number, FitResult>> {
    const results = await db('run_state')
      .join('run', 'run.id', 'run_state.run_id')
      .join('sounding', 'sounding.id', 'run.sounding_id')
      .join('computation', 'computation.id', 'run_state.computation_id')
      .where({ 'sounding.name': sounding })
      .pluck<FitResult[]>('computation.result');
    return new Map(results.map((result) => [result.earth.resistivity.length, result]));
  }

  it.each(INTERPRETATIONS)(
    'writes of $sounding only numbers of its run and of the boreholes',
    async (demo) => {
      const result = (await resultsOf(demo.sounding)).get(demo.layers)!;
      const place = SOUNDINGS.find(({ name }) => name === demo.sounding)!;
      const { earth, darZarrouk, intervals } = result;
      const holes = BOREHOLES.filter(({ name }) => demo.narrative.includes(name));
      const known = [
        ...earth.resistivity,
        ...earth.thickness,
        ...depthsOf(earth.thickness),
        ...intervals.thickness.flat().filter((end) => end !== null),
        ...darZarrouk.conductanceS,
        ...darZarrouk.resistanceOhmM2,
        ...holes.map(({ xM, yM }) => Math.hypot(xM - place.xM, yM - place.yM)),
        ...holes.flatMap((hole) => hole.intervals.flatMap(({ topM, baseM }) => [topM, baseM - topM])),
      ];
      for (const number of numbersIn(demo.narrative))
        expect([number, known.some((value) => Math.abs(number / value - 1) < 0.03)]).toEqual([number, true]);
      if (!demo.narrative.includes('95 % range')) return;
      const contacts = holes[0]!.intervals.slice(1).map(({ topM }) => topM);
      expect(contacts).toHaveLength(intervals.depth.length);
      contacts.forEach((contact, i) => {
        const [low, high] = intervals.depth[i]!;
        expect(contact).toBeGreaterThanOrEqual(low ?? 0);
        expect(contact).toBeLessThanOrEqual(high ?? Infinity);
      });
    },
  );

  it('says of too few and of enough beds what the runs say', async () => {
    expect((await resultsOf('S-07')).get(3)?.misfitProbability).toBeLessThan(0.01);
    const rock = await resultsOf('S-12');
    expect([...rock.keys()].toSorted((a, b) => a - b)).toEqual([2, 3, 4]);
    expect(rock.get(2)?.misfitProbability).toBeGreaterThan(0.05);
    expect(rock.get(3)?.warnings.join()).toMatch(/Another model fits nearly as well/);
  });

  it('names another candidate for every bed: resistivity alone never names one ground', () => {
    expect(INTERPRETATIONS.flatMap(({ beds }) => beds).filter((bed) => bed.otherCandidates === '')).toEqual(
      [],
    );
  });

  it('leaves no job for the queue', async () => {
    expect((await db.raw('SELECT count(*)::int AS n FROM graphile_worker.jobs')).rows[0].n).toBe(0);
  });

  it.each(PEOPLE)('lets $role sign in', async ({ email }) => {
    const answer = await server.nobody.post('/session', { email, password: DEMO_PASSWORD });
    expect(answer.status).toBe(200);
  });
});
