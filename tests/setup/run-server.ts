import { join } from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { pino } from 'pino';
import { afterAll, expect } from 'vitest';
import type { FitSettingsInput } from '../../server/contract/fit-settings';
import { runSchema, type Run } from '../../server/contract/runs';
import { startRunWorker } from '../../server/jobs/run-worker';
import { threeLayerReadings } from './factories';
import { createTestServer, type TestServer } from './server';

export const THREE: FitSettingsInput = { kind: 'layered', layers: 3 };

/** A server with a survey and a geophysicist in it who asks for runs; await it at the top of a test file. */
export async function createRunServer() {
  const server = await createTestServer();
  const survey = await server.createSurvey();
  const geophysicist = await server.signInAs('geophysicist', survey.id);
  const authorId = geophysicist.user?.id ?? '';

  async function measured(readings = threeLayerReadings()): Promise<string> {
    const sounding = await server.createSounding(survey.id);
    await server.createRevision(sounding.id, authorId, readings);
    return sounding.id;
  }

  const ask = (soundingId: string, body: object) => geophysicist.post(`/soundings/${soundingId}/runs`, body);

  async function asked(soundingId: string, settings: FitSettingsInput = THREE): Promise<Run> {
    const answer = await ask(soundingId, { settings });
    expect(answer).toMatchObject({ status: 201 });
    return runSchema.parse(answer.body);
  }

  async function finished(run: Run): Promise<Run> {
    for (let tries = 0; tries < 400; tries++) {
      const now = runSchema.parse((await geophysicist.get(`/runs/${run.id}`)).body);
      if (now.endedAt) return now;
      await delay(50);
    }
    throw new Error('the run did not end');
  }

  return { server, db: server.db, survey, geophysicist, authorId, measured, ask, asked, finished };
}

/** A worker in this process that ends with the file; call it after the server was made. */
export function startWorkerHere({ db, services }: TestServer): void {
  const worker = startRunWorker({
    db,
    pool: services.pool,
    log: pino({ level: 'silent' }),
    threads: 1,
    threadFile: join(import.meta.dirname, '../../server/jobs/fit-thread.ts'),
  });
  afterAll(() => worker.stop());
}
