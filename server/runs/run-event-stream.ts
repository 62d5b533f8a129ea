import { once } from 'node:events';
import type { Response } from 'express';
import { getSoundingAccess } from '../access/survey-access';
import type { RunSummary } from '../contract/runs';
import type { Context } from '../http/context';
import type { Exchange } from '../http/endpoint';
import { presentRunSummary } from './runs-presenter';
import { listRuns } from './runs-store';

const RECHECK_MS = 10_000;
/** Runs told on connecting; older ones do not change any more. */
const RECENT_RUNS = 100;

/**
 * Tells the runs of a sounding as they change, until the browser leaves, the server stops, or the person is signed out or
 * no longer a member. What is told is read anew each time, so a burst of changes becomes one event.
 */
export async function streamRunEvents(
  context: Context,
  soundingId: string,
  { response }: Exchange,
): Promise<void> {
  const { db, actor, sessions, runEvents, stopping, log } = context;
  await getSoundingAccess(db, actor, soundingId);
  openStream(response);
  const changed = new Set<string>();
  // set by the first announcement that the line is up
  let everything = false;
  let telling = false;

  // read in the person's own scope: after leaving the survey nothing comes back
  const takeChanged = async (): Promise<RunSummary[]> => {
    const only = everything ? { limit: RECENT_RUNS } : { runIds: [...changed] };
    everything = false;
    changed.clear();
    return (await listRuns(db, actor, soundingId, only)).map(presentRunSummary).reverse();
  };

  const tell = async (): Promise<void> => {
    if (telling) return;
    telling = true;
    try {
      while (!response.writableEnded && (everything || changed.size > 0)) {
        for (const run of await takeChanged())
          await send(response, `event: run\ndata: ${JSON.stringify(run)}\n\n`);
      }
    } catch (error) {
      log.debug({ err: error }, 'changes of runs could not be told; trying again');
      everything = true;
    } finally {
      telling = false;
    }
  };

  const recheck = async (): Promise<void> => {
    try {
      if (!(await sessions.isLive(actor.sessionId))) return void response.end();
      await getSoundingAccess(db, actor, soundingId);
      await send(response, ': still here\n\n');
      if (everything) await tell();
    } catch {
      response.end();
    }
  };

  const unsubscribe = runEvents.subscribe(soundingId, {
    changed: ({ runId }) => {
      changed.add(runId);
      void tell();
    },
    missed: () => {
      everything = true;
      void tell();
    },
  });
  const timer = setInterval(() => void recheck(), RECHECK_MS);
  const end = () => response.end();
  stopping.addEventListener('abort', end);
  response.once('close', () => {
    clearInterval(timer);
    unsubscribe();
    stopping.removeEventListener('abort', end);
  });
  if (stopping.aborted) end();
}

function openStream(response: Response): void {
  response.status(200).set({
    'Content-Type': 'text/event-stream; charset=utf-8',
    'Cache-Control': 'no-cache, no-transform',
    'X-Accel-Buffering': 'no',
  });
  response.flushHeaders();
}

/** Waits for a slow reader instead of piling up what it has not taken. */
async function send(response: Response, text: string): Promise<void> {
  if (response.writableEnded || response.destroyed || response.write(text)) return;
  await Promise.race([once(response, 'drain'), once(response, 'close')]);
}
