import { Plus, Users } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import { type Me } from '#contract/accounts';
import { paths } from '../../lib/paths.ts';
import { chooseStudio } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { LinkButton } from '../../ui/link-button.tsx';
import { Icon } from '../../ui/icon.tsx';

/** The studios one works in; without one an account watches and makes. */
export function StudiosPanel({ memberships }: { memberships: Me['memberships'] }) {
  const navigate = useNavigate();
  const go = (studioId: string) => {
    chooseStudio(studioId);
    void navigate(paths.shelf());
  };
  return (
    <section aria-labelledby="studios">
      <div className="panel-head justify-between bg-chalk max-sm:px-3">
        <h2 id="studios" className="h-panel">
          Your studios
        </h2>
        <LinkButton kind="quiet" icon={Plus} to={paths.openStudio()}>
          Open a studio
        </LinkButton>
      </div>
      {memberships.length === 0 && (
        <p className="max-w-[68ch] px-4 py-4 font-serif text-[16px] leading-[24px]">
          None yet. To make things from a pattern you need none: the link to its page is enough. To write patterns, open
          one, or ask a studio’s owner to invite you.
        </p>
      )}
      <ul>
        {memberships.map((membership) => (
          <li
            key={membership.studioId}
            className="grid min-h-[62px] grid-cols-[28px_minmax(0,1fr)_100px_auto] items-center gap-x-3 border-b border-feint px-4 max-sm:grid-cols-[28px_minmax(0,1fr)_auto] max-sm:px-3"
          >
            <span className="text-woad">
              <Icon of={Users} size={20} />
            </span>
            <span className="h-piece">{membership.studioName}</span>
            <span className="text-walnut2 max-sm:hidden">{membership.role}</span>
            <Button size="row" onClick={() => go(membership.studioId)}>
              To its shelf
            </Button>
          </li>
        ))}
      </ul>
    </section>
  );
}
