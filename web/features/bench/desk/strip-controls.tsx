import { Keyboard } from 'lucide-react';
import { cx } from '../../../lib/class-names.ts';
import { Button } from '../../../ui/button.tsx';
import { Switch } from '../../../ui/switch.tsx';
import { useDesk } from './use-desk.ts';

/** How saving stands, short enough never to move the head of the page; what is in the way stands under it. */
export function SaveWords() {
  const { save } = useDesk().bench;
  const isKept = save.state === 'not-saved';
  return (
    <span role="status" className={cx('whitespace-nowrap', isKept ? 'font-medium text-madder' : 'text-walnut2')}>
      {isKept ? 'Not saved, kept here' : save.words}
    </span>
  );
}

/** Which trade's words the lines are written in. */
export function TermsSwitch() {
  const { bench, pattern, tellDone } = useDesk();
  if (!pattern.mayEdit) return <span className="text-walnut2">{pattern.terms} terms</span>;
  return (
    <Switch
      label="The lines are written in"
      value={pattern.terms}
      options={[
        {
          value: 'US',
          label: (
            <>
              US<span className="max-lg:sr-only"> terms</span>
            </>
          ),
        },
        { value: 'UK', label: 'UK' },
      ]}
      onChange={(terms) => {
        bench.editPattern({ terms });
        tellDone(`Lines are read in ${terms} terms`);
      }}
    />
  );
}

export function KeysButton({ onPress }: { onPress: () => void }) {
  return (
    <Button icon={Keyboard} aria-keyshortcuts="?" onClick={onPress} className="max-lg:[&>.word]:hidden">
      <span className="word">Keys</span>
      <span className="sr-only lg:hidden">Keys</span>
    </Button>
  );
}
