import { enrolRequestSchema } from '../../contracts/people';
import { api } from '../query/api';
import { FormActions } from '../ui/form/FormActions';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';

interface Props {
  readonly lines: readonly { readonly id: string; readonly name: string }[];
}

/** Makes this device a tablet of the plant. */
export function EnrolForm({ lines }: Props) {
  const form = useZodForm(enrolRequestSchema, { name: '', lineId: null });
  const enrol = useSave(
    form,
    (values) => api<{ next: string }>('/api/tablet', { method: 'POST', body: values }),
    ({ next }) => location.assign(next),
  );
  return (
    <form onSubmit={enrol.submit} noValidate>
      <TextInput
        control={form.control}
        name="name"
        label="Name of the tablet"
        hint="Where it hangs, such as: retort bay, left."
      />
      <SelectInput
        className="mt-2"
        control={form.control}
        name="lineId"
        label="Line"
        none="no line in particular"
        options={lines.map(({ id, name }) => ({ value: id, label: name }))}
        hint="Its shift sheet is shown first."
      />
      <FormActions state={enrol.state} save="Enrol this device" saved="Enrolled." />
    </form>
  );
}
