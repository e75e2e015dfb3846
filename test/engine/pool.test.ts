import { afterEach, describe, expect, it } from 'vitest';
import { runCase } from '../../src/core/doors.ts';
import { inlineEngine } from '../../src/engine/inline.ts';
import { createPool } from '../../src/engine/pool.ts';
import type { Endpoint, Engine, FromWorker, ToWorker } from '../../src/engine/protocol.ts';
import { type Fake, fakeEnd, threadEnd } from './ends.ts';
import { ANALYSIS, frameOf, requestOf, samplesOf, yieldingFrameOf } from './fixtures.ts';

const engines: Engine[] = [];
afterEach(() => {
  for (const engine of engines.splice(0)) engine.dispose();
});

function poolOf(size: number, make: () => Endpoint, rest: { silent?: number; fallback?: () => Endpoint } = {}): Engine {
  const engine = createPool({ size, make, ...rest });
  engines.push(engine);
  engine.putMotion('a', samplesOf(800));
  engine.putMotion('b', samplesOf(800, 2));
  return engine;
}

/** A pool of bare message channels with the real jobs behind them; `ends` collects them. */
function channels(size: number): { engine: Engine; ends: Fake[] } {
  const ends: Fake[] = [];
  const make = () => {
    const end = fakeEnd();
    ends.push(end);
    return end;
  };
  return { engine: poolOf(size, make), ends };
}

const worksOf = (end: Fake) => end.received.filter((m) => m.kind === 'work');
const runIds = (message: ToWorker) => (message.kind === 'work' ? message.jobs.map((job) => job.id) : []);
const failure = (id: number, message: string): FromWorker => ({
  kind: 'news',
  outcomes: [{ id, kind: 'failed', message }],
  progress: null,
});

describe('the same bits on every side', () => {
  it.each([
    ['elastic', frameOf(3)],
    ['yielding', yieldingFrameOf(3)],
  ])('inline, message channel, thread and the door itself agree to the last bit: %s', async (kind, frame) => {
    const expected = runCase(
      { frame, analysis: ANALYSIS, motion: { interval: 0.01, scale: 1, acceleration: samplesOf(800) } },
      { histories: true },
    );
    expect(Math.max(...expected.storeys.peakDrift)).toBeGreaterThan(0);
    expect(expected.histories?.nonlinear?.yielding.includes(1) ?? false).toBe(kind === 'yielding');
    const inline = inlineEngine();
    engines.push(inline);
    inline.putMotion('a', samplesOf(800));
    for (const engine of [inline, channels(2).engine, poolOf(1, threadEnd)]) {
      const reply = await engine.run('q', requestOf('a', frame, true));
      expect(reply).toEqual({ status: 'done', value: expected, took: expect.any(Number) });
    }
  });

  it('a run longer than one slice has the bits of a run at once, and tells how far it is', async () => {
    const acceleration = samplesOf(400_000);
    const { engine } = channels(1);
    engine.putMotion('long', acceleration);
    const shares: number[] = [];
    const reply = await engine.run('q', requestOf('long', frameOf(12)), { onProgress: (share) => shares.push(share) });
    const whole = runCase(
      { frame: frameOf(12), analysis: ANALYSIS, motion: { interval: 0.01, scale: 1, acceleration } },
      { histories: false },
    );
    expect(reply).toEqual({ status: 'done', value: whole, took: expect.any(Number) });
    expect(shares.length).toBeGreaterThan(0);
    for (const share of shares) expect(share).toBeGreaterThanOrEqual(0);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)).toBeLessThan(1);
  });
});

