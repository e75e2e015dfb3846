import { expect, test } from 'vitest';
import { totalOf } from '../../.ci/total.mjs';

const vitest = {
  numPassedTests: 40,
  numFailedTests: 0,
  numPendingTests: 0,
  numTodoTests: 0,
  testResults: [] as object[],
};
const playwright = { stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0 }, errors: [] as object[] };
const all = { vitest, playwright, status: 0, required: true };

test('adds up both reports', () => {
  expect(totalOf(all)).toEqual({ notes: [], line: '43 passed, 0 failed', ok: true });
});

test('counts a failed test, a file that does not load, a flaky flow and an error outside of the flows', () => {
  const broken = { status: 'failed', assertionResults: [] };
  expect(totalOf({ ...all, vitest: { ...vitest, numFailedTests: 2 } }).line).toBe('43 passed, 2 failed');
  expect(totalOf({ ...all, vitest: { ...vitest, testResults: [broken] } }).line).toBe('43 passed, 1 failed');
  const flaky = { ...playwright, stats: { ...playwright.stats, flaky: 1 } };
  expect(totalOf({ ...all, playwright: flaky }).ok).toBe(false);
  expect(totalOf({ ...all, playwright: { ...playwright, errors: [{}] } }).ok).toBe(false);
});

test('is never good where a report is missing, npm test failed, or a required check was left out', () => {
  expect(totalOf({ ...all, vitest: null })).toMatchObject({ line: '3 passed, 1 failed', ok: false });
  expect(totalOf({ ...all, playwright: null })).toMatchObject({ line: '40 passed, 1 failed', ok: false });
  expect(totalOf({ ...all, status: 2 })).toMatchObject({ line: '43 passed, 1 failed', ok: false });
  const left = { ...vitest, numPendingTests: 4 };
  expect(totalOf({ ...all, vitest: left })).toMatchObject({ line: '43 passed, 1 failed', ok: false });
  expect(totalOf({ ...all, vitest: left, required: false }).ok).toBe(true);
});
