import { lazy, Suspense } from 'react';
import { setSession, useSession } from '../../state/session.ts';
import './dialogs.css';

const AnalysisDialog = lazy(() =>
  import('./AnalysisDialog.tsx').then((module) => ({ default: module.AnalysisDialog })),
);
const EvidenceDialog = lazy(() =>
  import('./EvidenceDialog.tsx').then((module) => ({ default: module.EvidenceDialog })),
);
const BenchDialog = lazy(() => import('./BenchDialog.tsx').then((module) => ({ default: module.BenchDialog })));
const TablesDialog = lazy(() => import('./TablesDialog.tsx').then((module) => ({ default: module.TablesDialog })));
const ImportDialog = lazy(() =>
  import('../motions/ImportDialog.tsx').then((module) => ({ default: module.ImportDialog })),
);
const KeysDialog = lazy(() => import('./KeysDialog.tsx').then((module) => ({ default: module.KeysDialog })));

const close = () => setSession({ dialog: 'none' });

/** The dialog that is open, if any. Each comes with its own part of the script when it is first opened. */
export function Dialogs() {
  const dialog = useSession((state) => state.dialog);
  return (
    <Suspense fallback={null}>
      {dialog === 'analysis' && <AnalysisDialog onClose={close} />}
      {dialog === 'evidence' && <EvidenceDialog onClose={close} />}
      {dialog === 'bench' && <BenchDialog onClose={close} />}
      {dialog === 'import' && <ImportDialog onClose={close} />}
      {dialog === 'tables' && <TablesDialog onClose={close} />}
      {dialog === 'keys' && <KeysDialog onClose={close} />}
    </Suspense>
  );
}
