import { Keyboard, LogIn } from 'lucide-react';
import { useLocation } from 'react-router-dom';
import { cx } from '../../../lib/class-names.ts';
import { paths } from '../../../lib/paths.ts';
import { Button } from '../../../ui/button.tsx';
import { LinkButton } from '../../../ui/link-button.tsx';
import { Switch } from '../../../ui/switch.tsx';
import { useDesk } from './use-desk.ts';

/** How saving stands, in words. Somebody who was signed out gets the way back; what was typed is kept meanwhile. */
export function SaveWords() {
  const { bench } = useDesk();
  const { pathname, search } = useLocation();
  const { state, words, isSignedOut } = bench.save;
  return (
    <span className="flex items-center gap-2.5">
      <span
        role="status"
        className={cx('max-w-[26em]', state === 'not-saved' ? 'small font-medium text-madder' : 'text-walnut2')}
      >
        {words}
      </span>
      {state === 'not-saved' &&
        (isSignedOut ? (
          <LinkButton size="row" icon={LogIn} to={paths.signIn(pathname + search)}>
            Sign in
          </LinkButton>
        ) : (
          <Button size="row" onClick={() => bench.retry()}>
            Try again
          </Button>
        ))}
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
