import { createHash } from 'node:crypto';
import { beforeEach, describe, expect, it } from 'vitest';
import { importPreviewSchema, revisionSchema, type ImportMapping } from '../../../server/contract/readings';
import { createTestServer, type Client } from '../../setup/server';

const server = await createTestServer({ UPLOAD_LIMIT_MB: '1' });
let soundingId = '';
let lead: Client;
let guest: Client;
let outsider: Client;

beforeEach(async () => {
  const surveyId = (await server.createSurvey()).id;
  soundingId = (await server.createSounding(surveyId, { spreadType: 'wenner' })).id;
  lead = await server.signInAs('lead', surveyId);
  guest = await server.signInAs('guest', surveyId);
  outsider = await server.signInOutsider();
});

const GOOD = 'a (m);V (mV);I (mA);Remark\n5;200;100;\n10;90,5;100;wet\n20;40;100;\n';
const FAULTY = GOOD.replace('90,5', 'ninety');
const NAME = 'Feuille Ω 3.csv';

const upload = (
  client: Client,
  what: 'import-previews' | 'imports',
  content: string | null,
  fields: Record<string, string> = {},
) => {
  const test = client.post(`/soundings/${soundingId}/${what}`);
  for (const [name, value] of Object.entries(fields)) test.field(name, value);
  return content === null ? test : test.attach('file', Buffer.from(content), NAME);
};
const preview = async (content: string, mapping?: ImportMapping) =>
  importPreviewSchema.parse(
    (await upload(lead, 'import-previews', content, mapping ? { mapping: JSON.stringify(mapping) } : {}))
      .body,
  );
const importing = async (content: string, accept: string, more: Record<string, string> = {}) => {
  const { mapping } = await preview(content);
  return upload(lead, 'imports', content, { mapping: JSON.stringify(mapping), accept, ...more });
};
const stored = async () => ({
  files: await server.db('source_file').where({ sounding_id: soundingId }),
  revisions: await server.db('data_revision').where({ sounding_id: soundingId }),
});

describe('POST /soundings/:soundingId/import-previews', () => {
  it('refuses strangers, faults, outsiders and guests', async () => {
    expect((await upload(server.nobody, 'import-previews', GOOD)).status).toBe(401);
    const none = await upload(lead, 'import-previews', null, {});
    expect(none.status).toBe(422);
    expect(none.body).toMatchObject({ faults: [{ path: ['body', 'file'] }] });
    const notJson = await upload(lead, 'import-previews', GOOD, { mapping: '{' });
    expect(notJson.status).toBe(422);
    expect(notJson.body).toMatchObject({ faults: [{ path: ['body', 'mapping'], message: 'must be JSON' }] });
    expect((await upload(outsider, 'import-previews', GOOD)).status).toBe(404);
    expect((await upload(guest, 'import-previews', GOOD)).status).toBe(403);
  });

  it('shows what would be imported and stores nothing', async () => {
    const shown = await preview(FAULTY);
    expect(shown).toMatchObject({
      fileName: NAME,
      sha256: createHash('sha256').update(FAULTY).digest('hex'),
      headings: ['a (m)', 'V (mV)', 'I (mA)', 'Remark'],
      unitsStated: true,
      missingColumns: [],
      faults: [{ row: 3, column: 'V (mV)', found: 'ninety', message: 'is not a number' }],
    });
    expect(shown.rows.map(({ line }) => line)).toEqual([2, 3, 4]);
    expect(shown.readings.map(({ line }) => line)).toEqual([2, 4]);
    expect(await stored()).toEqual({ files: [], revisions: [] });
  });

  it('reads by the mapping that is sent', async () => {
    const { mapping } = await preview(GOOD);
    const inFeet = await preview(GOOD, { ...mapping, units: { ...mapping.units, length: 'ft' } });
    expect(inFeet.unitsStated).toBe(false);
    expect(inFeet.readings[0]?.plottingSpacingM).toBeCloseTo(1.5 * 5 * 0.3048, 9);
  });

  it('checks the readings by the lines of the file', async () => {
    const shown = await preview('a (m);R (ohm);rhoa (ohm m)\n\n5;2;94.2\n');
    expect(shown.checks).toEqual([expect.objectContaining({ kind: 'sheet-mismatch', rows: [3] })]);
  });

  it('tells files that are too large, and files that are no text', async () => {
    const large = await upload(lead, 'import-previews', 'x'.repeat(1_200_000));
    expect(large.status).toBe(413);
    expect(large.body).toMatchObject({ detail: expect.stringMatching(/1 MB/) });
    const packed = await upload(lead, 'import-previews', 'PK\u0003\u0004…');
    expect(packed.status).toBe(415);
    expect(packed.body).toMatchObject({ detail: expect.stringMatching(/Save the sheet as CSV/) });
  });
});

