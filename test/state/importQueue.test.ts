import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readFile } from '../../src/engine/reading.ts';
import { documentStore, restore, undo } from '../../src/state/document.ts';
import {
  addReadyRecords,
  answerRecord,
  clearRecords,
  importStore,
  isReady,
  leaveRecordOut,
  nameRecord,
  offerRecords,
  removeRecord,
} from '../../src/state/importQueue.ts';
import { startImports } from '../../src/state/imports.ts';
import { projectOf } from './projects.ts';

const start = projectOf(2, 1).project;
const bytesOf = (text: string): ArrayBuffer => new TextEncoder().encode(text).buffer as ArrayBuffer;
const rows = Array.from({ length: 60 }, (_, i) => Math.sin(i / 7).toFixed(4));
const whole = (name: string) => ({ file: name, bytes: bytesOf(`interval 0.02 s, unit (g)\n${rows.join('\n')}`) });
const bare = { file: 'bare.txt', bytes: bytesOf(rows.join('\n')) };
const files = () => importStore.getState().files;
const motions = () => documentStore.getState().project.motions.map(({ name }) => name);

/** Readings wait here until they are let go, in any order. */
let waiting: { readonly question: string; readonly go: () => void }[] = [];
const settle = async () => {
  for (const { go } of waiting.splice(0)) go();
  await new Promise((resolve) => setTimeout(resolve));
};

beforeEach(() => {
  restore(start);
  waiting = [];
  startImports({
    read: (question, file, bytes, answers) =>
      new Promise((resolve) => {
        const go = () => resolve({ status: 'done', value: readFile(file, new Uint8Array(bytes), answers), took: 0 });
        waiting.push({ question, go });
      }),
    cancel: () => {},
  });
});
afterEach(clearRecords);

describe('record files on their way in', () => {
  it('are read at once, the first is shown; what is open is not ready', async () => {
    offerRecords([whole('a.txt'), bare]);
    expect(files().map(({ status }) => status)).toEqual(['reading', 'reading']);
    expect(importStore.getState().shown).toBe(files()[0].id);
    await settle();
    expect(files().map(isReady)).toEqual([true, false]);
    expect(files()[1].answer?.reading.asks).toEqual(['interval', 'unit']);
  });

  it('are added as one undo step; those that are open stay in the list', async () => {
    offerRecords([whole('a.txt'), bare, whole('b.txt')]);
    await settle();
    expect(addReadyRecords()).toEqual(['A (2)', 'B']);
    expect(motions()).toEqual(['A', 'A (2)', 'B']);
    expect(files().map(({ file }) => file)).toEqual(['bare.txt']);
    expect(importStore.getState().shown).toBe(files()[0].id);
    undo();
    expect(documentStore.getState().project).toBe(start);
  });

  it('take only the reading of the newest answers', async () => {
    offerRecords([bare]);
    await settle();
    const { id } = files()[0];
    answerRecord(id, { interval: 0.01, unit: 'g' });
    answerRecord(id, { interval: 0.02, unit: 'm/s2' });
    const [older, newer] = waiting.splice(0);
    newer.go();
    older.go();
    await settle();
    expect(files()[0].answer?.reading.motion?.interval).toBe(0.02);
    expect(files()[0].status).toBe('read');
  });

  it('left out or taken off the list, are not added; a reading that comes later changes nothing', async () => {
    offerRecords([whole('a.txt'), whole('b.txt')]);
    const [a, b] = files();
    removeRecord(b.id);
    await settle();
    expect(files().map(({ id }) => id)).toEqual([a.id]);
    leaveRecordOut(a.id, true);
    expect(addReadyRecords()).toEqual([]);
    expect(documentStore.getState().undoes).toBeNull();
    leaveRecordOut(a.id, false);
    expect(addReadyRecords()).toEqual(['A (2)']);
  });

  it('that were read take a name at once, without being read again', async () => {
    offerRecords([whole('a.txt')]);
    await settle();
    nameRecord(files()[0].id, 'Slab');
    expect(waiting).toEqual([]);
    expect(files()[0].answers.name).toBe('Slab');
    expect(addReadyRecords()).toEqual(['Slab']);
  });

  it('named while they are read, are read under the name', async () => {
    offerRecords([whole('a.txt')]);
    nameRecord(files()[0].id, 'Slab');
    await settle();
    expect(addReadyRecords()).toEqual(['Slab']);
  });

  it('that could not be read say why', async () => {
    startImports({ read: async () => ({ status: 'failed', message: 'the worker died' }), cancel: () => {} });
    offerRecords([whole('a.txt')]);
    await settle();
    expect(files()[0].failure).toBe('The file could not be read: the worker died.');
    expect(files().some(isReady)).toBe(false);
  });
});
