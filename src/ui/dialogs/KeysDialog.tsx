import { Dialog } from '../controls/Dialog.tsx';

interface KeyGroup {
  readonly title: string;
  /** Keys that do a thing, and what they do. */
  readonly rows: readonly (readonly [keys: readonly string[], does: string])[];
}

const GROUPS: readonly KeyGroup[] = [
  {
    title: 'On the sheet',
    rows: [
      [['Arrows'], 'move'],
      [['Tab', 'Shift+Tab'], 'right, left; out of the sheet after the last column'],
      [['Enter', 'Shift+Enter'], 'commit; one storey down, up'],
      [['F2', 'or type'], 'edit'],
      [['Esc', 'Delete'], 'give up the edit; clear'],
      [['Shift+Arrows'], 'extend the block'],
      [['Ctrl+Arrows'], 'to the edge'],
      [['Ctrl+Home', 'Ctrl+End'], 'roof, ground'],
      [['Ctrl+C', 'Ctrl+X', 'Ctrl+V'], 'a block to and from a spreadsheet'],
      [['Ctrl+D'], 'fill down'],
      [['Alt+Up', 'Alt+Down'], 'add a storey above, below, as a copy'],
      [['Alt+Delete'], 'remove the storey'],
    ],
  },
  {
    title: 'On the time strip',
    rows: [
      [['Space'], 'play, pause'],
      [['Left', 'Right'], 'one step'],
      [['Shift+Left', 'Shift+Right'], 'ten steps'],
      [['Home', 'End'], 'to the ends'],
      [['P'], 'to the peak of the chosen storey'],
      [['+', '−', '0'], 'less time, more time, all of it'],
    ],
  },
  {
    title: 'Anywhere',
    rows: [
      [['[', ']'], 'motion before, after'],
      [['Ctrl+Z'], 'undo'],
      [['Ctrl+Y', 'Ctrl+Shift+Z'], 'redo'],
      [['Ctrl+O', 'Ctrl+S'], 'open, save the project file'],
      [['F6', 'Shift+F6'], 'next, last part: bar, cells, answers, strip, plots, footers'],
      [['Ctrl+Shift+1', '2', '3'], 'Frame, Motions, Response'],
      [['F9'], 'run when out of date'],
      [['Esc'], 'stop a run'],
      [['?'], 'this list'],
    ],
  },
];

/** Every key, by where it works. */
export function KeysDialog({ onClose }: { readonly onClose: () => void }) {
  return (
    <Dialog title="Keys" onClose={onClose} width={860}>
      <div className="key-groups">
        {GROUPS.map(({ title, rows }) => (
          <section key={title}>
            <h3>{title}</h3>
            <dl>
              {rows.map(([keys, does]) => (
                <div key={does}>
                  <dt>
                    {keys.map((key) => (
                      <kbd key={key} className={key.startsWith('or ') ? 'quiet small' : 'keycap'}>
                        {key}
                      </kbd>
                    ))}
                  </dt>
                  <dd>{does}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
      <p className="quiet small pointer-words">
        On the time panels: drag moves the cursor, the wheel zooms time, Shift and the wheel move along it, a double
        click shows all of it.
      </p>
    </Dialog>
  );
}
