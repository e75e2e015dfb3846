import type { LawRow, Project, StoreyRow } from './project.ts';
import { setLaw } from './storeyParts.ts';

/**
 * Gives storeys the law of another one: its kind and the shape of its cycle. Strength and hardening have columns of their own and
 * stay where a storey has them; a storey that was elastic takes the hardening, and a starting strength of its own.
 */
export function lawLike(project: Project, from: number, to: readonly number[]): Project {
  const source = project.frame.storeys[from]?.law;
  if (source === undefined) return project;
  const given = setLaw(project, to, source.kind);
  const chosen = new Set(to);
  const storeys = given.frame.storeys.map((row, i): StoreyRow => {
    if (!chosen.has(i)) return row;
    const own = project.frame.storeys[i]?.law ?? row.law;
    return { ...row, law: shapedLike(row.law, source, own.kind === 'elastic') };
  });
  return { ...given, frame: { ...given.frame, storeys } };
}

function shapedLike(law: LawRow, source: LawRow, wasElastic: boolean): LawRow {
  if (law.kind === 'elastic' || source.kind === 'elastic') return law;
  const hardening = wasElastic ? source.hardening : law.hardening;
  if (law.kind === 'bouc-wen' && source.kind === 'bouc-wen') {
    const { exponent, beta, gamma } = source;
    return { ...law, hardening, exponent, beta, gamma };
  }
  if (law.kind === 'flag' && source.kind === 'flag') return { ...law, hardening, ratio: source.ratio };
  return { ...law, hardening };
}
