import { mkdirSync, writeFileSync } from 'node:fs';

const folder = new URL('../.cache/', import.meta.url);
export const tallyFile = new URL('tally.json', folder);

/**
 * Beside the usual report, writes down what a run came to: `{ passed, failed, skipped: [{ name, reason }] }`.
 * A file that cannot be loaded, and an error outside every test, each count as a failed test.
 */
export default class TallyReporter {
  /**
   * @param {ReadonlyArray<import('vitest/node').TestModule>} testModules
   * @param {ReadonlyArray<unknown>} unhandledErrors
   */
  onTestRunEnd(testModules, unhandledErrors) {
    const tally = { passed: 0, failed: unhandledErrors.length, skipped: [] };
    for (const module of testModules) {
      for (const container of [module, ...module.children.allSuites()])
        tally.failed += container.errors().length > 0 ? 1 : 0;
      for (const test of module.children.allTests()) {
        const { state, note } = test.result();
        if (state === 'passed') tally.passed += 1;
        else if (state === 'skipped') tally.skipped.push({ name: test.fullName, reason: note ?? null });
        // A test that was begun and not ended has not passed.
        else tally.failed += 1;
      }
    }
    mkdirSync(folder, { recursive: true });
    writeFileSync(tallyFile, JSON.stringify(tally));
  }
}
