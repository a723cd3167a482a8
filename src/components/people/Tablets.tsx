import { useState } from 'react';
import type { TabletDto } from '../../contracts/people';
import { messageOf } from '../query/api';
import { Button, buttonClass } from '../ui/Button';
import { Notice } from '../ui/Notice';
import type { People } from './usePeople';
import { linesText, momentText } from './words';

function Item({ tablet, people }: { readonly tablet: TabletDto; readonly people: People }) {
  const [fault, setFault] = useState('');
  const [isAsking, setAsking] = useState(false);
  const { id, name, lineId, enrolledBy, enrolledAt, lastSeenAt } = tablet;
  const { lines, timeZone } = people.data;
  const revoke = (): void => {
    people.change(`/api/tablet/${encodeURIComponent(id)}/revoke`).catch((error: unknown) => setFault(messageOf(error)));
  };
  return (
    <li className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2 border-b border-rule py-3">
      <div>
        <p className="font-semibold">{name}</p>
        <p className="text-sm text-ink-muted">
          {lineId === null ? 'No line in particular' : linesText([lineId], lines)}. Enrolled by {enrolledBy},{' '}
          {momentText(enrolledAt, timeZone)}. Last signed in at: {momentText(lastSeenAt, timeZone)}.
        </p>
        {fault ? <Notice look="over">{fault}</Notice> : null}
      </div>
      {isAsking ? (
        <div className="flex items-center gap-2">
          <span className="text-sm">It has to be enrolled anew then.</span>
          <Button size="small" onClick={() => setAsking(false)}>
            Leave it
          </Button>
          <Button size="small" look="over" onClick={revoke} aria-label={`Revoke ${name} now`}>
            Revoke
          </Button>
        </div>
      ) : (
        <Button size="small" onClick={() => setAsking(true)} aria-label={`Revoke ${name}`}>
          Revoke…
        </Button>
      )}
    </li>
  );
}

/** The devices on the floor that sign people in by badge. */
export function Tablets({ people }: { readonly people: People }) {
  const { tablets } = people.data;
  return (
    <section className="mt-10" aria-labelledby="tablets">
      <h2 id="tablets" className="text-lg">
        Tablets on the floor
      </h2>
      <p className="mt-1 mb-3 max-w-2xl text-ink-muted">
        People of the floor sign in there by badge number and PIN. To add one, sign in on the device itself and enrol
        it; you are signed out of it then.
      </p>
      {tablets.length > 0 ? (
        <ul className="mb-4 border-t border-rule">
          {tablets.map((tablet) => (
            <Item key={tablet.id} {...{ tablet, people }} />
          ))}
        </ul>
      ) : null}
      <a href="/tablet" className={buttonClass('plain')}>
        Enrol this device…
      </a>
    </section>
  );
}
