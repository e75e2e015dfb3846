import { lazy, useCallback, useEffect, useState } from 'react';

import { useSession } from '../state/session.ts';
import { appKey } from './appKeys.ts';
import { Boundary } from './controls/Boundary.tsx';
import { Cautions } from './foot/Cautions.tsx';
import { Evidence } from './foot/Evidence.tsx';
import { Toast } from './foot/Toast.tsx';
import { FileDrop } from './motions/import/FileDrop.tsx';
import { SheetScreen } from './sheet/SheetScreen.tsx';
import { openExample } from './top/begin.ts';
import { openFile, pickProject, type Refused, saveProject } from './top/files.ts';
import { RefusedDialog } from './top/RefusedDialog.tsx';
import { TopBar } from './top/TopBar.tsx';
import './tokens.css';
import './controls/controls.css';
import './foot/foot.css';
import './app.css';

const MotionsScreen = lazy(() =>
  import('./motions/MotionsScreen.tsx').then((module) => ({ default: module.MotionsScreen })),
);
const Dialogs = lazy(() => import('./dialogs/Dialogs.tsx').then((module) => ({ default: module.Dialogs })));

/** The whole page: bar, screen, footers, dialogs. */
export function App() {
  const screen = useSession((state) => state.screen);
  const theme = useSession((state) => state.theme);
  const [refused, setRefused] = useState<Refused | null>(null);
  const open = () => pickProject(setRefused);
  const openDropped = useCallback((file: File) => void openFile(file, setRefused), []);
  const save = () => saveProject(setRefused);

  useEffect(() => {
    if (theme === 'system') delete document.documentElement.dataset.theme;
    else document.documentElement.dataset.theme = theme;
  }, [theme]);
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) =>
      appKey(event, { open: () => pickProject(setRefused), save: () => saveProject(setRefused) });
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, []);

  return (
    <div className="app">
      <TopBar onOpen={open} onSave={save} />
      <main>
        {screen === 'motions' ? (
          <Boundary part="The motions">
            <MotionsScreen />
          </Boundary>
        ) : (
          <Boundary part="The sheet">
            <SheetScreen onOpen={open} onExample={openExample} />
          </Boundary>
        )}
      </main>
      <footer className="feet" data-part="foot">
        <Evidence />
        <Cautions />
      </footer>
      <Toast />
      <FileDrop openProject={openDropped} />
      <Boundary part="The dialogs">
        <Dialogs />
      </Boundary>
      {refused !== null && <RefusedDialog refused={refused} onClose={() => setRefused(null)} />}
    </div>
  );
}
