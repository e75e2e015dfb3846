import { afterEach, describe, expect, it } from 'vitest';
import { type Autosave, type AutosaveOptions, startAutosave } from '../../src/state/autosave.ts';
import { commitDraft, documentStore, edit, restore, setDraft } from '../../src/state/document.ts';
import { envelopeFor } from '../../src/state/kept.ts';
import { putSamples, samplesOf } from '../../src/state/samples.ts';
import { KEYS } from '../../src/state/writer.ts';
import { samplesOf as makeSamples } from '../engine/fixtures.ts';
import { type MemoryKeeper, memoryKeeper } from './memoryKeeper.ts';
import { projectOf, withStorey } from './projects.ts';

const demo = projectOf(5, 2);
const first = () => demo;
const now = () => documentStore.getState();
const draft = { path: 'frame.storeys[1].stiffness', text: '12 34', value: '12 34' };
const open: Autosave[] = [];

async function start(keeper: MemoryKeeper, options: Partial<AutosaveOptions> = {}): Promise<Autosave> {
  documentStore.setState({ savedAt: null, saveFault: null, setAside: null });
  const autosave = await startAutosave(keeper, { first, ...options });
  open.push(autosave);
  return autosave;
}

/** The page is closed and opened again over the same store. */
async function reload(keeper: MemoryKeeper): Promise<Autosave> {
  for (const autosave of open.splice(0)) autosave.end();
  restore(projectOf(1).project);
  return start(keeper);
}

const stored = (keeper: MemoryKeeper) => keeper.values.get(KEYS.document) as { document: unknown } | undefined;

afterEach(() => {
  for (const autosave of open.splice(0)) autosave.end();
});

describe('keeping', () => {
  it('a first visit opens what it is given, and keeps it with its samples', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    expect(now().project).toBe(demo.project);
    await autosave.flush();
    expect(stored(keeper)?.document).toEqual(demo.project);
    for (const [digest, values] of demo.samples) expect(keeper.values.get(KEYS.samples(digest))).toEqual(values);
    expect(now().savedAt).not.toBeNull();
    expect(now().saveFault).toBeNull();
  });

  it('a reload brings back project, samples and the half-typed cell', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    edit('soften', (project) => withStorey(project, 0, { stiffness: 'abc', mass: null }));
    setDraft(draft);
    await autosave.flush();
    const before = now().project;
    await reload(keeper);
    expect(now().project).toEqual(before);
    expect(now().draft).toEqual(draft);
    expect(now().undoes).toBeNull();
    expect(now().savedAt).not.toBeNull();
    for (const [digest, values] of demo.samples) expect(samplesOf(digest)).toEqual(values);
  });

  it('no edit is lost: however they fall, the store ends with the last one', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    for (let i = 1; i <= 60; i++) {
      edit(`edit ${i}`, (project) => withStorey(project, 0, { stiffness: i }));
      for (let turn = 0; turn < i % 5; turn++) await new Promise((resolve) => setImmediate(resolve));
      for (let turn = 0; turn < i % 7; turn++) await null;
    }
    await autosave.flush();
    expect(stored(keeper)?.document).toEqual(now().project);
    expect(now().project.frame.storeys[0].stiffness).toBe(60);
  });

  it('an edit is written without being asked to', async () => {
    const keeper = memoryKeeper();
    await start(keeper);
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    await expect.poll(() => stored(keeper)?.document).toEqual(now().project);
  });

  it('a draft is written when the typing pauses, when the page is left, and goes with its commit', async () => {
    const keeper = memoryKeeper();
    let leave = () => {};
    const onLeave = (call: () => void) => {
      leave = call;
      return () => {};
    };
    const autosave = await start(keeper, { onLeave });
    setDraft(draft);
    await expect.poll(() => keeper.values.get(KEYS.draft)).toEqual(draft);
    setDraft({ ...draft, text: '12 345', value: 12345 });
    leave();
    await expect.poll(() => keeper.values.get(KEYS.draft)).toEqual({ ...draft, text: '12 345', value: 12345 });
    commitDraft('stiffness');
    await autosave.flush();
    expect(keeper.values.has(KEYS.draft)).toBe(false);
    expect(stored(keeper)?.document).toEqual(now().project);
  });

  it('a page that is left has asked for everything, although nothing was taken yet', async () => {
    const keeper = memoryKeeper();
    let leave = () => {};
    await (
      await start(keeper, {
        onLeave: (call) => {
          leave = call;
          return () => {};
        },
      })
    ).flush();
    putSamples('late', makeSamples(30, 4));
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 3 }));
    setDraft(draft);
    const project = now().project;
    leave();
    // The page is gone: no callback of its own runs any more, what was asked of the store is still done.
    open.splice(0)[0].end();
    await keeper.idle();
    expect(stored(keeper)?.document).toEqual(project);
    expect(keeper.values.get(KEYS.draft)).toEqual(draft);
    expect(keeper.values.has(KEYS.samples('late'))).toBe(true);
  });

  it('samples are written once a digest, before the document that refers to them', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    await autosave.flush();
    const values = makeSamples(300, 9);
    putSamples('new', values);
    const entry = { ...demo.project.motions[0], name: 'N', samples: 'new', count: 300 };
    edit('add N', (project) => ({ ...project, motions: [...project.motions, entry] }));
    putSamples('new', values);
    await autosave.flush();
    expect(keeper.writes.filter((key) => key === KEYS.samples('new')).length).toBe(1);
    expect(keeper.writes.indexOf(KEYS.samples('new'))).toBeLessThan(keeper.writes.lastIndexOf(KEYS.document));
    const twice = keeper.writes.filter((key) => key.startsWith(KEYS.samples('')));
    expect(twice.length).toBe(new Set(twice).size);
    await (await reload(keeper)).flush();
    expect(keeper.writes.filter((key) => key.startsWith(KEYS.samples(''))).length).toBe(twice.length);
  });

  it('samples go at the next start after nothing refers to them, not while undo still can', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    const [digest] = demo.samples.keys();
    edit('remove A', (project) => ({ ...project, motions: project.motions.slice(1) }));
    await autosave.flush();
    expect(keeper.values.has(KEYS.samples(digest))).toBe(true);
    await reload(keeper);
    expect(keeper.values.has(KEYS.samples(digest))).toBe(false);
    expect(keeper.values.has(KEYS.samples(demo.project.motions[1].samples))).toBe(true);
  });
});

