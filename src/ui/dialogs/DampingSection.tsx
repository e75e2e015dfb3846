import { type Fault, never } from '../../core/fault.ts';
import type { Mode } from '../../core/frame/modes.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import type { DampingRow, Project, StoreyRow } from '../../document/project.ts';
import { edit } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { Button } from '../controls/Button.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { NumberField } from '../controls/NumberField.tsx';
import { Segmented } from '../controls/Segmented.tsx';
import { Select } from '../controls/Select.tsx';
import { DampingPicture } from './DampingPicture.tsx';
import { Facts, Faults, Line, Section } from './Section.tsx';

type Kind = DampingRow['kind'];
type RayleighRow = Extract<DampingRow, { kind: 'rayleigh' }>;

const KINDS: readonly { readonly value: Kind; readonly label: string }[] = [
  { value: 'rayleigh', label: 'Rayleigh: exact in two modes' },
  { value: 'modal', label: 'Modal: a ratio for each mode' },
  { value: 'stiffness-proportional', label: 'Stiffness-proportional: exact in one mode' },
  { value: 'none', label: 'None' },
];

/** Where each kind begins: 5 % of critical, a common value for frames near yielding (from memory). */
const START: { readonly [K in Kind]: Extract<DampingRow, { kind: K }> } = {
  none: { kind: 'none' },
  rayleigh: { kind: 'rayleigh', modes: [1, 3], ratios: [0.05, 0.05] },
  modal: { kind: 'modal', ratios: [0.05] },
  'stiffness-proportional': { kind: 'stiffness-proportional', mode: 1, ratio: 0.05 },
};

const ABOUT: Readonly<Record<Kind, string>> = {
  none: 'No viscous damping: what the scheme and the storeys take out is all there is.',
  rayleigh:
    'C = a0 M + a1 K from the ratios of two modes; modes between them get less, those above more. Rayleigh (1877); Chopra, Dynamics of Structures, 11.4.1 (from memory).',
  modal:
    'Each mode gets its own ratio; the last one typed counts for the rest. Chopra, Dynamics of Structures, 11.4.3 (from memory).',
  'stiffness-proportional': 'C = a1 K from one mode; higher modes are damped in proportion to their frequency.',
};

/** Modes whose resulting ratio is listed. */
const LISTED = 6;

export interface DampingSectionProps {
  readonly frame: Project['frame'];
  readonly modes: readonly Mode[] | null;
  readonly faults: readonly Fault[];
}

/** Viscous damping: its kind, its numbers, and the ratio that each mode comes out with. */
export function DampingSection({ frame, modes, faults }: DampingSectionProps) {
  const { damping, storeys } = frame;
  const current = useResults((state) => state.status === 'current');
  const ratios = useResults((state) => state.answers?.case.prepared.dampingRatios ?? null);
  const listed = current && ratios !== null && modes !== null ? Array.from(ratios.slice(0, LISTED)) : [];
  return (
    <Section title="Damping" about={ABOUT[damping.kind]}>
      <Line label="Kind">
        <Select
          label="Kind of damping"
          value={damping.kind}
          options={KINDS.map((kind) => ({ ...kind, disabled: kind.value === 'rayleigh' && storeys.length === 1 }))}
          onChange={(kind) => begin(kind, storeys.length)}
        />
      </Line>
      <Numbers damping={damping} />
      {damping.kind === 'rayleigh' && <StiffnessLine damping={damping} yields={storeys.some(yields)} />}
      {listed.length > 0 && (
        <Facts
          facts={[
            [
              'Ratios that come out',
              `${listed.map((ratio, i) => `mode ${i + 1} ${printQuantity(ratio, 'percent', 'si', 1)} %`).join(', ')}${
                (ratios?.length ?? 0) > LISTED ? ' …' : ''
              }`,
            ],
          ]}
        />
      )}
      {current && <DampingPicture />}
      <Faults faults={faults} under="frame.damping" shown={FIELDS} />
    </Section>
  );
}

