// The last line of .ci/run: `N passed, M failed`, added up from what vitest and Playwright wrote. Exit 1 unless all of
// both ran and nothing failed.
import { readFileSync } from 'node:fs';

/** Counts of one vitest report (`--reporter=json`) or null where it is not there. */
export function countVitest(report) {
  return {
    passed: report.numPassedTests,
    failed: failedOf(report),
    left: report.numPendingTests + report.numTodoTests,
  };
}

/** A file that does not load holds no failed test, and yet failed. */
function failedOf({ numFailedTests, testResults }) {
  const broken = testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  );
  return numFailedTests + broken.length;
}

/** Counts of one Playwright report (json reporter). */
export function countPlaywright({ stats, errors }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, left: stats.skipped };
}

/**
 * What to print and how to end, from the reports (null: not written) and the status that `npm test` ended with.
 * `required`: the record checks must have run, so that nothing may have been left out.
 */
export function totalOf({ vitest, playwright, status, required }) {
  const counts = [vitest && countVitest(vitest), playwright && countPlaywright(playwright)];
  const sum = (key) => counts.reduce((total, count) => total + (count?.[key] ?? 0), 0);
  const notes = [];
  let failed = sum('failed');
  if (vitest === null) notes.push('vitest wrote no report');
  if (playwright === null) notes.push('playwright wrote no report');
  if (required && sum('left') > 0) notes.push(`${sum('left')} tests were left out although the record is there`);
  if (status !== 0 && failed === 0 && notes.length === 0) notes.push(`npm test ended with ${status}`);
  failed += notes.length;
  return { notes, line: `${sum('passed')} passed, ${failed} failed`, ok: failed === 0 };
}

if (process.argv[1]?.endsWith('total.mjs')) {
  const report = (name) => {
    try {
      return JSON.parse(readFileSync(`.cache/${name}.json`, 'utf8'));
    } catch {
      return null;
    }
  };
  const { notes, line, ok } = totalOf({
    vitest: report('vitest'),
    playwright: report('playwright'),
    status: Number(process.argv[2] ?? 0),
    required: process.env.SWAYBOOK_REQUIRE_RECORD === '1',
  });
  for (const note of notes) console.log(note);
  console.log(line);
  process.exit(ok ? 0 : 1);
}
