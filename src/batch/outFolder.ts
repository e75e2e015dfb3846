import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { faultLine, type Result } from '../core/fault.ts';
import { fileFault } from './files.ts';

/** A folder that answers are written into; what could not be written is kept as lines. */
export interface OutFolder {
  write(name: string, text: string): void;
  readonly faults: readonly string[];
}

/** Makes the folder where it is not there, and takes away an older response file: none stands there until the new one is whole. */
export function openFolder(path: string): Result<OutFolder> {
  try {
    mkdirSync(path, { recursive: true });
    rmSync(join(path, 'response.json'), { force: true });
  } catch (thrown) {
    return { ok: false, faults: [fileFault(thrown, 'written')] };
  }
  const faults: string[] = [];
  return {
    ok: true,
    value: {
      faults,
      write(name, text) {
        const file = join(path, name);
        try {
          writeFileSync(file, text);
        } catch (thrown) {
          faults.push(`${file}: ${faultLine(fileFault(thrown, 'written'))}`);
        }
      },
    },
  };
}
