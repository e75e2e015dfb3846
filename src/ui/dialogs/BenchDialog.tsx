import { useEffect, useMemo, useState } from 'react';
import { effectiveProject, useDocument } from '../../state/document.ts';
import { useResults } from '../../state/results.ts';
import { benchKey, runSchemeBench, stopSchemeBench, useSchemeBench } from '../../state/schemeBench.ts';
import { useChosenMotion } from '../../state/selectors.ts';
import { setSession } from '../../state/session.ts';
import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import { commitOpenDraft } from '../controls/field.ts';
import { letterOf } from '../controls/letters.ts';
import { methodWords } from '../foot/analysisWords.ts';
import { BenchProgress } from './BenchProgress.tsx';
import { BenchTable } from './BenchTable.tsx';
import { methodKey, methodsOnOffer, partsOnOffer, typedParts } from './benchChoice.ts';
import { shortSeconds } from './shortSeconds.ts';
import './bench.css';

/** Schemes and steps side by side for this frame and the chosen motion, so that a choice can be defended. */
export function BenchDialog({ onClose }: { readonly onClose: () => void }) {
  const project = useDocument(effectiveProject);
  const name = useChosenMotion();
  const modes = useResults((state) => state.modes);
  const bench = useSchemeBench((state) => state);
  const index = project.motions.findIndex((motion) => motion.name === name);
  const motion = project.motions[index];
  const { method } = project.analysis;
  const found = useResults((state) => (name === null ? undefined : state.answers?.evidence[name]?.parts));
  const own = motion === undefined ? null : (typedParts(project.analysis, motion.interval) ?? found ?? null);
  const methods = useMemo(() => methodsOnOffer(method), [method]);
  const parts = useMemo(() => partsOnOffer(own), [own]);
  const [withoutMethods, setWithoutMethods] = useState<ReadonlySet<string>>(new Set());
  const [withoutParts, setWithoutParts] = useState<ReadonlySet<number>>(new Set());
  const [refused, setRefused] = useState<string | null>(null);
  const asked = {
    methods: methods.filter((one) => !withoutMethods.has(methodKey(one))),
    parts: parts.filter((one) => !withoutParts.has(one)),
  };
  const old = bench.status !== 'idle' && bench.key !== benchKey();
  const run = () => {
    commitOpenDraft();
    setRefused(runSchemeBench(asked));
  };
  const nothing = asked.methods.length === 0 || asked.parts.length === 0 || name === null;

  // biome-ignore lint/correctness/useExhaustiveDependencies: what is asked is run at once when the panel opens, and only then
  useEffect(() => {
    if (name !== null && (bench.status === 'idle' || bench.status === 'stopped' || old)) run();
    return stopSchemeBench;
  }, []);

  return (
    <Dialog
      title="Compare schemes"
      onClose={onClose}
      width={1120}
      foot={
        <>
          <span className="quiet small foot-words">
            Use this sets scheme and step of the analysis for every motion; undo takes it back.
          </span>
          <Button onClick={() => setSession({ dialog: 'evidence' })}>Evidence</Button>
          <Button kind="primary" onClick={onClose}>
            Close
          </Button>
        </>
      }
    >
      <div className="bench">
        <div className="bench-ask">
          <fieldset>
            <legend>Schemes</legend>
            {methods.map((one) => (
              <Check
                key={methodKey(one)}
                label={methodWords(one)}
                checked={!withoutMethods.has(methodKey(one))}
                onChange={() => setWithoutMethods(toggled(withoutMethods, methodKey(one)))}
              />
            ))}
          </fieldset>
          <fieldset>
            <legend>Steps</legend>
            {parts.map((one) => (
              <Check
                key={one}
                label={stepWords(one, motion?.interval)}
                checked={!withoutParts.has(one)}
                onChange={() => setWithoutParts(toggled(withoutParts, one))}
              />
            ))}
          </fieldset>
        </div>
        <div className="bench-line">
          {bench.status === 'running' ? (
            <Button size="medium" onClick={stopSchemeBench}>
              Stop
            </Button>
          ) : (
            <Button size="medium" disabled={nothing} onClick={run}>
              {bench.status === 'idle' ? 'Run' : 'Run again'}
            </Button>
          )}
          <BenchProgress
            bench={bench}
            of={motion === undefined ? null : `${letterOf(index)}, ${motion.name}`}
            refused={refused}
            old={old}
          />
        </div>
        {bench.rows.length > 0 && (
          <>
            <BenchTable bench={bench} modes={modes} inUse={own === null ? null : { method, parts: own }} old={old} />
            <p className="quiet small">
              Damping added: what the scheme gives a free vibration of the mode beside the physical damping, as a ratio
              of critical; below zero: the scheme takes less than the physical damping.
            </p>
          </>
        )}
      </div>
    </Dialog>
  );
}

function stepWords(parts: number, interval: number | undefined): string {
  const share = parts === 1 ? 'the interval' : `1/${parts}`;
  return interval === undefined ? share : `${share}, ${shortSeconds(interval / parts)} s`;
}

function toggled<T>(set: ReadonlySet<T>, entry: T): ReadonlySet<T> {
  const next = new Set(set);
  if (!next.delete(entry)) next.add(entry);
  return next;
}

function Check({
  label,
  checked,
  onChange,
}: {
  readonly label: string;
  readonly checked: boolean;
  readonly onChange: () => void;
}) {
  return (
    <label className="check">
      <input type="checkbox" checked={checked} onChange={onChange} />
      {label}
    </label>
  );
}
