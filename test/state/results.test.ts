import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { runCase, stepErrorOf } from '../../src/core/doors.ts';
import { caseOf } from '../../src/document/case.ts';
import type { Project } from '../../src/document/project.ts';
import { type ResultsState, resultsStore } from '../../src/state/answers.ts';
import { documentStore, edit, effectiveProject, replace, restore, setDraft, undo } from '../../src/state/document.ts';
import { type Follower, follow, type Pace } from '../../src/state/follow.ts';
import { questionOf } from '../../src/state/question.ts';
import { chosenMotion, chosenStorey } from '../../src/state/selectors.ts';
import { sessionStore, setSession } from '../../src/state/session.ts';
import { projectOf, withStorey } from './projects.ts';
import { type Watched, watchedEngine } from './watched.ts';

const suite = projectOf(4, 3);
const EMPTY: ResultsState = resultsStore.getInitialState();
const now = () => resultsStore.getState();
const at = (status: ResultsState['status']) => expect.poll(() => now().status).toBe(status);

let engine: Watched;
let follower: Follower | null = null;
const PACE: Pace = { quick: 1e6, pause: 0, long: 1e9, shown: 1e6, evidence: 0, typing: 0 };

function begin(project: Project = suite.project, pace: Partial<Pace> = {}): void {
  restore(project);
  follower = follow(engine, (digest) => suite.samples.get(digest), { ...PACE, ...pace });
}

/** Names of the runs (not histories, not half steps) asked since the list was last emptied. */
const runsAsked = () =>
  engine.asked.filter(({ question }) => question.startsWith('run ')).map((a) => a.question.slice(4));

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

/** What the document as it stands asks, and whether the answers shown are those. */
function belongs(): boolean {
  const result = caseOf(effectiveProject(documentStore.getState()));
  return result.ok && now().answers?.key === questionOf(result.value).key;
}

describe('another project', () => {
  it('is never shown beside the answers of the one before it, not even as out of date', async () => {
    begin();
    await at('current');
    replace('open other', withStorey(projectOf(2, 1).project, 0, { stiffness: null }));
    expect(now()).toMatchObject({ status: 'stale', answers: null, chosen: null, stepErrors: null });
    undo();
    await at('current');
    expect(belongs()).toBe(true);
  });
});

describe('answers', () => {
  it('are those of the door, with the histories of the governing motion', async () => {
    begin();
    expect(now().status).toBe('running');
    await at('current');
    const { answers } = now();
    expect(answers?.runs.map((run) => run.motion)).toEqual(['A', 'B', 'C']);
    const result = caseOf(suite.project);
    if (!result.ok || !answers) throw new Error('no case');
    for (const [i, { run }] of answers.runs.entries()) {
      const { frame, analysis, motions } = result.value;
      const { interval, scale, samples } = motions[i];
      const acceleration = suite.samples.get(samples) ?? new Float64Array();
      expect(run).toEqual(
        runCase({ frame, analysis, motion: { interval, scale, acceleration } }, { histories: false }),
      );
    }
    const { envelope } = answers;
    expect(chosenStorey()).toBe(envelope.governingStorey);
    expect(chosenMotion()).toBe(envelope.motions[envelope.drift?.governing[envelope.governingStorey] ?? -1]);
    await expect.poll(() => now().chosen?.motion).toBe(chosenMotion());
    expect(now().chosen?.run.histories?.count).toBe(600);
    expect(answers.runs.every(({ run }) => run.histories === null)).toBe(true);
    expect(now().modes?.length).toBe(4);
  });

  it('step errors come behind, as the half step gives them', async () => {
    begin();
    await expect.poll(() => Object.keys(now().stepErrors ?? {})).toEqual(['A', 'B', 'C']);
    const result = caseOf(suite.project);
    if (!result.ok) throw new Error('no case');
    const { frame, analysis, motions } = result.value;
    const { interval, scale, samples } = motions[1];
    const motion = { interval, scale, acceleration: suite.samples.get(samples) ?? new Float64Array() };
    const run = runCase({ frame, analysis, motion }, { histories: false });
    const half = runCase({ frame, analysis: { ...analysis, step: { parts: 2 } }, motion }, { histories: false });
    expect(now().stepErrors?.B).toBe(stepErrorOf(run, half));
    expect(stepErrorOf(run, half)).toBeGreaterThan(0);
  });
});

