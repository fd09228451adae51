import { Monitor, Smartphone } from 'lucide-react';
import { type SignedInPlace } from '#contract/accounts';
import { formatDay, formatRecent } from '../../lib/days.ts';
import { wordsOf } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Icon } from '../../ui/icon.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useSignOutElsewhere } from './account.queries.ts';

const isPhone = (place: SignedInPlace) => /Mobile|Android|iPhone/u.test(place.userAgent);
const nameOf = (place: SignedInPlace) =>
  `${place.isThis ? 'This browser' : 'Browser'}${isPhone(place) ? ' on a phone' : ' on a computer'}`;

/** Where one is signed in, and the way to end it everywhere else. */
export function PlacesPanel({ places }: { places: readonly SignedInPlace[] }) {
  const signOut = useSignOutElsewhere();
  return (
    <section aria-labelledby="places">
      <div className="panel-head justify-between border-t border-t-rule bg-chalk max-sm:px-3">
        <h2 id="places" className="h-panel">
          Where you are signed in
        </h2>
        {places.length > 1 && (
          <Button kind="quiet" onClick={() => signOut.mutate()}>
            {signOut.isPending ? 'Signing out' : 'Sign out the others'}
          </Button>
        )}
      </div>
      {signOut.error && <ErrorNote what="Still signed in there.">{wordsOf(signOut.error)}</ErrorNote>}
      <ul>
        {places.map((place) => (
          <li
            key={place.createdAt + String(place.isThis)}
            className="grid min-h-[46px] grid-cols-[20px_minmax(0,1fr)_150px_130px] items-center gap-x-3 border-b border-feint px-4 max-sm:grid-cols-[20px_minmax(0,1fr)_auto] max-sm:px-3"
          >
            <Icon of={isPhone(place) ? Smartphone : Monitor} size={18} />
            <span className={place.isThis ? 'font-bold' : ''}>{nameOf(place)}</span>
            <span className="text-walnut2 max-sm:hidden">since {formatDay(place.createdAt)}</span>
            <span className="text-walnut2">{place.isThis ? 'now' : formatRecent(place.seenAt)}</span>
          </li>
        ))}
      </ul>
      <p className="px-4 py-3 text-walnut2 max-sm:px-3">
        A place not used for 12 hours is signed out by itself, and every place after 14 days.
      </p>
    </section>
  );
}
