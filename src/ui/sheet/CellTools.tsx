import { useDocument } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { Icon } from '../controls/Icon.tsx';
import { Menu } from '../controls/Menu.tsx';
import { add } from './commands.ts';
import type { Foldable, Shown } from './shown.ts';

export interface CellToolsProps {
  readonly storey: number;
  readonly empty: boolean;
  readonly shown: Shown;
  readonly onShow: (column: Foldable, shown: boolean) => void;
}

/** What can be done to the sheet as a whole, beside the line of the chosen cell. */
export function CellTools({ storey, empty, shown, onShow }: CellToolsProps) {
  const { pDelta, storeys } = useDocument((state) => state.project.frame);
  const yields = storeys.some(({ law }) => law.kind !== 'elastic');
  const item = (id: Foldable, label: string, disabled = false) => ({
    id,
    label,
    checked: !disabled && shown[id],
    disabled,
    run: () => onShow(id, !shown[id]),
  });
  return (
    <span className="cell-tools">
      <Button kind="text" size="low" onClick={() => add(storey, 'above')} disabled={empty}>
        Add storey
      </Button>
      <Menu
        align="right"
        items={[
          item('hardening', 'Hardening'),
          item('gravity', pDelta ? 'Gravity load of each floor' : 'Gravity load: P-Delta is off', !pDelta),
          item('damper', 'Damper: force at 1 m/s, exponent'),
          item(
            'answers',
            yields ? 'Ductility and residual drift' : 'Ductility and residual drift: no storey yields',
            !yields,
          ),
        ]}
      >
        Columns{shown.hidden > 0 && `, ${shown.hidden} hidden`}
        <Icon name="down" size={12} />
      </Menu>
    </span>
  );
}
