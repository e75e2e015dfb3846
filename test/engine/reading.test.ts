import { existsSync, readFileSync } from 'node:fs';
import { afterEach, describe, expect, it } from 'vitest';
import { digestOfSamples } from '../../src/core/digest.ts';
import { readRecord } from '../../src/core/doors.ts';
import { inlineEngine } from '../../src/engine/inline.ts';
import { createPool } from '../../src/engine/pool.ts';
import type { Engine, ReadAnswer, Reply } from '../../src/engine/protocol.ts';
import { fakeEnd, immediateTurns, threadEnd } from './ends.ts';
import { frameOf, requestOf, samplesOf } from './fixtures.ts';

const engines: Engine[] = [];
afterEach(() => {
  for (const engine of engines.splice(0)) engine.dispose();
});
function opened(engine: Engine): Engine {
  engines.push(engine);
  return engine;
}
const bytesOf = (text: string): ArrayBuffer => new TextEncoder().encode(text).buffer as ArrayBuffer;
const lines = (count: number) => Array.from({ length: count }, (_, i) => Math.sin(i / 9).toFixed(5));
const doneOf = (reply: Reply<ReadAnswer>): ReadAnswer => {
  if (reply.status !== 'done') throw new Error(JSON.stringify(reply));
  return reply.value;
};

describe('reading a file off the main thread', () => {
  it('is the reader itself, on every side, with digest and preview once nothing is open', async () => {
    const text = lines(2000).join('\n');
    const answers = { unit: 'g', interval: 0.01 } as const;
    const expected = readRecord('a.txt', new Uint8Array(bytesOf(text)), answers);
    expect(expected.motion).not.toBeNull();
    const sides = [
      inlineEngine(immediateTurns()),
      createPool({ size: 1, make: fakeEnd }),
      createPool({ size: 1, make: threadEnd }),
    ];
    for (const engine of sides.map(opened)) {
      const answer = doneOf(await engine.read('q', 'a.txt', bytesOf(text), answers));
      expect(answer.reading).toEqual(expected);
      expect(answer.samples).toBe(digestOfSamples(expected.motion?.acceleration ?? new Float64Array()));
      expect(answer.lines).toBe(2000);
      expect(answer.excerpt[0]).toEqual({ line: 1, text: '0.00000' });
      expect(answer.preview?.acceleration.length).toBe(answer.preview?.time.length);
      expect(answer.preview?.velocity.length).toBe(answer.preview?.time.length);
    }
  });

  it('copies the bytes, so that they are read again with other answers; the newer reading supersedes', async () => {
    const engine = opened(createPool({ size: 1, make: fakeEnd }));
    const bytes = bytesOf(lines(500).join('\n'));
    const open = doneOf(await engine.read('q', 'a.txt', bytes, {}));
    expect(open.reading.asks.length).toBeGreaterThan(0);
    expect([open.samples, open.preview]).toEqual([null, null]);
    const older = engine.read('q', 'a.txt', bytes, { unit: 'g' });
    const newer = engine.read('q', 'a.txt', bytes, { unit: 'g', interval: 0.01 });
    expect(await older).toEqual({ status: 'superseded' });
    expect(doneOf(await newer).samples).not.toBeNull();
    expect(bytes.byteLength).toBeGreaterThan(0);
  });

  it('shows the lines around each fault', async () => {
    const rows = lines(900);
    rows[699] = '0,12,3 bad';
    const engine = opened(inlineEngine(immediateTurns()));
    const answer = doneOf(await engine.read('q', 'a.txt', bytesOf(rows.join('\n')), { unit: 'g', interval: 0.01 }));
    expect(answer.reading.faults.length).toBeGreaterThan(0);
    const shown = answer.excerpt.map(({ line }) => line);
    for (const fault of answer.reading.faults) if (fault.line !== null) expect(shown).toContain(fault.line);
    expect(answer.excerpt.find(({ line }) => line === 700)?.text).toBe('0,12,3 bad');
  });

  it('draws what was read before the value that stopped it', async () => {
    const rows = lines(900);
    rows[600] = 'void';
    const engine = opened(inlineEngine(immediateTurns()));
    const answer = doneOf(await engine.read('q', 'a.txt', bytesOf(rows.join('\n')), { unit: 'g', interval: 0.01 }));
    expect(answer.measures).toBeNull();
    expect(answer.preview?.stopsAt).toBeCloseTo(6, 12);
    expect(answer.preview?.end).toBeCloseTo(8.99, 12);
    expect(answer.preview?.time.every((time) => time < 6)).toBe(true);
    expect(answer.preview?.acceleration.every(Number.isFinite)).toBe(true);
  });

  it('a run goes on beside it', async () => {
    const engine = opened(createPool({ size: 2, make: fakeEnd }));
    engine.putMotion('a', samplesOf(400));
    const replies = await Promise.all([
      engine.read('file', 'a.txt', bytesOf(lines(50_000).join('\n')), {}),
      engine.run('run', requestOf('a', frameOf(2))),
    ]);
    expect(replies.map((reply) => reply.status)).toEqual(['done', 'done']);
  });
});

const RECORD = new URL('../../../shared/records/imperial-valley-1940-ns.txt', import.meta.url);

describe.runIf(existsSync(RECORD))('the real record', () => {
  it('is read on a thread as by the door', async () => {
    const file = readFileSync(RECORD);
    const bytes = new Uint8Array(file).buffer as ArrayBuffer;
    const engine = opened(createPool({ size: 1, make: threadEnd }));
    const answer = doneOf(await engine.read('q', 'imperial-valley-1940-ns.txt', bytes, { interval: 0.02 }));
    expect(answer.reading).toEqual(readRecord('imperial-valley-1940-ns.txt', new Uint8Array(file), { interval: 0.02 }));
    expect(answer.reading.motion?.interval).toBe(0.02);
  });
});
