import { MOTIONS_FOR_MEAN } from '../../core/checks/envelope.ts';
import type { Fault } from '../../core/fault.ts';
import type { LimitsRow, MotionEntry } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { NumberField } from '../controls/NumberField.tsx';
import { Select } from '../controls/Select.tsx';
import { Faults, Line, Section } from './Section.tsx';
import { TextField } from './TextField.tsx';

const MEASURES = [
  { value: 'count', label: 'By their number' },
  { value: 'mean', label: 'Mean' },
  { value: 'median', label: 'Median' },
  { value: 'max', label: 'Largest' },
] as const;

export interface LimitSectionProps {
  readonly limits: LimitsRow;
  /** The first storey is an isolator. */
  readonly isolated: boolean;
  readonly motions: readonly MotionEntry[];
  readonly faults: readonly Fault[];
}

/** The allowable drift, and which drift of the suite is held against it. */
export function LimitSection({ limits, isolated, motions, faults }: LimitSectionProps) {
  const used = motions.filter((motion) => motion.used).length;
  const byCount = used >= MOTIONS_FOR_MEAN ? 'the mean' : 'the largest';
  return (
    <Section
      title="Limit"
      about="The allowable storey drift over height, and which drift is compared with it. The local code governs: type what it says, and where."
    >
      <Line label="Drift" means="of the storey height">
        <NumberField path="limits.drift" label="Allowable storey drift" />
      </Line>
      <Line
        label="Of the suite"
        means={
          limits.measure === undefined
            ? `mean from ${MOTIONS_FOR_MEAN} motions on, else the largest (EN 1998-1:2004, 4.3.3.4.3): ${byCount} of ${used} now`
            : 'as the clause says'
        }
      >
        <Select
          label="Which drift of the suite"
          value={limits.measure ?? 'count'}
          options={MEASURES}
          onChange={(measure) => {
            commitOpenDraft();
            edit(`limit on the ${MEASURES.find(({ value }) => value === measure)?.label.toLowerCase()}`, (project) => {
              const { measure: _, ...rest } = project.limits;
              return { ...project, limits: measure === 'count' ? rest : { ...rest, measure } };
            });
          }}
        />
      </Line>
      <Line
        label="Factor"
        means="on the computed drift before it is compared; 1 unless a clause compares another drift"
      >
        <NumberField path="limits.factor" label="Factor on the computed drift" unit={false} />
      </Line>
      {isolated && (
        <Line
          label="Isolator"
          means="displacement that the isolator may reach, of the same statistic and without the factor; left empty: not compared"
        >
          <NumberField path="limits.isolator" label="Allowable isolator displacement" />
        </Line>
      )}
      <Line label="Source" means="clause, earthquake level and which drift it limits">
        <TextField path="limits.source" label="Source of the limit" className="wide" />
      </Line>
      <Faults
        faults={faults}
        under="limits"
        shown={['limits.drift', 'limits.factor', ...(isolated ? ['limits.isolator'] : [])]}
      />
    </Section>
  );
}
