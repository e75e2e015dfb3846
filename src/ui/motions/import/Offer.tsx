import { Button } from '../../controls/Button.tsx';
import { pickRecords } from './pick.ts';

/** Nothing is on its way in yet: where records come from. */
export function Offer({ onPaste }: { readonly onPaste: () => void }) {
  return (
    <div className="import-offer">
      <p>
        <b>Drop ground-acceleration records here</b>
      </p>
      <p className="quiet">plain text: one value a line, rows of values, or time and value in columns</p>
      <div className="import-more">
        <Button kind="primary" onClick={pickRecords}>
          Choose files
        </Button>
        <Button onClick={onPaste}>Paste samples</Button>
      </div>
      <p className="quiet small">
        Records stay on this machine. What was read, interval, unit and any warning are shown before anything goes in.
      </p>
    </div>
  );
}
