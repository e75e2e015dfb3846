import { type KeyboardEvent, type ReactNode, useEffect, useId, useLayoutEffect, useRef, useState } from 'react';
import { Icon } from './Icon.tsx';
import { placeBeside } from './placeBeside.ts';

export interface MenuItem {
  readonly id: string;
  readonly label: ReactNode;
  /** Keys that do the same, shown at the right. */
  readonly keys?: string;
  readonly disabled?: boolean;
  /** Set on items that are switches. */
  readonly checked?: boolean;
  /** Stands apart from what is above it. */
  readonly apart?: boolean;
  readonly run: () => void;
}

export interface MenuProps {
  /** What stands in the button. */
  readonly children: ReactNode;
  /** Accessible name of the button where its content is no text. */
  readonly label?: string;
  readonly items: readonly MenuItem[];
  readonly className?: string;
  readonly align?: 'left' | 'right';
  readonly tabIndex?: number;
}

/** A button that opens a list of commands: arrows, Home, End, first letters, Enter or Space, Esc; the focus goes back to the button. */
export function Menu({ children, label, items, className = 'button text low', align = 'left', tabIndex }: MenuProps) {
  const [open, setOpen] = useState(false);
  const button = useRef<HTMLButtonElement>(null);
  const id = useId();
  return (
    <>
      <button
        ref={button}
        type="button"
        className={className}
        aria-label={label}
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        tabIndex={tabIndex}
        onClick={() => setOpen(!open)}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown') return;
          event.preventDefault();
          event.stopPropagation();
          setOpen(true);
        }}
      >
        {children}
      </button>
      {open && button.current !== null && (
        <MenuList
          id={id}
          anchor={button.current}
          label={label}
          items={items}
          align={align}
          onClose={() => setOpen(false)}
        />
      )}
    </>
  );
}

interface MenuListProps {
  readonly id?: string;
  readonly anchor: Element;
  readonly label?: string;
  readonly items: readonly MenuItem[];
  readonly align: 'left' | 'right';
  readonly onClose: () => void;
}

/** The list alone, for menus opened by something other than a button. */
function MenuList({ id, anchor, label, items, align, onClose }: MenuListProps) {
  const list = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    const element = list.current;
    if (element === null) return;
    element.showPopover();
    placeBeside(element, anchor, align);
    const rows = element.querySelectorAll<HTMLElement>('[role^="menuitem"]');
    rows[0]?.focus();
  }, [anchor, align]);
  useEffect(() => {
    const outside = (event: PointerEvent) => {
      const target = event.target as Node;
      if (!list.current?.contains(target) && !anchor.contains(target)) onClose();
    };
    document.addEventListener('pointerdown', outside, true);
    window.addEventListener('resize', onClose);
    return () => {
      document.removeEventListener('pointerdown', outside, true);
      window.removeEventListener('resize', onClose);
    };
  }, [anchor, onClose]);

  const leave = () => {
    onClose();
    if (anchor instanceof HTMLElement) anchor.focus();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const rows = [...(list.current?.querySelectorAll<HTMLElement>('[role^="menuitem"]') ?? [])];
    const at = rows.indexOf(document.activeElement as HTMLElement);
    const go = (index: number) => rows[(index + rows.length) % rows.length]?.focus();
    event.stopPropagation();
    if (event.key === 'ArrowDown') go(at + 1);
    else if (event.key === 'ArrowUp') go(at - 1);
    else if (event.key === 'Home') go(0);
    else if (event.key === 'End') go(-1);
    else if (event.key === 'Escape') leave();
    else if (event.key === 'Tab') return leave();
    else if (event.key.length === 1 && event.key !== ' ') {
      const letter = event.key.toLowerCase();
      const ahead = rows.map((_, step) => (at + 1 + step) % rows.length);
      const hit = ahead.find((index) => rows[index]?.textContent?.trim().toLowerCase().startsWith(letter));
      if (hit !== undefined) go(hit);
    } else return;
    event.preventDefault();
  };

  return (
    <div
      ref={list}
      id={id}
      className="menu"
      role="menu"
      aria-label={label}
      popover="manual"
      tabIndex={-1}
      onKeyDown={onKeyDown}
    >
      {items.map((item) => (
        <MenuRow
          key={item.id}
          item={item}
          onChoose={() => {
            if (item.disabled) return;
            leave();
            item.run();
          }}
        />
      ))}
    </div>
  );
}

function MenuRow({ item, onChoose }: { readonly item: MenuItem; readonly onChoose: () => void }) {
  const keys = item.keys !== undefined && <span className="menu-keys">{item.keys}</span>;
  const className = item.apart ? 'apart' : undefined;
  if (item.checked === undefined) {
    return (
      <button
        type="button"
        role="menuitem"
        className={className}
        aria-disabled={item.disabled}
        tabIndex={-1}
        onClick={onChoose}
      >
        <span>{item.label}</span>
        {keys}
      </button>
    );
  }
  return (
    <button
      type="button"
      role="menuitemcheckbox"
      className={className}
      aria-checked={item.checked}
      aria-disabled={item.disabled}
      tabIndex={-1}
      onClick={onChoose}
    >
      <span className="menu-check">{item.checked && <Icon name="check" size={12} />}</span>
      <span>{item.label}</span>
      {keys}
    </button>
  );
}
