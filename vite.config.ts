import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const apiPort = process.env.API_PORT ?? '4310';

export default defineConfig(({ isSsrBuild }) => ({
  plugins: [react(), tailwindcss()],
  worker: { format: 'es' },
  optimizeDeps: { exclude: ['highs'] },
  publicDir: false,
  build: isSsrBuild
    ? {
        outDir: 'dist/server',
        target: 'node20',
        emptyOutDir: true,
        rollupOptions: { input: 'server/main.ts' },
      }
    : { outDir: 'dist/client', target: 'es2022', emptyOutDir: true, chunkSizeWarningLimit: 1200 },
  // The host stays as the browser sent it: the server takes writes from its own pages only.
  server: {
    proxy: Object.fromEntries(
      ['/api', '/healthz'].map((path) => [
        path,
        { target: `http://localhost:${apiPort}`, changeOrigin: false },
      ]),
    ),
  },
  test: {
    maxWorkers: 2,
    testTimeout: 60_000,
    hookTimeout: 120_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'node',
          include: ['{shared,server,src,workers,tests}/**/*.test.{ts,tsx}'],
          exclude: ['tests/e2e/**', 'node_modules/**'],
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/e2e/**/*.test.ts'],
          fileParallelism: false,
          testTimeout: 600_000,
        },
      },
    ],
  },
}));
