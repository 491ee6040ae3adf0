import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    // One fewer than there are cores unless said: on two cores that is half the machine.
    maxWorkers: '100%',
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
        // Runs against out/: build first. Comes last and alone: a browser is timed by what else the machine does.
        test: {
          name: 'built',
          include: ['test/{journeys,built}/**/*.test.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
          sequence: { groupOrder: 1 },
          expect: { poll: { timeout: 20_000 } },
        },
      },
    ],
  },
});
