import { createServer, get, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { setTimeout as delay } from 'node:timers/promises';
import { afterAll, describe, expect, it } from 'vitest';
import { runSummarySchema, type RunSummary } from '../../../server/contract/runs';
import { createRun } from '../../setup/run-factory';
import { createRunServer, startWorkerHere, THREE } from '../../setup/run-server';
import type { Client } from '../../setup/server';

const { server, db, survey, geophysicist, authorId, measured, asked, finished } = await createRunServer();
startWorkerHere(server);
const web = createServer(server.app).listen(0, '127.0.0.1');
afterAll(() => {
  web.closeAllConnections();
  web.close();
});

describe('run events', () => {
  it('tell the runs that are there, then every change up to the end', async () => {
    const soundingId = await measured();
    const before = await createRun(db, soundingId, { requestedBy: authorId });
    const stream = await openStream(geophysicist, soundingId);
    expect(stream.response.headers['content-type']).toMatch('text/event-stream');
    await stream.until((runs) => runs.some((run) => run.id === before.id));
    const run = await asked(soundingId, { ...THREE, seed: 41 });
    const states = (
      await stream.until((runs) => runs.some((one) => one.id === run.id && one.endedAt !== null))
    )
      .filter((one) => one.id === run.id)
      .map((one) => one.state);
    expect(states.at(-1)).toBe('finished');
    // a quick worker may be further on before the first change is read, but never back
    const course = ['queued', 'running', 'finished'];
    expect(states).toEqual(states.toSorted((a, b) => course.indexOf(a) - course.indexOf(b)));
    stream.response.destroy();
  });

  it('tell that an interpretation stands on a run, and that it was discarded', async () => {
    const soundingId = await measured();
    const run = await createRun(db, soundingId, { requestedBy: authorId });
    const stream = await openStream(geophysicist, soundingId);
    await stream.until((runs) => runs.length > 0);
    const made = await geophysicist.post(`/soundings/${soundingId}/interpretations`, {
      runId: run.id,
      title: 'Sand',
    });
    await stream.until((runs) => runs.at(-1)?.interpretedAs === 'draft');
    expect(await geophysicist.delete(`/interpretations/${made.body.id}`)).toMatchObject({ status: 204 });
    await stream.until((runs) => runs.at(-1)?.interpretedAs === null);
    stream.response.destroy();
  });

  it('say nothing of other soundings', async () => {
    const [here, there] = [await measured(), await measured()];
    const stream = await openStream(geophysicist, here);
    await finished(await asked(there, { ...THREE, seed: 42 }));
    const mine = await asked(here, { ...THREE, seed: 43 });
    const heard = await stream.until((runs) => runs.some((run) => run.id === mine.id));
    expect(new Set(heard.map((run) => run.soundingId))).toEqual(new Set([here]));
    stream.response.destroy();
  });

  it('tell nothing more to a person who is no longer a member, and end', { timeout: 30_000 }, async () => {
    const soundingId = await measured();
    const leaver = await server.signInAs('guest', survey.id);
    const stream = await openStream(leaver, soundingId);
    await db('survey_member')
      .where({ user_id: leaver.user?.id ?? '' })
      .delete();
    const run = await asked(soundingId, { ...THREE, seed: 44 });
    await stream.ended;
    expect(stream.heard.map((one) => one.id)).not.toContain(run.id);
  });

  it('end after a sign-out everywhere', { timeout: 30_000 }, async () => {
    const leaver = await server.signInAs('guest', survey.id);
    const stream = await openStream(leaver, await measured());
    expect(await leaver.delete('/sessions')).toMatchObject({ status: 204 });
    await stream.ended;
  });
});

/** Hears the run events of a sounding over a real connection. */
async function openStream(client: Client, soundingId: string) {
  const cookie = (await server.services.sessions.create(client.user?.id ?? '', 'vitest')).split(';')[0];
  const { port } = web.address() as AddressInfo;
  const url = `http://127.0.0.1:${port}/api/v1/soundings/${soundingId}/run-events`;
  const response = await new Promise<IncomingMessage>((resolve, reject) => {
    get(url, { headers: { cookie } }, resolve).on('error', reject);
  });
  const heard: RunSummary[] = [];
  let buffer = '';
  response.setEncoding('utf8').on('data', (text: string) => {
    const parts = (buffer + text).split('\n\n');
    buffer = parts.pop() ?? '';
    for (const part of parts) {
      const data = /^event: run\ndata: (.*)$/.exec(part)?.[1];
      if (data) heard.push(runSummarySchema.parse(JSON.parse(data)));
    }
  });
  const ended = new Promise<void>((resolve) => response.on('close', resolve));
  const until = async (reached: (runs: RunSummary[]) => boolean): Promise<RunSummary[]> => {
    for (let tries = 0; tries < 300; tries++) {
      if (reached(heard)) return heard;
      await delay(50);
    }
    throw new Error(`not heard; only ${JSON.stringify(heard.map((run) => run.state))}`);
  };
  return { response, heard, ended, until };
}
