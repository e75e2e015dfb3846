import { stepOf } from '../../core/dynamics/steps.ts';
import type { Fault } from '../../core/fault.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { Project } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { letterOf } from '../controls/letters.ts';
import { NumberField } from '../controls/NumberField.tsx';
import { Segmented } from '../controls/Segmented.tsx';
import { Facts, Faults, Line, Section } from './Section.tsx';
import { shortSeconds } from './shortSeconds.ts';

export interface StepSectionProps {
  readonly project: Project;
  readonly modes: readonly Mode[] | null;
  readonly faults: readonly Fault[];
}

/** The time step, how long is computed, and where a run is stopped. */
export function StepSection({ project, modes, faults }: StepSectionProps) {
  const { step } = project.analysis;
  const parts = typeof step === 'object' && step !== null;
  return (
    <Section
      title="Step"
      about="A whole part of every record's interval, so that no sample is passed over. Twenty steps in the shortest period that matters are common practice (from memory)."
    >
      <Line label="Given as">
        <Segmented
          label="Step given as"
          value={parts ? 'parts' : 'seconds'}
          segments={[
            { value: 'parts', label: 'Parts of each interval' },
            { value: 'seconds', label: 'Seconds' },
          ]}
          onChange={(kind) => giveAs(kind, project)}
        />
      </Line>
      {parts ? (
        <Line label="Parts" means="1: a step a sample; 2: half the interval; 4: a quarter">
          <NumberField path="analysis.step.parts" label="Parts of the interval" unit={false} />
        </Line>
      ) : (
        <Line label="Step" means="the same for every motion">
          <NumberField path="analysis.step" label="Time step" />
        </Line>
      )}
      <Line
        label="Tail"
        means="free vibration computed after the last sample; some first periods show what drift remains"
      >
        <NumberField path="analysis.tail" label="Free vibration after the record" />
      </Line>
      <Line label="Stop at" means="a P-Delta run whose storey drift passes this is stopped as collapsed">
        <NumberField path="analysis.stopDrift" label="Drift at which a run is stopped" />
      </Line>
      <Facts facts={factsOf(project, modes)} />
      <Faults
        faults={faults}
        under="analysis.s"
        shown={['analysis.step.parts', 'analysis.stopDrift', ...(parts ? [] : ['analysis.step'])]}
      />
    </Section>
  );
}

/** The step said the other way, at the same size where it can be. */
function giveAs(kind: 'parts' | 'seconds', project: Project): void {
  commitOpenDraft();
  const { step } = project.analysis;
  const intervals = project.motions.map(({ interval }) => interval);
  const shortest = intervals.length > 0 ? Math.min(...intervals) : 0.01;
  if (kind === 'parts') {
    if (typeof step === 'object' && step !== null) return;
    const parts = typeof step === 'number' && step > 0 ? Math.max(1, Math.round(shortest / step)) : 1;
    change('step as parts of the interval', { parts });
  } else {
    if (typeof step !== 'object' || step === null) return;
    change('step in seconds', Number((shortest / step.parts).toPrecision(12)));
  }
}

function change(label: string, step: Project['analysis']['step']): void {
  edit(label, (project) => ({ ...project, analysis: { ...project.analysis, step } }));
}

function factsOf(
  { analysis, motions }: Project,
  modes: readonly Mode[] | null,
): readonly (readonly [string, string])[] {
  const { step } = analysis;
  const facts: (readonly [string, string])[] = [];
  if (step === null || typeof step === 'string') return facts;
  const sizes = new Map<number, string[]>();
  motions.forEach(({ used, interval }, i) => {
    if (!used) return;
    const found = stepOf(step, interval);
    if (!found.ok) return;
    const size = Number(found.value.size.toPrecision(9));
    sizes.set(size, [...(sizes.get(size) ?? []), letterOf(i)]);
  });
  const all = [...sizes].sort(([a], [b]) => a - b);
  if (all.length === 0) return facts;
  const words = all.map(
    ([size, letters]) => `${shortSeconds(size)} s${all.length > 1 ? ` (${letters.join(', ')})` : ''}`,
  );
  facts.push(['Steps taken', words.join('; ')]);
  const shortest = modes?.at(-1)?.period;
  const longest = all[all.length - 1][0];
  if (shortest !== undefined) {
    const ratio = longest / shortest;
    facts.push([
      'Step over shortest period',
      `${printQuantity(ratio, 'ratio', 'si', ratio < 0.1 ? 3 : 2)}: ${shortSeconds(longest)} s in ${shortSeconds(shortest)} s, ${printQuantity(1 / ratio, 'ratio', 'si', 0)} steps a period`,
    ]);
  }
  return facts;
}
