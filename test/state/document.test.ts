import fc from 'fast-check';
import { beforeEach, describe, expect, it } from 'vitest';
import type { Project } from '../../src/document/project.ts';
import {
  commitDraft,
  documentStore,
  edit,
  effectiveProject,
  redo,
  replace,
  restore,
  setDraft,
  undo,
} from '../../src/state/document.ts';
import { sessionStore, setSession } from '../../src/state/session.ts';
import { projectOf, withStorey } from './projects.ts';

const start = projectOf(3).project;
const now = () => documentStore.getState();
const stiffen = (value: number) => (project: Project) => withStorey(project, 1, { stiffness: value });
const undoAll = () => {
  while (now().undoes !== null) undo();
};
const redoAll = () => {
  while (now().redoes !== null) redo();
};

beforeEach(() => restore(start));

/** One thing a user does. */
const action = fc.oneof(
  fc.record({ kind: fc.constant('step' as const), value: fc.integer({ min: 1, max: 9 }) }),
  fc.record({
    kind: fc.constant('fold' as const),
    value: fc.integer({ min: 1, max: 9 }),
    into: fc.constantFrom('drag 1', 'drag 2'),
  }),
  fc.record({ kind: fc.constant('draft' as const), value: fc.integer({ min: 1, max: 9 }), commit: fc.boolean() }),
  fc.record({ kind: fc.constantFrom('undo' as const, 'redo' as const) }),
);
type Action = typeof action extends fc.Arbitrary<infer T> ? T : never;

function act(one: Action): void {
  if (one.kind === 'step') edit(`to ${one.value}`, stiffen(one.value));
  else if (one.kind === 'fold') edit(`drag to ${one.value}`, stiffen(one.value), { kind: 'fold', into: one.into });
  else if (one.kind === 'draft') {
    setDraft({ path: 'frame.storeys[1].stiffness', text: String(one.value), value: one.value });
    if (one.commit) commitDraft(`typed ${one.value}`);
    else setDraft(null);
  } else if (one.kind === 'undo') undo();
  else redo();
}

describe('undo and redo', () => {
  it('after any sequence, undo all is the start and redo all is where it was', () => {
    let changed = 0;
    fc.assert(
      fc.property(fc.array(action, { maxLength: 40 }), (actions) => {
        restore(start);
        for (const one of actions) act(one);
        redoAll();
        const end = now().project;
        if (end !== start) changed += 1;
        undoAll();
        expect(now().project).toEqual(start);
        redoAll();
        expect(now().project).toBe(end);
      }),
    );
    expect(changed).toBeGreaterThan(50);
  });

  it('names what it would take back and bring again', () => {
    edit('one', stiffen(1));
    edit('two', stiffen(2));
    expect([now().undoes, now().redoes]).toEqual(['two', null]);
    undo();
    expect([now().undoes, now().redoes]).toEqual(['one', 'two']);
    edit('three', stiffen(3));
    expect([now().undoes, now().redoes]).toEqual(['three', null]);
  });

  it('a drag is one step, the next drag another', () => {
    for (const value of [1, 2, 3]) edit(`drag to ${value}`, stiffen(value), { kind: 'fold', into: 'drag 1' });
    for (const value of [4, 5]) edit(`drag to ${value}`, stiffen(value), { kind: 'fold', into: 'drag 2' });
    expect(now().undoes).toBe('drag to 5');
    undo();
    expect(now().project).toEqual(stiffen(3)(start));
    undo();
    expect(now().project).toBe(start);
    expect(now().undoes).toBeNull();
  });

  it('a step between two parts of a drag ends the fold', () => {
    edit('drag', stiffen(1), { kind: 'fold', into: 'drag 1' });
    edit('step', stiffen(2));
    edit('drag on', stiffen(3), { kind: 'fold', into: 'drag 1' });
    undo();
    expect(now().project).toEqual(stiffen(2)(start));
  });

  it('a silent change is no step and outlives undo and redo', () => {
    edit('one', stiffen(1));
    edit('two', stiffen(2));
    undo();
    edit('rename', (project) => ({ ...project, title: 'Renamed' }), { kind: 'silent' });
    expect(now().undoes).toBe('one');
    undo();
    expect(now().project).toEqual({ ...start, title: 'Renamed' });
    redoAll();
    expect(now().project).toEqual({ ...stiffen(2)(start), title: 'Renamed' });
  });

  it('a change that changes nothing is no step', () => {
    edit('nothing', (project) => project);
    expect(now().undoes).toBeNull();
    expect(now().project).toBe(start);
  });

  it('another project in its place is one step', () => {
    const other = projectOf(5).project;
    replace('open other', other);
    expect(now().project).toBe(other);
    undo();
    expect(now().project).toBe(start);
  });

  it('another project begins at its own beginning', () => {
    setSession({ time: 12.5, range: [10, 14], playing: true, storey: 3, motion: 'B' });
    replace('open other', projectOf(5).project);
    expect(sessionStore.getState()).toMatchObject({ time: 0, range: null, playing: false, storey: null, motion: null });
  });
});

describe('the draft', () => {
  const draft = { path: 'frame.storeys[1].stiffness', text: '47', value: 47 };

  it('stands in the effective project, not in the committed one', () => {
    setDraft(draft);
    expect(now().project).toBe(start);
    expect(effectiveProject(now())).toEqual(stiffen(47)(start));
    expect(effectiveProject(now())).toBe(effectiveProject(now()));
    setDraft(null);
    expect(effectiveProject(now())).toBe(start);
  });

  it('raw text that cannot be read is kept as it stands', () => {
    setDraft({ ...draft, text: '4x7', value: '4x7' });
    commitDraft('typed 4x7');
    expect(now().project.frame.storeys[1].stiffness).toBe('4x7');
    expect(now().draft).toBeNull();
  });

  it('commits as one step; with no draft there is nothing to commit', () => {
    setDraft({ ...draft, text: '4', value: 4 });
    setDraft(draft);
    commitDraft('stiffness to 47');
    commitDraft('again');
    expect(now().undoes).toBe('stiffness to 47');
    undo();
    expect(now().project).toBe(start);
    expect(now().undoes).toBeNull();
  });
});
