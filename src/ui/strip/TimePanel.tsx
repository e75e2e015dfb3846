import { memo, useLayoutEffect, useMemo, useRef } from 'react';
import type { Table } from '../../core/report/table.ts';
import { printQuantity, type Quantity, type System } from '../../core/units/quantities.ts';
import { chooseSquare, chooseTimePanel } from '../plots/choice.ts';
import { PanelMenu } from '../plots/PanelMenu.tsx';
import { Plot } from '../plots/Plot.tsx';
import type { Tokens } from '../plots/tokens.ts';
import type { ShownRun } from '../plots/useShownRun.ts';
import { EnergyKey } from './EnergyKey.tsx';
import { ENERGY_NAMES } from './energyLook.ts';
import { followTime } from './followTime.ts';
import type { Band } from './geometry.ts';
import { endOf, type PanelContent, TIME_PANELS, type TimePanelKind, valueAt } from './panelContent.ts';
import type { TimeScale } from './scale.ts';
import { AROUND, namedLayers, timePlot, unitOfContent } from './timePlot.ts';

export interface TimePanelProps {
  readonly slot: number;
  readonly kind: TimePanelKind;
  readonly content: PanelContent | null;
  readonly shown: ShownRun | null;
  readonly band: Band;
  readonly axisX: number;
  readonly scale: TimeScale;
  readonly tokens: Tokens;
  readonly system: System;
  /** What the computed drift is held against: a ratio, of an isolator a displacement [m]; null where there is none. */
  readonly limit: number | null;
  readonly old: boolean;
}

/** Bars by storey stand as high as their storeys and need no time: they are in a square panel. */
const PER_STOREY = [
  { id: 'per-storey', label: 'Per storey, at the right', run: () => chooseSquare(1, 'storey-energy') },
];

/** One history under the ground motion, on the same time axis, with its name and what it is at the cursor. */
export const TimePanel = memo(function TimePanel(props: TimePanelProps) {
  const { slot, kind, content, shown, band, axisX, scale, tokens, system, old } = props;
  const limit = kind === 'drift' ? props.limit : null;
  const { height } = band;
  const plot = useMemo(
    () => (content === null ? null : { content, scale, height, tokens, system, limit }),
    [content, scale, height, tokens, system, limit],
  );
  const spec = useMemo(() => (plot === null ? null : () => timePlot(plot)), [plot]);
  const name = content?.name ?? TIME_PANELS.find((panel) => panel.kind === kind)?.name ?? '';
  const unit = content === null ? null : unitOfContent(content, system);
  const title = unit === null ? name : `${name}, ${unit.unit}`;
  return (
    <>
      <div className={`time-label ${old ? 'old' : ''}`} style={{ top: band.label }}>
        <PanelMenu
          label={title}
          choices={TIME_PANELS}
          value={kind}
          onChoose={(next) => chooseTimePanel(slot, next)}
          options={kind === 'energy' ? PER_STOREY : undefined}
          table={content === null || shown === null ? null : () => historyTable(content, shown.motion)}
        >
          {title}
        </PanelMenu>
        {plot === null || shown === null ? (
          <p className="quiet small">no run yet</p>
        ) : kind === 'energy' ? (
          <EnergyWords plot={plot} imbalance={shown.run.energy.imbalance} />
        ) : (
          <HistoryWords content={plot.content} system={system} />
        )}
      </div>
      <div
        className="time-plot"
        style={{
          left: axisX - AROUND.left,
          top: band.top - AROUND.above,
          width: scale.width + AROUND.left + AROUND.right,
          height: height + AROUND.above + AROUND.below,
        }}
      >
        <Plot
          spec={spec}
          label={sentence(content, title, system)}
          old={old}
          of={content === null || shown === null ? '' : `${content.kind} ${content.place} ${shown.motion}`}
        />
      </div>
    </>
  );
});

/** A layer below zero by so much of the largest input is in sight: about a pixel. */
const IN_SIGHT = 0.01;

