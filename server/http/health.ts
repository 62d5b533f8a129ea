import { Router } from 'express';
import type { Knex } from 'knex';
import type { JobQueue } from '../jobs/job-queue';
import type { Services } from './context';

const PATIENCE_MS = 3000;

interface Readiness {
  database: boolean;
  queue: boolean;
  /** workers that reported lately; the web process is ready without any, runs then wait */
  workers: number;
}

/** `/healthz`: the process answers. `/readyz`: it can also reach the database and the job queue. */
export function healthRouter({ db, jobs }: Pick<Services, 'db' | 'jobs'>): Router {
  const router = Router();
  router.get('/healthz', (_request, response) => {
    response.json({ ok: true });
  });
  router.get('/readyz', async (_request, response) => {
    const readiness = await readinessOf(db, jobs);
    response.status(readiness.database && readiness.queue ? 200 : 503).json(readiness);
  });
  return router;
}

async function readinessOf(db: Knex, jobs: JobQueue): Promise<Readiness> {
  const [database, queue, health] = await Promise.all([
    withinPatience(db.raw('SELECT 1')),
    withinPatience(db.raw("SELECT 'graphile_worker.jobs'::regclass")),
    withinPatience(jobs.health()),
  ]);
  return { database: database !== null, queue: queue !== null, workers: health?.liveWorkers ?? 0 };
}

const withinPatience = <T>(question: PromiseLike<T>): Promise<T | null> =>
  Promise.race([
    Promise.resolve(question).catch(() => null),
    new Promise<null>((resolve) => setTimeout(() => resolve(null), PATIENCE_MS).unref()),
  ]);