describe('what reruns', () => {
  const settled = async () => {
    await at('current');
    await expect.poll(() => now().stepErrors).not.toBeNull();
    engine.asked.length = 0;
  };

  it('a stiffness reruns every motion', async () => {
    begin();
    await settled();
    edit('soften', (project) => withStorey(project, 0, { stiffness: 9e7 }));
    expect(now().status).toBe('running');
    await at('current');
    expect(runsAsked().sort()).toEqual(['A', 'B', 'C']);
    expect(belongs()).toBe(true);
  });

  it('a limit reruns nothing, and its ratios follow at once', async () => {
    begin();
    await settled();
    const before = now().answers;
    edit('limit', (project) => ({ ...project, limits: { ...project.limits, drift: 0.01 } }));
    expect(now().status).toBe('current');
    expect(engine.asked).toEqual([]);
    const [was, is] = [before?.envelope.ratio?.[0] ?? 0, now().answers?.envelope.ratio?.[0] ?? 0];
    expect(was).toBeGreaterThan(0);
    expect(is).toBeCloseTo(2 * was, 12);
    expect(now().stepErrors).not.toBeNull();
  });

  it('a title or a storey name reruns nothing', async () => {
    begin();
    await settled();
    edit('rename', (project) => ({ ...withStorey(project, 0, { name: 'Entrance' }), title: 'New' }));
    expect(now().status).toBe('current');
    expect(now().answers?.case.frame.storeys[0].name).toBe('Entrance');
    expect(engine.asked).toEqual([]);
  });

  it('a scale reruns its motion only, and undo none', async () => {
    begin();
    await settled();
    const scaled = (project: Project): Project => ({
      ...project,
      motions: project.motions.map((motion, i) => (i === 1 ? { ...motion, scale: 1.5 } : motion)),
    });
    edit('scale B', scaled);
    await at('current');
    expect(runsAsked()).toEqual(['B']);
    await expect.poll(() => now().stepErrors).not.toBeNull();
    engine.asked.length = 0;
    undo();
    await at('current');
    expect(runsAsked()).toEqual([]);
    expect(belongs()).toBe(true);
  });

  it('another motion chosen asks its histories once', async () => {
    begin();
    await settled();
    const other = ['A', 'B', 'C'].find((name) => name !== chosenMotion()) ?? '';
    setSession({ motion: other });
    await expect.poll(() => now().chosen?.motion).toBe(other);
    expect(engine.asked.map((one) => one.question)).toEqual(['histories']);
    expect(now().status).toBe('current');
    edit('soften', (project) => withStorey(project, 1, { stiffness: 8e7 }));
    await at('current');
    expect(now().chosen?.motion).toBe(other);
  });

  it('a motion left out leaves the answers without a run', async () => {
    begin();
    await settled();
    edit('leave C out', (project) => ({
      ...project,
      motions: project.motions.map((m) => (m.name === 'C' ? { ...m, used: false, reason: 'too short' } : m)),
    }));
    await at('current');
    expect(runsAsked()).toEqual([]);
    expect(now().answers?.runs.map((run) => run.motion)).toEqual(['A', 'B']);
    expect(now().answers?.envelope.leftOut).toEqual(['C']);
  });
});

