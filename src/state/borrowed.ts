import type { Result } from '../core/fault.ts';
import type { Project, Typed } from '../document/project.ts';

/** Stands in for the document room's own functions until they are there. */
export function emptyProject(): Project {
  return {
    title: '',
    frame: { storeys: [], damping: { kind: 'modal', ratios: [0.05] }, pDelta: false },
    motions: [],
    analysis: { method: { kind: 'newmark', beta: 0.25, gamma: 0.5 }, step: { parts: 1 }, tail: 0, stopDrift: 0.1 },
    limits: { drift: 0.02, factor: 1, source: '' },
  };
}

export function writeAt(project: Project, path: string, value: Typed): Project {
  const keys = path.split(/[.[\]]+/).filter((key) => key !== '');
  const into = (node: unknown, at: number): unknown => {
    if (at === keys.length) return value;
    if (Array.isArray(node)) return node.map((entry, i) => (String(i) === keys[at] ? into(entry, at + 1) : entry));
    const record = node as Record<string, unknown>;
    return { ...record, [keys[at]]: into(record[keys[at]], at + 1) };
  };
  return into(project, 0) as Project;
}

export function demoProject(): { readonly project: Project; readonly samples: Map<string, Float64Array> } {
  return { project: emptyProject(), samples: new Map() };
}

export function readProject(
  _text: string,
): Result<{ readonly project: Project; readonly samples: ReadonlyMap<string, Float64Array> }> {
  return { ok: false, faults: [] };
}

export function writeProject(project: Project, _samplesOf: (digest: string) => Float64Array): string {
  return JSON.stringify(project);
}
