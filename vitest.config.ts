import { defineConfig } from 'vitest/config';

/** One project per kind of test, so that each gets the environment it needs and can be run alone. */
export default defineConfig({
  test: {
    projects: [
      { extends: true, test: { name: 'unit', include: ['tests/unit/**/*.test.ts', 'tests/guards/**/*.test.ts'], environment: 'node' } },
      { extends: true, test: { name: 'client', include: ['tests/client/**/*.test.{ts,tsx}'], environment: 'jsdom', setupFiles: ['tests/setup/client.ts'] } },
    ],
    maxWorkers: 2,
  },
});
