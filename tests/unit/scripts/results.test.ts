import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closingLine, countRun, sumCounts } from '../../../scripts/support/results';

let folder: string;
beforeAll(() => (folder = mkdtempSync(join(tmpdir(), 'steadmain-results-'))));
afterAll(() => rmSync(folder, { recursive: true }));

function report(name: string, passed: number, failed: number, pending: number): string {
  const file = join(folder, name);
  const counts = { numPassedTests: passed, numFailedTests: failed, numPendingTests: pending };
  writeFileSync(file, JSON.stringify(counts));
  return file;
}

describe('the count of a test run', () => {
  it('is what its report says', () => {
    expect(countRun(report('good', 12, 0, 0), 0)).toEqual({ passed: 12, failed: 0 });
    expect(countRun(report('bad', 10, 2, 0), 1)).toEqual({ passed: 10, failed: 2 });
  });

  it('has a failure for each test that was skipped', () => {
    expect(countRun(report('skipped', 10, 0, 3), 0)).toEqual({ passed: 10, failed: 3 });
  });

  it('has one failure for a run that broke outside of any test', () => {
    expect(countRun(report('broke', 10, 0, 0), 1)).toEqual({ passed: 10, failed: 1 });
    expect(countRun(join(folder, 'never-written'), 137)).toEqual({ passed: 0, failed: 1 });
  });

  it('has one failure for a run that found no test', () => {
    expect(countRun(report('empty', 0, 0, 0), 0)).toEqual({ passed: 0, failed: 1 });
  });

  it('closes with the sum of all runs', () => {
    const sum = sumCounts([
      { passed: 12, failed: 0 },
      { passed: 0, failed: 1 },
      { passed: 30, failed: 2 },
    ]);
    expect(closingLine(sum)).toBe('42 passed, 3 failed');
  });
});
