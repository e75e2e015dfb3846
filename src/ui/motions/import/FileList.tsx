import { type ImportFile, removeRecord, showRecord } from '../../../state/importQueue.ts';
import { Button, IconButton } from '../../controls/Button.tsx';
import { CautionMark, Icon } from '../../controls/Icon.tsx';
import { pickRecords } from './pick.ts';
import { count, shortWords, standingOf } from './words.ts';

export interface FileListProps {
  readonly files: readonly ImportFile[];
  readonly shown: string | null;
  readonly onPaste: () => void;
}

/** The files on their way in, each with how far it is. */
export function FileList({ files, shown, onPaste }: FileListProps) {
  return (
    <nav className="import-files" aria-label="Files">
      <h3 className="import-caption">{count(files.length, 'file')}</h3>
      <ul>
        {files.map((file) => (
          <li key={file.id} className={file.id === shown ? 'on' : ''}>
            <button
              type="button"
              className="import-file"
              aria-current={file.id === shown ? 'true' : undefined}
              onClick={() => showRecord(file.id)}
            >
              <span className="import-file-name" title={file.file}>
                {file.file}
              </span>
              <span className={`small ${tone(file)}`}>{shortWords(file)}</span>
            </button>
            <Mark file={file} />
            <IconButton
              icon="close"
              size="low"
              className="import-remove"
              label={`Take ${file.file} off the list`}
              onClick={() => removeRecord(file.id)}
            />
          </li>
        ))}
      </ul>
      <div className="import-more">
        <Button size="low" onClick={pickRecords}>
          More files
        </Button>
        <Button size="low" onClick={onPaste}>
          Paste samples
        </Button>
      </div>
    </nav>
  );
}

function tone(file: ImportFile): string {
  const standing = standingOf(file);
  return standing === 'stopped' || standing === 'failed' ? 'import-stopped-words' : 'quiet';
}

function Mark({ file }: { readonly file: ImportFile }) {
  const standing = standingOf(file);
  return (
    <span className="import-mark">
      {(standing === 'stopped' || standing === 'failed') && <CautionMark solid size={14} />}
      {(standing === 'look' || standing === 'asks') && <CautionMark />}
      {standing === 'ready' && <Icon name="check" size={14} />}
    </span>
  );
}
