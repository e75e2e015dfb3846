import { type ReactNode, useEffect, useId, useRef } from 'react';
import { IconButton } from './Button.tsx';
import { focusSheet } from './focusSheet.ts';

export interface DialogProps {
  readonly title: string;
  /** Called by Esc, by the cross and by a click beside the dialog (where `sticky` is not set). */
  readonly onClose: () => void;
  /** [px] */
  readonly width?: number;
  /** Buttons at the foot, the main one last. */
  readonly foot?: ReactNode;
  /** A click beside it does not close it: for dialogs that hold unsaved answers. */
  readonly sticky?: boolean;
  readonly children: ReactNode;
}

const FIRST_STOP = '.dialog-body :is(input, select, textarea, button):not(:disabled):not([tabindex="-1"])';
const MAIN_BUTTON = '.dialog-foot button:last-of-type:not(:disabled)';

/** A modal dialog: shown while it is mounted. The browser's own element traps the focus; it goes back to where it came from. */
export function Dialog({ title, onClose, width = 560, foot, sticky = false, children }: DialogProps) {
  const element = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const dialog = element.current;
    const before = document.activeElement;
    if (dialog !== null && !dialog.open) {
      dialog.showModal();
      // The browser would take the cross, which stands first: start at the first field, else at the main button.
      // Where a wrong answer would be a wrong number, the dialog names the button that does nothing.
      const named = dialog.querySelector<HTMLElement>('[data-first]');
      const first =
        named ?? dialog.querySelector<HTMLElement>(FIRST_STOP) ?? dialog.querySelector<HTMLElement>(MAIN_BUTTON);
      first?.focus();
    }
    // What held the focus may be taken out (a step of the dialog is done): the keys must still reach the dialog.
    const keep = new MutationObserver(() => {
      if (dialog?.open && document.activeElement === document.body) dialog.focus();
    });
    if (dialog !== null) keep.observe(dialog, { childList: true, subtree: true });
    return () => {
      keep.disconnect();
      dialog?.close();
      if (before instanceof HTMLElement || before instanceof SVGElement) before.focus();
      // What opened it may be gone with what was done in it, now or once the page is drawn again.
      const lost = () => document.activeElement === document.body || document.activeElement === null;
      if (lost()) focusSheet();
      requestAnimationFrame(() => {
        if (lost()) focusSheet();
      });
    };
  }, []);
  return (
    <dialog
      ref={element}
      className="dialog"
      tabIndex={-1}
      style={{ width }}
      aria-labelledby={heading}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (!sticky && event.target === element.current) onClose();
      }}
      onKeyDown={(event) => event.stopPropagation()}
    >
      <header className="dialog-head">
        <h2 id={heading}>{title}</h2>
        <IconButton icon="close" label="Close" keys="Esc" onClick={onClose} />
      </header>
      <div className="dialog-body">{children}</div>
      {foot !== undefined && <footer className="dialog-foot">{foot}</footer>}
    </dialog>
  );
}
