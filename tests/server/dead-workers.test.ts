import { hostname } from 'node:os';
import { setTimeout as delay } from 'node:timers/promises';
import { beforeEach, describe, expect, it } from 'vitest';
import {
  beat,
  freeOwnEarlierLives,
  freeSilentWorkers,
  rescueStrandedRuns,
} from '../../server/jobs/dead-workers';
import { RUN_MAX_ATTEMPTS, runJobKey } from '../../server/jobs/job-queue';
import { PROCESS_PLACE } from '../../server/jobs/process-place';
import { createRun } from '../setup/run-factory';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { db, services } = server;
const { jobs, runEvents } = services;
const survey = await server.createSurvey();
const requester = await server.createUser();
const sounding = await server.createSounding(survey.id);
await server.createRevision(sounding.id, requester.id);

beforeEach(async () => {
  await db.raw('DELETE FROM graphile_worker._private_jobs');
  await db('worker_heartbeat').delete();
});

async function queuedRun(): Promise<string> {
  const run = await createRun(db, sounding.id, { requestedBy: requester.id, finished: false });
  await db.transaction((trx) => jobs.enqueueRun(trx, run.id));
  return run.id;
}

const lock = (runId: string, workerId: string, secondsAgo: number) =>
  db.raw(
    'UPDATE graphile_worker._private_jobs SET locked_by = ?, locked_at = now() - make_interval(secs => ?) WHERE key = ?',
    [workerId, secondsAgo, runJobKey(runId)],
  );
const jobOf = (runId: string) =>
  db('graphile_worker.jobs')
    .where({ key: runJobKey(runId) })
    .first();
const stateOf = (runId: string) => db('run_state').where({ run_id: runId }).first();

/** A database that has just started judges nobody. */
async function databaseOldEnough(): Promise<void> {
  for (;;) {
    const { rows } = await db.raw("SELECT pg_postmaster_start_time() < now() - interval '5 seconds' AS old");
    if (rows[0].old) return;
    await delay(200);
  }
}

describe('workers that fell silent', () => {
  it('frees what a worker without a heartbeat holds, and leaves what a live one holds', async () => {
    await databaseOldEnough();
    const [ofSilent, ofLive, ofNew] = [await queuedRun(), await queuedRun(), await queuedRun()];
    await db('worker_heartbeat').insert({
      worker_id: 'silent',
      host: 'elsewhere/1',
      seen_at: db.raw("now() - interval '6 seconds'"),
    });
    await beat(db, 'live');
    await lock(ofSilent, 'silent', 60);
    await lock(ofLive, 'live', 60);
    await lock(ofNew, 'not yet heard of', 1);
    expect(await freeSilentWorkers(db)).toEqual(['silent']);
    expect((await jobOf(ofSilent)).locked_by).toBeNull();
    expect((await jobOf(ofLive)).locked_by).toBe('live');
    expect((await jobOf(ofNew)).locked_by).toBe('not yet heard of');
    expect(await jobs.health()).toMatchObject({ liveWorkers: 1 });
  });

  it('frees at once what processes held here that are gone, and not those of a namesake machine', async () => {
    const [ofGone, ofOther] = [await queuedRun(), await queuedRun()];
    await db('worker_heartbeat').insert([
      // no process has this id: it is above the kernel's largest
      { worker_id: 'gone', host: `${PROCESS_PLACE}/4194305` },
      { worker_id: 'other', host: `${hostname()}/another-boot/pid:[1]/4194305` },
    ]);
    await beat(db, 'self');
    await lock(ofGone, 'gone', 0);
    await lock(ofOther, 'other', 0);
    expect(await freeOwnEarlierLives(db)).toEqual(['gone']);
    expect((await jobOf(ofGone)).locked_by).toBeNull();
    expect((await jobOf(ofOther)).locked_by).toBe('other');
    expect(await db('worker_heartbeat').pluck('worker_id')).toEqual(
      expect.arrayContaining(['other', 'self']),
    );
  });
});

describe('runs without a job', () => {
  it('are queued again', async () => {
    const runId = await queuedRun();
    await db.raw('DELETE FROM graphile_worker._private_jobs');
    await rescueStrandedRuns(db, jobs, runEvents);
    expect(await jobOf(runId)).toMatchObject({ attempts: 0, locked_by: null });
  });

  it('are given up after worker upon worker was lost', async () => {
    const [given, held] = [await queuedRun(), await queuedRun()];
    await db.raw('UPDATE graphile_worker._private_jobs SET attempts = max_attempts');
    await lock(held, 'live', 0);
    await rescueStrandedRuns(db, jobs, runEvents);
    expect(await stateOf(given)).toMatchObject({
      state: 'failed',
      error_message: `The worker was lost ${RUN_MAX_ATTEMPTS} times while it computed this run. Ask again with fewer layers.`,
    });
    expect(await jobOf(given)).toBeUndefined();
    expect((await stateOf(held)).state).toBe('queued');
  });
});
