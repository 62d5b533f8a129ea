import type { Knex } from 'knex';
import type { Notification, Pool, PoolClient } from 'pg';
import type { Logger } from 'pino';
import { z } from 'zod';
import { runStateNameSchema } from '../contract/runs';
import { createOutageLog } from './outage-log';

const CHANNEL = 'run_changed';
const RECONNECT_MS = 500;

const runChangeSchema = z.strictObject({
  soundingId: z.string(),
  runId: z.string(),
  state: runStateNameSchema,
});
/** That something about a run changed; what it is now stands in the database. */
export type RunChange = z.infer<typeof runChangeSchema>;

export interface RunListener {
  changed(change: RunChange): void;
  /** Changes may have been missed while the line to the database was down, or before it was up: look again. */
  missed(): void;
}

/** Changes of runs from every server and worker of one database. */
export interface RunEvents {
  /** Heard by all once the transaction commits. */
  publish(trx: Knex, change: RunChange): Promise<void>;
  /** `soundingId` null hears of every run. Returns the way to stop listening. */
  subscribe(soundingId: string | null, listener: RunListener): () => void;
  close(): Promise<void>;
}

function readChange(payload: string | undefined): RunChange | null {
  try {
    return runChangeSchema.parse(JSON.parse(payload ?? ''));
  } catch {
    return null;
  }
}

interface Subscription {
  readonly soundingId: string | null;
  readonly listener: RunListener;
}

/** Holds one connection of the pool from the first subscription on, and connects again whenever it is lost. */
export function createRunEvents(pool: Pool, log: Logger): RunEvents {
  const subscriptions = new Set<Subscription>();
  let client: PoolClient | null = null;
  let opening: Promise<void> | null = null;
  let retry: NodeJS.Timeout | null = null;
  let closed = false;
  const outage = createOutageLog(log, 'announcements of changed runs');

  const hear = ({ payload }: Notification): void => {
    const change = readChange(payload);
    if (!change) return log.warn({ payload }, 'an announcement of a changed run could not be read');
    for (const { soundingId, listener } of subscriptions)
      if (soundingId === null || soundingId === change.soundingId) listener.changed(change);
  };

  const connect = async (): Promise<void> => {
    try {
      const fresh = await pool.connect();
      const lost = (error?: Error) => {
        if (client !== fresh) return;
        client = null;
        fresh.release(error ?? true);
        reconnectLater(error);
      };
      fresh.on('error', lost);
      fresh.on('end', lost);
      fresh.on('notification', hear);
      client = fresh;
      await fresh.query(`LISTEN ${CHANNEL}`).catch(lost);
      if (client !== fresh) return;
      outage.worked();
      for (const { listener } of subscriptions) listener.missed();
    } catch (error) {
      reconnectLater(error);
    }
  };

  const reconnectLater = (error: unknown): void => {
    if (closed) return;
    outage.failed(error);
    retry = setTimeout(open, RECONNECT_MS);
  };

  function open(): void {
    retry = null;
    if (closed || opening || client) return;
    opening = connect().finally(() => (opening = null));
  }

  return {
    async publish(trx, change) {
      await trx.raw('SELECT pg_notify(?, ?)', [CHANNEL, JSON.stringify(change)]);
    },
    subscribe(soundingId, listener) {
      const subscription = { soundingId, listener };
      subscriptions.add(subscription);
      if (client && !opening) queueMicrotask(() => subscriptions.has(subscription) && listener.missed());
      else if (!retry) open();
      return () => void subscriptions.delete(subscription);
    },
    async close() {
      closed = true;
      if (retry) clearTimeout(retry);
      subscriptions.clear();
      await opening;
      const last = client as PoolClient | null;
      client = null;
      last?.release(true);
    },
  };
}
