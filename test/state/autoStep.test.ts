import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { runAtAutoStep } from '../../src/core/doors.ts';
import { leastParts } from '../../src/core/dynamics/autoStep.ts';
import { type Case, caseOf } from '../../src/document/case.ts';
import type { Project } from '../../src/document/project.ts';
import { type ResultsState, resultsStore } from '../../src/state/answers.ts';
import {
  commitDraft,
  documentStore,
  edit,
  effectiveProject,
  restore,
  setDraft,
  undo,
} from '../../src/state/document.ts';
import { type Follower, follow, type Pace } from '../../src/state/follow.ts';
import { questionOf } from '../../src/state/question.ts';
import { setSession } from '../../src/state/session.ts';
import { noise } from '../support/frames.ts';
import { projectOf, withStorey } from './projects.ts';
import { type Watched, watchedEngine } from './watched.ts';

const made = projectOf(3, 3, 300);
const samples = new Map(['A', 'B', 'C'].map((name, i) => [`noise ${name}`, noise(i + 1, 300)]));
const suite: Project = {
  ...made.project,
  frame: {
    ...made.project.frame,
    storeys: made.project.frame.storeys.map((row) => ({
      ...row,
      law: { kind: 'bilinear' as const, strength: 2.5e5, hardening: 0.02 },
    })),
  },
  motions: made.project.motions.map((motion) => ({ ...motion, interval: 0.02, samples: `noise ${motion.name}` })),
  analysis: { ...made.project.analysis, step: 'auto', tail: 1 },
};
const EMPTY: ResultsState = resultsStore.getInitialState();
const PACE: Pace = { quick: 1e6, pause: 0, long: 1e9, shown: 1e6, evidence: 0, typing: 0 };
const now = () => resultsStore.getState();

let engine: Watched;
let follower: Follower | null = null;

function begin(project: Project = suite, pace: Partial<Pace> = {}): void {
  restore(project);
  follower = follow(engine, (digest) => samples.get(digest), { ...PACE, ...pace });
}

/** The search is over: each motion has its step error. */
const settled = () => expect.poll(() => now().status === 'current' && now().stepErrors !== null && quiet()).toBe(true);
/** Nothing that was asked is still out. */
const quiet = () => Object.values(now().answers?.evidence ?? {}).every(({ auto }) => auto?.converged !== null);
const partsNow = () => Object.values(now().answers?.evidence ?? {}).map(({ parts }) => parts);

function caseNow(): Case {
  const result = caseOf(effectiveProject(documentStore.getState()));
  if (!result.ok) throw new Error(result.faults[0].message);
  return result.value;
}

/** The whole search at once, a motion: what the state must come to. */
function searched() {
  const { frame, prepared, analysis, motions } = caseNow();
  return motions.map(({ interval, scale, samples: digest }) => {
    const acceleration = samples.get(digest) ?? new Float64Array();
    return runAtAutoStep(
      prepared,
      { frame, analysis, motion: { interval, scale, acceleration } },
      { histories: false },
    );
  });
}

beforeEach(() => {
  engine = watchedEngine();
  resultsStore.setState(EMPTY, true);
  setSession({ motion: null, storey: null });
});

afterEach(() => {
  follower?.end();
  follower = null;
  engine.dispose();
});

