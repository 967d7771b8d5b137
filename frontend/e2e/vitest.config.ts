import { defineConfig } from 'vitest/config';

/** Journeys drive a real browser against a real server: one file at a time, as people would. */
export default defineConfig({
  test: {
    root: import.meta.dirname,
    include: ['**/*.e2e.ts'],
    environment: 'node',
    fileParallelism: false,
    testTimeout: 120_000,
    hookTimeout: 120_000,
  },
});
