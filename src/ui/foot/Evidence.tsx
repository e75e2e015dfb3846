import { AIM } from '../../core/dynamics/autoStep.ts';
import { printQuantity } from '../../core/units/quantities.ts';
import { type Answers, useResults } from '../../state/results.ts';
import { type AnalysisPart, setSession } from '../../state/session.ts';
import { dampingWords, methodWords } from './analysisWords.ts';
import { percent, percentBeside, runsWords, tookWords } from './evidenceWords.ts';
import { useOldAnswers } from './oldAnswers.ts';

/** How good the numbers are: what was assumed, the step, its error, the energy balance. The choices open their dialog. */
export function Evidence() {
  const answers = useResults((state) => state.answers);
  const old = useOldAnswers();
  const stepErrors = useResults((state) => state.stepErrors);
  if (answers === null) {
    return (
      <section className="foot evidence" aria-label="Evidence">
        <h2 className="foot-head">Evidence</h2>
        <span className="quiet">
          none yet: method, step, step error and energy imbalance stand here after the first run
        </span>
      </section>
    );
  }
  const { frame, analysis } = answers.case;
  return (
    <section className={`foot evidence ${old ? 'old' : ''}`} aria-label="Evidence">
      <h2 className="foot-head">
        <button
          type="button"
          className="choice"
          aria-label="Evidence: how good are these numbers?"
          onClick={() => setSession({ dialog: 'evidence' })}
        >
          Evidence
        </button>
      </h2>
      <ul className="facts">
        {old && <li className="as-of">of the last finished run, {clock(answers.at)}</li>}
        <Choice part="Damping">
          <Worded words={dampingWords(frame.damping)} from=" in " />
        </Choice>
        <Choice part="P-Delta">P-Delta {frame.pDelta ? 'on' : 'off'}</Choice>
        <Choice part="Method">
          <Worded words={methodWords(analysis.method)} from="," />
        </Choice>
        <Choice part="Step">
          step {stepSizes(answers)} s{stepOrigin(answers)}
        </Choice>
        {stepErrors !== null && <StepError errors={Object.values(stepErrors)} />}
        <Halved runs={answers.runs} />
        <li>
          <span className="long">energy </span>imbalance{' '}
          <b>{percent(Math.max(...answers.runs.map(({ run }) => run.energy.imbalance)))}</b>
        </li>
        <li>
          step<span className="long"> / shortest period</span>
          <span className="short">
            {' '}
            / T<sub>min</sub>
          </span>{' '}
          <b>{printQuantity(answers.step.overShortest, 'ratio', 'si', overDecimals(answers.step.overShortest))}</b>
        </li>
        <li>
          {answers.step.limit === null ? (
            <>
              stable<span className="long"> at any step</span>
            </>
          ) : (
            <>
              stable up to <span className="long">a step of </span>
              <b>{shortNumber(answers.step.limit)} s</b>
            </>
          )}
        </li>
      </ul>
      <span className="at-end">
        {runsWords(answers.runs.map(({ run }) => run.ending === null))} in <b>{tookWords(answers.took)}</b>
      </span>
    </section>
  );
}

function Choice({ part, children }: { readonly part: AnalysisPart; readonly children: React.ReactNode }) {
  return (
    <li>
      <button type="button" className="choice" onClick={() => setSession({ dialog: 'analysis', analysisPart: part })}>
        {children}
      </button>
    </li>
  );
}

/** What begins with `from` is left out where the page is not wide. */
function Worded({ words, from }: { readonly words: string; readonly from: string }) {
  const at = words.indexOf(from);
  if (at < 0) return words;
  return (
    <>
      {words.slice(0, at)}
      <span className="long">{words.slice(at)}</span>
    </>
  );
}

function StepError({ errors }: { readonly errors: readonly number[] }) {
  if (errors.length === 0) return null;
  const largest = Math.max(...errors);
  return (
    <li>
      step error <b>{percentBeside(AIM, largest)}</b>
      <span className="long">, aim below {printQuantity(AIM, 'percent', 'si', 0)} %</span>
    </li>
  );
}

/** "0.005", or the finest and the coarsest of the suite. */
function stepSizes({ runs }: Answers): string {
  const sizes = runs.map(({ run }) => run.step);
  const [least, most] = [shortNumber(Math.min(...sizes)), shortNumber(Math.max(...sizes))];
  return least === most ? most : `${least} to ${most}`;
}

function stepOrigin({ case: from, evidence }: Answers): string {
  const { step } = from.analysis;
  if (step === 'auto') {
    const open = Object.values(evidence).some(({ auto }) => auto?.converged === null);
    return open ? ', by halving, to be confirmed' : ', by halving';
  }
  if (typeof step !== 'object') return '';
  return step.parts === 1 ? ', the interval' : `, the interval in ${step.parts}`;
}

/** Steps that did not converge at once: said only where there are any. */
function Halved({ runs }: { readonly runs: Answers['runs'] }) {
  const halvings = runs.reduce((sum, { run }) => sum + run.marching.halvings, 0);
  if (halvings === 0) return null;
  return (
    <li>
      steps halved <b>{printQuantity(halvings, 'count', 'si')}</b>
    </li>
  );
}

function overDecimals(value: number): number {
  return value < 0.1 ? 3 : 2;
}

/** A step with no more figures than it has. */
function shortNumber(value: number): string {
  return String(Number(value.toPrecision(3)));
}

function clock(at: number): string {
  return new Date(at).toTimeString().slice(0, 5);
}
