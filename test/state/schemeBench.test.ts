import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { runCase } from '../../src/core/doors.ts';
import { methodOf, stabilityLimit } from '../../src/core/dynamics/methods.ts';
import { BENCH_METHODS, BENCH_PARTS } from '../../src/core/dynamics/schemeBench.ts';
import { caseOf } from '../../src/document/case.ts';
import { edit, restore } from '../../src/state/document.ts';
import { putEngine } from '../../src/state/engineInUse.ts';
import { putSamples } from '../../src/state/samples.ts';
import { benchKey, runSchemeBench, schemeBenchStore, stopSchemeBench } from '../../src/state/schemeBench.ts';
import { setSession } from '../../src/state/session.ts';
import { projectOf, withStorey } from './projects.ts';
import { type Watched, watchedEngine } from './watched.ts';

const suite = projectOf(3, 2, 300);
const now = () => schemeBenchStore.getState();
const over = () => expect.poll(() => now().status).toBe('done');
let engine: Watched;

beforeEach(() => {
  engine = watchedEngine();
  restore(suite.project);
  setSession({ motion: 'B', storey: null });
  schemeBenchStore.setState(schemeBenchStore.getInitialState(), true);
  putEngine(engine);
  for (const [digest, values] of suite.samples) putSamples(digest, values);
});

afterEach(() => {
  stopSchemeBench();
  engine.dispose();
});

describe('[EVI-6] schemes and steps side by side', () => {
  it('each row is the run of its scheme at its step, measured against one run that is finer than all', async () => {
    expect(runSchemeBench()).toBeNull();
    expect(now()).toMatchObject({ status: 'running', motion: 'B', key: benchKey() });
    await over();
    const { rows, reference, progress } = now();
    expect(progress).toBeNull();
    expect(rows.length).toBe(BENCH_METHODS.length * BENCH_PARTS.length);
    const result = caseOf(suite.project);
    if (!result.ok || !reference) throw new Error('no case');
    expect(reference.parts).toBeGreaterThan(Math.max(...BENCH_PARTS));
    const { frame, analysis, motions } = result.value;
    const { interval, scale, samples } = motions[1];
    const motion = { interval, scale, acceleration: suite.samples.get(samples) ?? new Float64Array() };
    const at = ({ method, parts }: Pick<typeof reference, 'method' | 'parts'>) =>
      runCase({ frame, analysis: { ...analysis, method, step: { parts } }, motion }, { histories: false });
    const finest = at(reference).storeys.peakDrift;
    for (const row of rows) {
      expect(row.state).toBe('done');
      const peaks = at(row).storeys.peakDrift;
      const error = Math.max(...peaks.map((d, i) => Math.abs(d - finest[i]))) / Math.max(...finest);
      expect(row.result?.error).toBeCloseTo(error, 14);
      expect(row.result?.solves).toBe(299 * row.parts);
      expect(row.result?.took).toBeGreaterThan(0);
    }
    // Second order: the finest step of each scheme is far better than its coarsest.
    for (const method of BENCH_METHODS) {
      const [coarse, , , fine] = rows.filter((row) => row.method === method);
      expect(fine.result?.error).toBeLessThan((coarse.result?.error ?? 0) / 4);
      const [little, much] = [fine, coarse].map(({ highest }) => Math.abs(highest.addedDamping ?? Number.NaN));
      expect(little).toBeLessThan(much);
    }
  });

  it('a scheme beyond its stability limit is said and not run', async () => {
    edit('a light, stiff storey', (project) => withStorey(project, 2, { stiffness: 4e9, mass: 5e3 }));
    runSchemeBench();
    await over();
    const unstable = now().rows.filter(({ state }) => state === 'unstable');
    expect(unstable.length).toBeGreaterThan(0);
    for (const { method, step, limit, result } of unstable) {
      expect(stabilityLimit(methodOf(method))).toBeLessThan(Number.POSITIVE_INFINITY);
      expect(step).toBeGreaterThan(limit ?? Number.NaN);
      expect(result).toBeNull();
    }
    expect(engine.asked.length).toBe(now().rows.length - unstable.length + 1);
  });

  it('is kept: asked again it runs nothing, and a changed frame makes it old', async () => {
    runSchemeBench();
    await over();
    const { rows } = now();
    engine.asked.length = 0;
    runSchemeBench();
    expect(now()).toMatchObject({ status: 'done', rows });
    expect(engine.asked).toEqual([]);
    expect(now().key).toBe(benchKey());
    edit('limit', (project) => ({ ...project, limits: { ...project.limits, drift: 0.01 } }));
    expect(now().key).toBe(benchKey());
    edit('soften', (project) => withStorey(project, 0, { stiffness: 9e7 }));
    expect(now().key).not.toBe(benchKey());
    setSession({ motion: 'A' });
    expect(now().key).not.toBe(benchKey());
  });

  it('stops: what is done stays, what comes late shows nowhere; it goes on where it stopped', async () => {
    let release = () => {};
    runSchemeBench({ parts: [1] });
    await over();
    engine.hold = new Promise((resolve) => {
      release = resolve;
    });
    runSchemeBench({ parts: [1, 2] });
    expect(now().status).toBe('running');
    stopSchemeBench();
    const stopped = now();
    expect(stopped).toMatchObject({ status: 'stopped', progress: null });
    release();
    await new Promise((resolve) => setTimeout(resolve, 5));
    expect(now()).toBe(stopped);
    engine.hold = null;
    runSchemeBench({ parts: [1, 2] });
    await over();
    expect(now().rows.every(({ state }) => state === 'done')).toBe(true);
  });

  it('a run that fails is said in its row; a document that does not run is said at once', async () => {
    engine.fail = (question) => (question === 'bench 2' ? 'out of memory' : null);
    runSchemeBench({ parts: [1] });
    await over();
    expect(
      now()
        .rows.map(({ state }) => state)
        .filter((state) => state === 'failed').length,
    ).toBe(1);
    expect(now().rows.find(({ state }) => state === 'failed')?.why).toBe('out of memory');
    edit('empty', (project) => withStorey(project, 0, { stiffness: null }));
    expect(runSchemeBench()).toMatch(/\w/);
    expect(now().status).toBe('done');
  });
});
