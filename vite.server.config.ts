import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

/** Each becomes dist/server/<name>.js: the processes, and the files that worker threads are started from. */
const entries: Record<string, string> = {
  main: 'server/main.ts',
  worker: 'server/worker.ts',
  prepare: 'server/prepare.ts',
  'fit-thread': 'server/jobs/fit-thread.ts',
};

export default defineConfig({
  publicDir: false,
  build: {
    ssr: true,
    outDir: 'dist/server',
    emptyOutDir: true,
    target: 'node20',
    sourcemap: true,
    rolldownOptions: {
      input: Object.fromEntries(
        Object.entries(entries).map(([name, path]) => [name, fileURLToPath(new URL(path, import.meta.url))]),
      ),
      output: { entryFileNames: '[name].js', chunkFileNames: 'chunks/[name]-[hash].js' },
    },
  },
});
