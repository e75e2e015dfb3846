import { redo, undo, useDocument } from '../../state/document.ts';
import { setSession, useSession } from '../../state/session.ts';
import { Button, IconButton } from '../controls/Button.tsx';
import { Brand } from './Brand.tsx';
import { openEmpty } from './begin.ts';
import { Steps } from './Steps.tsx';
import { TitleBlock } from './TitleBlock.tsx';
import './top.css';

export interface TopBarProps {
  readonly onOpen: () => void;
  readonly onSave: () => void;
}

/** The bar over every screen. */
export function TopBar({ onOpen, onSave }: TopBarProps) {
  const undoes = useDocument((state) => state.undoes);
  const redoes = useDocument((state) => state.redoes);
  const system = useSession((state) => state.system);
  const theme = useSession((state) => state.theme);
  const dark = theme === 'dark' || (theme === 'system' && window.matchMedia('(prefers-color-scheme: dark)').matches);
  return (
    <header className="top" data-part="bar">
      <Brand />
      <TitleBlock />
      <Steps />
      <div className="tools">
        <IconButton
          icon="undo"
          label={undoes === null ? 'Undo' : `Undo: ${undoes}`}
          keys="Ctrl+Z"
          disabled={undoes === null}
          onClick={undo}
        />
        <IconButton
          icon="redo"
          label={redoes === null ? 'Redo' : `Redo: ${redoes}`}
          keys="Ctrl+Y"
          disabled={redoes === null}
          onClick={redo}
        />
        <IconButton icon="blank" label="New project" onClick={openEmpty} />
        <IconButton icon="open" label="Open a project file" keys="Ctrl+O" onClick={onOpen} />
        <IconButton icon="save" label="Save the project file" keys="Ctrl+S" onClick={onSave} />
        <IconButton icon="record" label="Add records" onClick={() => setSession({ dialog: 'import' })} />
        <IconButton icon="table" label="Tables" onClick={() => setSession({ dialog: 'tables' })} />
        <Button
          size="low"
          className="units"
          aria-label={`Units: ${system === 'si' ? 'kilonewton, metre, millimetre' : 'kip, foot, inch'}. Change`}
          onClick={() => setSession({ system: system === 'si' ? 'us' : 'si' })}
        >
          {system === 'si' ? 'kN, m, mm' : 'kip, ft, in'}
        </Button>
        <IconButton icon="keys" label="Keys" keys="?" onClick={() => setSession({ dialog: 'keys' })} />
        <IconButton
          icon="theme"
          label={dark ? 'Light' : 'Dark'}
          onClick={() => setSession({ theme: dark ? 'light' : 'dark' })}
        />
      </div>
    </header>
  );
}
