import react from '@vitejs/plugin-react';
import { defaultClientConditions } from 'vite';
import { defineConfig } from 'vitest/config';

const apiPort = process.env.API_PORT ?? '3100';

export default defineConfig({
  plugins: [react()],
  resolve: { conditions: ['@wetside/source', ...defaultClientConditions] },
  server: {
    host: '127.0.0.1',
    port: Number(process.env.WEB_PORT ?? '5173'),
    strictPort: true,
    proxy: { '/api': { target: `http://127.0.0.1:${apiPort}` } },
  },
  build: { target: 'es2022', sourcemap: false, chunkSizeWarningLimit: 900 },
  test: {
    environment: 'jsdom',
    setupFiles: ['./src/testing/setup.ts'],
    include: ['src/**/*.spec.{ts,tsx}'],
    css: false,
    restoreMocks: true,
    // Whole pages in jsdom on a busy machine: a slow test is no failed test.
    testTimeout: 30_000,
  },
});
