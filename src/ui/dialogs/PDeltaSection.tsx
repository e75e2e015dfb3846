import type { Fault } from '../../core/fault.ts';
import { edit } from '../../state/document.ts';
import { commitOpenDraft } from '../controls/field.ts';
import { Faults, Line, Section } from './Section.tsx';

/** Whether gravity acts on the displaced storeys. */
export function PDeltaSection({ pDelta, faults }: { readonly pDelta: boolean; readonly faults: readonly Fault[] }) {
  return (
    <Section
      title="P-Delta"
      about="Gravity above each storey acts on its drift: a stiffness of minus the gravity above over the height, storey by storey. Periods and damping count with it."
    >
      <Line label="P-Delta" means="gravity loads are the weights, or those typed in the column Gravity of the sheet">
        <label className="check">
          <input
            type="checkbox"
            checked={pDelta}
            onChange={(event) => {
              const { checked } = event.target;
              commitOpenDraft();
              edit(`P-Delta ${checked ? 'on' : 'off'}`, (project) => ({
                ...project,
                frame: { ...project.frame, pDelta: checked },
              }));
            }}
          />
          {pDelta ? 'on' : 'off'}
        </label>
      </Line>
      <Faults faults={faults} under="frame.pDelta" />
    </Section>
  );
}
