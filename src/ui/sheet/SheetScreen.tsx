import { lazy, useCallback, useEffect, useLayoutEffect, useMemo, useRef, useState } from 'react';
import { toDisplay } from '../../core/units/quantities.ts';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { useChosenMotion, useChosenStorey } from '../../state/selectors.ts';
import { useSession } from '../../state/session.ts';
import { Boundary } from '../controls/Boundary.tsx';
import { letterOf } from '../controls/letters.ts';
import { answerRowsOf, motionDrifts } from './answerRows.ts';
import { CellLine } from './CellLine.tsx';
import { CellTools } from './CellTools.tsx';
import { answerColumns } from './columns.ts';
import { ensureStorey } from './commands.ts';
import { DriftPlot } from './DriftPlot.tsx';
import { swayFactor } from './drawing.ts';
import { EmptyStart } from './EmptyStart.tsx';
import { bayOf, FrameDrawing } from './FrameDrawing.tsx';
import { Grid } from './Grid.tsx';
import { Ground } from './Ground.tsx';
import { Heads } from './Heads.tsx';
import { open } from './keys.ts';
import { LimitCell } from './LimitCell.tsx';
import { fetchLater, LawPanel, PasteDialog } from './later.ts';
import { rowsOf } from './rows.ts';
import { AccelerationPlot, ShearPlot } from './SidePlots.tsx';
import { SpokenVerdict } from './SpokenVerdict.tsx';
import { type Choice, shownOf } from './shown.ts';
import { useAxes } from './useAxes.ts';
import { useCursorAtPeak } from './useCursorAtPeak.ts';
import { useLayout } from './useLayout.ts';
import { Verdict } from './Verdict.tsx';
import './page.css';
import './line.css';
import './heads.css';
import './grid.css';
import './drawing.css';

const GroundStack = lazy(() => import('../strip/GroundStack.tsx').then((module) => ({ default: module.GroundStack })));
const SquarePanels = lazy(() =>
  import('../plots/SquarePanels.tsx').then((module) => ({ default: module.SquarePanels })),
);

export interface SheetScreenProps {
  readonly onOpen: () => void;
  readonly onExample: () => void;
}

