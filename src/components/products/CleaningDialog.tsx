import { z } from 'zod';
import {
  CLEANING_KINDS,
  CLEANING_MINUTES,
  cleaningRequestSchema,
  type CleaningRequest,
  type CleaningRuleDto,
  type FamilyDto,
  type ProductsDto,
} from '@/contracts/products';
import type { UnitKind } from '@/core/plant/plant';
import { api } from '../query/api';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm, type Blank } from '../ui/form/useZodForm';
import { UsesEditor } from './UsesEditor';

/** Two families on a kind of unit, and what is cleaned between them now. */
export interface CleaningPair {
  readonly unitKind: UnitKind;
  readonly from: FamilyDto;
  readonly to: FamilyDto;
  readonly rule: CleaningRuleDto | null;
}

interface Props {
  readonly pair: CleaningPair;
  readonly choices: ProductsDto['choices'];
  readonly onClose: () => void;
}

const formSchema = z.object({ ...cleaningRequestSchema.shape, rule: cleaningRequestSchema.shape.rule.unwrap() });
type FormValues = z.infer<typeof formSchema>;

const KINDS = CLEANING_KINDS.map((value) => ({ value, label: value === 'allergen' ? 'allergen clean' : value }));

function startOf({ unitKind, from, to, rule }: CleaningPair): Blank<FormValues> {
  const kept = rule ?? { kind: 'wash' as const, minutes: null, dutyId: null, uses: [] };
  const { kind, minutes, dutyId } = kept;
  const uses = kept.uses.map((use) => ({ ...use }));
  return { unitKind, fromFamilyId: from.id, toFamilyId: to.id, rule: { kind, minutes, dutyId, uses } };
}

const send = (request: CleaningRequest) => api('/api/families/cleaning', { method: 'POST', body: request });
const reload = (): void => window.location.reload();

/** What is cleaned between two families, for how long, and with which duty. */
export function CleaningDialog({ pair, choices, onClose }: Props) {
  const form = useZodForm(formSchema, startOf(pair));
  const { control } = form;
  const save = useSave(form, send, reload);
  const duties = choices.duties.map(({ id, name, title }) => ({ value: id, label: `${name} (${title})` }));
  const { name: label, unit, min, max } = CLEANING_MINUTES;
  const takeBack = (): void => {
    const { unitKind, from, to } = pair;
    void send({ unitKind, fromFamilyId: from.id, toFamilyId: to.id, rule: null }).then(reload, () => undefined);
  };
  return (
    <Dialog open wide title={`After ${pair.from.name}, before ${pair.to.name}`} onClose={onClose}>
      <form onSubmit={save.submit} noValidate>
        <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
          <SelectInput control={control} name="rule.kind" label="What is done" options={KINDS} />
          <NumberField {...{ control, name: 'rule.minutes', label, unit, min, max }} />
          <SelectInput
            {...{ control, name: 'rule.dutyId', label: 'Duty', options: duties, none: 'none: draws no steam' }}
            className="sm:col-span-2"
            hint="Its steam is worked out on the header of this kind of unit, and again whenever the duty changes."
          />
        </div>
        <UsesEditor control={control as never} name="rule.uses" limits={choices.limits} />
        <FormActions state={save.state} save="Save the cleaning" onCancel={onClose}>
          {pair.rule ? (
            <Button look="quiet" className="mr-auto" onClick={takeBack}>
              Nothing is cleaned here
            </Button>
          ) : null}
        </FormActions>
      </form>
    </Dialog>
  );
}
