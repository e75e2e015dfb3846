import { type ReactNode, useState } from 'react';
import type { Table } from '../../core/report/table.ts';
import { Icon } from '../controls/Icon.tsx';
import { Menu, type MenuItem } from '../controls/Menu.tsx';
import { PlotTable } from './PlotTable.tsx';

export interface PanelMenuProps<K extends string> {
  /** Name of what is shown, with its unit. */
  readonly children: ReactNode;
  /** Accessible name: what is shown, in words. */
  readonly label: string;
  readonly choices: readonly { readonly kind: K; readonly name: string }[];
  readonly value: K;
  readonly onChoose: (kind: K) => void;
  /** What can be chosen of the panel that is shown. */
  readonly options?: readonly MenuItem[];
  /** The numbers behind the plot; null while there are none. */
  readonly table: (() => Table) | null;
}

/** The head of a panel: its name, which opens the choice of what it shows, and its numbers as a table. */
export function PanelMenu<K extends string>({
  children,
  label,
  choices,
  value,
  onChoose,
  options = [],
  table,
}: PanelMenuProps<K>) {
  const [shown, setShown] = useState<Table | null>(null);
  return (
    <>
      <Menu
        className="panel-name"
        label={`${label}: choose what is shown`}
        items={[
          ...choices.map(({ kind, name }) => ({
            id: kind,
            label: name,
            checked: kind === value,
            run: () => onChoose(kind),
          })),
          ...options.map((option, i) => ({ ...option, apart: i === 0 })),
          {
            id: 'table',
            label: 'Show as table',
            apart: true,
            disabled: table === null,
            run: () => table !== null && setShown(table()),
          },
        ]}
      >
        <b>{children}</b>
        <Icon name="down" size={12} />
      </Menu>
      {shown !== null && <PlotTable table={shown} onClose={() => setShown(null)} />}
    </>
  );
}
