import type { Knex } from 'knex';
import type { Work } from '../http/context';

/** Tells open Ledgers that what stands on a run is another state now. Only finished runs are interpreted. */
export const announceRun = (
  { runEvents }: Work,
  trx: Knex,
  soundingId: string,
  runId: string,
): Promise<void> => runEvents.publish(trx, { soundingId, runId, state: 'finished' });
