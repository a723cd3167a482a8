import { badgeRequestSchema, type PersonDto } from '../../contracts/people';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import type { People } from './usePeople';

interface Props {
  readonly people: People;
  readonly person: PersonDto;
  readonly onTake: () => void;
}

/** Badge number and PIN for the tablets on the floor. */
export function BadgeForm({ people, person, onTake }: Props) {
  const form = useZodForm(badgeRequestSchema, { number: person.badge ?? '', pin: '' });
  const give = useSave(
    form,
    (values) => people.change(`/api/people/${encodeURIComponent(person.id)}/badge`, values),
    () => form.setValue('pin', ''),
  );
  return (
    <form onSubmit={give.submit} noValidate>
      <div className="grid gap-x-6 sm:grid-cols-2">
        <TextInput control={form.control} name="number" label="Badge number" hint="As printed, 1 to 8 digits." />
        <TextInput
          control={form.control}
          name="pin"
          label={person.badge === null ? 'PIN' : 'New PIN'}
          hint="4 to 6 digits; its holder can change it."
        />
      </div>
      <FormActions
        state={give.state}
        save={person.badge === null ? 'Give the badge' : 'Set badge and PIN'}
        saved="Set. Tell the holder in person."
      >
        {person.badge === null ? null : <Button onClick={onTake}>Take the badge away</Button>}
      </FormActions>
    </form>
  );
}
