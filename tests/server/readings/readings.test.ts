import { beforeEach, describe, expect, it } from 'vitest';
import {
  DEFAULT_SHEET_UNITS as units,
  fieldSheetSchema,
  revisionListSchema,
  revisionSchema,
  type SheetRow,
} from '../../../server/contract/readings';
import { createTestServer, type Client } from '../../setup/server';

const server = await createTestServer();
let soundingId = '';
let surveyId = '';
let lead: Client;
let other: Client;
let guest: Client;
let outsider: Client;

beforeEach(async () => {
  surveyId = (await server.createSurvey()).id;
  soundingId = (await server.createSounding(surveyId, { name: 'V1', spreadType: 'wenner' })).id;
  lead = await server.signInAs('lead', surveyId);
  other = await server.signInAs('geophysicist', surveyId);
  guest = await server.signInAs('guest', surveyId);
  outsider = await server.signInOutsider();
});

const row = (spacing: string, resistance: string, excluded: string | null = null): SheetRow => ({
  cells: { spacing, resistance },
  excluded,
});
const sheet = (rows: SheetRow[], baseRevisionId: string | null = null) => ({ rows, units, baseRevisionId });
const THREE = [row('5', '2'), row('10', '0,9'), row('20', '0.4')];
const save = (client: Client, rows: SheetRow[], base: string | null = null) =>
  client.post(`/soundings/${soundingId}/revisions`, sheet(rows, base));
const savedBy = async (client: Client, rows: SheetRow[], base: string | null = null) =>
  revisionSchema.parse((await save(client, rows, base)).body);
const waitingForLocks = async (): Promise<number> => {
  const [found] = await server
    .db('pg_stat_activity')
    .whereRaw(`datname = current_database() AND wait_event_type = 'Lock'`)
    .count<{ count: string }[]>();
  return Number(found?.count ?? 0);
};
const fieldSheet = async (client: Client) =>
  fieldSheetSchema.parse((await client.get(`/soundings/${soundingId}/readings`)).body);

describe('POST /soundings/:soundingId/revisions', () => {
  it('refuses strangers, guests, and rows with faults, naming row, column, found and allowed', async () => {
    expect((await save(server.nobody, THREE)).status).toBe(401);
    const faulty = await save(lead, [row('5', '2'), row('', ''), row('1,5,2', '1'), row('20', '-1')]);
    expect(faulty.status).toBe(422);
    expect(faulty.body).toMatchObject({
      code: 'invalid',
      detail: '2 rows cannot be used. Nothing was saved.',
      faults: [
        {
          path: ['rows', 3, 'a'],
          message: 'Row 3, a: has more than one decimal sign',
          found: '1,5,2',
          allowed: expect.stringMatching(/above 0\sm/),
        },
        { path: ['rows', 4, 'R'], message: expect.stringMatching(/K·V\/I gives -/) },
      ],
    });
    expect((await save(lead, [row(' ', '')])).body).toMatchObject({
      detail: 'The sheet holds no reading to save.',
    });
    expect((await save(outsider, THREE)).status).toBe(404);
    expect((await save(guest, THREE)).status).toBe(403);
    expect((await fieldSheet(lead)).revision).toBeNull();
  });

  it('saves what was on the sheet, and shows what follows from it', async () => {
    const answer = await save(lead, THREE);
    expect(answer.status).toBe(201);
    const revision = revisionSchema.parse(answer.body);
    expect(revision).toMatchObject({ number: 1, current: true, excluded: 0, sourceFile: null, checks: [] });
    expect(revision.readings[1]).toMatchObject({
      spread: { spacing: 10 },
      resistanceOhm: 0.9,
      voltageMv: null,
    });
    expect(revision.derived[0]).toMatchObject({
      plottingSpacingM: 7.5,
      geometricFactorM: expect.closeTo(10 * Math.PI, 9),
      apparentResistivityOhmM: expect.closeTo(20 * Math.PI, 9),
      relativeError: 0.03,
    });
    expect((await fieldSheet(guest)).revision?.id).toBe(revision.id);
  });

  it('is the same revision when the content is equal, and drops the draft', async () => {
    const first = await savedBy(lead, THREE);
    await lead.put(`/soundings/${soundingId}/reading-draft`, sheet(THREE, first.id));
    const again = await save(
      lead,
      [row('5.0', '2'), row('10', '0.90'), row('', ''), row('20', '4e-1')],
      first.id,
    );
    expect(again.status).toBe(200);
    expect(again.body).toMatchObject({ id: first.id, number: 1 });
    expect((await fieldSheet(lead)).draft).toBeNull();
  });

  it('is no conflict when someone else saved the same content before', async () => {
    const first = await savedBy(lead, THREE);
    const theirs = await savedBy(other, THREE.slice(0, 2), first.id);
    const same = await save(lead, THREE.slice(0, 2), first.id);
    expect(same.status).toBe(200);
    expect(same.body).toMatchObject({ id: theirs.id, author: { id: other.user?.id } });
  });

  it('makes an older revision current again when its content returns', async () => {
    const first = await savedBy(lead, THREE);
    const second = await savedBy(lead, THREE.slice(0, 2), first.id);
    expect(second).toMatchObject({ number: 2, current: true });
    const back = await save(lead, THREE, second.id);
    expect(back.status).toBe(200);
    expect(back.body).toMatchObject({ id: first.id, current: true });
    const { items } = revisionListSchema.parse((await lead.get(`/soundings/${soundingId}/revisions`)).body);
    expect(items.map(({ number, current, readings }) => [number, current, readings])).toEqual([
      [2, false, 2],
      [1, true, 3],
    ]);
  });

  it('takes leaving a reading out, with its reason, as a change of content', async () => {
    const first = await savedBy(lead, THREE);
    const left = await savedBy(lead, [row('5', '2', 'fence'), ...THREE.slice(1)], first.id);
    expect(left).toMatchObject({ number: 2, excluded: 1 });
    expect(left.readings[0]?.excluded).toBe('fence');
    expect(left.contentHash).not.toBe(first.contentHash);
  });

  it('answers a stale base with the current revision, and keeps the draft', async () => {
    const first = await savedBy(lead, THREE);
    const theirs = await savedBy(other, THREE.slice(0, 2), first.id);
    await lead.put(`/soundings/${soundingId}/reading-draft`, sheet([row('5', '7')], first.id));
    const stale = await save(lead, [row('5', '7')], first.id);
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'conflict', current: { id: theirs.id, number: 2 } });
    const kept = await fieldSheet(lead);
    expect(kept.draft?.rows).toEqual([row('5', '7')]);
    expect(kept.revision?.id).toBe(theirs.id);
    expect((await save(lead, [row('5', '7')], null)).status).toBe(409);
  });

  it('waits for a save that is under way, and then judges by what it left', async () => {
    const first = await savedBy(lead, THREE);
    const trx = await server.db.transaction();
    await trx('sounding').where({ id: soundingId }).forUpdate().first('id');
    const made = await trx('data_revision')
      .insert({
        sounding_id: soundingId,
        number: 2,
        content_hash: 'theirs',
        readings: JSON.stringify(first.readings),
        author_id: other.user?.id,
      })
      .returning<{ id: string }[]>('id');
    await trx('sounding').where({ id: soundingId }).update({ current_revision_id: made[0]?.id });
    const mine = save(lead, [row('5', '7')], first.id).then((answer) => answer);
    await expect.poll(waitingForLocks, { timeout: 15_000 }).toBeGreaterThan(0);
    await trx.commit();
    const answer = await mine;
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'conflict', current: made[0] });
  });

  it('never changes or deletes a revision', async () => {
    const { id } = await savedBy(lead, THREE);
    await expect(server.db('data_revision').where({ id }).update({ number: 9 })).rejects.toThrow(
      /never changed/,
    );
    await expect(server.db('data_revision').where({ id }).delete()).rejects.toThrow(/never changed/);
  });

  it('writes who saved into the audit trail', async () => {
    await savedBy(other, THREE);
    const events = await server.db('audit_event').where({ survey_id: surveyId, action: 'readings.saved' });
    expect(events).toEqual([expect.objectContaining({ actor_id: other.user?.id, subject: 'V1' })]);
  });
});

