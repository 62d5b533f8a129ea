import type { Knex } from 'knex';
import { ENGINE_VERSION, fitEarth } from '../../inversion/index';
import { fitSettingsSchema, type FitSettingsInput } from '../../server/contract/fit-settings';
import type { Reading } from '../../server/contract/readings';
import type { RunInput } from '../../server/contract/runs';
import { resultHash } from '../../server/jobs/run-lease';
import { fitReadingsOf } from '../../server/readings/fit-readings';
import { computationKey } from '../../server/runs/computation-key';
import { insertRun } from '../../server/runs/new-run-store';

export interface TestRun {
  readonly id: string;
  readonly number: number;
}

interface Given {
  readonly requestedBy: string;
  readonly settings?: FitSettingsInput;
  /** false: it waits, and no worker knows of it */
  readonly finished?: boolean;
}

/** A run of the sounding's current revision, computed here and now without the queue. */
export async function createRun(db: Knex, soundingId: string, given: Given): Promise<TestRun> {
  const revision = await db('sounding')
    .join('data_revision', 'data_revision.id', 'sounding.current_revision_id')
    .where('sounding.id', soundingId)
    .first<{ id: string; readings: Reading[] }>('data_revision.id', 'data_revision.readings');
  const settings = fitSettingsSchema.parse(given.settings ?? { kind: 'layered', layers: 3 });
  const input: RunInput = {
    readings: fitReadingsOf(revision.readings, 0.03).map(({ reading }) => reading),
    settings,
  };
  const key = computationKey(ENGINE_VERSION, input);
  return db.transaction(async (trx) => {
    const computationId = given.finished === false ? null : await insertComputation(trx, key, input);
    return insertRun(trx, {
      soundingId,
      revisionId: revision.id,
      input,
      computationKey: key,
      engineVersion: ENGINE_VERSION,
      requestedBy: given.requestedBy,
      recomputesRunId: null,
      computationId,
    });
  });
}

async function insertComputation(trx: Knex, key: string, input: RunInput): Promise<string | null> {
  const result = fitEarth(input.readings, input.settings);
  const [made] = await trx('computation')
    .insert({
      key,
      engine_version: ENGINE_VERSION,
      input: JSON.stringify(input),
      result: JSON.stringify(result),
      result_hash: resultHash(result),
      duration_ms: 1,
    })
    .returning<{ id: string }[]>('id');
  return made?.id ?? null;
}
