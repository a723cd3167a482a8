import { useState } from 'react';
import type { PeopleDto } from '../../contracts/people';
import { QueryProvider } from '../query/client';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { Invitations } from './Invitations';
import { InviteDialog } from './InviteDialog';
import { PeopleList } from './PeopleList';
import { PersonDialog } from './PersonDialog';
import { Tablets } from './Tablets';
import { usePeople } from './usePeople';

interface Props {
  readonly initial: PeopleDto;
}

function Page({ initial }: Props) {
  const people = usePeople(initial);
  const [isInviting, setInviting] = useState(false);
  const [openId, setOpenId] = useState<string | null>(null);
  const [invited, setInvited] = useState<string | null>(null);
  const person = people.data.people.find(({ id }) => id === openId);
  const onInvited = (email: string): void => {
    setInviting(false);
    setInvited(email);
  };
  return (
    <>
      <div className="mb-5 flex min-h-9 flex-wrap items-center gap-4">
        <Button look="main" onClick={() => setInviting(true)}>
          Invite somebody…
        </Button>
        <div aria-live="polite">
          {invited === null ? null : <Notice look="good">An invitation goes to {invited}.</Notice>}
        </div>
      </div>
      <PeopleList people={people} onOpen={setOpenId} />
      <Invitations people={people} />
      <Tablets people={people} />
      {isInviting ? <InviteDialog people={people} onClose={() => setInviting(false)} onInvited={onInvited} /> : null}
      {person ? <PersonDialog key={person.id} {...{ people, person }} onClose={() => setOpenId(null)} /> : null}
    </>
  );
}

/** The plant's people as an island. */
export function PeoplePage(props: Props) {
  return (
    <QueryProvider>
      <Page {...props} />
    </QueryProvider>
  );
}
