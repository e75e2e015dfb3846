import { readFileSync } from 'node:fs';
import type { Fault, Result } from '../core/fault.ts';

/** The bytes of a file, or the fault that it cannot be read. */
export function readBytes(path: string): Result<Uint8Array> {
  try {
    return { ok: true, value: readFileSync(path) };
  } catch (thrown) {
    return { ok: false, faults: [fileFault(thrown, 'read')] };
  }
}

/** What the file system threw, in words; anything else is thrown on. */
export function fileFault(thrown: unknown, deed: 'read' | 'written'): Fault {
  const { code, syscall } = (thrown ?? {}) as NodeJS.ErrnoException;
  if (code === undefined || syscall === undefined) throw thrown;
  const why: Readonly<Record<string, string>> = {
    ENOENT: 'is not there',
    EISDIR: 'is a folder',
    ENOTDIR: 'stands under a file that is no folder',
    EEXIST: 'is a file, where a folder is wanted',
    EACCES: `may not be ${deed}`,
    EPERM: `may not be ${deed}`,
    ENOSPC: 'does not fit: the disk is full',
  };
  return {
    code: 'file',
    where: 'file',
    message: why[code] ?? `cannot be ${deed} (${code})`,
    mend: deed === 'read' ? 'Check its path' : 'Name a folder that can be written to',
  };
}

/** Longest name that is kept, so that a file system takes it with its ending. */
const MAX_NAME = 80;

/**
 * Names made safe for files, one each and no two alike (letters of either case count as the same): letters, digits, dots and
 * dashes; never empty, hidden, or a name that a system keeps for itself.
 */
export function safeFileNames(names: readonly string[]): string[] {
  const taken = new Set<string>();
  return names.map((name) => {
    const plain = safeFileName(name);
    let free = plain;
    for (let copy = 2; taken.has(free.toLowerCase()); copy++) free = `${plain}-${copy}`;
    taken.add(free.toLowerCase());
    return free;
  });
}

function safeFileName(name: string): string {
  const plain = name
    .normalize('NFC')
    .replace(/[^\p{L}\p{N}.-]+/gu, '-')
    .slice(0, MAX_NAME)
    .replace(/^[.-]+|[.-]+$/g, '');
  return plain === '' || /^(con|prn|aux|nul|com\d|lpt\d)(\.|$)/i.test(plain) ? `motion${plain && '-'}${plain}` : plain;
}
