import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: ['test/{unit,reference,property,integration,faults,frozen,helpers}/**/*.test.ts'],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        plugins: [vue()],
        test: { name: 'screens', include: ['test/screens/**/*.test.ts'], environment: 'happy-dom' },
      },
      {
        // Runs against out/: build first.
        test: {
          name: 'built',
          include: ['test/{journeys,built}/**/*.test.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
          expect: { poll: { timeout: 20_000 } },
        },
      },
    ],
  },
});
