import type { RecordFault } from '../../../core/motion/reading.ts';
import type { System } from '../../../core/units/quantities.ts';
import type { ReadAnswer } from '../../../state/imports.ts';
import { CautionMark } from '../../controls/Icon.tsx';
import { Preview } from './Preview.tsx';
import type { MendChoice } from './useMend.ts';
import { UNIT_NAMES } from './WhatWasRead.tsx';
import { count, placeWords, sentence } from './words.ts';

export interface StoppedProps {
  readonly answer: ReadAnswer;
  readonly mend: MendChoice;
  readonly system: System;
}

/** What stopped the reading, and the mends that make sense, the best one chosen. */
export function Stopped({ answer, mend, system }: StoppedProps) {
  const { reading } = answer;
  const { fault, choice } = mend;
  const others = reading.faults.slice(1);
  return (
    <>
      <div className="import-stop" role="alert">
        <CautionMark solid size={14} />
        <div>
          <p className="import-stop-what">
            {placeWords(fault)}: {sentence(fault.message).replace(/^./, (first) => fault.message[0] ?? first)}
          </p>
          <p className="quiet">{sentence(fault.detail ?? fault.mend)}</p>
        </div>
      </div>
      <Preview answer={answer} system={system} />
      <fieldset className="import-mends">
        <legend className="import-caption">Choose a mend</legend>
        {fault.choices.map((option) => (
          <label key={option.id} className={option.id === choice ? 'on' : ''}>
            <input
              type="radio"
              name={`mend ${fault.id}`}
              checked={option.id === choice}
              onChange={() => mend.choose(option.id)}
            />
            <span>
              <span className="import-mend-name">{option.label}</span>
              {option.asksValue && (
                <>
                  <input
                    className="field"
                    style={{ width: 96 }}
                    aria-label={[option.label, option.valueUnit ?? reading.unit].filter(Boolean).join(', ')}
                    autoComplete="off"
                    value={mend.typed}
                    onFocus={() => mend.choose(option.id)}
                    onChange={(event) => mend.type(event.target.value)}
                  />
                  <span className="unit">
                    {option.valueUnit ?? (reading.unit === null ? '' : UNIT_NAMES[reading.unit])}
                  </span>
                </>
              )}
              {option.detail !== undefined && <small>{option.detail}</small>}
            </span>
          </label>
        ))}
      </fieldset>
      {mend.alike.length > 0 && (
        <label className="import-for-all">
          <input type="checkbox" checked={mend.forAll} onChange={(event) => mend.setForAll(event.target.checked)} />
          The same for {count(mend.alike.length, 'more value')} of this kind
        </label>
      )}
      {others.length > 0 && <Others faults={others} />}
      <p className="quiet import-kept">
        The file on the disk is not changed. Each mend is kept with the motion and printed with it: the line, what stood
        there and what was taken.
      </p>
    </>
  );
}

/** So many of the other faults are listed here. */
const LISTED = 6;

function Others({ faults }: { readonly faults: readonly RecordFault[] }) {
  return (
    <div className="import-others">
      <h4 className="import-caption">{count(faults.length, 'more fault')} after this one</h4>
      <ul className="small">
        {faults.slice(0, LISTED).map((fault) => (
          <li key={fault.id}>
            {placeWords(fault)}: {fault.message}
          </li>
        ))}
        {faults.length > LISTED && <li>and {faults.length - LISTED} more</li>}
      </ul>
    </div>
  );
}
