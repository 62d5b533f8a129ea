import { wrap, type Remote } from 'comlink';
import type { LayeredEarth, Spread } from '../../inversion';
import type { EngineWorker } from './engine-worker';

let remote: Remote<EngineWorker> | null = null;

/** One worker for the page, started when it is first asked. */
function engineWorker(): Remote<EngineWorker> {
  remote ??= wrap<EngineWorker>(
    new Worker(new URL('./engine-worker.ts', import.meta.url), { type: 'module' }),
  );
  return remote;
}

/** Apparent resistivity, Ω·m, one a spread, off the page's own thread; rejects what the engine refuses. */
export async function predictCurve(spreads: readonly Spread[], earth: LayeredEarth): Promise<number[]> {
  return Array.from(await engineWorker().predictCurve(spreads, earth));
}
