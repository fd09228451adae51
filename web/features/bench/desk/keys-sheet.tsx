import { useSingleKeys } from '../../../lib/use-keys.ts';
import { Dialog } from '../../../ui/dialog.tsx';
import { KeyCap } from '../../../ui/key-cap.tsx';
import { TickBox } from '../../../ui/field.tsx';

type Row = readonly [keys: readonly string[], does: string];

const CLIP: readonly Row[] = [
  [['Space'], 'play, pause'],
  [['←', '→'], 'a second back, on'],
  [['Shift', '←', '→'], 'a tenth of a second'],
  [['-', '='], 'five seconds back, on'],
  [['Page Up', 'Page Down'], 'caption before, next'],
  [[',', '.'], 'slower, faster'],
  [['L'], 'repeat this round'],
  [['/'], 'find in the transcript'],
];

const BENCH: readonly Row[] = [
  [['M'], 'mark a round at the needle'],
  [['[', ']'], 'its moment a tenth earlier, later'],
  [['P'], 'hear what was said for it'],
  [['N'], 'next line to look at'],
  [['W'], 'choose the words that are spoken'],
  [['C'], 'the automatic checks'],
  [['↑', '↓'], 'line above, below'],
  [['Enter'], 'open the line, done with it'],
  [['Ctrl', 'Enter'], 'use the suggestion'],
  [['Alt', '↑', '↓'], 'move the line'],
  [['Ctrl', 'Z'], 'undo'],
  [['Ctrl', 'Y'], 'do it again'],
  [['?'], 'this sheet'],
];

/** All keys, and the switch that turns the single ones off for those who speak to their computer. */
export function KeysSheet({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  const [singleKeys, setSingleKeys] = useSingleKeys();
  return (
    <Dialog title="Keys" isOpen={isOpen} onClose={onClose}>
      <div className="grid gap-x-9 gap-y-5 p-4.5 sm:grid-cols-2">
        <KeyList title="Clip" rows={CLIP} />
        <KeyList title="Bench" rows={BENCH} />
      </div>
      <div className="border-t border-feint px-4.5 py-3.5">
        <TickBox
          checked={singleKeys}
          onChange={(event) => setSingleKeys(event.target.checked)}
          label="Single keys act. They rest while you type; switched off, only keys with Ctrl or Alt, arrows and Enter act."
        />
      </div>
    </Dialog>
  );
}

function KeyList({ title, rows }: { title: string; rows: readonly Row[] }) {
  return (
    <section>
      <h3 className="h-panel mb-1.5">{title}</h3>
      <dl>
        {rows.map(([keys, does]) => (
          <div key={does} className="flex min-h-[27px] items-center gap-3 border-b border-feint">
            <dt className="flex w-36 flex-none gap-1">
              {keys.map((key) => (
                <KeyCap key={key} name={key} />
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
