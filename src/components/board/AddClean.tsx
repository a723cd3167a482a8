import { useEffect, useMemo } from 'react';
import { cleaningPlanSchema, type CleaningPlanDto } from '../../contracts/cleanings';
import type { PlantModel } from '../../core/plant/plant';
import { cleanableUnits, longestRule } from '../../core/schedule/plannedCleaning';
import { api } from '../query/api';
import { spanText } from '../time';
import { Dialog } from '../ui/Dialog';
import { FormActions } from '../ui/form/FormActions';
import { SelectInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { CLEAN_WORDS, fullCleanOf, kindsOf } from './cleans';

interface Props {
  readonly weekStart: string;
  readonly plant: PlantModel;
  /** Chosen to begin with; null: the first that is cleaned at all. */
  readonly unitId: string | null;
  readonly onClose: () => void;
  readonly onAdded: (added: CleaningPlanDto) => void;
}

/** Asks which unit to clean and how; the plant's rules say what that takes. */
export function AddClean({ weekStart, plant, unitId, onClose, onAdded }: Props) {
  const cleanable = useMemo(() => cleanableUnits(plant), [plant]);
  const kindFor = (id: string) => fullCleanOf(cleanable, id) ?? kindsOf(cleanable, id)[0] ?? 'wash';
  const first = unitId ?? cleanable[0]?.unit.id ?? '';
  const form = useZodForm(cleaningPlanSchema, { unitId: first, kind: kindFor(first) });
  const add = useSave(
    form,
    (body) => api<CleaningPlanDto>(`/api/weeks/${weekStart}/cleanings`, { method: 'POST', body }),
    onAdded,
  );
  const chosen = form.watch();
  const kinds = kindsOf(cleanable, chosen.unitId);
  const otherKind = kinds.length > 0 && !kinds.includes(chosen.kind) ? kindFor(chosen.unitId) : null;
  useEffect(() => {
    if (otherKind) form.setValue('kind', otherKind);
  }, [form, otherKind]);
  const unitKind = cleanable.find(({ unit }) => unit.id === chosen.unitId)?.unit.kind ?? 'other';
  const rule = longestRule(plant.cleaning, unitKind, otherKind ?? chosen.kind);
  const takes = rule ? `At least ${spanText(rule.minutes)}: the longest of the plant’s rules for it.` : '';
  return (
    <Dialog open title="Add a clean" onClose={onClose}>
      <form onSubmit={add.submit} noValidate>
        <div className="grid grid-cols-2 gap-x-3 max-sm:grid-cols-1">
          <SelectInput
            control={form.control}
            name="unitId"
            label="Unit"
            options={cleanable.map(({ unit }) => ({ value: unit.id, label: unit.name }))}
          />
          <SelectInput
            control={form.control}
            name="kind"
            label="Kind"
            options={kinds.map((kind) => ({ value: kind, label: CLEAN_WORDS[kind] }))}
          />
        </div>
        <p className="text-sm text-ink-muted">
          {takes}
          {chosen.kind === 'rinse' ? ' A rinse is no full clean.' : ''} It waits among the not yet placed: drag it onto
          the unit, or pick it up with Enter.
        </p>
        <FormActions state={add.state} save="Add it" onCancel={onClose} cancel="Not now" />
      </form>
    </Dialog>
  );
}