describe('drafts', () => {
  it('keep half-written text, each person their own', async () => {
    const halfWritten = sheet([{ cells: { spacing: '1,', remark: 'later' }, excluded: '' }]);
    const ohmCm = { ...halfWritten, units: { ...units, length: 'ft' as const } };
    const path = `/soundings/${soundingId}/reading-draft`;
    expect((await lead.put(path, halfWritten)).status).toBe(200);
    expect((await lead.put(path, ohmCm)).status).toBe(200);
    expect((await fieldSheet(lead)).draft).toMatchObject(ohmCm);
    expect((await fieldSheet(other)).draft).toBeNull();
    expect((await lead.delete(path)).status).toBe(204);
    expect((await fieldSheet(lead)).draft).toBeNull();
  });

  it('refuse a base that is of another sounding', async () => {
    const elsewhere = await server.createSounding(surveyId);
    const foreign = await server.createRevision(elsewhere.id, lead.user?.id ?? '');
    const answer = await lead.put(`/soundings/${soundingId}/reading-draft`, sheet(THREE, foreign.id));
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ faults: [{ path: ['body', 'baseRevisionId'] }] });
  });
});

describe('GET /revisions/:revisionId', () => {
  it('is not there for people outside of the survey', async () => {
    const { id } = await savedBy(lead, THREE);
    expect((await server.nobody.get(`/revisions/${id}`)).status).toBe(401);
    expect((await outsider.get(`/revisions/${id}`)).status).toBe(404);
    expect((await guest.get(`/revisions/${id}`)).status).toBe(200);
  });

  it('tells doubts about the readings and alters none', async () => {
    // Road exercise, Schlumberger: seen in print; the 7 m point cannot be of a layered earth
    const sounding = await server.createSounding(surveyId, { spreadType: 'schlumberger' });
    const spacings = [1, 3, 5, 7, 10, 15, 20, 30, 40, 50];
    const printed = [450, 190, 100, 200, 90, 60, 45, 45, 45, 45];
    const rows = spacings.map((halfAB, i) => ({
      cells: { halfAB: String(halfAB), apparentResistivity: String(printed[i]) },
      excluded: null,
    }));
    const answer = await lead.post(`/soundings/${sounding.id}/revisions`, sheet(rows));
    const revision = revisionSchema.parse(answer.body);
    expect(revision.checks.map(({ kind, rows: at }) => [kind, at])).toEqual([
      ['steep-rise', [3, 4]],
      ['far-from-trend', [4]],
    ]);
    expect(revision.derived[3]?.apparentResistivityOhmM).toBe(200);
  });
});
