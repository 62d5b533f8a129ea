import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const server = process.env.API_URL ?? 'http://127.0.0.1:4310';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  worker: { format: 'es' },
  server: {
    host: '127.0.0.1',
    proxy: Object.fromEntries(
      ['/api', '/healthz', '/readyz', '/metrics'].map((path) => [path, { target: server }]),
    ),
  },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    target: 'es2023',
    chunkSizeWarningLimit: 700,
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [{ name: 'charts', test: /node_modules[\\/](echarts|echarts-for-react|zrender)[\\/]/ }],
        },
      },
    },
  },
});
