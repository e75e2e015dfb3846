import { endingWords } from '../../checks/verdict.ts';
import { type ReportRun, type ReportSource, yields } from '../source.ts';
import { type Cell, type Column, decimalsOf, type Table } from '../table.ts';

/** Energies at the end of each run, of relative motion, with the evidence that the step was small enough. */
export function energyBalance({ prepared, runs }: ReportSource): Table {
  const column = (key: string, name: string, quantity: Column['quantity'], of: (run: ReportRun) => Cell): Column => ({
    key,
    name,
    quantity,
    values: runs.map(of),
  });
  return {
    id: 'energy',
    title: 'Energy balance and evidence',
    columns: [
      column('motion', 'Motion', 'text', ({ motion }) => motion),
      column('input', 'Input', 'energy', ({ run }) => run.energy.input),
      column('kinetic', 'Kinetic', 'energy', ({ run }) => run.energy.kinetic),
      column('strain', 'Strain', 'energy', ({ run }) => run.energy.strain),
      column('damping', 'Viscous damping', 'energy', ({ run }) => run.energy.damping),
      column('dampers', 'Dampers', 'energy', ({ run }) => run.energy.dampers),
      column('hysteretic', 'Hysteretic', 'energy', ({ run }) => run.energy.hysteretic),
      column('imbalance', 'Largest imbalance', 'percent', ({ run }) => run.energy.imbalance),
      {
        ...column('step', 'Step', 'time', ({ run }) => run.step),
        decimals: decimalsOf(runs.map(({ run }) => run.step)),
      },
      ...(runs.some(({ stepWhy }) => stepWhy !== undefined)
        ? [column('stepWhy', 'Why this step', 'text', ({ stepWhy }) => stepWhy ?? null)]
        : []),
      column('steps', 'Steps', 'count', ({ run }) => run.steps),
      column('solves', 'Solves of all steps', 'count', ({ run }) => run.marching.solves),
      column('mostSolves', 'Most solves of one step', 'count', ({ run }) => run.marching.mostSolves),
      column('halvings', 'Steps halved', 'count', ({ run }) => run.marching.halvings),
      ...(prepared.frame.storeys.some(yields)
        ? [
            column('baseDampingForce', 'Damping force at the base past yield', 'force', ({ run }) =>
              Number.isFinite(run.base.peakDampingForce) ? run.base.peakDampingForce : null,
            ),
          ]
        : []),
      column('stepError', 'Step error', 'percent', ({ stepError }) => stepError),
      column('ending', 'Ending', 'text', ({ run }) => (run.ending === null ? 'completed' : endingWords(run))),
    ],
  };
}
