import { Button } from '../controls/Button.tsx';
import { Dialog } from '../controls/Dialog.tsx';
import type { Refused } from './files.ts';

/** Everything that stands in the way of opening or saving a project. The document stays as it was. */
export function RefusedDialog({ refused, onClose }: { readonly refused: Refused; readonly onClose: () => void }) {
  const { title, faults } = refused;
  return (
    <Dialog
      title={title}
      width={640}
      onClose={onClose}
      foot={
        <Button kind="primary" onClick={onClose}>
          Close
        </Button>
      }
    >
      <p className="quiet">
        {faults.length === 1 ? 'One thing stands' : `${faults.length} things stand`} in the way. Your document is as it
        was.
      </p>
      <ul className="fault-list">
        {faults.map((fault) => (
          <li key={fault.where + fault.code}>
            <b>{fault.where}</b>
            <span>{fault.message}</span>
            <span className="quiet">{fault.mend}</span>
          </li>
        ))}
      </ul>
    </Dialog>
  );
}