describe('superseding', () => {
  it('a newer job for the same question takes the place of the older one, before and after it was sent', async () => {
    const { engine, ends } = channels(1);
    engine.putMotion('long', samplesOf(2_000_000));
    const first = engine.run('q', requestOf('long'));
    const second = engine.run('q', requestOf('long'));
    expect(await first).toEqual({ status: 'superseded' });
    await engine.run('other', requestOf('a'), { priority: -1 });
    const third = engine.run('q', requestOf('b'));
    expect(await second).toEqual({ status: 'superseded' });
    expect((await third).status).toBe('done');
    const dropped = worksOf(ends[0]).flatMap((m) => (m.kind === 'work' ? m.drop : []));
    expect(dropped).toEqual([2]);
    expect(worksOf(ends[0]).flatMap(runIds)).not.toContain(1);
  });

  it('cancel settles the job as superseded and a late answer is not heard', async () => {
    const late: (() => void)[] = [];
    const engine = poolOf(1, () =>
      fakeEnd((answer) => (message) => {
        for (const id of runIds(message)) late.push(() => answer(failure(id, 'late')));
      }),
    );
    const cancelled = engine.run('q', requestOf('a'));
    await expect.poll(() => late.length).toBe(1);
    engine.cancel('q');
    engine.cancel('nobody asked');
    expect(await cancelled).toEqual({ status: 'superseded' });
    const next = engine.run('q', requestOf('a'));
    await expect.poll(() => late.length).toBe(2);
    late[0]();
    late[1]();
    expect(await next).toEqual({ status: 'failed', message: 'late' });
  });

  it('dispose settles what is open, and what comes after', async () => {
    const { engine, ends } = channels(2);
    engine.putMotion('long', samplesOf(2_000_000));
    const open = ['p', 'q', 'r'].map((question) => engine.run(question, requestOf('long')));
    await Promise.resolve();
    engine.dispose();
    for (const reply of await Promise.all(open)) expect(reply).toEqual({ status: 'superseded' });
    expect(await engine.run('late', requestOf('a'))).toEqual({ status: 'superseded' });
    expect(ends.map((end) => end.ended)).toEqual([true, true]);
  });
});

describe('order and messages', () => {
  it('lower priority numbers go first, equal ones in the order asked', async () => {
    const { engine } = channels(1);
    const order: string[] = [];
    const ask = (name: string, priority: number) =>
      engine.run(name, requestOf('a'), { priority }).then(() => order.push(name));
    await Promise.all([ask('late', 10), ask('first', 0), ask('second', 0), ask('urgent', -1)]);
    expect(order).toEqual(['urgent', 'first', 'second', 'late']);
  });

  it('a job of a lower number overtakes a run under way', async () => {
    const { engine } = channels(1);
    engine.putMotion('long', samplesOf(1_000_000));
    const order: string[] = [];
    const slow = engine.run('slow', requestOf('long', frameOf(12)), { priority: 10 }).then(() => order.push('slow'));
    await engine.run('warm', requestOf('a'), { priority: 0 });
    await Promise.all([slow, engine.run('quick', requestOf('b'), { priority: 0 }).then(() => order.push('quick'))]);
    expect(order).toEqual(['quick', 'slow']);
  });

  it('the jobs of one keystroke cross in one message a worker, samples once, the frame once', async () => {
    const { engine, ends } = channels(2);
    const suite = (stiffness: number) => {
      const frame = frameOf(3, stiffness);
      return Promise.all(
        Array.from({ length: 11 }, (_, i) => engine.run(`run ${i}`, requestOf(i % 2 ? 'a' : 'b', frame))),
      );
    };
    await suite(1e8);
    await suite(1.1e8);
    expect(ends.length).toBe(2);
    for (const end of ends) {
      expect(worksOf(end).length).toBe(2);
      const digests = end.received.flatMap((m) => (m.kind === 'motion' ? [m.digest] : []));
      expect(digests.length).toBe(new Set(digests).size);
      for (const work of worksOf(end)) {
        const frames =
          work.kind === 'work' ? work.jobs.filter((job) => job.kind === 'run' && job.prepared !== null) : [];
        expect(frames.length).toBe(1);
      }
    }
  });

  it('keeps samples of its own: those of the caller are neither detached nor changed', async () => {
    const { engine } = channels(1);
    const own = samplesOf(50);
    engine.putMotion('own', own);
    await engine.run('q', requestOf('own'));
    expect(own).toEqual(samplesOf(50));
    expect(engine.hasMotion('own')).toBe(true);
    engine.dropMotion('own');
    expect(engine.hasMotion('own')).toBe(false);
    expect((await engine.run('q', requestOf('own'))).status).toBe('failed');
  });
});

