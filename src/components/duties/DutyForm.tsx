import { useMemo, useState } from 'react';
import { useWatch } from 'react-hook-form';
import type { DutiesDto, DutyDto } from '@/contracts/duties';
import type { DutyModel } from '@/core/duty/model';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { workOutOn } from './demand';
import { DemandPanel } from './DemandPanel';
import { DutyFields } from './DutyFields';
import { dutyFormSchema, faultsLeft, inputsOf, blankInputs, typedDuty, type DutyFormValues } from './formModel';
import { TypedFields } from './TypedFields';

export interface DutyFormProps {
  readonly dto: DutiesDto;
  /** null: a new one. */
  readonly saved: DutyDto | null;
  readonly model: DutyModel['model'];
  readonly mayEdit: boolean;
  readonly whoMay: string;
}

/** A duty's inputs, and beside them what it draws as they are typed. */
export function DutyForm({ dto, saved, model, mayEdit, whoMay }: DutyFormProps) {
  const schema = useMemo(() => dutyFormSchema(model, dto), [model, dto]);
  const form = useZodForm(schema, startOf(dto, saved, model));
  const { control, setValue } = form;
  const values = useWatch({ control }) as DutyFormValues;
  const duty = typedDuty(model, values.duty.inputs);
  const worked = duty && workOutOn(dto, values.tryOnHeaderId, duty);
  const headerName = dto.headers.find(({ id }) => id === values.tryOnHeaderId)?.name ?? 'header';
  const save = useSave(form, (ready) => send(saved, ready), leave);
  return (
    <div className="grid grid-cols-1 gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_22rem] xl:grid-cols-[minmax(0,1fr)_26rem]">
      <form onSubmit={save.submit} noValidate className="min-w-0">
        <fieldset disabled={!mayEdit} className="contents">
          <div className="grid grid-cols-1 gap-x-4 gap-y-1.5 sm:grid-cols-2">
            <TextInput control={control} name="name" label="Name" maxLength={120} />
            <SelectInput
              {...{
                control,
                name: 'tryOnHeaderId',
                label: 'Try it on',
                hint: 'The unit’s own header counts in the plan.',
              }}
              options={dto.headers.map(({ id, name }) => ({ value: id, label: name }))}
            />
          </div>
          {model === 'typed' ? (
            <TypedFields control={control} />
          ) : (
            <DutyFields {...{ control, setValue, model, products: dto.products }} />
          )}
        </fieldset>
        {mayEdit ? (
          <FormActions state={save.state} save="Save the duty" onCancel={() => window.location.assign('/duties')}>
            {saved ? <Retire saved={saved} /> : null}
          </FormActions>
        ) : (
          <Notice>{whoMay}</Notice>
        )}
      </form>
      <aside className="min-w-0 lg:sticky lg:top-20 lg:max-h-[calc(100dvh-6rem)] lg:self-start lg:overflow-y-auto lg:pr-1">
        <DemandPanel
          {...{ model, duty, worked, headerName, faultsLeft: faultsLeft(model, values.duty.inputs) }}
          processData={saved?.processData ?? []}
          workingHref={saved ? `/working/duty/${saved.id}?header=${values.tryOnHeaderId}` : null}
        />
      </aside>
    </div>
  );
}

function startOf(dto: DutiesDto, saved: DutyDto | null, model: DutyModel['model']): DutyFormValues {
  const inputs = saved?.duty?.model === model ? inputsOf(saved.duty) : blankInputs(model);
  const tryOnHeaderId = saved?.headerId ?? dto.headers[0]?.id ?? '';
  return { name: saved?.name ?? '', tryOnHeaderId, duty: { model, inputs } };
}

const send = (saved: DutyDto | null, values: DutyFormValues): Promise<{ readonly id: string }> =>
  saved
    ? api(`/api/duties/${saved.id}`, { method: 'POST', body: { ...values, revision: saved.revision } })
    : api('/api/duties', { method: 'POST', body: values });

const leave = (): void => window.location.assign('/duties');

/** Takes an unused duty out of use; says why not where that is refused. */
function Retire({ saved }: { readonly saved: DutyDto }) {
  const [refusal, setRefusal] = useState('');
  if (saved.uses.length > 0) return null;
  const retire = async (): Promise<void> => {
    try {
      await api(`/api/duties/${saved.id}/retire`, { method: 'POST', body: { revision: saved.revision } });
      leave();
    } catch (error) {
      setRefusal(messageOf(error));
    }
  };
  return (
    <div className="mr-auto flex flex-wrap items-center gap-3">
      <Button look="over" onClick={() => void retire()}>
        Take out of use
      </Button>
      {refusal === '' ? null : (
        <p role="alert" className="text-sm text-over">
          {refusal}
        </p>
      )}
    </div>
  );
}
