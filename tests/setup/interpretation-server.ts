import { expect } from 'vitest';
import { interpretationSchema, type Interpretation } from '../../server/contract/interpretations';
import { createRun } from './run-factory';
import { createTestServer, type Client } from './server';

export const idOf = (client: Client): string => client.user?.id ?? '';

/** A server with a survey, and in it one who interprets and one who decides; await it at the top of a test file. */
export async function createInterpretationServer() {
  const server = await createTestServer();
  const { db } = server;
  const survey = await server.createSurvey();
  const geophysicist = await server.signInAs('geophysicist', survey.id);
  const hydrogeologist = await server.signInAs('hydrogeologist', survey.id);

  async function fittedSounding(requester: Client = geophysicist, layers = 3) {
    const sounding = await server.createSounding(survey.id);
    await server.createRevision(sounding.id, idOf(geophysicist));
    const run = await createRun(db, sounding.id, {
      requestedBy: idOf(requester),
      settings: { kind: 'layered', layers },
    });
    return { soundingId: sounding.id, runId: run.id };
  }

  async function draft(given: { soundingId: string; runId: string }, author: Client = geophysicist) {
    const made = await author.post(`/soundings/${given.soundingId}/interpretations`, {
      runId: given.runId,
      title: 'Sand over clay',
    });
    expect(made).toMatchObject({ status: 201 });
    return interpretationSchema.parse(made.body);
  }

  const tell = (client: Client, { id }: Interpretation, kind: string, more: object = {}) =>
    client.post(`/interpretations/${id}/review-events`, { kind, ...more });

  async function told(client: Client, one: Interpretation, kind: string, more: object = {}) {
    const answer = await tell(client, one, kind, more);
    expect(answer).toMatchObject({ status: 201 });
    return interpretationSchema.parse(answer.body);
  }

  const read = async (client: Client, { id }: Interpretation) =>
    interpretationSchema.parse((await client.get(`/interpretations/${id}`)).body);

  return { server, db, survey, geophysicist, hydrogeologist, fittedSounding, draft, tell, told, read };
}
