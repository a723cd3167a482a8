import { useState } from 'react';
import { changePasswordRequestSchema, noticesRequestSchema, ownPinRequestSchema } from '../../contracts/people';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { CheckInput } from '../ui/form/TextInput';
import { FormActions } from '../ui/form/FormActions';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { SecretInput } from './SecretInput';

interface Props {
  readonly badge: string | null;
  readonly notices: { readonly issue: boolean };
  /** The person runs lines: only then is told of issues. */
  readonly isSupervisor: boolean;
}

const post = (path: string) => (body: unknown) => api<null>(`/api/session/${path}`, { method: 'POST', body });

function Password() {
  const form = useZodForm(changePasswordRequestSchema, { password: '', newPassword: '' });
  const save = useSave(form, post('password'), () => form.reset());
  return (
    <form onSubmit={save.submit} noValidate>
      <SecretInput
        control={form.control}
        name="password"
        label="Password that you have"
        autoComplete="current-password"
      />
      <SecretInput
        control={form.control}
        name="newPassword"
        label="New password"
        autoComplete="new-password"
        hint="12 characters at least. Four words that don’t belong together are good."
      />
      <FormActions state={save.state} save="Change the password" saved="Changed. You are signed out everywhere else." />
    </form>
  );
}

function Pin({ badge }: { readonly badge: string }) {
  const form = useZodForm(ownPinRequestSchema, { pin: '', password: '' });
  const save = useSave(form, post('pin'), () => form.reset());
  return (
    <form onSubmit={save.submit} noValidate>
      <p className="mb-3">Badge {badge}</p>
      <SecretInput
        control={form.control}
        name="pin"
        label="New PIN"
        autoComplete="off"
        hint="4 to 6 digits."
        isDigits
      />
      <SecretInput control={form.control} name="password" label="Your password" autoComplete="current-password" />
      <FormActions state={save.state} save="Change the PIN" saved="Changed." />
    </form>
  );
}

function Notices({ notices }: Pick<Props, 'notices'>) {
  const form = useZodForm(noticesRequestSchema, notices);
  const save = useSave(form, post('notices'));
  return (
    <form onSubmit={save.submit} noValidate>
      <CheckInput
        control={form.control}
        name="issue"
        label="Tell me by e-mail when a plan is put on the floor"
        hint="For the lines that you run."
      />
      <FormActions state={save.state} save="Keep this" saved="Kept." />
    </form>
  );
}

function Everywhere() {
  const [fault, setFault] = useState('');
  const leave = (): void => {
    api<null>('/api/session/everywhere', { method: 'DELETE' })
      .then(() => location.assign('/sign-in'))
      .catch((error: unknown) => setFault(messageOf(error)));
  };
  return (
    <>
      <p className="mb-3 text-ink-muted">Ends every session of yours, this one too: after a lost phone, for example.</p>
      <Button onClick={leave}>Sign out everywhere</Button>
      {fault ? <Notice look="over">{fault}</Notice> : null}
    </>
  );
}

/** The parts of one's own account, as an island. */
export function OwnAccount({ badge, notices, isSupervisor }: Props) {
  const parts = [
    { id: 'password', title: 'Password', part: <Password /> },
    ...(badge === null ? [] : [{ id: 'pin', title: 'PIN at tablets', part: <Pin badge={badge} /> }]),
    ...(isSupervisor ? [{ id: 'notices', title: 'By e-mail', part: <Notices notices={notices} /> }] : []),
    { id: 'everywhere', title: 'Signed in elsewhere', part: <Everywhere /> },
  ];
  return (
    <div className="grid gap-x-16 gap-y-12 lg:grid-cols-2">
      {parts.map(({ id, title, part }) => (
        <section key={id} aria-labelledby={id} className="max-w-md">
          <h2 id={id} className="mb-4 text-lg">
            {title}
          </h2>
          {part}
        </section>
      ))}
    </div>
  );
}
