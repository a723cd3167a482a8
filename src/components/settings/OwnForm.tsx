import { ownSettingsSchema, type OwnSettings, type OwnSettingsDto } from '@/contracts/settings';
import type { UnitSystem } from '@/core/quantity/display';
import { keepTheme } from '../account/personMenu';
import { api } from '../query/api';
import { Form } from '../ui/form/Form';
import { FormActions } from '../ui/form/FormActions';
import { SelectInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { optionsOf, THEME_WORDS, UNIT_WORDS } from './words';

interface Props {
  readonly own: OwnSettings;
  readonly plantUnits: UnitSystem;
  readonly onSaved: (own: OwnSettings) => void;
}

const save = (body: OwnSettings): Promise<OwnSettingsDto> =>
  api<OwnSettingsDto>('/api/settings/own', { method: 'POST', body });

/** Light or dark, and the units that figures are read and typed in. */
export function OwnForm({ own, plantUnits, onSaved }: Props) {
  const form = useZodForm(ownSettingsSchema, own);
  const { state, submit } = useSave(form, save, (saved) => {
    keepTheme(saved.own.theme);
    form.reset(saved.own);
    onSaved(saved.own);
  });
  return (
    <Form onSubmit={submit}>
      <SelectInput
        control={form.control}
        name="units"
        label="Units"
        none={`As the plant: ${UNIT_WORDS[plantUnits]}`}
        options={optionsOf(UNIT_WORDS)}
        hint="For every figure on screens and prints. Nothing stored changes."
      />
      <SelectInput
        className="mt-2"
        control={form.control}
        name="theme"
        label="Light or dark"
        options={optionsOf(THEME_WORDS)}
        hint="A device on which you chose otherwise keeps its choice."
      />
      <FormActions state={state} save="Keep these" saved="Kept." />
    </Form>
  );
}