const FIELDS = [
  'frame.damping.mode',
  'frame.damping.ratio',
  ...[0, 1].flatMap((i) => [`frame.damping.modes[${i}]`]),
  ...Array.from({ length: 60 }, (_, i) => `frame.damping.ratios[${i}]`),
];

function begin(kind: Kind, storeys: number): void {
  const start = START[kind];
  // The second mode of the pair must be there.
  set(
    `damping ${kind}`,
    start.kind === 'rayleigh' ? { ...start, modes: [1, Math.min(3, Math.max(2, storeys))] } : start,
  );
}

function set(label: string, damping: DampingRow): void {
  commitOpenDraft();
  edit(label, (project) => ({ ...project, frame: { ...project.frame, damping } }));
}

function Numbers({ damping }: { readonly damping: DampingRow }) {
  switch (damping.kind) {
    case 'none':
      return null;
    case 'rayleigh':
      return [0, 1].map((i) => (
        <Line key={i} label={i === 0 ? 'First mode' : 'Second mode'}>
          <NumberField path={`frame.damping.modes[${i}]`} label={`Damping, mode ${i + 1}`} unit={false} width={48} />
          <span className="quiet">with</span>
          <NumberField path={`frame.damping.ratios[${i}]`} label={`Damping ratio ${i + 1}`} width={64} />
          <span className="quiet">of critical</span>
        </Line>
      ));
    case 'stiffness-proportional':
      return (
        <Line label="Mode">
          <NumberField path="frame.damping.mode" label="Damping, mode" unit={false} width={48} />
          <span className="quiet">with</span>
          <NumberField path="frame.damping.ratio" label="Damping ratio" width={64} />
          <span className="quiet">of critical</span>
        </Line>
      );
    case 'modal':
      return <ModalNumbers damping={damping} />;
    default:
      return never(damping);
  }
}

const yields = ({ law }: StoreyRow) => law.kind !== 'elastic';

/** Which stiffness stands in a1 K once storeys yield. */
function StiffnessLine({ damping, yields }: { readonly damping: RayleighRow; readonly yields: boolean }) {
  const tangent = damping.stiffness === 'tangent';
  const means = tangent
    ? 'K is what the storeys have at each instant: damping falls where they yield'
    : 'K stays as it is at rest: damping forces go on where storeys yield, and may grow large beside theirs';
  return (
    <Line label="Stiffness" means={yields ? means : `${means}; no storey of this frame yields, so both are the same`}>
      <Segmented
        label="Stiffness in the damping"
        value={tangent ? 'tangent' : 'initial'}
        segments={[
          { value: 'initial', label: 'Initial' },
          { value: 'tangent', label: 'Tangent' },
        ]}
        onChange={(stiffness) => {
          if (stiffness === (tangent ? 'tangent' : 'initial')) return;
          const { stiffness: _, ...rest } = damping;
          set(`damping on ${stiffness} stiffness`, stiffness === 'initial' ? rest : { ...rest, stiffness });
        }}
      />
    </Line>
  );
}

function ModalNumbers({ damping }: { readonly damping: Extract<DampingRow, { kind: 'modal' }> }) {
  const { ratios } = damping;
  return (
    <Line
      label={ratios.length === 1 ? 'Every mode' : 'Modes'}
      means={
        ratios.length === 1
          ? 'of critical'
          : `of critical, mode 1 first; the last for mode ${ratios.length} and all above`
      }
    >
      {ratios.map((_, i) => {
        const path = `frame.damping.ratios[${i}]`;
        return (
          <NumberField
            key={path}
            path={path}
            label={`Damping ratio ${i + 1}`}
            unit={i === ratios.length - 1}
            width={56}
          />
        );
      })}
      <Button
        size="low"
        onClick={() => set('add a damping ratio', { ...damping, ratios: [...ratios, ratios.at(-1) ?? 0.05] })}
      >
        Add a mode
      </Button>
      {ratios.length > 1 && (
        <Button size="low" onClick={() => set('remove a damping ratio', { ...damping, ratios: ratios.slice(0, -1) })}>
          Remove the last
        </Button>
      )}
    </Line>
  );
}
