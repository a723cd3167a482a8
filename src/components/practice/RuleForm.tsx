import { useEffect, useState } from 'react';
import type { Control, UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { NO_SOURCE, PRACTICE_SCHEMAS, type PracticeDto, type PracticeRuleKind } from '../../contracts/practice';
import { api } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import { fieldsOf, KIND_WORDS } from './words';

interface Props {
  readonly kind: PracticeRuleKind;
  readonly practice: PracticeDto;
  readonly groupId: string | null;
  readonly onSaved: (practice: PracticeDto) => void;
  readonly onLeave: () => void;
}

type FormValues = Record<string, unknown>;
type FormControl = Control<FormValues, unknown, unknown>;

/** The form starts from what is in force. */
function filled(kind: PracticeRuleKind, practice: PracticeDto, groupId: string | null): FormValues {
  const empty = Object.fromEntries(fieldsOf(kind).map(({ name }) => [name, null]));
  const numbers = practice.ventGroups.find(({ id }) => id === groupId)?.numbers;
  const rule = practice.rules.find((one) => one.kind === kind && one.released && !one.withdrawnAt);
  const standing = kind === 'ventGroup' ? numbers : rule?.values;
  const values = Object.fromEntries(
    Object.keys(empty).map((name) => [name, (standing as FormValues | undefined)?.[name] ?? null]),
  );
  return { kind, ventGroupId: kind === 'ventGroup' ? groupId : null, values, source: '' };
}

/** A vent group that is chosen brings the numbers that it stands at, unless some were typed. */
function useGroupNumbers(form: UseFormReturn<FormValues>, kind: PracticeRuleKind, practice: PracticeDto): void {
  const groupId = form.watch('ventGroupId');
  useEffect(() => {
    const values = (form.getValues('values') ?? {}) as FormValues;
    const isEmpty = Object.values(values).every((value) => value === null || value === undefined);
    if (typeof groupId !== 'string' || !isEmpty) return;
    form.setValue('values', filled(kind, practice, groupId).values);
  }, [form, groupId, kind, practice]);
}

/** Enters a rule as it shall be; it holds once the quality lead has released it. */
export function RuleForm({ kind, practice, groupId, onSaved, onLeave }: Props) {
  const schema = PRACTICE_SCHEMAS[kind] as unknown as z.ZodType<FormValues, FormValues>;
  const [start] = useState(() => filled(kind, practice, groupId));
  const form = useZodForm(schema, start);
  const control = form.control as unknown as FormControl;
  const save = useSave(form, (values) => api<PracticeDto>('/api/practice', { method: 'POST', body: values }), onSaved);
  const typed: FormValues = form.watch();
  useGroupNumbers(form, kind, practice);
  const groups = practice.ventGroups.map(({ id, name }) => ({ value: id, label: name }));
  return (
    <form noValidate onSubmit={save.submit} aria-labelledby="rule-form">
      <div className="flex items-start justify-between gap-3">
        <h2 id="rule-form" className="text-xl">
          {KIND_WORDS[kind].title}
        </h2>
        <Button look="quiet" size="small" onClick={onLeave}>
          Close
        </Button>
      </div>
      <p className="mt-1 text-sm text-ink-muted">{KIND_WORDS[kind].says}</p>
      <div className="mt-4 grid gap-x-4 gap-y-1 sm:grid-cols-2">
        {kind === 'ventGroup' ? (
          <SelectInput {...{ control }} name="ventGroupId" label="Vent group" options={groups} none="choose …" />
        ) : null}
        {fieldsOf(kind).map(({ name, range, mayBeEmpty }) => (
          <NumberField
            key={name}
            {...{ control }}
            name={`values.${name}`}
            label={range.name}
            unit={range.unit}
            min={range.min}
            max={range.max}
            {...(mayBeEmpty ? { hint: 'empty: not set' } : {})}
          />
        ))}
      </div>
      <PressureSaid {...{ practice }} typed={typed} />
      <TextInput
        {...{ control }}
        name="source"
        label="Source"
        hint="study, regulation or document, with its issue"
        className="mt-2"
      />
      <Button size="small" onClick={() => form.setValue('source', NO_SOURCE, { shouldValidate: true })}>
        It is {NO_SOURCE}
      </Button>
      <FormActions state={save.state} save="Enter the rule" />
    </form>
  );
}

/** A least header pressure that a header of the group's retorts does not reach. */
function PressureSaid({ practice, typed }: { readonly practice: PracticeDto; readonly typed: FormValues }) {
  const units = useUnits();
  const group = practice.ventGroups.find(({ id }) => id === typed.ventGroupId);
  const least = (typed.values as FormValues | undefined)?.leastHeaderBarG;
  if (!group || typeof least !== 'number') return null;
  const low = group.headers.filter(({ pressureBarG }) => pressureBarG < least);
  return low.map(({ name, pressureBarG }) => (
    <Notice key={name} look="caution" className="my-2">
      {name} is set to {units.text('gaugePressure', pressureBarG)}: with {units.text('gaugePressure', least)} as the
      least, every vent of {group.name} is over a process limit.
    </Notice>
  ));
}