describe('[EVI-5] step "auto" behind the answers', () => {
  it('comes to the runs of the whole search, with its step errors and its words', async () => {
    begin();
    await settled();
    const found = searched();
    expect(now().answers?.runs.map(({ run }) => run)).toEqual(found.map(({ run }) => run));
    expect(Object.values(now().stepErrors ?? {})).toEqual(found.map(({ stepError }) => stepError));
    const evidence = Object.values(now().answers?.evidence ?? {});
    expect(evidence.map(({ parts }) => parts)).toEqual(found.map(({ parts }) => parts));
    expect(evidence.map(({ auto }) => auto)).toEqual(found.map(({ why, converged }) => ({ why, converged })));
    expect(now().answers?.evidenceSentence).toMatch(
      /^Drifts are converged to 0\.\d %, storey shears to [\d.]+ % and floor accelerations to [\d.]+ %; energy balances to /,
    );
    const least = leastParts(caseNow().prepared, caseNow().analysis.method, 0.02).parts;
    expect(Math.max(...partsNow())).toBeGreaterThan(least);
    await expect
      .poll(() => now().chosen?.run.step)
      .toBe(0.02 / (now().answers?.evidence[now().chosen?.motion ?? '']?.parts ?? 0));
  });

  it('while a cell is edited one run a motion answers, at the parts that did before, and it is confirmed behind', async () => {
    begin();
    await settled();
    const before = partsNow();
    engine.asked.length = 0;
    setDraft({ path: 'frame.storeys[0].stiffness', text: '118', value: 1.18e8 });
    await expect.poll(() => now().status).toBe('current');
    const asked = engine.asked.filter(({ question }) => question.startsWith('run '));
    expect(asked.map(({ request }) => request.analysis.step)).toEqual(before.map((parts) => ({ parts })));
    await settled();
    const behind = engine.asked.filter(({ question }) => question.startsWith('half '));
    expect(
      behind.every(
        ({ request }) =>
          typeof request.analysis.step === 'object' && request.analysis.step.parts >= 2 * Math.min(...before),
      ),
    ).toBe(true);
    commitDraft('stiffness');
    await settled();
    await expect.poll(partsNow).toEqual(searched().map(({ parts }) => parts));
  });

  it('comes to the same step whatever was done before', async () => {
    begin();
    await settled();
    const first = now().answers?.runs;
    // A frame that asks for a finer step, and the way back.
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 9e9, mass: 2e4 }));
    await settled();
    undo();
    await settled();
    expect(now().answers?.runs).toEqual(first);
    edit('soften', (project) => withStorey(project, 2, { stiffness: 3e7 }));
    await settled();
    await expect.poll(() => now().answers?.runs.map(({ run }) => run)).toEqual(searched().map(({ run }) => run));
  });

  it('each update is of one suite: current answers belong to the document, errors to their runs', async () => {
    begin();
    let [seen, wrong] = [0, 0];
    const off = resultsStore.subscribe(({ status, answers, stepErrors }) => {
      if (status !== 'current' || !answers) return;
      seen += 1;
      if (answers.key !== questionOf(caseNow()).key) wrong += 1;
      for (const { motion, run } of answers.runs) {
        const { parts, step, stepError } = answers.evidence[motion];
        if (step !== run.step || Math.abs(parts * step - 0.02) > 1e-12) wrong += 1;
        if (stepErrors && stepErrors[motion] !== stepError) wrong += 1;
      }
    });
    await settled();
    for (let i = 0; i < 12; i++) {
      const stiffness = 5e7 + 1e7 * ((i * 7) % 13);
      if (i % 4 === 3) undo();
      else edit('stiffness', (project) => withStorey(project, i % 3, { stiffness }));
      for (let turn = 0; turn < (i % 5) * 4; turn++) await new Promise((resolve) => setImmediate(resolve));
    }
    await settled();
    off();
    expect(seen).toBeGreaterThan(5);
    expect(wrong).toBe(0);
    await expect.poll(() => now().answers?.runs.map(({ run }) => run)).toEqual(searched().map(({ run }) => run));
  });

  it('halving a typed step runs nothing that the evidence has run', async () => {
    begin({ ...suite, analysis: { ...suite.analysis, step: { parts: 4 } } });
    await expect.poll(() => now().stepErrors).not.toBeNull();
    engine.asked.length = 0;
    edit('halve', (project) => ({ ...project, analysis: { ...project.analysis, step: 0.0025 } }));
    expect(now().status).toBe('current');
    expect(engine.asked.filter(({ question }) => question.startsWith('run '))).toEqual([]);
    expect(now().answers?.evidence.A).toMatchObject({ parts: 8, step: 0.0025, auto: null, stepError: null });
    await expect.poll(() => now().stepErrors).not.toBeNull();
  });

  it('a half-step run that fails leaves the answer as it is, without a step error', async () => {
    engine.fail = (question) => (question === 'half B' ? 'out of memory' : null);
    begin();
    await expect.poll(() => engine.asked.filter(({ question }) => question === 'half B').length).toBe(1);
    await expect.poll(() => now().answers?.evidence.A?.auto?.converged).toBe(true);
    expect(now()).toMatchObject({ status: 'current', stepErrors: null, faults: [] });
    expect(now().answers?.evidence.B).toMatchObject({ stepError: null, auto: { converged: null } });
    expect(now().answers?.evidenceSentence).toContain('the step error of 1 of 3 motions is not known');
  });
});