describe('POST /soundings/:soundingId/imports', () => {
  it('refuses any fault when all rows are wanted, and stores nothing', async () => {
    const answer = await importing(FAULTY, 'all');
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      detail: 'One line cannot be used. Nothing was saved.',
      faults: [{ path: ['rows', 3, 'V (mV)'], message: 'Line 3, V (mV): is not a number', found: 'ninety' }],
    });
    expect(await stored()).toEqual({ files: [], revisions: [] });
  });

  it('stores the good rows and the file, byte for byte', async () => {
    const answer = await importing(FAULTY, 'good-rows');
    expect(answer.status).toBe(201);
    const revision = revisionSchema.parse(answer.body);
    expect(revision.readings.map(({ spread }) => 'spacing' in spread && spread.spacing)).toEqual([5, 20]);
    const sha256 = createHash('sha256').update(FAULTY).digest('hex');
    expect(revision.sourceFile).toMatchObject({ name: NAME, sha256 });
    const path = `/revisions/${revision.id}/source-file`;
    const file = await guest.get(path).buffer(true);
    expect(file.status).toBe(200);
    expect((file.body as Buffer).toString('utf8')).toBe(FAULTY);
    expect(file.headers['content-type']).toBe('application/octet-stream');
    expect(file.headers['content-disposition']).toMatch(
      /^attachment;.*filename\*=UTF-8''Feuille%20%CE%A9%203\.csv/,
    );
    expect((await server.nobody.get(path)).status).toBe(401);
    expect((await outsider.get(path)).status).toBe(404);
  });

  it('keeps with the revision which lines were left out, and why', async () => {
    const twice = FAULTY.replace('20;40;100', '-20;forty;100');
    const made = revisionSchema.parse((await importing(twice, 'good-rows')).body);
    const kept = revisionSchema.parse((await guest.get(`/revisions/${made.id}`)).body);
    expect(kept.importFaults).toMatchObject([
      { row: 3, column: 'V (mV)', found: 'ninety', message: 'is not a number' },
      { row: 4, column: 'a (m)', found: '-20' },
      { row: 4, column: 'V (mV)', found: 'forty' },
    ]);
    const list = await guest.get(`/soundings/${soundingId}/revisions`);
    expect(list.body).toMatchObject({ items: [{ number: 1, linesLeftOut: 2 }] });
    const whole = revisionSchema.parse((await importing(GOOD, 'all')).body);
    expect([whole.linesLeftOut, whole.importFaults]).toEqual([0, []]);
  });

  it('is the same revision when the readings are equal, and keeps a draft', async () => {
    const units = (await preview(GOOD)).mapping.units;
    const rows = [{ cells: { spacing: '5' }, excluded: null }];
    await lead.put(`/soundings/${soundingId}/reading-draft`, { rows, units, baseRevisionId: null });
    const first = await importing(GOOD, 'all');
    const again = await importing(`# copied\n${GOOD}`, 'all');
    expect([first.status, again.status]).toEqual([201, 200]);
    expect((again.body as { id: string }).id).toBe((first.body as { id: string }).id);
    expect((await stored()).files).toHaveLength(1);
    expect((await lead.get(`/soundings/${soundingId}/readings`)).body).toMatchObject({ draft: { rows } });
  });

  it('answers a base that is no longer current with the current revision', async () => {
    const first = revisionSchema.parse((await importing(GOOD, 'all', { baseRevisionId: '' })).body);
    const stale = await importing(GOOD.replace('90,5', '91'), 'all', { baseRevisionId: '' });
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'conflict', current: { id: first.id } });
    expect((await stored()).files).toHaveLength(1);
    const next = await importing(GOOD.replace('90,5', '91'), 'all', { baseRevisionId: first.id });
    expect(next.status).toBe(201);
  });

  it('refuses missing columns, units of headings that cannot be used, and files without a good row', async () => {
    const missing = await importing('a (m);V (mV)\n5;2\n', 'good-rows');
    expect(missing.status).toBe(422);
    expect(missing.body).toMatchObject({ detail: expect.stringMatching(/mapped to V and I, or R, or ρa/) });
    const unusable = await importing('a (m);R (kohm)\n5;2\n', 'good-rows');
    expect(unusable.body).toMatchObject({ faults: [{ path: ['rows', 1, 'R (kohm)'] }] });
    const none = await importing('a (m);R (ohm)\n5;x\n', 'good-rows');
    expect(none.body).toMatchObject({ detail: 'The file holds no reading that can be used.' });
    expect(await stored()).toEqual({ files: [], revisions: [] });
  });
});
