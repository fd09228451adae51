import { Keyboard, Printer } from 'lucide-react';
import { useSingleKeys } from '../lib/use-keys.ts';
import { Button } from '../ui/button.tsx';
import { Dialog } from '../ui/dialog.tsx';
import { Icon } from '../ui/icon.tsx';
import { KeyCaps } from '../ui/key-cap.tsx';
import { Switch } from '../ui/switch.tsx';
import { sheetHref } from './sheet-href.ts';
import { useWatch } from './use-watch.ts';

const TERMS = [
  { value: 'US', label: <TermsLabel name="US" /> },
  { value: 'UK', label: <TermsLabel name="UK" /> },
] as const;

function TermsLabel({ name }: { name: string }) {
  return (
    <>
      {name}
      <span className="max-sm:sr-only"> terms</span>
    </>
  );
}

const KEYS: readonly (readonly [string, readonly string[]])[] = [
  ['Tick off and go on', ['Enter']],
  ['Round before, round after', ['↑', '↓']],
  ['The same from a pedal', ['Page Up', 'Page Down']],
  ['Play, pause', ['Space']],
  ['A second back, on (with Shift a tenth)', ['←', '→']],
  ['Five seconds back, on', ['-', '=']],
  ['Slower, faster', [',', '.']],
  ['Repeat this round', ['L']],
  ['Mirror', ['X']],
  ['US or UK terms', ['T']],
  ['Print the sheet', ['P']],
  ['These keys', ['?']],
];

/** Terms, the sheet to print, and the keys of the page. */
export function Tools({ showsKeys, onKeys }: { showsKeys: boolean; onKeys: (open: boolean) => void }) {
  const { edition, state, act } = useWatch();
  const [singleKeys, setSingleKeys] = useSingleKeys();
  return (
    <>
      <Switch label="Terms" value={state.terms} options={TERMS} onChange={(terms) => act({ kind: 'terms', terms })} />
      <a className="btn watch-print" href={sheetHref(edition, state.terms)} aria-keyshortcuts="P">
        <Icon of={Printer} size={17} />
        <span className="max-sm:sr-only">Print sheet</span>
      </a>
      <Button className="max-sm:hidden" icon={Keyboard} onClick={() => onKeys(true)}>
        Keys
      </Button>
      <Dialog title="Keys" isOpen={showsKeys} onClose={() => onKeys(false)}>
        <table className="m-3.5">
          <tbody>
            {KEYS.map(([what, keys]) => (
              <tr key={what}>
                <th scope="row" className="py-1 pr-6 text-left font-normal">
                  {what}
                </th>
                <td>
                  <KeyCaps keys={keys} />
                  <span className="sr-only">{keys.join(', ')}</span>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
        <label className="m-3.5 flex items-center gap-2">
          <input
            type="checkbox"
            className="tick"
            checked={singleKeys}
            onChange={(event) => setSingleKeys(event.target.checked)}
          />
          Keys without Ctrl act on this page
        </label>
      </Dialog>
    </>
  );
}
