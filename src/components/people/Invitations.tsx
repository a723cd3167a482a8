import { useState } from 'react';
import type { InvitationDto } from '../../contracts/people';
import { messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { Tag } from '../ui/Tag';
import type { People } from './usePeople';
import { linesText, momentText, rolesText } from './words';

function MailState({ invitation }: { readonly invitation: InvitationDto }) {
  const { isExpired, mail } = invitation;
  if (isExpired) return <Tag look="over">expired</Tag>;
  if (mail.state === 'sent') return <Tag look="room">sent</Tag>;
  if (mail.state === 'failed') return <Tag look="over">not delivered</Tag>;
  return <Tag look="quiet">{mail.error === null ? 'on its way' : 'waits for the mail server'}</Tag>;
}

function Item({ invitation, people }: { readonly invitation: InvitationDto; readonly people: People }) {
  const [fault, setFault] = useState('');
  const [busy, setBusy] = useState(false);
  const { id, email, roles, lineIds, invitedBy, expiresAt, mail } = invitation;
  const { lines, timeZone } = people.data;
  const run = (action: string): void => {
    setBusy(true);
    people
      .change(`/api/invitations/${encodeURIComponent(id)}/${action}`)
      .catch((error: unknown) => setFault(messageOf(error)))
      .finally(() => setBusy(false));
  };
  return (
    <li className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2 border-b border-rule py-3">
      <div className="min-w-0">
        <p className="flex flex-wrap items-center gap-2">
          <span className="font-semibold break-all">{email}</span>
          <MailState invitation={invitation} />
        </p>
        <p className="text-sm text-ink-muted">
          {rolesText(roles)}; {linesText(lineIds, lines)}. Invited by {invitedBy}, open until{' '}
          {momentText(expiresAt, timeZone)}.
        </p>
        {mail.error && mail.state !== 'sent' ? <p className="text-sm text-over">{mail.error}</p> : null}
        {fault ? (
          <Notice look="over" live className="mt-2">
            {fault}
          </Notice>
        ) : null}
      </div>
      <div className="flex gap-2">
        <Button size="small" disabled={busy} onClick={() => run('resend')} aria-label={`Send again to ${email}`}>
          Send again
        </Button>
        <Button size="small" disabled={busy} onClick={() => run('withdraw')} aria-label={`Withdraw from ${email}`}>
          Withdraw
        </Button>
      </div>
    </li>
  );
}

/** Who has been asked to join and has not yet. */
export function Invitations({ people }: { readonly people: People }) {
  const { invitations } = people.data;
  if (invitations.length === 0) return null;
  return (
    <section className="mt-10" aria-labelledby="invited">
      <h2 id="invited" className="mb-2 text-lg">
        Invited
      </h2>
      <ul className="border-t border-rule">
        {invitations.map((invitation) => (
          <Item key={invitation.id} {...{ invitation, people }} />
        ))}
      </ul>
    </section>
  );
}
