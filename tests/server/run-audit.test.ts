import { expect, it } from 'vitest';
import { runSchema } from '../../server/contract/runs';
import { threeLayerReadings } from '../setup/factories';
import { createTestServer } from '../setup/server';

const server = await createTestServer();

it('the audit trail names a run by its letter and its sounding, as the screens do', async () => {
  const survey = await server.createSurvey();
  const geophysicist = await server.signInAs('geophysicist', survey.id);
  const sounding = await server.createSounding(survey.id, { name: 'S-31' });
  await server.createRevision(sounding.id, geophysicist.user?.id ?? '', threeLayerReadings());
  for (const seed of [1, 2]) {
    const asked = await geophysicist.post(`/soundings/${sounding.id}/runs`, {
      settings: { kind: 'layered', layers: 3, seed },
    });
    await geophysicist.put(`/runs/${runSchema.parse(asked.body).id}/cancellation`);
  }
  const events = await server.db('audit_event').where('action', 'like', 'run.%').orderBy('id');
  expect(events.map(({ action, subject }) => [action, subject])).toEqual([
    ['run.requested', 'run A of S-31'],
    ['run.cancelled', 'run A of S-31'],
    ['run.requested', 'run B of S-31'],
    ['run.cancelled', 'run B of S-31'],
  ]);
});
