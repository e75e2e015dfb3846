import type { Evidence } from '../../core/dynamics/evidence.ts';
import { stepOf } from '../../core/dynamics/steps.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { Project } from '../../document/project.ts';
import { letterOf } from '../controls/letters.ts';
import { shortSeconds } from './shortSeconds.ts';

type Fact = readonly [name: string, value: string];

/** What a step comes to: its size by motion, why where halving chose it, and how it stands to the shortest period. */
export function stepFacts(
  { analysis, motions }: Project,
  modes: readonly Mode[] | null,
  evidence: Readonly<Record<string, Evidence>> | null,
): readonly Fact[] {
  const { step } = analysis;
  const found = motions.flatMap(({ name, used, interval }, i) => {
    const letter = letterOf(i);
    const one = evidence?.[name];
    if (!used) return [];
    if (step === 'auto') return one === undefined ? [] : [{ letter, size: one.step, why: one.auto?.why ?? null }];
    if (step === null || typeof step === 'string') return [];
    const typed = stepOf(step, interval);
    return typed.ok ? [{ letter, size: typed.value.size, why: null }] : [];
  });
  if (found.length === 0) return [];
  const sizes = grouped(found.map(({ letter, size }) => ({ letter, key: shortSeconds(size) })));
  const facts: Fact[] = [
    [
      'Steps taken',
      [...sizes].map(([size, letters]) => `${size} s${sizes.size > 1 ? ` (${letters.join(', ')})` : ''}`).join('; '),
    ],
  ];
  const whys = grouped(found.flatMap(({ letter, why }) => (why === null ? [] : [{ letter, key: why }])));
  for (const [why, letters] of whys) facts.push([whys.size > 1 ? `Why, ${letters.join(', ')}` : 'Why', why]);
  const longest = Math.max(...found.map(({ size }) => size));
  const shortest = modes?.at(-1)?.period;
  if (shortest !== undefined) {
    const ratio = longest / shortest;
    facts.push([
      'Step over shortest period',
      `${printQuantity(ratio, 'ratio', 'si', ratio < 0.1 ? 3 : 2)}: ${shortSeconds(longest)} s in ${shortSeconds(shortest)} s, ${printQuantity(1 / ratio, 'ratio', 'si', 0)} steps a period`,
    ]);
  }
  return facts;
}

/** Letters of motions by what they have in common, in the order in which they come. */
function grouped(entries: readonly { readonly letter: string; readonly key: string }[]): Map<string, string[]> {
  const groups = new Map<string, string[]>();
  for (const { letter, key } of entries) groups.set(key, [...(groups.get(key) ?? []), letter]);
  return groups;
}
