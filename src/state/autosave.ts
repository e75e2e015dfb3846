import type { Result } from '../core/fault.ts';
import { fieldOf, writeAt } from '../document/fields.ts';
import type { Project } from '../document/project.ts';
import { type Draft, documentStore, restore } from './document.ts';
import type { Keeper } from './keeper.ts';
import { linesOf, readDraft, readEnvelope, writtenAt } from './kept.ts';
import { onNewSamples, putSamples, samplesOf } from './samples.ts';
import { KEYS, type Writer, writerTo } from './writer.ts';

/** A draft is written when the typing pauses for so long [ms]. */
const DRAFT_PAUSE = 300;

export interface Start {
  readonly project: Project;
  readonly samples: ReadonlyMap<string, Float64Array>;
}

export interface AutosaveOptions {
  /** What a first visit opens. */
  readonly first: () => Start;
  /** False where another page of this browser has the document: this one then keeps nothing. */
  readonly alone?: () => Promise<boolean>;
  /** Calls back when the page is left or hidden. */
  readonly onLeave?: (leave: () => void) => () => void;
}

export interface Autosave {
  flush(): Promise<void>;
  end(): void;
}

interface Stored {
  readonly document: unknown;
  readonly draft: unknown;
  readonly keys: readonly string[];
}

/**
 * Brings back the kept document with its half-typed cell (else what a first visit opens) and from then on writes every
 * committed edit at once, a draft when the typing pauses. A kept document that cannot be read is moved aside and told of; where
 * even that is refused, or the store cannot be read, nothing is written at all, so that nothing kept is ever overwritten.
 */
export async function startAutosave(keeper: Keeper, { first, alone, onLeave }: AutosaveOptions): Promise<Autosave> {
  const nothing: Autosave = { flush: async () => {}, end() {} };
  let stored: Stored;
  try {
    stored = {
      document: await keeper.get(KEYS.document),
      draft: await keeper.get(KEYS.draft),
      keys: await keeper.keys(),
    };
  } catch (error) {
    open(first());
    documentStore.setState({ saveFault: `this browser keeps nothing (${wordsOf(error)}): save the project as a file` });
    return nothing;
  }
  const kept: Result<Project> | null = stored.document === undefined ? null : readEnvelope(stored.document);
  if (kept?.ok) await reopen(keeper, kept.value, readDraft(stored.draft));
  else open(first());
  if (alone && !(await alone())) {
    const saveFault = 'the project is open in another tab too: edits in this one are not kept, save them as a file';
    documentStore.setState({ saveFault });
    return nothing;
  }
  const aside = kept && !kept.ok ? await moveAside(keeper, stored, linesOf(kept.faults)) : true;
  if (!aside) return nothing;
  documentStore.setState({ savedAt: kept?.ok ? writtenAt(stored.document) : null });
  const known = await collect(keeper, stored.keys);
  const writer = writerTo(keeper, known, (refusal) => {
    if (refusal === null) documentStore.setState({ savedAt: Date.now(), saveFault: null });
    else documentStore.setState({ saveFault: `not kept by this browser (${refusal}): save the project as a file` });
  });
  return follow(writer, kept?.ok !== true, onLeave);
}

function follow(writer: Writer, unsaved: boolean, onLeave: AutosaveOptions['onLeave']): Autosave {
  let pause: ReturnType<typeof setTimeout> | null = null;
  const writeDraft = () => {
    if (pause !== null) clearTimeout(pause);
    pause = null;
    writer.draft(documentStore.getState().draft);
  };
  const later = () => {
    pause ??= setTimeout(writeDraft, DRAFT_PAUSE);
  };
  const leaving = onLeave?.(() => {
    if (pause !== null) writeDraft();
    void writer.flush();
  });
  const off = documentStore.subscribe((now, before) => {
    if (now.project !== before.project) writer.document(now.project);
    if (now.draft && now.draft !== before.draft) later();
    else if (now.draft !== before.draft) writeDraft();
  });
  onNewSamples((digest, samples) => writer.samples(digest, samples));
  const { project } = documentStore.getState();
  for (const { samples: digest } of project.motions) {
    const samples = samplesOf(digest);
    if (samples) writer.samples(digest, samples);
  }
  if (unsaved) writer.document(project);
  return {
    async flush() {
      if (pause !== null) writeDraft();
      await writer.flush();
    },
    end() {
      off();
      onNewSamples(null);
      leaving?.();
      if (pause !== null) writeDraft();
    },
  };
}

function open({ project, samples }: Start): void {
  for (const [digest, values] of samples) putSamples(digest, values);
  restore(project);
}

async function reopen(keeper: Keeper, project: Project, draft: Draft | null): Promise<void> {
  for (const { samples: digest, count } of project.motions) {
    const values = await keeper.get(KEYS.samples(digest)).catch(() => undefined);
    if (values instanceof Float64Array && values.length === count) putSamples(digest, values);
  }
  restore(project, draft && fits(project, draft) ? draft : null);
}

/** Whether the draft's field is still there. */
function fits(project: Project, draft: Draft): boolean {
  try {
    fieldOf(draft.path);
    return writeAt(project, draft.path, draft.value) !== null;
  } catch {
    return false;
  }
}

async function moveAside(keeper: Keeper, stored: Stored, why: string): Promise<boolean> {
  const key = KEYS.aside(new Date().toISOString());
  try {
    await keeper.set(key, { document: stored.document, draft: stored.draft });
    documentStore.setState({ setAside: `the kept project could not be read and was moved aside as ${key}. ${why}` });
    return true;
  } catch (error) {
    const saveFault = `the kept project could not be read nor moved aside (${wordsOf(error)}), so nothing is written over it: save as a file. ${why}`;
    documentStore.setState({ saveFault });
    return false;
  }
}

/**
 * Removes stored samples that nothing refers to: only now, when there is no undo step yet, and only while nothing is set aside
 * (what cannot be read may refer to them). Returns the digests whose samples are stored.
 */
async function collect(keeper: Keeper, keys: readonly string[]): Promise<Set<string>> {
  const prefix = KEYS.samples('');
  const digests = keys.filter((key) => key.startsWith(prefix)).map((key) => key.slice(prefix.length));
  const known = new Set(digests);
  if (documentStore.getState().setAside || keys.some((key) => key.startsWith(KEYS.aside('')))) return known;
  const { project } = documentStore.getState();
  const referred = new Set(project.motions.map((motion) => motion.samples));
  for (const digest of digests) {
    if (referred.has(digest)) continue;
    // Left where it is if the store refuses: the next start tries again.
    await keeper.delete(KEYS.samples(digest)).then(
      () => known.delete(digest),
      () => false,
    );
  }
  return known;
}

function wordsOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
}
