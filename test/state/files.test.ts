import { beforeEach, describe, expect, it } from 'vitest';
import { caseOf } from '../../src/document/case.ts';
import { documentStore, edit, restore, undo } from '../../src/state/document.ts';
import { openProject, projectFile } from '../../src/state/files.ts';
import { putSamples, samplesOf } from '../../src/state/samples.ts';
import { projectOf, withStorey } from './projects.ts';

const suite = projectOf(3, 2, 80);
const now = () => documentStore.getState();

beforeEach(() => {
  for (const [digest, values] of suite.samples) putSamples(digest, values);
  restore(suite.project);
});

function saved(): { name: string; text: string } {
  const file = projectFile();
  if (!file.ok) throw new Error(file.faults.map((fault) => fault.message).join());
  return file.value;
}

describe('the project file', () => {
  it('saved and opened again is the same project, its samples bit for bit, as one undo step', () => {
    const { text } = saved();
    const other = projectOf(1).project;
    restore(other);
    expect(openProject('frame.swaybook.json', text)).toEqual({ ok: true });
    expect(now().project).toEqual(suite.project);
    for (const { samples } of now().project.motions) expect(samplesOf(samples)).toEqual(suite.samples.get(samples));
    expect(now().undoes).toBe('open frame.swaybook.json');
    undo();
    expect(now().project).toBe(other);
  });

  it('with faults changes nothing, and all of them come back', () => {
    const broken = JSON.parse(saved().text);
    broken.frame.storeys[1].mass = -3;
    broken.limits.drift = 'a lot';
    broken.stray = 1;
    const opened = openProject('broken.json', JSON.stringify(broken));
    expect(opened.ok).toBe(false);
    const places = opened.ok ? [] : opened.faults.map((fault) => fault.where);
    expect(places).toEqual(expect.arrayContaining(['frame.storeys[1].mass', 'limits.drift', 'stray']));
    expect(now().project).toBe(suite.project);
    expect(now().undoes).toBeNull();
  });

  it('is named after its title, as every file system takes it', () => {
    const names = ['Clinic: wing A/B', '  ', '../etc', 'Spital Süd'].map((title) => {
      edit('title', (project) => ({ ...project, title }));
      return saved().name;
    });
    expect(names).toEqual([
      'Clinic wing A B.swaybook.json',
      'untitled.swaybook.json',
      'etc.swaybook.json',
      'Spital Süd.swaybook.json',
    ]);
  });

  it('is refused while samples are missing: it would not hold the project', () => {
    const lost = { ...suite.project.motions[0], name: 'Lost', samples: 'nowhere' };
    edit('lose', (project) => ({ ...project, motions: [...project.motions, lost] }));
    const file = projectFile();
    expect(file.ok).toBe(false);
    expect(file.ok ? [] : file.faults.map((fault) => fault.where)).toEqual(['motions[2]']);
  });

  it('a document on its way comes back as it was, open cells and all, and does not run', () => {
    edit('half done', (project) => ({
      ...withStorey(withStorey(project, 0, { stiffness: null }), 1, { mass: '4 00x' }),
      frame: {
        ...withStorey(withStorey(project, 0, { stiffness: null }), 1, { mass: '4 00x' }).frame,
        damping: { kind: 'rayleigh', modes: [1, 9], ratios: [0.05, null] },
      },
      motions: project.motions.map((motion, i) => (i === 0 ? { ...motion, scale: null, used: false } : motion)),
      analysis: { ...project.analysis, step: null, tail: '' },
      limits: { ...project.limits, drift: null },
    }));
    const { project } = now();
    const { text } = saved();
    restore(suite.project);
    expect(openProject('half.json', text)).toEqual({ ok: true });
    expect(now().project).toEqual(project);
    const result = caseOf(now().project);
    expect(result.ok ? [] : result.faults.map((fault) => fault.where)).toEqual(
      expect.arrayContaining([
        'frame.storeys[0].stiffness',
        'frame.storeys[1].mass',
        'frame.damping.modes[1]',
        'limits.drift',
      ]),
    );
  });

  it('the empty sheet with its motions comes back too', () => {
    edit('clear', (project) => ({ ...project, frame: { ...project.frame, storeys: [] } }));
    const { project } = now();
    const { text } = saved();
    restore(suite.project);
    expect(openProject('empty.json', text)).toEqual({ ok: true });
    expect(now().project).toEqual(project);
  });

  it('an open cell beside a real fault is refused with both', () => {
    const broken = JSON.parse(saved().text);
    broken.frame.storeys[0].mass = null;
    broken.frame.storeys[1].mass = -3;
    const opened = openProject('broken.json', JSON.stringify(broken));
    const places = opened.ok ? [] : opened.faults.map((fault) => fault.where);
    expect(places).toEqual(['frame.storeys[0].mass', 'frame.storeys[1].mass']);
    broken.frame.storeys[1].mass = 4;
    broken.frame.damping = { kind: 'modal', ratios: [null], stray: 1 };
    expect(openProject('broken.json', JSON.stringify(broken)).ok).toBe(false);
  });
});