function HistoryWords({ content, system }: { readonly content: PanelContent; readonly system: System }) {
  const now = useRef<HTMLParagraphElement>(null);
  const unit = unitOfContent(content, system);
  const { values, interval, peak, place, quantity } = content;
  useLayoutEffect(() => {
    const print = unitOfContent(content, system);
    return followTime((time) => {
      const { current } = now;
      if (current === null) return;
      const end = endOf(content);
      if (time > end + interval) {
        current.textContent = `nothing after ${printQuantity(end, 'time', system)} s`;
        return;
      }
      const atPeak = quantity === 'percent' && Math.abs(time - peak.time) <= interval / 2;
      current.textContent = `${print.print(valueAt(values, interval, time), print.decimals)} now${atPeak ? ', the peak' : ''}`;
    });
  }, [content, values, interval, peak, quantity, system]);
  return (
    <>
      {place !== null && <p className="quiet small">{place}</p>}
      <p ref={now} className="now small" aria-hidden="true" />
      {quantity !== 'percent' && (
        <p className="quiet small">
          peak {unit.print(peak.value, unit.decimals)} at {printQuantity(peak.time, 'time', system)} s
        </p>
      )}
    </>
  );
}

function EnergyWords({
  plot,
  imbalance,
}: {
  readonly plot: Parameters<typeof timePlot>[0];
  readonly imbalance: number;
}) {
  const below = plot.content.strainBelowZero > IN_SIGHT;
  const named = namedLayers(plot);
  const beside = plot.content.stack.filter(({ part }) => !named.has(part));
  return (
    <>
      {below ? (
        <p className="quiet small">strain below zero: P-Delta,</p>
      ) : (
        <p className="quiet small">input against the sum,</p>
      )}
      <p className="quiet small">apart by {apartWords(imbalance, plot.system)}</p>
      {beside.length > 0 && (
        <p className="layer-key">
          {[...beside].reverse().map(({ part }) => (
            <span key={part}>
              <EnergyKey part={part} />
              {ENERGY_NAMES[part]}
            </span>
          ))}
        </p>
      )}
    </>
  );
}

/** The imbalance in percent with as many decimals as it takes to be seen. */
function apartWords(share: number, system: System): string {
  const least = 1e-5;
  if (share > 0 && share < least / 2) return `under ${printQuantity(least, 'percent', system, 3)} %`;
  return `${printQuantity(share, 'percent', system, share > 0 && share < 1e-4 ? 3 : 2)} % at most`;
}

/** A history shows more figures than a peak: its small values would all read 0. */
const TABLE_DECIMALS: Readonly<Partial<Record<Quantity, number>>> = {
  percent: 4,
  acceleration: 4,
  displacement: 2,
  force: 1,
  energy: 2,
};

function historyTable(content: PanelContent, motion: string): Table {
  const { kind, name, place, quantity, values, interval, stack } = content;
  const energy = kind === 'energy';
  const decimals = TABLE_DECIMALS[quantity];
  const own = { key: 'value', name: energy ? 'Input' : name, quantity, decimals, values: Array.from(values) };
  const below = (i: number, j: number) => (i === 0 ? 0 : stack[i - 1].sum[j]);
  return {
    id: `${kind}-history`,
    title: `${name}${place === null ? '' : `, ${place}`}, under ${motion}`,
    columns: [
      {
        key: 'time',
        name: 'Time',
        quantity: 'time',
        decimals: 3,
        values: Array.from(values, (_, j) => j * interval),
      },
      own,
      ...stack.map(({ part, sum }, i) => ({
        key: part,
        name: `${capital(ENERGY_NAMES[part])}${part === 'strain' && content.strainBelowZero > 0 ? ' (below zero: P-Delta)' : ''}`,
        quantity,
        decimals,
        values: Array.from(sum, (value, j) => value - below(i, j)),
      })),
    ],
  };
}

function capital(words: string): string {
  return `${words.slice(0, 1).toUpperCase()}${words.slice(1)}`;
}

function sentence(content: PanelContent | null, title: string, system: System): string {
  if (content === null) return `${title}: no run yet`;
  const unit = unitOfContent(content, system);
  const place = content.place === null ? '' : `, ${content.place}`;
  return `${title}${place}, over time: peak ${unit.print(content.peak.value, unit.decimals)} at ${printQuantity(content.peak.time, 'time', system)} s${content.strainBelowZero > IN_SIGHT ? '; strain below zero: P-Delta' : ''}`;
}
