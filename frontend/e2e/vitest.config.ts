import { defineConfig } from 'vitest/config';
import { BaseSequencer } from 'vitest/node';
import type { TestSpecification } from 'vitest/node';

/** By name, each time: the journeys share one demo, and what one leaves behind must not meet another by chance. */
class ByName extends BaseSequencer {
  override sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    return Promise.resolve([...files].sort((a, b) => a.moduleId.localeCompare(b.moduleId, 'en')));
  }
}

/** Journeys drive a real browser against a real server: one file at a time, as people would. */
export default defineConfig({
  test: {
    root: import.meta.dirname,
    include: ['**/*.e2e.ts'],
    environment: 'node',
    fileParallelism: false,
    sequence: { sequencer: ByName },
    testTimeout: 120_000,
    hookTimeout: 120_000,
  },
});
