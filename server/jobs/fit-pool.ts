import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { RunInput } from '../contract/runs';
import type { ProgressReport } from './fit-progress';
import type { FitAnswer, FitOrder } from './fit-thread';

export interface FitPool {
  /** Aborting ends the thread at once, however deep in the computation it is. */
  compute(
    input: RunInput,
    signal: AbortSignal,
    onProgress: (report: ProgressReport) => void,
  ): Promise<FitAnswer>;
  close(): Promise<void>;
}

/** Threads that compute fits. `threadFile` is source under tsx, or built JavaScript. */
export function createFitPool(threadFile: string, threads: number): FitPool {
  const pool = new Piscina<FitOrder, FitAnswer>({
    filename: threadFile,
    minThreads: threads,
    maxThreads: threads,
    execArgv: threadFile.endsWith('.ts') ? ['--import', 'tsx'] : [],
  });
  return {
    async compute(input, signal, onProgress) {
      const { port1, port2 } = new MessageChannel();
      port1.on('message', onProgress);
      try {
        return await pool.run({ input, progress: port2 }, { signal, transferList: [port2] });
      } finally {
        port1.close();
      }
    },
    close: () => pool.destroy(),
  };
}
