import { useCallback, useMemo, useRef } from 'react';
import { printQuantity, printTyped } from '../../core/units/quantities.ts';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { samplesOf } from '../../state/samples.ts';
import { useChosenMotion } from '../../state/selectors.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { letterOf } from '../controls/letters.ts';
import { chipRows, MotionChooser } from '../motions/MotionChooser.tsx';
import { usePanelChoice } from '../plots/choice.ts';
import { useTokens } from '../plots/tokens.ts';
import { useNarrow } from '../plots/useNarrow.ts';
import { type ShownRun, useShownRun } from '../plots/useShownRun.ts';
import { useSize } from '../plots/useSize.ts';
import { type Band, stackGeometry } from './geometry.ts';
import { MotionStrip } from './MotionStrip.tsx';
import { Playing } from './Playing.tsx';
import { contentOf, endOf, valueAt } from './panelContent.ts';
import { timeScale } from './scale.ts';
import { TimeCursor } from './TimeCursor.tsx';
import { TimePanel } from './TimePanel.tsx';
import { unitOfContent } from './timePlot.ts';
import { shownRange } from './timeRange.ts';
import { type PointerPlace, usePointer } from './usePointer.ts';
import { useTimeAxis } from './useTimeAxis.ts';
import './strip.css';

const FIRST_SIZE = { width: 868, height: 384 };

