import { useState } from 'react';
import { editPersonRequestSchema, type PersonDto } from '../../contracts/people';
import { messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { FormActions } from '../ui/form/FormActions';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { BadgeForm } from './BadgeForm';
import { RolesAndLines } from './RolesAndLines';
import type { People } from './usePeople';

interface Props {
  readonly people: People;
  readonly person: PersonDto;
  readonly onClose: () => void;
}

function RolesForm({ people, person }: Omit<Props, 'onClose'>) {
  const { roles, lineIds } = person;
  const was = { roles: [...roles], lineIds: lineIds === null ? null : [...lineIds] };
  const form = useZodForm(editPersonRequestSchema, { ...was, was });
  const save = useSave(
    form,
    (values) => people.change(`/api/people/${encodeURIComponent(person.id)}`, values),
    () => {
      const values = form.getValues();
      form.reset({ ...values, was: { roles: values.roles, lineIds: values.lineIds } });
    },
  );
  return (
    <form onSubmit={save.submit} noValidate>
      <RolesAndLines control={form.control} lines={people.data.lines} />
      <FormActions state={save.state} save="Save roles and lines" />
    </form>
  );
}

/** Signing out everywhere, and whether the person may work here. */
function Access({ people, person }: Omit<Props, 'onClose'>) {
  const [said, setSaid] = useState<{ readonly look: 'good' | 'over'; readonly text: string } | null>(null);
  const [busy, setBusy] = useState(false);
  const run = (action: string, done: string): void => {
    setBusy(true);
    people
      .change(`/api/people/${encodeURIComponent(person.id)}/${action}`)
      .then(() => setSaid({ look: 'good', text: done }))
      .catch((error: unknown) => setSaid({ look: 'over', text: messageOf(error) }))
      .finally(() => setBusy(false));
  };
  const { name, isActive } = person;
  return (
    <section aria-label="Access">
      <div className="flex flex-wrap gap-2">
        <Button disabled={busy} onClick={() => run('sign-out', `${name} is signed out on every device.`)}>
          Sign out everywhere
        </Button>
        {isActive ? (
          <Button
            look="over"
            disabled={busy}
            onClick={() => run('deactivate', `${name} is signed out and can’t sign in here.`)}
          >
            Deactivate
          </Button>
        ) : (
          <Button look="main" disabled={busy} onClick={() => run('activate', `${name} can sign in again.`)}>
            Activate
          </Button>
        )}
      </div>
      <div className="mt-3 min-h-6" aria-live="polite">
        {said ? <Notice look={said.look}>{said.text}</Notice> : null}
      </div>
    </section>
  );
}

/** All that an administrator does about one person. */
export function PersonDialog({ people, person, onClose }: Props) {
  const [fault, setFault] = useState('');
  const isOfFloor = person.roles.includes('lineSupervisor');
  const take = (): void => {
    people
      .change(`/api/people/${encodeURIComponent(person.id)}/badge`, undefined, 'DELETE')
      .then(() => setFault(''))
      .catch((error: unknown) => setFault(messageOf(error)));
  };
  return (
    <Dialog open title={`${person.name}, ${person.email}`} onClose={onClose} wide>
      <RolesForm {...{ people, person }} />
      {isOfFloor ? (
        <section className="mt-5 border-t border-rule pt-4" aria-label="Badge">
          <BadgeForm key={person.badge ?? ''} {...{ people, person }} onTake={take} />
          {fault ? <Notice look="over">{fault}</Notice> : null}
        </section>
      ) : null}
      <div className="mt-5 border-t border-rule pt-4">
        <Access {...{ people, person }} />
      </div>
    </Dialog>
  );
}
