import type { Knex } from 'knex';
import type { RunLease } from './run-lease';

/** Those of the leases that were cancelled or given to another worker while the announcement did not get through. */
export async function lostLeases(db: Knex, leases: readonly RunLease[]): Promise<Set<string>> {
  if (leases.length === 0) return new Set();
  const rows = await db('run_state')
    .whereIn(
      'run_id',
      leases.map((lease) => lease.runId),
    )
    .select<{ run_id: string; state: string; worker_id: string; attempt: number }[]>(
      'run_id',
      'state',
      'worker_id',
      'attempt',
    );
  const held = new Set(
    rows
      .filter((row) => row.state === 'running')
      .map((row) => `${row.run_id} ${row.worker_id} ${row.attempt}`),
  );
  return new Set(
    leases
      .filter(({ runId, workerId, attempt }) => !held.has(`${runId} ${workerId} ${attempt}`))
      .map((lease) => lease.runId),
  );
}
