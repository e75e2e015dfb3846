import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readRecord } from '../../src/core/doors.ts';
import { caseOf } from '../../src/document/case.ts';
import { readProject } from '../../src/document/file.ts';

test('the project file in the README is one, and can be computed', () => {
  const [, text] = /```json\n([\s\S]*?)```/.exec(readFileSync('README.md', 'utf8')) ?? [];
  const record = Array.from({ length: 100 }, (_, i) => `${(0.01 * i).toFixed(2)} ${Math.sin(i).toFixed(4)}`).join('\n');
  const asked: string[] = [];
  const read = readProject(text, (name, answers) => {
    asked.push(name);
    return { ok: true, value: readRecord(name, new TextEncoder().encode(record), answers) };
  });
  if (!read.ok) throw new Error(JSON.stringify(read.faults));
  expect(asked).toEqual(['records/a.txt']);
  const computed = caseOf(read.value.project);
  if (!computed.ok) throw new Error(JSON.stringify(computed.faults));
  expect(computed.value.motions).toMatchObject([{ name: 'Motion A', interval: 0.01, count: 100, scale: 1.35 }]);
});

test('every file that the README and the page for contributors link to is there', () => {
  for (const page of ['README.md', 'DEVELOPERS.md']) {
    for (const [, target] of readFileSync(page, 'utf8').matchAll(/\]\((?!https?:)([^)#]+)\)/g)) {
      expect(() => readFileSync(target), `${page} links to ${target}`).not.toThrow();
    }
  }
});

test('every rule that a test quotes stands in DEVELOPERS.md', async () => {
  const page = readFileSync('DEVELOPERS.md', 'utf8');
  const tests = import.meta.glob('../**/*.test.{ts,tsx}', { query: '?raw', import: 'default' });
  const quoted = new Set<string>();
  for (const load of Object.values(tests)) {
    for (const [rule] of String(await load()).matchAll(/\[[A-Z]+-\d+\]/g)) quoted.add(rule);
  }
  expect(quoted.size).toBeGreaterThan(20);
  expect([...quoted].filter((rule) => !page.includes(rule))).toEqual([]);
});
