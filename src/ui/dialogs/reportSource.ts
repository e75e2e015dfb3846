import type { ReportSource } from '../../core/report/source.ts';
import type { Project } from '../../document/project.ts';
import type { Answers } from '../../state/results.ts';
import { samplesOf } from '../../state/samples.ts';
import { measuresOfSamples } from '../motions/measures.ts';

/** What the tables are written from: the answers, with the motions of the document, those left out as well. */
export function reportSourceOf(
  answers: Answers,
  project: Project,
  stepErrors: Readonly<Record<string, number>> | null,
): ReportSource {
  const { case: from, runs, envelope, evidence } = answers;
  const scales = new Map(from.motions.map(({ name, scale }) => [name, scale]));
  return {
    title: project.title,
    prepared: from.prepared,
    motions: project.motions.map(({ name, interval, count, samples, scale, used, reason, origin }) => {
      const values = samplesOf(samples);
      return {
        name,
        interval,
        count,
        scale: scales.get(name) ?? (typeof scale === 'number' ? scale : Number.NaN),
        peakAcceleration: values === undefined ? null : measuresOfSamples(values, interval).peakAcceleration,
        used,
        ...(reason === undefined ? {} : { reason }),
        ...(origin === undefined ? {} : { origin }),
      };
    }),
    runs: runs.map(({ motion, run }) => {
      const why = evidence[motion]?.auto?.why;
      return { motion, run, stepError: stepErrors?.[motion] ?? null, ...(why === undefined ? {} : { stepWhy: why }) };
    }),
    envelope,
    analysis: from.analysis,
    limits: from.limits,
  };
}
