import type { Fault } from '../core/fault.ts';

const SECTIONS: readonly string[] = ['format', 'version', 'title', 'frame', 'motions', 'analysis', 'limits'];
const FRAME: readonly string[] = ['', 'storeys', 'damping', 'pDelta'];

/** Faults in the order in which their places stand in the file: storeys and motions by number, unknown sections last. */
export function inFileOrder(faults: readonly Fault[]): Fault[] {
  const keyed = faults.map((fault) => ({ fault, keys: keysOf(fault.where) }));
  return keyed.sort((a, b) => compare(a.keys, b.keys)).map(({ fault }) => fault);
}

/** Section, list, number: what stands deeper keeps the order in which it was found. */
function keysOf(where: string): readonly [section: number, list: string, index: number] {
  const [, section = '', list = '', index = '0'] = /^(\w+)(?:\.(\w+))?(?:\[(\d+)\])?/.exec(where) ?? [];
  const known = SECTIONS.indexOf(section);
  return [known < 0 ? SECTIONS.length : known, section === 'frame' ? list : '', Number(index)];
}

function compare(a: ReturnType<typeof keysOf>, b: ReturnType<typeof keysOf>): number {
  if (a[0] !== b[0]) return a[0] - b[0];
  if (a[1] !== b[1]) return FRAME.indexOf(a[1]) - FRAME.indexOf(b[1]);
  return a[2] - b[2];
}
