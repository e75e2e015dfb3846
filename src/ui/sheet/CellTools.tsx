import { useDocument } from '../../state/document.ts';
import { Button } from '../controls/Button.tsx';
import { Icon } from '../controls/Icon.tsx';
import { Menu } from '../controls/Menu.tsx';
import { add } from './commands.ts';

export interface CellToolsProps {
  readonly storey: number;
  readonly empty: boolean;
  /** Whether the gravity column is shown. */
  readonly gravity: boolean;
  readonly onGravity: (shown: boolean) => void;
}

/** What can be done to the sheet as a whole, beside the line of the chosen cell. */
export function CellTools({ storey, empty, gravity, onGravity }: CellToolsProps) {
  const pDelta = useDocument((state) => state.project.frame.pDelta);
  return (
    <span className="cell-tools">
      <Button kind="text" size="low" onClick={() => add(storey, 'above')} disabled={empty}>
        Add storey
      </Button>
      <Menu
        align="right"
        items={[
          {
            id: 'gravity',
            label: pDelta ? 'Gravity load of each floor' : 'Gravity load: P-Delta is off',
            checked: pDelta && gravity,
            disabled: !pDelta,
            run: () => onGravity(!gravity),
          },
        ]}
      >
        Columns
        <Icon name="down" size={12} />
      </Menu>
    </span>
  );
}
