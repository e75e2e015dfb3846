import { useMemo } from 'react';
import type { Table } from '../../core/report/table.ts';
import { roofFirst } from '../../core/report/table.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { type Answers, useResults } from '../../state/results.ts';
import { useChosenMotion } from '../../state/selectors.ts';
import { useSession } from '../../state/session.ts';
import { Plot } from './Plot.tsx';
import { MEASURE_WORDS, type Profile, type ProfileKind, profileOf } from './profile.ts';
import { profilePlot } from './profilePlot.ts';
import { KeyLine, plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import type { Tokens } from './tokens.ts';

export interface StoreyProfileProps {
  readonly kind: ProfileKind;
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
}

/** One answer over the height: each motion, the suite, the limit where it has one. */
export function StoreyProfile({ kind, layout, tokens, system, old }: StoreyProfileProps) {
  const answers = useResults((state) => state.answers);
  const chosen = useChosenMotion();
  const lit = useSession((state) => state.lit);
  const { width, height } = plotSize(layout);
  const profile = useMemo(() => (answers === null ? null : profileOf(kind, answers)), [kind, answers]);
  const nothing = answers !== null && profile !== null && isEmpty(answers, profile);
  const spec = useMemo(
    () =>
      answers === null || profile === null || nothing
        ? null
        : () => profilePlot(profile, answers, lit ?? chosen, { width, height }, tokens, system),
    [answers, profile, nothing, lit, chosen, width, height, tokens, system],
  );
  const length = axisUnitOf('length', system, 0).unit;
  const measure = MEASURE_WORDS[answers?.envelope.measure ?? 'mean'];
  return (
    <SquareFrame
      layout={layout}
      old={old}
      kind={kind}
      words={`level in ${length}${profile?.across ?? ''}`}
      legend={
        <>
          <span>
            <KeyLine stroke="ink" width={2} />
            {measure}
          </span>
          <span>
            <KeyLine stroke="accent" width={1.3} />
            chosen
          </span>
          <span>
            <KeyLine stroke="suite" />
            each motion
          </span>
          {profile !== null && profile.limit !== null && (
            <span>
              <KeyLine stroke="signal" dash="5 2" />
              limit
            </span>
          )}
        </>
      }
      table={answers === null || profile === null || nothing ? null : () => profileTable(profile, answers)}
    >
      {/* A drawing is never left under words that say there is none. */}
      {spec !== null && <Plot spec={spec} label={sentence(profile, answers, system)} old={old} />}
      {spec === null && (
        <p className="nothing quiet small">{nothing ? 'No storey of this frame yields.' : 'No run yet.'}</p>
      )}
    </SquareFrame>
  );
}

/** Whether no storey has such an answer. */
function isEmpty({ runs }: Answers, { of }: Profile): boolean {
  return !runs.some(({ run }) => Array.from(of(run)).some(Number.isFinite));
}

function profileTable(profile: Profile, { envelope, runs, case: from }: Answers): Table {
  const n = from.frame.storeys.length;
  const { quantity, decimals } = profile;
  const measure = MEASURE_WORDS[envelope.measure];
  const column = (key: string, name: string, values: ArrayLike<number> | null) => ({
    key,
    name,
    quantity,
    decimals,
    values: roofFirst(values, n),
  });
  return {
    id: profile.id,
    title: `${profile.name} over the height`,
    columns: [
      { key: 'storey', name: 'Storey', quantity: 'count', values: Array.from({ length: n }, (_, row) => n - row) },
      column('suite', `${measure.charAt(0).toUpperCase()}${measure.slice(1)}`, profile.suite),
      ...runs.map(({ motion, run }, i) => column(`motion${i + 1}`, motion, profile.of(run))),
    ],
  };
}

function sentence(profile: Profile | null, answers: Answers | null, system: System): string {
  if (profile === null || answers === null) return 'Profile: no suite yet';
  const { suite, name, quantity, decimals } = profile;
  if (suite === null) return `${name} over the height: no statistic of the suite yet`;
  const values = Array.from(suite);
  const largest = values.reduce((at, value, i) => (value > (values[at] ?? 0) || !(values[at] >= 0) ? i : at), 0);
  const say = (value: number) =>
    `${printQuantity(value, quantity, system, decimals)}${quantity === 'percent' ? ' percent' : ''}`;
  const limit = profile.limit === null ? '' : `, limit ${say(profile.limit)}`;
  return `${name} over the height: largest in storey ${largest + 1}, ${say(values[largest])}${limit}`;
}
