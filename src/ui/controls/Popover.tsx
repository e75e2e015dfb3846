import { type ReactNode, useEffect, useId, useLayoutEffect, useRef, useState } from 'react';
import { placeBeside } from './placeBeside.ts';

export interface PopoverProps {
  /** What stands in the button. */
  readonly button: ReactNode;
  /** Accessible name of button and panel. */
  readonly label: string;
  readonly className?: string;
  readonly align?: 'left' | 'right';
  /** The controls, or what makes them where one of them closes the panel. */
  readonly children: ReactNode | ((close: () => void) => ReactNode);
}

/** A button with a small panel of controls: Esc or a click elsewhere closes it and the focus goes back to the button. */
export function Popover({ button, label, className = 'button text low', align = 'left', children }: PopoverProps) {
  const [open, setOpen] = useState(false);
  const anchor = useRef<HTMLButtonElement>(null);
  const panel = useRef<HTMLDivElement>(null);
  const id = useId();
  useLayoutEffect(() => {
    if (!open || panel.current === null || anchor.current === null) return;
    panel.current.showPopover();
    placeBeside(panel.current, anchor.current, align);
    panel.current.querySelector<HTMLElement>('button, input, select, a[href]')?.focus();
  }, [open, align]);
  useEffect(() => {
    if (!open) return;
    const outside = (event: PointerEvent) => {
      const target = event.target as Node;
      if (!panel.current?.contains(target) && !anchor.current?.contains(target)) setOpen(false);
    };
    document.addEventListener('pointerdown', outside, true);
    return () => document.removeEventListener('pointerdown', outside, true);
  }, [open]);
  return (
    <>
      <button
        ref={anchor}
        type="button"
        className={className}
        aria-label={label}
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        onClick={() => setOpen(!open)}
      >
        {button}
      </button>
      {open && (
        <div
          ref={panel}
          id={id}
          className="menu popover"
          role="dialog"
          aria-label={label}
          popover="manual"
          onKeyDown={(event) => {
            event.stopPropagation();
            if (event.key !== 'Escape') return;
            setOpen(false);
            anchor.current?.focus();
          }}
        >
          {typeof children === 'function' ? children(() => setOpen(false)) : children}
        </div>
      )}
    </>
  );
}
