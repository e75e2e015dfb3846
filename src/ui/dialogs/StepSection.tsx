import { AIM, MASS_COVERED, MOST_PARTS, STEPS_A_PERIOD } from '../../core/dynamics/autoStep.ts';
import type { Evidence } from '../../core/dynamics/evidence.ts';
import type { Fault } from '../../core/fault.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { Project } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { NumberField } from '../controls/NumberField.tsx';
import { Segmented } from '../controls/Segmented.tsx';
import { Facts, Faults, Line, Section } from './Section.tsx';
import { stepFacts } from './stepFacts.ts';

export interface StepSectionProps {
  readonly project: Project;
  readonly modes: readonly Mode[] | null;
  readonly faults: readonly Fault[];
}

type Given = 'parts' | 'seconds' | 'auto';

/** The time step, how long is computed, and where a run is stopped. */
export function StepSection({ project, modes, faults }: StepSectionProps) {
  const { step } = project.analysis;
  const given = givenAs(step);
  const evidence = useResults((state) => (state.status === 'current' ? (state.answers?.evidence ?? null) : null));
  const chosen = (): number | null => {
    const all = Object.values(evidence ?? {}).map(({ parts }) => parts);
    return all.length > 0 ? Math.max(...all) : null;
  };
  return (
    <Section
      title="Step"
      about={`A whole part of every record's interval, so that no sample is passed over. ${STEPS_A_PERIOD} steps in the shortest period that matters are common practice (from memory).`}
    >
      <Line label="Given as">
        <Segmented
          label="Step given as"
          value={given}
          segments={[
            { value: 'parts', label: 'Parts of each interval' },
            { value: 'seconds', label: 'Seconds' },
            { value: 'auto', label: 'By halving (auto)' },
          ]}
          onChange={(kind) => giveAs(kind, project, chosen())}
        />
      </Line>
      {given === 'parts' && (
        <Line label="Parts" means="1: a step a sample; 2: half the interval; 4: a quarter">
          <NumberField path="analysis.step.parts" label="Parts of the interval" unit={false} />
        </Line>
      )}
      {given === 'seconds' && (
        <Line label="Step" means="the same for every motion">
          <NumberField path="analysis.step" label="Time step" />
        </Line>
      )}
      {given === 'auto' && (
        <Line label="Parts" means={HALVING}>
          <span className="accent">{searched(evidence)}</span>
        </Line>
      )}
      <Line
        label="Tail"
        means="free vibration computed after the last sample; some first periods show what drift remains"
      >
        <NumberField path="analysis.tail" label="Free vibration after the record" />
      </Line>
      <Line
        label="Stop at"
        means="a run that yields or has P-Delta ends where a storey drift passes this, and is named as collapsed with storey and time; a linear run without P-Delta goes on, with a caution"
      >
        <NumberField path="analysis.stopDrift" label="Drift at which a run is stopped" />
      </Line>
      <Facts facts={stepFacts(project, modes, evidence)} />
      <Faults
        faults={faults}
        under="analysis.s"
        shown={[
          'analysis.stopDrift',
          ...(given === 'parts' ? ['analysis.step.parts'] : given === 'seconds' ? ['analysis.step'] : []),
        ]}
      />
    </Section>
  );
}

const HALVING = `each record's interval in 1, 2, 4 … ${MOST_PARTS} parts: the first whose peak drifts change by so little at half the step that the step error is under ${printQuantity(AIM, 'percent', 'si', 0)} %, with ${STEPS_A_PERIOD} steps in each mode needed for ${printQuantity(MASS_COVERED, 'percent', 'si', 0)} % of the mass, and within the stability limit. While a cell is edited the last step counts at once and is confirmed behind`;

/** What halving came to: "1 or 2, by motion". */
function searched(evidence: Readonly<Record<string, Evidence>> | null): string {
  const parts = [...new Set(Object.values(evidence ?? {}).map((one) => one.parts))].sort((a, b) => a - b);
  if (parts.length === 0) return 'not known yet';
  return parts.length === 1
    ? String(parts[0])
    : `${parts.slice(0, -1).join(', ')} or ${parts[parts.length - 1]}, by motion`;
}

function givenAs(step: Project['analysis']['step']): Given {
  if (step === 'auto') return 'auto';
  return typeof step === 'object' && step !== null ? 'parts' : 'seconds';
}

/** The step said another way, at the same size where it can be. `chosen`: parts that halving came to, where they are known. */
function giveAs(kind: Given, project: Project, chosen: number | null): void {
  commitOpenDraft();
  const { step } = project.analysis;
  if (kind === givenAs(step)) return;
  const intervals = project.motions.map(({ interval }) => interval);
  const shortest = intervals.length > 0 ? Math.min(...intervals) : 0.01;
  const parts =
    step === 'auto'
      ? (chosen ?? 1)
      : typeof step === 'object' && step !== null
        ? step.parts
        : typeof step === 'number' && step > 0
          ? Math.max(1, Math.round(shortest / step))
          : 1;
  if (kind === 'auto') change('step by halving', 'auto');
  else if (kind === 'parts') change('step as parts of the interval', { parts });
  else change('step in seconds', Number((shortest / parts).toPrecision(12)));
}

function change(label: string, step: Project['analysis']['step']): void {
  edit(label, (project) => ({ ...project, analysis: { ...project.analysis, step } }));
}
