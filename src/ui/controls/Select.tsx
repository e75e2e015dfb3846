import type { SelectHTMLAttributes } from 'react';

export interface SelectProps<T extends string>
  extends Omit<SelectHTMLAttributes<HTMLSelectElement>, 'onChange' | 'value'> {
  /** Accessible name. */
  readonly label: string;
  readonly options: readonly { readonly value: T; readonly label: string; readonly disabled?: boolean }[];
  readonly value: T;
  readonly onChange: (value: T) => void;
}

/** The browser's own list, in the look of a field. */
export function Select<T extends string>({ label, options, value, onChange, className = '', ...rest }: SelectProps<T>) {
  return (
    <select
      className={`field ${className}`}
      aria-label={label}
      value={value}
      onChange={(event) => {
        const option = options.find((entry) => entry.value === event.target.value);
        if (option !== undefined) onChange(option.value);
      }}
      {...rest}
    >
      {options.map((option) => (
        <option key={option.value} value={option.value} disabled={option.disabled}>
          {option.label}
        </option>
      ))}
    </select>
  );
}
