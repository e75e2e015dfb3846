import { type Method, methodOf, spectralRadiusAtInfinity } from '../../core/dynamics/methods.ts';
import type { MethodChoice } from '../../core/dynamics/run.ts';
import { stepLimit } from '../../core/dynamics/steps.ts';
import { type Fault, never } from '../../core/fault.ts';
import type { Swaying } from '../../core/frame/stiffening.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { AnalysisRow } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { NumberField } from '../controls/NumberField.tsx';
import { Select } from '../controls/Select.tsx';
import { Facts, Faults, Line, Section } from './Section.tsx';
import { shortSeconds } from './shortSeconds.ts';

const KINDS: readonly { readonly value: MethodChoice['kind']; readonly label: string }[] = [
  { value: 'newmark', label: 'Newmark' },
  { value: 'generalized-alpha', label: 'Generalized-α' },
  { value: 'hht', label: 'HHT-α' },
  { value: 'central-difference', label: 'Central difference' },
];

/** Where each scheme begins: average acceleration, and mild damping of the high modes. */
const START: { readonly [K in MethodChoice['kind']]: Extract<MethodChoice, { kind: K }> } = {
  newmark: { kind: 'newmark', beta: 0.25, gamma: 0.5 },
  'generalized-alpha': { kind: 'generalized-alpha', spectralRadius: 0.8 },
  hht: { kind: 'hht', alpha: -0.1 },
  'central-difference': { kind: 'central-difference' },
};

export interface MethodSectionProps {
  readonly analysis: AnalysisRow;
  /** null while the frame cannot stand. */
  readonly frame: Swaying | null;
  readonly faults: readonly Fault[];
}

/** The time-stepping scheme, its numbers, and what they bring. */
export function MethodSection({ analysis: { method }, frame, faults }: MethodSectionProps) {
  const scheme = schemeOf(method);
  return (
    <Section
      title="Method"
      about={
        <>
          One family, four numbers: how displacement, velocity and acceleration at the end of a step follow from its
          beginning. {scheme?.source}
        </>
      }
    >
      <Line label="Scheme">
        <Select
          label="Scheme"
          value={method.kind}
          options={KINDS}
          onChange={(kind) => setMethod(START[kind], KINDS.find(({ value }) => value === kind)?.label ?? kind)}
        />
      </Line>
      <Numbers method={method} />
      {scheme === null ? null : <Facts facts={factsOf(scheme, method, frame)} />}
      <Faults faults={faults} under="analysis.method" shown={FIELDS} />
    </Section>
  );
}

const FIELDS = ['beta', 'gamma', 'spectralRadius', 'alpha'].map((name) => `analysis.method.${name}`);

function setMethod(method: MethodChoice, name: string): void {
  commitOpenDraft();
  edit(`method ${name}`, (project) => ({ ...project, analysis: { ...project.analysis, method } }));
}

function Numbers({ method }: { readonly method: MethodChoice }) {
  switch (method.kind) {
    case 'newmark':
      return (
        <>
          <Line
            label="β"
            means="share of the new acceleration in the displacement: 1/4 average, 1/6 linear over the step"
          >
            <NumberField path="analysis.method.beta" label="Newmark beta" unit={false} />
          </Line>
          <Line label="γ" means="1/2 keeps second order and adds no damping; more damps the high modes, at first order">
            <NumberField path="analysis.method.gamma" label="Newmark gamma" unit={false} />
          </Line>
          <Line label="">
            <Button size="low" onClick={() => setMethod(START.newmark, 'average acceleration')}>
              Average acceleration
            </Button>{' '}
            <Button
              size="low"
              onClick={() => setMethod({ kind: 'newmark', beta: 1 / 6, gamma: 0.5 }, 'linear acceleration')}
            >
              Linear acceleration
            </Button>
          </Line>
        </>
      );
    case 'generalized-alpha':
      return (
        <Line
          label="Spectral radius"
          means="what a step leaves of the highest modes: 1 all of it, 0 nothing; second order throughout"
        >
          <NumberField path="analysis.method.spectralRadius" label="Spectral radius" unit={false} />
        </Line>
      );
    case 'hht':
      return (
        <Line label="α" means="from −1/3 to 0; more negative damps the high modes more; second order throughout">
          <NumberField path="analysis.method.alpha" label="HHT alpha" unit={false} />
        </Line>
      );
    case 'central-difference':
      return (
        <Line label="" means="β 0, γ 1/2: no equation is solved, and the step must stay under the limit below">
          {null}
        </Line>
      );
    default:
      return never(method);
  }
}

/** The four numbers; null while one of those typed is out of its range. */
function schemeOf(method: MethodChoice): Method | null {
  try {
    return methodOf(method);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

function factsOf(scheme: Method, choice: MethodChoice, frame: Swaying | null): readonly (readonly [string, string])[] {
  return [
    [
      'Order',
      scheme.order === 2 ? 'second: half the step, a quarter of the error' : 'first: half the step, half the error',
    ],
    ['Damping of its own', dampingWords(scheme)],
    ['Stability', stabilityWords(choice, frame)],
  ];
}

function dampingWords(scheme: Method): string {
  const radius = spectralRadiusAtInfinity(scheme);
  if (!Number.isFinite(radius)) return 'none under the stability limit';
  if (radius > 1 - 1e-9) return 'none: the highest modes keep their amplitude';
  return `the highest modes keep ${printQuantity(radius, 'ratio', 'si', 2)} of their amplitude a step`;
}

function stabilityWords(choice: MethodChoice, frame: Swaying | null): string {
  if (frame === null) return 'known once the frame stands';
  const limit = stepLimit(frame, choice);
  return limit === null ? 'stable at any step' : `stable up to a step of ${shortSeconds(limit)} s for this frame`;
}
