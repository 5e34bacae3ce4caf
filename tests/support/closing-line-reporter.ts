/** Prints as the very last line how many tests passed, failed and were skipped. */
import type { Reporter, TestModule } from 'vitest/node';
import { browserNote } from './open-browser';

export default class ClosingLineReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], errors: readonly unknown[]): void {
    const counts = { passed: 0, failed: errors.length, skipped: 0 };
    for (const module of modules) {
      if (module.errors().length > 0) counts.failed += 1;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state !== 'pending') counts[state] += 1;
      }
    }
    // After all other reporters, which print in the same turn and right after it.
    // Titles of skipped suites are not printed by the default reporter.
    if (browserNote !== '' && modules.some(({ project }) => project.name === 'browser'))
      process.stdout.write(`\nBrowser tests${browserNote}\n`);
    const line = `${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped\n`;
    process.once('exit', () => process.stdout.write(line));
  }
}
