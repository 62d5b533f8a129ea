import { setTimeout as delay } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import type { FitSettingsInput } from '../../server/contract/fit-settings';
import { runSchema, type Run } from '../../server/contract/runs';
import { HEAVY, heavyReadings } from '../setup/heavy-readings';
import { workerProcesses, type WorkerProcess } from '../setup/run-worker';
import { createTestServer, type Client } from '../setup/server';

const server = await createTestServer();
const { db, services } = server;
const survey = await server.createSurvey();
const geophysicist = await server.signInAs('geophysicist', survey.id);
const startWorker = workerProcesses(services.config.databaseUrl);

const LONG: FitSettingsInput = { kind: 'layered', layers: 'auto' };
const SHORT: FitSettingsInput = { kind: 'layered', layers: 3 };

async function soundingWith(readings?: ReturnType<typeof heavyReadings>): Promise<string> {
  const sounding = await server.createSounding(survey.id);
  await server.createRevision(sounding.id, geophysicist.user?.id ?? '', readings);
  return sounding.id;
}

async function ask(
  soundingId: string,
  settings: FitSettingsInput,
  client: Client = geophysicist,
): Promise<Run> {
  const response = await client.post(`/soundings/${soundingId}/runs`, { settings });
  expect(response).toMatchObject({ status: 201 });
  return runSchema.parse(response.body);
}

const read = async (runId: string): Promise<Run> =>
  runSchema.parse((await geophysicist.get(`/runs/${runId}`)).body);

interface StateRow {
  state: string;
  progress_text: string;
  ended_at: Date | null;
}

/** Looks at the row alone: a whole run of thousands of readings is slow to read over and over. */
async function until(runId: string, reached: (row: StateRow) => boolean, patienceMs = 90_000): Promise<Run> {
  const giveUpAt = Date.now() + patienceMs;
  for (;;) {
    const row = await db('run_state')
      .where({ run_id: runId })
      .first<StateRow | undefined>('state', 'progress_text', 'ended_at');
    if (row && reached(row)) return read(runId);
    if (Date.now() > giveUpAt) throw new Error(`still ${row?.state}: ${row?.progress_text}`);
    await delay(50);
  }
}

const isRunning = (row: StateRow) => row.state === 'running' && row.progress_text !== '';
const hasEnded = (row: StateRow) => row.ended_at !== null;
const computationsOf = async (run: Run): Promise<number> =>
  (await db('computation').where({ key: run.computationKey })).length;
const attemptsOf = async (run: Run): Promise<number> =>
  (await db('run_state').where({ run_id: run.id }).first<{ attempt: number }>('attempt')).attempt;
const jobsLeft = async (): Promise<number> => (await db('graphile_worker.jobs')).length;

async function untilNoJobs(): Promise<void> {
  for (let tries = 0; tries < 100 && (await jobsLeft()) > 0; tries++) await delay(50);
  expect(await jobsLeft()).toBe(0);
}