describe('never stale as current', () => {
  it('whatever is edited while runs are under way, current means that the answers belong to the document', async () => {
    begin();
    let [seen, wrong] = [0, 0];
    const off = resultsStore.subscribe(({ status }) => {
      if (status !== 'current') return;
      seen += 1;
      if (!belongs()) wrong += 1;
    });
    const offDocument = documentStore.subscribe(() => {
      if (now().status === 'current' && !belongs()) wrong += 1;
    });
    for (let i = 0; i < 60; i++) {
      const stiffness = 5e7 + 1e6 * ((i * 7) % 13);
      if (i % 9 === 4) setDraft({ path: 'frame.storeys[1].stiffness', text: '4x', value: '4x' });
      else if (i % 9 === 5) setDraft(null);
      else if (i % 9 === 7) undo();
      else edit('stiffness', (project) => withStorey(project, i % 4, { stiffness }));
      for (let turn = 0; turn < i % 6; turn++) await new Promise((resolve) => setImmediate(resolve));
      if (i % 20 === 19) await at('current');
    }
    setDraft(null);
    await at('current');
    off();
    offDocument();
    expect(belongs()).toBe(true);
    expect(seen).toBeGreaterThan(3);
    expect(wrong).toBe(0);
  });

  it('a newer edit supersedes the question under way: its late answer shows nowhere', async () => {
    begin();
    await at('current');
    let release = () => {};
    engine.hold = new Promise((resolve) => {
      release = resolve;
    });
    const before = now().answers;
    edit('soften', (project) => withStorey(project, 0, { stiffness: 6e7 }));
    await new Promise((resolve) => setTimeout(resolve, 5));
    engine.hold = null;
    edit('soften more', (project) => withStorey(project, 0, { stiffness: 5e7 }));
    expect(now()).toMatchObject({ status: 'running', answers: before });
    await at('current');
    const settled = now().answers;
    release();
    await new Promise((resolve) => setTimeout(resolve, 5));
    expect(now().answers?.runs).toEqual(settled?.runs);
    expect(belongs()).toBe(true);
  });

  it('a draft that cannot be read makes the answers stale with its fault and words; giving it up brings them back', async () => {
    begin();
    await at('current');
    const before = now().answers;
    setDraft({ path: 'frame.storeys[1].stiffness', text: '4x7', value: '4x7' });
    expect(now()).toMatchObject({ status: 'stale', answers: before, waits: false });
    expect(now().faults.map((fault) => fault.where)).toEqual(['frame.storeys[1].stiffness']);
    expect(now().changed).toContain('4x7');
    follower?.runNow();
    expect(now().status).toBe('stale');
    setDraft(null);
    expect(now()).toMatchObject({ status: 'current', faults: [], changed: null });
    expect(belongs()).toBe(true);
  });

  it('stop keeps the last answers as stale, F9 runs again', async () => {
    begin();
    await at('current');
    edit('soften', (project) => withStorey(project, 0, { stiffness: 6e7 }));
    follower?.stop();
    expect(now()).toMatchObject({ status: 'stale', waits: true, changed: 'soften', progress: null });
    expect(belongs()).toBe(false);
    follower?.runNow();
    expect(now().status).toBe('running');
    await at('current');
    expect(belongs()).toBe(true);
  });

  it('a run expected to be long waits for F9, except the first', async () => {
    begin(suite.project, { long: -1 });
    await at('current');
    edit('soften', (project) => withStorey(project, 0, { stiffness: 6e7 }));
    expect(now()).toMatchObject({ status: 'stale', waits: true });
    follower?.runNow();
    await at('current');
    expect(belongs()).toBe(true);
  });

  it('a run expected to take a while waits for a pause in the typing, the first change does not', async () => {
    begin(suite.project, { quick: -1, pause: 40 });
    await at('current');
    await new Promise((resolve) => setTimeout(resolve, 50));
    engine.asked.length = 0;
    const stiffnesses = [6e7, 7e7, 8e7];
    for (const stiffness of stiffnesses) {
      edit('stiffness', (project) => withStorey(project, 0, { stiffness }));
      expect(now().status).toBe('running');
    }
    await at('current');
    const runs = engine.asked.filter(({ question }) => question.startsWith('run '));
    const asked = new Set(runs.map(({ request }) => request.prepared.frame.storeys[0].stiffness));
    expect([...asked]).toEqual([6e7, 8e7]);
    expect(belongs()).toBe(true);
  });

  it('a worker that fails leaves the answers stale with words; F9 tries again', async () => {
    begin();
    await at('current');
    const before = now().answers;
    engine.fail = (question) => (question === 'run B' ? 'out of memory' : null);
    edit('soften', (project) => withStorey(project, 0, { stiffness: 6e7 }));
    await at('stale');
    expect(now()).toMatchObject({ answers: before, waits: true });
    expect(now().faults.map((fault) => fault.message)).toEqual([expect.stringContaining('out of memory')]);
    engine.fail = null;
    follower?.runNow();
    await at('current');
    expect(belongs()).toBe(true);
  });

  it('samples that are not there are named, and nothing runs', async () => {
    const lost = { ...suite.project.motions[0], name: 'Lost', samples: 'nowhere' };
    begin({ ...suite.project, motions: [...suite.project.motions, lost] });
    expect(now()).toMatchObject({ status: 'stale', answers: null });
    expect(now().faults.map((fault) => fault.code)).toEqual(['samples-missing']);
    expect(engine.asked).toEqual([]);
  });
});

describe('nothing to compute', () => {
  it('a fault beside the frame leaves its modes; one in it takes them', async () => {
    begin();
    await at('current');
    const before = now().modes?.map(({ period }) => period);
    const { project } = suite;
    for (const change of [
      { analysis: { ...project.analysis, step: { parts: 0 } } },
      { frame: { ...project.frame, damping: { kind: 'modal' as const, ratios: [-1] } } },
    ]) {
      edit('a fault', () => ({ ...project, ...change }));
      expect(now().status).toBe('stale');
      expect(now().modes?.map(({ period }) => period)).toEqual(before);
    }
    edit('a fault in the frame', () => withStorey(project, 1, { stiffness: -1 }));
    expect(now()).toMatchObject({ status: 'stale', modes: null });
  });

  it('no motion in use: modes and no answers; the first motion answers', async () => {
    begin({ ...suite.project, motions: [] });
    expect(now()).toMatchObject({ status: 'empty', answers: null, chosen: null });
    expect(now().modes?.length).toBe(4);
    edit('add', () => suite.project);
    await at('current');
    edit('empty', (project) => ({ ...project, frame: { ...project.frame, storeys: [] } }));
    expect(now()).toMatchObject({ status: 'empty', answers: null, chosen: null, modes: null });
  });
});

describe('running for long', () => {
  it('shows itself after a while, with the motions that are in', async () => {
    begin(suite.project, { shown: 1 });
    await at('current');
    let release = () => {};
    engine.hold = new Promise((resolve) => {
      release = resolve;
    });
    edit('soften', (project) => withStorey(project, 0, { stiffness: 6e7 }));
    await expect.poll(() => now().slow).toBe(true);
    expect(now().progress?.of).toBe(3);
    expect(now().arrived).toEqual([]);
    release();
    await at('current');
    expect(now()).toMatchObject({ slow: false, progress: null, arrived: [] });
  });
});

describe('the choice', () => {
  it('falls back from the chosen to the governing to the first', async () => {
    begin();
    expect(chosenMotion()).toBe('A');
    expect(chosenStorey()).toBe(0);
    await at('current');
    setSession({ storey: 99, motion: 'not there' });
    expect(chosenStorey()).toBe(3);
    expect(chosenMotion()).toBe(now().chosen?.motion);
    expect(sessionStore.getState().motion).toBe('not there');
  });
});
