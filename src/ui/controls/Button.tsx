import type { ButtonHTMLAttributes } from 'react';
import { Icon, type IconName } from './Icon.tsx';

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  readonly kind?: 'plain' | 'primary' | 'text';
  /** Height 32, 28 or 24 px. */
  readonly size?: 'high' | 'medium' | 'low';
}

export function Button({ kind = 'plain', size = 'high', className = '', ...rest }: ButtonProps) {
  return <button type="button" className={`button ${kind} ${size} ${className}`} {...rest} />;
}

export interface IconButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  readonly icon: IconName;
  /** Accessible name; shown on hover and on focus, with `keys` behind it. */
  readonly label: string;
  readonly keys?: string;
  readonly size?: 'high' | 'low';
}

export function IconButton({ icon, label, keys, size = 'high', className = '', ...rest }: IconButtonProps) {
  return (
    <button
      type="button"
      className={`icon-button ${size} ${className}`}
      aria-label={label}
      data-tip={keys === undefined ? label : `${label}  ${keys}`}
      {...rest}
    >
      <Icon name={icon} />
    </button>
  );
}