/** One after the other: each scene goes on with the worker that the last one left. */
describe('workers on one database', { timeout: 200_000 }, () => {
  let worker: WorkerProcess;

  it('computes a run, tells its progress, and answers the same request from the cache', async () => {
    worker = startWorker();
    const soundingId = await soundingWith(heavyReadings());
    const asked = await ask(soundingId, LONG);
    expect(asked.state).toBe('queued');
    const running = await until(asked.id, isRunning);
    expect(running.progressText).toMatch(/^\d beds?, start \d+ of \d+, χ²\/N\u00a0/);
    const finished = await until(asked.id, hasEnded);
    expect(finished).toMatchObject({ state: 'finished', fromCache: false, progress: 1, errorMessage: null });
    expect(finished.result?.layerCounts).not.toBeNull();
    expect(finished.durationMs).toBeGreaterThan(0);
    const again = await ask(soundingId, LONG);
    expect(again).toMatchObject({ state: 'finished', fromCache: true, number: 2, result: finished.result });
    expect(await computationsOf(again)).toBe(1);
    await untilNoJobs();
  });

  it('computes the same request only once when it was asked twice before the first ended', async () => {
    const soundingId = await soundingWith(heavyReadings(120));
    const pair = [await ask(soundingId, LONG), await ask(soundingId, LONG)];
    const ended = [await until(pair[0]!.id, hasEnded), await until(pair[1]!.id, hasEnded)];
    expect(ended.map((run) => [run.state, run.fromCache])).toEqual([
      ['finished', false],
      ['finished', true],
    ]);
    expect(await computationsOf(pair[0]!)).toBe(1);
  });

  it('cancels in the middle, and a cancelled run never finishes', async () => {
    const asked = await ask(await soundingWith(heavyReadings(HEAVY * 16)), LONG);
    await until(asked.id, isRunning);
    const answer = await geophysicist.put(`/runs/${asked.id}/cancellation`);
    expect(answer.body).toMatchObject({ state: 'cancelled' });
    // the only thread would be busy for longer than this had it not been ended
    const next = await ask(await soundingWith(), SHORT);
    await until(next.id, hasEnded, 30_000);
    expect((await read(asked.id)).state).toBe('cancelled');
    expect(await computationsOf(asked)).toBe(0);
    await untilNoJobs();
  });

  it('goes on after its connections to the database were cut', async () => {
    const asked = await ask(await soundingWith(heavyReadings(HEAVY + 1)), LONG);
    await until(asked.id, isRunning);
    await db.raw(
      'SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = current_database() AND pid <> pg_backend_pid()',
    );
    const finished = await until(asked.id, hasEnded);
    expect(finished.state).toBe('finished');
    expect(await computationsOf(finished)).toBe(1);
    const next = await ask(await soundingWith(), { ...SHORT, seed: 5 });
    expect((await until(next.id, hasEnded)).state).toBe('finished');
  });

  it('gives a run back when it is stopped, and another worker takes it up', async () => {
    const asked = await ask(await soundingWith(heavyReadings(HEAVY * 2)), LONG);
    await until(asked.id, isRunning);
    expect(await worker.end('SIGTERM')).toBe(0);
    expect(await read(asked.id)).toMatchObject({ state: 'queued', startedAt: null, progress: 0 });
    expect(await db('worker_heartbeat')).toEqual([]);
    worker = startWorker();
    const finished = await until(asked.id, hasEnded);
    expect(finished.state).toBe('finished');
    expect(await computationsOf(finished)).toBe(1);
    await untilNoJobs();
  });

  it('ends a run once when its worker is killed in the middle', async () => {
    const asked = await ask(await soundingWith(heavyReadings(HEAVY + 2)), LONG);
    await until(asked.id, isRunning);
    const other = startWorker();
    await worker.end('SIGKILL');
    const finished = await until(asked.id, hasEnded);
    expect(finished.state).toBe('finished');
    expect(await computationsOf(finished)).toBe(1);
    expect(await attemptsOf(finished)).toBe(2);
    await untilNoJobs();
    worker = other;
  });

  it('drops what a worker taken for dead still sends, and that worker works on', async () => {
    const asked = await ask(await soundingWith(heavyReadings(HEAVY + 3)), LONG);
    await until(asked.id, isRunning);
    worker.signal('SIGSTOP');
    const other = startWorker();
    const finished = await until(asked.id, hasEnded);
    expect(await attemptsOf(finished)).toBe(2);
    await other.end('SIGTERM');
    worker.signal('SIGCONT');
    const next = await ask(await soundingWith(), { ...SHORT, seed: 7 });
    await until(next.id, hasEnded);
    expect(await computationsOf(finished)).toBe(1);
    expect(await read(asked.id)).toEqual(finished);
    expect(await worker.end('SIGTERM')).toBe(0);
  });
});