describe('failure', () => {
  it('a job that throws fails with its words, and the worker goes on', async () => {
    const { engine, ends } = channels(1);
    const bad = { ...requestOf('a'), analysis: { ...ANALYSIS, step: 0.003 } };
    const reply = await engine.run('bad', bad);
    expect(reply.status).toBe('failed');
    expect(reply.status === 'failed' && reply.message).toContain('0.003');
    expect((await engine.run('good', requestOf('a'))).status).toBe('done');
    expect(ends.length).toBe(1);
  });

  it('a request that cannot be cloned fails, and the worker goes on', async () => {
    const { engine, ends } = channels(1);
    const frame = { ...frameOf(3), stray: () => 0 };
    expect((await engine.run('bad', requestOf('a', frame))).status).toBe('failed');
    expect((await engine.run('good', requestOf('a'))).status).toBe('done');
    expect(ends.length).toBe(1);
  });

  it('a worker that dies is replaced and its jobs are repeated once', async () => {
    const ends: Fake[] = [];
    const engine = poolOf(1, () => {
      const end = fakeEnd(ends.length === 0 ? () => () => ends[0].die('out of memory') : undefined);
      ends.push(end);
      return end;
    });
    const replies = await Promise.all([engine.run('p', requestOf('a')), engine.run('q', requestOf('b'))]);
    expect(replies.map((reply) => reply.status)).toEqual(['done', 'done']);
    expect(ends.map((end) => end.ended)).toEqual([true, false]);
    expect(ends[1].received.flatMap((m) => (m.kind === 'motion' ? [m.digest] : []))).toEqual(['a', 'b']);
  });

  it('a job that kills its worker twice fails; those that were sent with it do not', async () => {
    const ends: Fake[] = [];
    const engine = poolOf(1, () => {
      const end: Fake = fakeEnd((answer) => (message) => {
        if (message.kind !== 'work') return;
        const deadly = message.jobs.some((job) => job.kind === 'run' && job.motion.scale === 13);
        if (deadly) end.die('it fell over');
        else for (const job of message.jobs) answer(failure(job.id, 'lived'));
      });
      ends.push(end);
      return end;
    });
    const request = requestOf('a');
    const replies = await Promise.all([
      engine.run('p', request),
      engine.run('deadly', { ...request, motion: { ...request.motion, scale: 13 } }),
      engine.run('q', request),
    ]);
    expect(replies[0]).toEqual({ status: 'failed', message: 'lived' });
    expect(replies[1].status === 'failed' && replies[1].message).toContain('it fell over');
    expect(replies[2]).toEqual({ status: 'failed', message: 'lived' });
    expect(ends.length).toBe(3);
  });

  it('a worker that is silent while it has a job is replaced; a second silence fails the job', async () => {
    const ends: Fake[] = [];
    const make = (mute: (at: number) => boolean) => () => {
      const end = fakeEnd(mute(ends.length) ? () => () => {} : undefined);
      ends.push(end);
      return end;
    };
    const engine = poolOf(
      1,
      make((at) => at === 0),
      { silent: 80 },
    );
    expect((await engine.run('q', requestOf('a'))).status).toBe('done');
    expect(ends.length).toBe(2);
    const silent = poolOf(
      1,
      make(() => true),
      { silent: 80 },
    );
    const reply = await silent.run('q', requestOf('a'));
    expect(reply.status === 'failed' && reply.message).toContain('silent');
  });

  it('where no worker can be started the fallback answers; without one the job fails', async () => {
    const dead = () => {
      const end = fakeEnd(() => () => {});
      return { ...end, listen() {}, onDeath: (died: (why: string) => void) => setTimeout(() => died('not found'), 1) };
    };
    const engine = poolOf(2, dead, { fallback: fakeEnd });
    const replies = await Promise.all(['p', 'q', 'r'].map((question) => engine.run(question, requestOf('a'))));
    expect(replies.map((reply) => reply.status)).toEqual(['done', 'done', 'done']);
    const helpless = poolOf(1, dead);
    const reply = await helpless.run('q', requestOf('a'));
    expect(reply.status === 'failed' && reply.message).toContain('not found');
  });

  it('a thread that breaks down under its job is replaced by another thread', async () => {
    const workers: ReturnType<typeof threadEnd>[] = [];
    const engine = poolOf(1, () => {
      const end = threadEnd();
      workers.push(end);
      return end;
    });
    engine.putMotion('long', samplesOf(1_500_000));
    await engine.run('warm', requestOf('a'));
    const reply = engine.run('q', requestOf('long', frameOf(10)));
    // No job at all: it throws outside of any job, an uncaught error of the worker.
    workers[0].worker.postMessage({ kind: 'work', drop: [], jobs: null });
    expect((await reply).status).toBe('done');
    expect(workers.length).toBe(2);
  });
});
