import type { Fault } from '../../../core/fault.ts';
import { documentStore } from '../../../state/document.ts';
import { answerRecord, type ImportFile, importStore } from '../../../state/importQueue.ts';
import { Button } from '../../controls/Button.tsx';
import { CautionMark } from '../../controls/Icon.tsx';
import { letterOf } from '../../controls/letters.ts';
import { count, placeWords, realMinus, sentence } from './words.ts';

/** Warnings of a file that was read, a file that is there twice, and the mends made so far. */
export function ThingsToLookAt({ file }: { readonly file: ImportFile }) {
  const reading = file.answer?.reading;
  if (reading === undefined) return null;
  const warnings: readonly Fault[] = [...reading.warnings, ...twice(file)];
  return (
    <>
      {warnings.length > 0 && (
        <section className="import-look" aria-label="To look at">
          <h4 className="import-caption">{count(warnings.length, 'thing')} to look at</h4>
          <ul>
            {warnings.map((warning) => (
              <li key={warning.code}>
                <CautionMark />
                <span>
                  <b>{sentence(realMinus(`${placeWords(warning)}: ${warning.message}`))}</b> {sentence(warning.mend)}
                </span>
              </li>
            ))}
          </ul>
        </section>
      )}
      {reading.mends.length > 0 && (
        <section className="import-look" aria-label="Mends">
          <h4 className="import-caption">{count(reading.mends.length, 'mend')} made</h4>
          <ul>
            {reading.mends.map((mend) => (
              <li key={`${mend.line} ${mend.was}`} className="plain">
                <span>
                  {mend.line > 0 && `Line ${mend.line}: `}
                  {mend.was}, taken as {mend.is}: {sentence(mend.why)}
                </span>
              </li>
            ))}
          </ul>
          <Button
            size="low"
            onClick={() => {
              const { mends: _, ...rest } = file.answers;
              answerRecord(file.id, rest);
            }}
          >
            Take the mends back
          </Button>
        </section>
      )}
    </>
  );
}

/** The same bytes among the motions of the project, or among the files of the list. */
function twice({ id, answer }: ImportFile): Fault[] {
  const digest = answer?.reading.motion?.origin.digest;
  if (digest === undefined) return [];
  const { motions } = documentStore.getState().project;
  const at = motions.findIndex(({ origin }) => origin?.digest === digest);
  const other = importStore
    .getState()
    .files.find((file) => file.id < id && file.answer?.reading.motion?.origin.digest === digest);
  const where =
    at >= 0 ? `among the motions as ${letterOf(at)}, ${motions[at].name}` : other && `in this list as ${other.file}`;
  if (where === undefined) return [];
  return [
    {
      code: 'twice',
      where: 'file',
      message: `it is already ${where}`,
      mend: 'Take it off the list unless it shall count twice',
    },
  ];
}