/** Frame and Response: the two ends of one screen. What is typed, the frame, what it answers; the ground; the motion. */
export function SheetScreen({ onOpen, onExample }: SheetScreenProps) {
  const page = useRef<HTMLDivElement>(null);
  const project = useDocument(effectiveProject);
  const editing = useDocument((state) => state.draft !== null);
  const system = useSession((state) => state.system);
  const selection = useSession((state) => state.selection);
  const status = useResults((state) => state.status);
  const slow = useResults((state) => state.slow);
  const found = useResults((state) => state.answers);
  const arrivedRuns = useResults((state) => state.arrived);
  const faults = useResults((state) => state.faults);
  const chosenStorey = useChosenStorey();
  const chosenMotion = useChosenMotion();
  const [pasted, setPasted] = useState<string | null>(null);
  const [choice, setChoice] = useState<Choice>({});
  const { frame } = project;
  const show = useCallback(
    (narrow: boolean, roomy: boolean) => shownOf({ frame }, faults, choice, narrow, roomy),
    [frame, faults, choice],
  );
  const { layout, columns, shown, free } = useLayout(page, show);
  const [lawOf, setLawOf] = useState<number | null>(null);
  const closeLaw = useCallback(() => setLawOf(null), []);

  const { storeys } = project.frame;
  const empty = storeys.length === 0;
  const heights = useMemo(() => (empty ? [null] : storeys.map(({ height }) => asNumber(height))), [storeys, empty]);
  const stiffnesses = useMemo(() => storeys.map(({ stiffness }) => asNumber(stiffness)), [storeys]);
  const isolated = storeys[0]?.role === 'isolator';
  const rows = useMemo(() => rowsOf(heights, free, isolated), [heights, free, isolated]);
  const height = Math.max(free, rows.total);
  const cell = selection ?? { storey: Math.max(0, chosenStorey), column: empty ? 'height' : 'stiffness' };
  const shownCell = { storey: Math.min(cell.storey, rows.heights.length - 1), column: cell.column };

  // Answers of another number of storeys would stand on the wrong rows.
  const answers = useMemo(
    () => (found === null || found.case.frame.storeys.length !== storeys.length ? null : answerRowsOf(found, system)),
    [found, storeys.length, system],
  );
  const old = status === 'stale' || (status === 'running' && slow);
  const factor = found?.envelope.factor ?? 1;
  const arrived = useMemo(
    () => (slow && answers !== null ? motionDrifts(arrivedRuns, factor, system) : []),
    [slow, answers, arrivedRuns, factor, system],
  );
  const typedLimit = asNumber(project.limits.drift);
  const limit = typedLimit === null ? null : toDisplay(typedLimit, 'percent', system);
  const axes = useAxes(answers, limit, editing);
  const limitX = Math.min(layout.drift.width, ((limit ?? 0) * layout.drift.width) / axes.drift.end);
  // Over the cell stands the name of the column where the limit is near the start of the axis.
  const beside = limitX < (layout.narrow ? 95 : 122);
  const letters = useMemo(
    () => Object.fromEntries(project.motions.map((motion, index) => [motion.name, letterOf(index)])),
    [project.motions],
  );
  const letter = chosenMotion === null ? null : (letters[chosenMotion] ?? null);
  const sway = useMemo(() => {
    const peaks = found?.runs.flatMap(({ run }) => Array.from(run.floors.peakDisplacement)) ?? [];
    return peaks.length === 0
      ? null
      : swayFactor(Math.max(...peaks), rows.scale, bayOf(layout.frame.width, layout.narrow ? 16 : 24).room);
  }, [found, rows.scale, layout]);
  const edit = () =>
    open({
      ground: { storeys: rows.heights.length, columns: [...columns, ...answerColumns(shown.answers)] },
      inputs: columns,
      cell: shownCell,
      ensureStorey,
      openLaw: setLawOf,
    });
  const statistic = { mean: 'Mean', median: 'Median', max: 'Largest' }[answers?.measure ?? 'mean'];
  const tall = rows.total > free + 40;
  useCursorAtPeak();
  useEffect(fetchLater, []);
  // A building taller than the sheet opens at the storey that is shown, not at the roof.
  const opened = useRef(false);
  useLayoutEffect(() => {
    if (!tall || opened.current || page.current === null) return;
    opened.current = true;
    page.current.querySelector(`[data-storey="${shownCell.storey}"]`)?.scrollIntoView({ block: 'center' });
  }, [tall, shownCell.storey]);
  return (
    <div
      ref={page}
      className={`page ${layout.narrow ? 'narrow' : ''} ${layout.sideways ? 'sideways' : ''} ${layout.tight ? 'tight' : ''} ${tall ? 'tall' : ''}`}
      onScroll={(event) => event.currentTarget.classList.toggle('scrolled', event.currentTarget.scrollTop > 0)}
    >
      <div
        className="sheet-page"
        style={{
          width: layout.width,
          ['--tracks' as string]: layout.tracks,
          ['--under-left' as string]: `${layout.frame.x + layout.frame.width - layout.margin}px`,
          ['--under-right' as string]: `${layout.answers.width}px`,
        }}
      >
        <div className="sheet-head">
          <div
            className="cell-line"
            style={{
              left: layout.margin,
              width: layout.narrow
                ? layout.width - 2 * layout.margin
                : layout.frame.x + layout.frame.width - layout.margin,
            }}
          >
            <CellLine project={project} system={system} cell={shownCell} faults={faults} onEdit={edit} />
            <CellTools
              storey={shownCell.storey}
              empty={empty}
              shown={shown}
              onShow={(column, on) => setChoice({ ...choice, [column]: on })}
            />
          </div>
          <div
            className="verdict-place"
            style={
              layout.narrow
                ? { left: layout.margin, width: layout.width - 2 * layout.margin }
                : { left: layout.answers.x, width: layout.answers.width }
            }
          >
            <Verdict letters={letters} onLaw={setLawOf} />
            <SpokenVerdict />
          </div>
          <Heads
            layout={layout}
            columns={columns}
            system={system}
            sway={sway}
            toScale={rows.toScale}
            yielding={shown.answers}
            strengths={answers?.strengths.some((strength) => strength !== null) ?? false}
            suite={
              answers === null || found === null
                ? null
                : `${statistic.toLowerCase()} of ${found.envelope.motions.length}`
            }
            statistic={statistic}
            letter={letter}
            factor={factor}
            driftAxis={axes.drift}
            limit={limit}
            beside={beside}
            shearAxis={answers?.shear ? axes.shear : null}
            accelerationAxis={answers === null ? null : axes.acceleration}
          />
          <div className="limit-place" style={{ left: layout.drift.x }}>
            <LimitCell x={limitX} beside={beside} />
          </div>
        </div>
        <div className={`rows ${old ? 'old' : ''}`} style={{ height }}>
          {empty && <EmptyStart system={system} onOpen={onOpen} onExample={onExample} width={layout.inputs.width} />}
          <div className="grid-place" style={{ left: layout.margin, right: layout.margin }}>
            {empty &&
              [2, 3].map((index) => (
                <div
                  key={index}
                  className="ghost-row"
                  style={{ bottom: rows.total + 50 * (index - 2) }}
                  aria-hidden="true"
                >
                  {index}
                </div>
              ))}
            <Grid
              project={project}
              columns={columns}
              rows={rows}
              lawNames={layout.lawNames}
              signs={layout.signs}
              yielding={shown.answers}
              system={system}
              cell={shownCell}
              chosenStorey={empty ? -1 : chosenStorey}
              answers={answers}
              old={old}
              faults={faults}
              letters={letters}
              panel={lawOf !== null}
              onPaste={setPasted}
              onLaw={setLawOf}
            />
          </div>
          <FrameDrawing
            span={layout.frame}
            rows={rows}
            height={height}
            heights={heights}
            stiffnesses={empty ? [null] : stiffnesses}
            over={old ? [] : (answers?.over ?? [])}
            governing={answers?.governing ?? -1}
            isolated={isolated}
            sway={sway ?? 1}
            system={system}
            ghost={empty}
          />
          <DriftPlot
            span={layout.drift}
            rows={rows}
            height={height}
            axis={axes.drift}
            answers={answers}
            limit={limit}
            standing={old ? 'old' : 'current'}
            arrived={arrived}
            chosenMotion={chosenMotion}
            storeyHeights={heights}
            factor={factor}
            letters={letters}
          />
          {layout.shear !== null && answers !== null && (
            <ShearPlot span={layout.shear} rows={rows} height={height} axis={axes.shear} answers={answers} old={old} />
          )}
          {layout.acceleration !== null && answers !== null && (
            <AccelerationPlot
              span={layout.acceleration}
              rows={rows}
              height={height}
              axis={axes.acceleration}
              answers={answers}
              old={old}
              chosenMotion={chosenMotion}
            />
          )}
        </div>
        <div className="under">
          <Ground margin={layout.margin} />
          <div className="under-panels" style={{ margin: `0 ${layout.margin}px` }}>
            <Boundary part="The ground motion">
              <GroundStack />
            </Boundary>
            <Boundary part="The panels">
              <SquarePanels />
            </Boundary>
          </div>
        </div>
      </div>
      {lawOf !== null && lawOf < storeys.length && (
        <Boundary part="The law">
          <LawPanel storey={lawOf} onClose={closeLaw} />
        </Boundary>
      )}
      {pasted !== null && (
        <Boundary part="The pasted block">
          <PasteDialog
            text={pasted}
            cell={shownCell}
            columns={columns}
            system={system}
            onClose={() => setPasted(null)}
          />
        </Boundary>
      )}
    </div>
  );
}

function asNumber(value: unknown): number | null {
  return typeof value === 'number' ? value : null;
}
