import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const api = process.env['MANTLET_API'] ?? 'http://127.0.0.1:4700';

export default defineConfig({
  plugins: [react()],
  resolve: {
    alias: { '@mantlet/common': fileURLToPath(new URL('../common/src/index.ts', import.meta.url)) },
  },
  server: { port: 4710, proxy: { '/api': api } },
  // the server puts the nonce of each answer in its place
  html: { cspNonce: 'MANTLET_NONCE' },
  build: { outDir: 'dist/app', chunkSizeWarningLimit: 1200 },
  test: {
    environment: 'jsdom',
    include: ['src/**/*.spec.{ts,tsx}'],
    setupFiles: ['src/test/setup.ts'],
    testTimeout: 20_000,
  },
});
