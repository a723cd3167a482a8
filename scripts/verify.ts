/** npm run verify: every check against figures from outside; with -- --json the whole table as data. */
import { carryOut, type CheckRow, type Mark } from '../tests/verification/checks/check';
import { ALL_CHECKS, NOT_ANSWERED } from '../tests/verification/checks';

const MARKS: Readonly<Record<Mark, string>> = {
  published: 'seen in a source',
  independent: 'computed with an independent implementation',
  memory: 'from memory',
};

interface Group {
  readonly name: string;
  readonly checks: number;
  readonly failed: number;
  readonly worst: CheckRow | undefined;
}

/** How much of its tolerance a row uses; above 1 it fails. */
function used({ computed, expected, tolerance }: CheckRow): number {
  const off = Math.abs(computed - expected);
  return off / (tolerance.kind === 'absolute' ? tolerance.value : tolerance.value * Math.abs(expected));
}

function groupsOf(rows: readonly CheckRow[]): Group[] {
  return [...new Set(rows.map(({ group }) => group))].map((name) => {
    const its = rows.filter(({ group }) => group === name);
    const worst = [...its].sort((a, b) => used(b) - used(a))[0];
    return { name, checks: its.length, failed: its.filter(({ ok }) => !ok).length, worst };
  });
}

function countsOf(rows: readonly CheckRow[]) {
  const of = (mark: Mark) => rows.filter((row) => row.mark === mark).length;
  return {
    checks: rows.length,
    failed: rows.filter(({ ok }) => !ok).length,
    published: of('published'),
    independent: of('independent'),
    memory: of('memory'),
  };
}

const percent = (error: number | null): string => (error === null ? '-' : `${(100 * error).toPrecision(2)} %`);

function describe({ group, what, unit, source, expected, computed, relativeError, tolerance }: CheckRow): string {
  const within = tolerance.kind === 'relative' ? percent(tolerance.value) : `${tolerance.value} ${unit}`;
  const figures = `expected ${expected}, computed ${computed} ${unit}, off by ${percent(relativeError)} (within ${within})`;
  return `${group}: ${what}: ${figures}. ${source}`;
}

function printForPeople(rows: readonly CheckRow[]) {
  const groups = groupsOf(rows);
  const width = Math.max(...groups.map(({ name }) => name.length));
  for (const { name, checks, failed, worst } of groups) {
    const nearest = worst ? `nearest to its tolerance: ${worst.what}, off by ${percent(worst.relativeError)}` : '';
    const state = failed === 0 ? 'ok    ' : 'FAILED';
    console.log(`${state}  ${name.padEnd(width)}  ${String(checks).padStart(4)}  ${nearest}`);
  }
  for (const row of rows.filter(({ ok }) => !ok)) console.log(`\n${describe(row)}`);
  const counts = countsOf(rows);
  console.log('');
  for (const mark of Object.keys(MARKS) as Mark[]) console.log(`${String(counts[mark]).padStart(5)}  ${MARKS[mark]}`);
  console.log(`\nNot answered by a formula here:`);
  for (const { what, why } of NOT_ANSWERED) console.log(`  ${what}. ${why}`);
  console.log(`\n${counts.checks - counts.failed} of ${counts.checks} checks hold, ${counts.failed} fail`);
}

const rows = ALL_CHECKS.map(carryOut);
if (process.argv.includes('--json')) {
  console.log(JSON.stringify({ counts: countsOf(rows), marks: MARKS, rows, notAnswered: NOT_ANSWERED }, null, 2));
} else {
  printForPeople(rows);
}
process.exitCode = rows.every(({ ok }) => ok) ? 0 : 1;
