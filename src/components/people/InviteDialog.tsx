import { inviteRequestSchema, type PeopleDto } from '../../contracts/people';
import { Dialog } from '../ui/Dialog';
import { FormActions } from '../ui/form/FormActions';
import { TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { RolesAndLines } from './RolesAndLines';
import type { People } from './usePeople';

interface Props {
  readonly people: People;
  readonly onClose: () => void;
  readonly onInvited: (email: string) => void;
}

/** Asks an address to join the plant. */
export function InviteDialog({ people, onClose, onInvited }: Props) {
  const form = useZodForm(inviteRequestSchema, { email: '', roles: [], lineIds: null });
  const invite = useSave(
    form,
    (values): Promise<PeopleDto> => people.change('/api/invitations', values),
    () => onInvited(form.getValues('email').trim()),
  );
  return (
    <Dialog open title="Invite somebody" onClose={onClose} wide>
      <form onSubmit={invite.submit} noValidate>
        <TextInput
          className="max-w-md"
          control={form.control}
          name="email"
          label="E-mail address"
          hint="A link goes there: it works once, for seven days."
        />
        <div className="mt-3">
          <RolesAndLines control={form.control} lines={people.data.lines} />
        </div>
        <FormActions state={invite.state} save="Send the invitation" onCancel={onClose} cancel="Not now" />
      </form>
    </Dialog>
  );
}
