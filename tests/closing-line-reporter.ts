import type { Reporter, TestModule } from 'vitest/node';

/** Closes a run with one plain line of counts, for machines that read logs and know no test runner. */
export default class ClosingLineReporter implements Reporter {
  onTestRunEnd(testModules: readonly TestModule[]): void {
    const counts = { passed: 0, failed: 0, skipped: 0, pending: 0 };
    for (const testModule of testModules) {
      for (const test of testModule.children.allTests()) counts[test.result().state] += 1;
    }
    process.stdout.write(`\n${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped\n`);
  }
}
