import { Mail } from 'lucide-react';
import { useState } from 'react';
import { Role, type Me } from '#contract/accounts';
import { type Invitation, type Member, type StudioPeople } from '#contract/studios';
import { formatDay, formatRecent } from '../../lib/days.ts';
import { wordsOf } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { SelectField } from '../../ui/field.tsx';
import { Icon } from '../../ui/icon.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { Initials } from '../../ui/initials.tsx';
import { usePeopleDeeds } from './studio.queries.ts';

type Deeds = ReturnType<typeof usePeopleDeeds>;

const ROW =
  'grid min-h-[58px] grid-cols-[28px_minmax(0,1fr)_150px_120px_150px] items-center gap-x-4 border-b border-feint px-4 max-lg:grid-cols-[28px_minmax(0,1fr)_140px_130px] max-sm:grid-cols-[28px_minmax(0,1fr)_130px] max-sm:px-3 max-sm:py-2';

/** Asked once, in place: what somebody may do ends with their next click. */
function Removal({ member, isMe, deeds }: { member: Member; isMe: boolean; deeds: Deeds }) {
  const [isAsked, setAsked] = useState(false);
  const word = isMe ? 'Leave' : 'Let go';
  if (!isAsked) {
    return (
      <Button kind="quiet" aria-label={`${word}: ${member.name}`} onClick={() => setAsked(true)}>
        {word}
      </Button>
    );
  }
  return (
    <span className="flex justify-end gap-2">
      <Button kind="harm" size="row" autoFocus onClick={() => deeds.remove.mutate(member.personId)}>
        {word}
      </Button>
      <Button size="row" onClick={() => setAsked(false)}>
        Keep
      </Button>
    </span>
  );
}

function MemberRow({ member, me, isOwner, deeds }: { member: Member; me: Me; isOwner: boolean; deeds: Deeds }) {
  const isMe = member.personId === me.id;
  return (
    <li className={ROW}>
      <Initials name={member.name} />
      <span className="min-w-0">
        <span className="h-piece block">{member.name}</span>
        <span className="small block truncate text-walnut2">{member.email}</span>
      </span>
      {isOwner ? (
        <SelectField
          label={`Role of ${member.name}`}
          hideLabel
          value={member.role}
          onChange={(event) =>
            deeds.changeRole.mutate({ personId: member.personId, role: Role.parse(event.target.value) })
          }
        >
          {Role.options.map((role) => (
            <option key={role}>{role}</option>
          ))}
        </SelectField>
      ) : (
        <span>{member.role}</span>
      )}
      <span className="text-walnut2 max-lg:hidden">{member.seenAt ? formatRecent(member.seenAt) : '–'}</span>
      <span className="text-right max-sm:col-start-2 max-sm:col-end-4">
        {(isOwner || isMe) && <Removal member={member} isMe={isMe} deeds={deeds} />}
      </span>
    </li>
  );
}

function InvitationRow({ invitation, deeds }: { invitation: Invitation; deeds: Deeds }) {
  return (
    <li className={ROW}>
      <span className="grid size-[28px] place-items-center rounded-full border border-dashed border-edge text-walnut2">
        <Icon of={Mail} size={14} />
      </span>
      <span className="min-w-0">
        <span className="wr block truncate">{invitation.email}</span>
        <span className="small block text-walnut2">asked by {invitation.askedBy}</span>
      </span>
      <span className="font-medium">{invitation.role}</span>
      <span className="text-walnut2 max-lg:hidden">until {formatDay(invitation.expiresAt)}</span>
      <span className="text-right max-sm:col-start-2 max-sm:col-end-4">
        <Button kind="quiet" onClick={() => deeds.takeBack.mutate(invitation.id)}>
          Take back
        </Button>
      </span>
    </li>
  );
}

/** Everybody who belongs to the studio and, for its owners, who is asked in. */
export function PeopleLedger({
  studioId,
  people,
  me,
  isOwner,
}: {
  studioId: string;
  people: StudioPeople;
  me: Me;
  isOwner: boolean;
}) {
  const deeds = usePeopleDeeds(studioId);
  const error = deeds.changeRole.error ?? deeds.remove.error ?? deeds.takeBack.error;
  const { members, invitations } = people;
  return (
    <>
      {error && <ErrorNote what="Nothing was changed.">{wordsOf(error)}</ErrorNote>}
      <div className={`${ROW} min-h-[38px]! border-rule! text-walnut2 max-sm:hidden!`} aria-hidden>
        <span />
        <span>Name</span>
        <span>Role</span>
        <span className="max-lg:hidden">last here</span>
      </div>
      <ul aria-label="Members">
        {members.map((member) => (
          <MemberRow key={member.personId} member={member} me={me} isOwner={isOwner} deeds={deeds} />
        ))}
      </ul>
      {invitations.length > 0 && (
        <>
          <div className="panel-head gap-2.5 max-sm:px-3">
            <h2 className="h-panel">Invited</h2>
            <span className="text-walnut2">
              {invitations.length === 1 ? '1 letter out' : `${invitations.length} letters out`}
            </span>
          </div>
          <ul aria-label="Invited">
            {invitations.map((invitation) => (
              <InvitationRow key={invitation.id} invitation={invitation} deeds={deeds} />
            ))}
          </ul>
        </>
      )}
    </>
  );
}
