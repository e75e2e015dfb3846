import { beforeEach, describe, expect, it } from 'vitest';
import { digestOfSamples } from '../../src/core/digest.ts';
import { documentStore, restore, undo } from '../../src/state/document.ts';
import { addMotions, cancelReading, type ReadAnswer, readRecordFile, startImports } from '../../src/state/imports.ts';
import { samplesOf } from '../../src/state/samples.ts';
import { samplesOf as makeSamples } from '../engine/fixtures.ts';
import { projectOf } from './projects.ts';

const start = projectOf(2, 1).project;
const motions = () => documentStore.getState().project.motions;

function answerOf(name: string, acceleration: Float64Array | null): ReadAnswer {
  const reading: ReadAnswer['reading'] = {
    file: `${name}.txt`,
    layout: 'values',
    name,
    interval: 0.02,
    unit: 'm/s2',
    statedCount: null,
    values: acceleration ?? new Float64Array(),
    firstLine: 1,
    perLine: 1,
    facts: [],
    warnings: [],
    faults: [],
    asks: acceleration ? [] : ['unit'],
    mends: [],
    motion: acceleration ? { name, interval: 0.02, acceleration, origin: { file: `${name}.txt` } } : null,
  };
  const samples = acceleration ? digestOfSamples(acceleration) : null;
  return { reading, samples, excerpt: [], lines: 0, measures: null, preview: null };
}

beforeEach(() => restore(start));

describe('addMotions', () => {
  it('adds what was read as one undo step, under free names, with its samples and where they came from', () => {
    const [one, two] = [makeSamples(40, 3), makeSamples(50, 5)];
    const names = addMotions([
      answerOf('A', one),
      answerOf('open', null),
      answerOf('A', two),
      answerOf('Station 7', one),
    ]);
    expect(names).toEqual(['A (2)', 'A (3)', 'Station 7']);
    expect(motions().map((motion) => motion.name)).toEqual(['A', ...names]);
    expect(motions()[2]).toEqual({
      name: 'A (3)',
      interval: 0.02,
      samples: digestOfSamples(two),
      count: 50,
      scale: 1,
      used: true,
      origin: { file: 'A.txt' },
    });
    expect(samplesOf(digestOfSamples(two))).toEqual(two);
    expect(documentStore.getState().undoes).toBe('add 3 motions');
    undo();
    expect(documentStore.getState().project).toBe(start);
  });

  it('with nothing that could be read there is no step', () => {
    expect(addMotions([answerOf('open', null)])).toEqual([]);
    expect(documentStore.getState().undoes).toBeNull();
  });
});

describe('readRecordFile', () => {
  it('asks the engine under a question of its own, and cancels it', async () => {
    const asked: string[] = [];
    startImports({
      async read(question, file) {
        asked.push(`${question} of ${file}`);
        return { status: 'done', value: answerOf(file, null), took: 0 };
      },
      cancel: (question) => asked.push(`cancel ${question}`),
    });
    const reply = await readRecordFile('1', 'a.txt', new ArrayBuffer(4), {});
    cancelReading('1');
    expect(reply.status === 'done' && reply.value.reading.name).toBe('a.txt');
    expect(asked).toEqual(['read 1 of a.txt', 'cancel read 1']);
  });
});
