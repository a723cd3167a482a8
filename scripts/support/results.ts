import { existsSync, readFileSync } from 'node:fs';

/** Tests of one run, or of several summed. */
export interface Count {
  readonly passed: number;
  readonly failed: number;
}

/** The part of Vitest's JSON report that is read here. */
interface Report {
  readonly numPassedTests?: number;
  readonly numFailedTests?: number;
  readonly numPendingTests?: number;
}

/**
 * Counts one run from its JSON report. A run that failed without a failed test of its own (it crashed, found no test,
 * or left an error outside of any test) counts as one failure; so does a skipped test: nothing may be left out unseen.
 */
export function countRun(reportFile: string, exitCode: number): Count {
  const report: Report = existsSync(reportFile) ? (JSON.parse(readFileSync(reportFile, 'utf8')) as Report) : {};
  const passed = report.numPassedTests ?? 0;
  const failed = (report.numFailedTests ?? 0) + (report.numPendingTests ?? 0);
  const silent = failed === 0 && (exitCode !== 0 || passed === 0);
  return { passed, failed: silent ? 1 : failed };
}

/** Sums runs. */
export const sumCounts = (counts: readonly Count[]): Count =>
  counts.reduce((sum, { passed, failed }) => ({ passed: sum.passed + passed, failed: sum.failed + failed }), {
    passed: 0,
    failed: 0,
  });

/** The line that closes `npm test`. */
export const closingLine = ({ passed, failed }: Count): string => `${passed} passed, ${failed} failed`;