/** Below the ground every pixel column belongs to an instant: the motion, and what it does to the building in time. */
export function GroundStack() {
  const stack = useRef<HTMLElement>(null);
  const readout = useRef<HTMLDivElement>(null);
  const narrow = useNarrow();
  const size = useSize(stack) ?? FIRST_SIZE;
  const system = useSession((state) => state.system);
  const chosenRange = useSession((state) => state.range);
  const litName = useSession((state) => state.lit);
  const project = useDocument(effectiveProject);
  const motion = useChosenMotion();
  const kinds = usePanelChoice((choice) => choice.time);
  const tokens = useTokens();
  const { shown, old } = useShownRun();
  const axis = useTimeAxis(project, motion, shown);

  const geometry = useMemo(
    () => stackGeometry(size.width, narrow ? 0 : size.height, narrow, chipRows(project.motions.length)),
    [size.width, size.height, narrow, project.motions.length],
  );
  const { axisX, axisWidth, strip, panels, numbers } = geometry;
  const bottom = (panels.at(-1)?.top ?? 0) + (panels.at(-1)?.height ?? 0);
  const scale = useMemo(
    () => timeScale(shownRange(chosenRange, axis.end), axisWidth),
    [chosenRange, axis.end, axisWidth],
  );
  const contents = useMemo(
    () =>
      panels.map((_, slot) =>
        shown === null
          ? null
          : contentOf(kinds[slot], shown.run, shown.storey, shown.heights, shown.answers.envelope.isolator !== null),
      ),
    [panels, kinds, shown],
  );
  const limits = shown?.answers.envelope;
  const limit = shown === null ? null : driftLimit(shown);
  const lit = useMemo(() => {
    const entry = litName === motion ? undefined : project.motions.find(({ name }) => name === litName);
    const samples = entry && samplesOf(entry.samples);
    if (!entry || !samples || typeof entry.scale !== 'number') return null;
    return { samples, interval: entry.interval, factor: entry.scale };
  }, [litName, motion, project.motions]);
  const ended = useMemo(() => {
    const ending = shown?.run.ending ?? null;
    if (ending === null) return null;
    const where = ending.storey >= 0 ? `, storey ${ending.storey + 1}` : '';
    return { time: ending.time, words: `${ending.status} at ${printQuantity(ending.time, 'time', 'si')} s${where}` };
  }, [shown]);
  const keys = useMemo(
    () => ({
      end: axis.end,
      step: axis.step,
      peak: shown === null ? null : (shown.run.storeys.peakTime[shown.storey] ?? null),
    }),
    [axis.end, axis.step, shown],
  );

  const letter = axis.entry === null ? '' : letterOf(axis.index);
  const hover = useCallback(
    (place: PointerPlace | null) => {
      const label = readout.current;
      if (label === null) return;
      const slot =
        place === null ? -1 : panels.findIndex(({ top, height }) => place.y >= top && place.y <= top + height);
      const onStrip = place !== null && place.y >= strip.top && place.y <= strip.top + strip.height;
      const time = place === null ? 0 : Math.max(scale.range[0], Math.min(scale.range[1], scale.time(place.x)));
      const seconds = `${printQuantity(time, 'time', system)} s`;
      const content = contents[slot] ?? null;
      let words = '';
      if (content !== null && time <= endOf(content) + content.interval) {
        const unit = unitOfContent(content, system);
        const value = unit.print(valueAt(content.values, content.interval, time), unit.decimals);
        words = [
          seconds,
          `${value} ${unit.unit}`,
          content.kind === 'energy' ? 'input' : content.place,
          letter,
          old ? 'last run' : '',
        ]
          .filter((word) => word !== null && word !== '')
          .join(', ');
      } else if (onStrip && axis.samples !== null && axis.entry !== null && axis.scale !== null) {
        const value =
          time > axis.lastSample + axis.entry.interval
            ? 0
            : axis.scale * valueAt(axis.samples, axis.entry.interval, time);
        words = `${seconds}, ${printQuantity(value, 'acceleration', system, 3)} g, ${letter}`;
      }
      label.hidden = words === '';
      if (words === '' || place === null) return;
      label.textContent = words;
      const left = axisX + place.x + 14;
      const over = left + label.offsetWidth > axisX + scale.width;
      label.style.transform = `translate(${Math.round(over ? axisX + place.x - 14 - label.offsetWidth : left)}px, ${Math.round(place.y - 30)}px)`;
    },
    [panels, strip, scale, contents, axis, axisX, system, letter, old],
  );
  usePointer(stack, axisX, scale, axis.end, hover);

  const litEntry = project.motions.find(({ name }) => name === litName) ?? axis.entry;
  return (
    <section
      ref={stack}
      className="time-stack"
      data-part="strip"
      aria-label="Ground motion and histories"
      style={{ height: narrow ? geometry.height : undefined }}
    >
      {axis.lastSample < scale.range[1] && axis.entry !== null && (
        <FreeVibration
          geometry={geometry}
          panels={shown === null ? [] : panels}
          x={Math.max(0, scale.x(axis.lastSample))}
        />
      )}
      <TimeCursor axisX={axisX} scale={scale} height={bottom} keys={keys} />
      <div className="time-label" style={{ top: strip.label }}>
        <b>Ground acceleration, g</b>
        {litEntry === null ? (
          <>
            <p className="quiet small">no motion in use</p>
            <Button size="low" className="add-records" onClick={() => setSession({ dialog: 'import' })}>
              Add records
            </Button>
          </>
        ) : (
          <>
            <p className="quiet small name" title={litEntry.name}>
              {litEntry.name}, {factorWords(litEntry.scale)}
              {!litEntry.used && ', left out'}
            </p>
            <MotionChooser motions={project.motions} chosen={motion} incomplete={limits?.incomplete ?? []} />
            <Playing end={axis.end} />
          </>
        )}
      </div>
      <div className="time-strip" style={{ left: axisX, width: axisWidth }}>
        <MotionStrip axis={axis} band={strip} scale={scale} system={system} lit={lit} ended={ended} old={old} />
        <svg className="time-numbers" style={{ top: numbers - 14 }} width={axisWidth} height="18" aria-hidden="true">
          {scale.ticks.at.map((time, i) => (
            <text key={time} x={scale.x(time)} y="14" className="middle">
              {printQuantity(time, 'time', system, scale.ticks.decimals)}
              {i === scale.ticks.at.length - 1 && ' s'}
            </text>
          ))}
        </svg>
      </div>
      {panels.map((band, slot) => (
        <TimePanel
          key={band.top}
          slot={slot}
          kind={kinds[slot]}
          content={contents[slot]}
          shown={shown}
          band={band}
          axisX={axisX}
          scale={scale}
          tokens={tokens}
          system={system}
          limit={limit}
          old={old}
        />
      ))}
      <div ref={readout} className="time-readout" hidden aria-hidden="true" />
    </section>
  );
}

/** What the drift of the shown storey may reach: a ratio, of an isolator its displacement [m]; null where there is none. */
function driftLimit({ storey, answers: { envelope } }: ShownRun): number | null {
  if (storey === 0 && envelope.isolator !== null) return envelope.isolator.limit;
  return envelope.limit / envelope.factor;
}

function factorWords(scale: unknown): string {
  return typeof scale === 'number' ? `× ${printTyped(scale, 'ratio', 'si')}` : 'factor not typed';
}

/** What comes after the last sample, shaded through all panels. */
function FreeVibration({
  geometry: { axisX, axisWidth, strip },
  panels,
  x,
}: {
  readonly geometry: ReturnType<typeof stackGeometry>;
  /** Those that show a history. */
  readonly panels: readonly Band[];
  readonly x: number;
}) {
  if (x >= axisWidth) return null;
  return [strip, ...panels].map(({ top, height }) => (
    <i key={top} className="free-vibration" style={{ left: axisX + x, width: axisWidth - x, top, height }} />
  ));
}
