import type { Table } from '../../core/report/table.ts';
import { useSession } from '../../state/session.ts';
import { Dialog } from '../controls/Dialog.tsx';
import { TableView } from './TableView.tsx';

/** The numbers of a plot. */
export function PlotTable({ table, onClose }: { readonly table: Table; readonly onClose: () => void }) {
  const system = useSession((state) => state.system);
  return (
    <Dialog title={table.title} onClose={onClose} width={Math.max(360, 120 * table.columns.length + 64)}>
      <TableView table={table} system={system} height={440} />
    </Dialog>
  );
}