describe('what cannot be read or written', () => {
  const broken = [
    ['text that is no envelope', 'not an envelope'],
    ['a later version', { ...envelopeFor(demo.project, 1), version: 99 }],
    [
      'a storey without a mass',
      { format: 'swaybook', version: 1, document: withStorey(demo.project, 0, { mass: undefined }) },
    ],
    ['no document', { format: 'swaybook', version: 1 }],
  ] as const;

  it.each(broken)('%s is moved aside untouched, told of, and never overwritten', async (_, value) => {
    const keeper = memoryKeeper([
      [KEYS.document, value],
      [KEYS.draft, draft],
      [KEYS.samples('of the unreadable one'), makeSamples(3)],
    ]);
    const autosave = await start(keeper);
    expect(now().project).toBe(demo.project);
    expect(now().setAside).toContain('moved aside');
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    await autosave.flush();
    const aside = [...keeper.values.keys()].filter((key) => key.startsWith(KEYS.aside('')));
    expect(aside.length).toBe(1);
    expect(keeper.values.get(aside[0])).toEqual({ document: value, draft });
    await reload(keeper);
    expect(keeper.values.has(KEYS.samples('of the unreadable one'))).toBe(true);
    expect(keeper.values.get(aside[0])).toEqual({ document: value, draft });
  });

  it('where it cannot be moved aside nothing is written', async () => {
    const keeper = memoryKeeper([[KEYS.document, 'broken']]);
    keeper.refuse = (call) => (call === 'set' ? 'full' : null);
    const autosave = await start(keeper);
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    keeper.refuse = () => null;
    await autosave.flush();
    expect(keeper.values.get(KEYS.document)).toBe('broken');
    expect(now().saveFault).toContain('full');
  });

  it('a store that cannot be read is not written to either', async () => {
    const keeper = memoryKeeper([[KEYS.document, envelopeFor(demo.project, 1)]]);
    keeper.refuse = (call) => (call === 'get' ? 'blocked' : null);
    const autosave = await start(keeper);
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    await autosave.flush();
    expect(keeper.writes).toEqual([]);
    expect(now().saveFault).toContain('blocked');
  });

  it('a full store is told of and survived: what was refused is written with the next edit', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    await autosave.flush();
    keeper.refuse = (call) => (call === 'set' ? 'quota exceeded' : null);
    putSamples('large', makeSamples(400, 7));
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    await autosave.flush();
    expect(now().saveFault).toContain('quota exceeded');
    keeper.refuse = () => null;
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 8 }));
    await autosave.flush();
    expect(now().saveFault).toBeNull();
    expect(stored(keeper)?.document).toEqual(now().project);
    expect(keeper.values.has(KEYS.samples('large'))).toBe(true);
  });

  it('samples that are refused do not keep the document back', async () => {
    const keeper = memoryKeeper();
    const autosave = await start(keeper);
    keeper.refuse = (call, key) => (call === 'set' && key.startsWith(KEYS.samples('')) ? 'too large' : null);
    putSamples('huge', makeSamples(500, 8));
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 9 }));
    await autosave.flush();
    expect(stored(keeper)?.document).toEqual(now().project);
    expect(now().saveFault).toContain('too large');
  });

  it('a second tab keeps nothing and says so', async () => {
    const keeper = memoryKeeper([[KEYS.document, envelopeFor(demo.project, 1)]]);
    const autosave = await start(keeper, { alone: async () => false });
    expect(now().project).toEqual(demo.project);
    edit('stiffen', (project) => withStorey(project, 0, { stiffness: 7 }));
    await autosave.flush();
    expect(keeper.writes).toEqual([]);
    expect(now().saveFault).toContain('another tab');
  });

  it('a draft whose field is gone is let go, the project is not', async () => {
    const keeper = memoryKeeper([
      [KEYS.document, envelopeFor(demo.project, 1)],
      [KEYS.draft, { ...draft, path: 'nowhere[3].at.all' }],
    ]);
    await start(keeper);
    expect(now().draft).toBeNull();
    expect(now().project).toEqual(demo.project);
  });
});
