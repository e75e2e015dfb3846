import { describe, expect, test } from 'vitest';
import { responseOf } from '../../../src/core/report/response.ts';
import { exampleSource, isolatedSource } from './example.ts';

describe('[FILE-2] the response file carries the keys of the project-file page', () => {
  const source = exampleSource();
  const response = responseOf(source);

  test('modes, runs and envelope under their names, ground up', () => {
    expect(Object.keys(response)).toEqual(['format', 'version', 'modes', 'runs', 'envelope']);
    expect(response).toMatchObject({ format: 'swaybook-response', version: 1 });
    expect(response.modes).toHaveLength(3);
    for (const mode of response.modes) {
      expect(Object.keys(mode).sort()).toEqual([
        'effectiveMass',
        'effectiveMassRatio',
        'participation',
        'period',
        'shape',
      ]);
      expect(mode.shape.at(-1)).toBe(1);
    }
    const [run] = response.runs;
    expect(Object.keys(run).sort()).toEqual([
      'base',
      'completed',
      'energy',
      'floors',
      'method',
      'motion',
      'step',
      'stepError',
      'steps',
      'storeys',
    ]);
    expect(run).toMatchObject({ motion: 'A', step: 0.01, completed: true, stepError: 0.004 });
    expect(response.runs[1].stepError).toBeNull();
    expect(Object.keys(run.storeys[0]).sort()).toEqual([
      'dissipated',
      'peakDrift',
      'peakDriftRatio',
      'peakOverturning',
      'peakShear',
      'peakTime',
      'residualDrift',
    ]);
    expect(Object.keys(run.floors[0]).sort()).toEqual(['peakAcceleration', 'peakDisplacement', 'peakVelocity']);
    expect(run.base).toEqual({
      peakShear: run.storeys[0].peakShear,
      peakOverturning: run.storeys[0].peakOverturning,
    });
    // Ground up: floor 1 moves with storey 1 alone.
    expect(run.floors[0].peakDisplacement).toBe(run.storeys[0].peakDrift);
  });

  test('the ratio is factor x measure / limit, and the governing motion is the one with the largest value', () => {
    response.envelope.storeys.forEach((storey, i) => {
      const ratios = response.runs.map((run) => run.storeys[i].peakDriftRatio);
      const largest = Math.max(...ratios);
      expect(storey.max).toBe(largest);
      expect(storey.governing).toBe(response.runs[ratios.indexOf(largest)].motion);
      expect(storey.ratio).toBeCloseTo((1.25 * largest) / 0.02, 12);
      expect(Object.keys(storey.shear)).toEqual(['mean', 'median', 'max', 'governing']);
    });
    expect(response.envelope).toMatchObject({ measure: 'max', factor: 1.25, leftOut: ['C'] });
    expect(response.envelope).not.toHaveProperty('incomplete');
  });

  test('survives JSON without losing a digit', () => {
    expect(JSON.parse(JSON.stringify(response))).toEqual(response);
  });
});

test('[FILE-2] a suite with a run that ended early has no statistics and says which run', () => {
  const { envelope, runs } = responseOf(exampleSource({ strength: 100 }));
  const [first] = runs;
  expect(first.completed).toBe(false);
  expect(first.reason?.why).toMatch(/^storey \d lost its stability at \d\.\d\d s/);
  expect(first.reason?.time).toBeGreaterThan(0);
  expect(first.reason?.storey).toBeGreaterThanOrEqual(1);
  expect(envelope.incomplete).toEqual(['A']);
  for (const storey of envelope.storeys) {
    expect(storey).toMatchObject({ mean: null, median: null, max: null, ratio: null, governing: null });
    expect(storey.limit).toBe(0.02);
    expect(storey.shear).toEqual({ mean: null, median: null, max: null, governing: null });
  }
});

describe('[FILE-3] the response of storeys that yield, dampers and an isolator', () => {
  const source = isolatedSource({ limit: 0.25 });
  const response = responseOf(source);
  const [run] = response.runs;
  const computed = source.runs[0].run;

  test('ductility stands where a storey can yield and is absent for elastic ones', () => {
    expect(run.storeys.map(({ ductility }) => ductility)).toEqual([
      ...computed.storeys.ductility.slice(0, 2),
      undefined,
    ]);
    expect(run.storeys[2]).not.toHaveProperty('ductility');
    const [isolator, ground, top] = response.envelope.storeys;
    expect(isolator.ductility?.max).toBe(source.envelope.ductility?.max[0]);
    expect(ground.ductility?.governing).toMatch(/^[AB]$/);
    expect(top).not.toHaveProperty('ductility');
  });

  test('energies of dampers and hysteresis are those of the run', () => {
    expect(run.energy.dampers).toBeGreaterThan(0);
    expect(run.energy.hysteretic).toBeGreaterThan(0);
    const dissipated = run.storeys.reduce((sum, storey) => sum + storey.dissipated, 0);
    expect(dissipated / run.energy.hysteretic).toBeCloseTo(1, 9);
  });

  test('an isolator is compared by its displacement, in m and without the factor on drifts', () => {
    const [isolator, ground] = response.envelope.storeys;
    expect(isolator.limit).toBeNull();
    expect(isolator.ratio).toBeNull();
    const { displacement } = response.envelope.floors[0];
    expect(displacement).toMatchObject({ limit: 0.25, ratio: Number(displacement.max) / 0.25 });
    expect(response.envelope.floors[1].displacement).not.toHaveProperty('limit');
    expect(ground.limit).toBe(0.02);
    expect(ground.ratio).toBeCloseTo((1.25 * Number(ground.max)) / 0.02, 12);
    expect(responseOf(isolatedSource()).envelope.floors[0].displacement).toMatchObject({ limit: null, ratio: null });
  });

  test('survives JSON without losing a digit', () => expect(JSON.parse(JSON.stringify(response))).toEqual(response));

  test('a collapse names storey, time and why, and leaves no statistic', () => {
    const stopped = responseOf(isolatedSource({ limit: 0.25, strength: 40 }));
    expect(stopped.runs[0].completed).toBe(false);
    expect(stopped.runs[0].reason?.storey).toBeGreaterThanOrEqual(1);
    expect(stopped.runs[0].reason?.why).toMatch(/^storey \d lost its stability/);
    expect(stopped.envelope.incomplete).toContain('A');
    const none = { mean: null, median: null, max: null, governing: null };
    expect(stopped.envelope.storeys[0]).toMatchObject({ ...none, limit: null, ratio: null, ductility: none });
    expect(stopped.envelope.floors[0].displacement).toEqual({ ...none, limit: 0.25, ratio: null });
  });
});

test('[FILE-2] a step that does not converge is named with its storey', () => {
  const source = isolatedSource();
  const [first, second] = source.runs;
  const ending = { status: 'not-converged', storey: 1, time: 2.35 } as const;
  const { runs } = responseOf({ ...source, runs: [{ ...first, run: { ...first.run, ending } }, second] });
  expect(runs[0].reason).toEqual({
    storey: 2,
    time: 2.35,
    why: 'storey 2 found no equilibrium at 2.35 s, however short the step',
  });
});
