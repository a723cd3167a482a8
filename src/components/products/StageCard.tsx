import { useFieldArray, useFormState, useWatch, get, type Control } from 'react-hook-form';
import { ROUTE_RANGES, STAGES, STAGE_NAMES, type RouteChoicesDto, type RouteRequest } from '@/contracts/products';
import { Button } from '../ui/Button';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput } from '../ui/form/TextInput';
import { useUnits } from '../ui/units';
import { DemandOutline } from '../working/DemandOutline';
import { emptyUnit, modeOf, type TypedStage } from './routeForm';
import { UsesEditor } from './UsesEditor';

type RouteControl = Control<RouteRequest, unknown, RouteRequest>;

interface Props {
  readonly control: RouteControl;
  readonly choices: RouteChoicesDto;
  readonly index: number;
  readonly isLast: boolean;
  readonly onUp: () => void;
  readonly onDown: () => void;
  readonly onRemove: () => void;
}

const STAGE_OPTIONS = STAGES.map((value) => ({ value, label: STAGE_NAMES[value] }));

/** One stage: its units, and what a run draws on each. */
export function StageCard({ control, choices, index, isLast, onUp, onDown, onRemove }: Props) {
  const name = `stages.${index}` as const;
  const units = useFieldArray({ control, name: `${name}.units` });
  const { errors } = useFormState({ control });
  const found = get<object, { message?: string; root?: { message?: string } } | undefined>(errors, `${name}.units`);
  const fault = found?.root?.message ?? found?.message;
  return (
    <li className="rounded-md border border-rule bg-surface px-4 pt-3 pb-4">
      <div className="flex flex-wrap items-start gap-x-3">
        <span className="mt-7 w-6 text-md font-semibold">{index + 1}</span>
        <SelectInput control={control} name={`${name}.stage`} label="Stage" options={STAGE_OPTIONS} className="w-52" />
        <span className="mt-6 ml-auto flex gap-1">
          <Button
            look="quiet"
            size="small"
            disabled={index === 0}
            onClick={onUp}
            aria-label={`Stage ${index + 1} earlier`}
          >
            Earlier
          </Button>
          <Button look="quiet" size="small" disabled={isLast} onClick={onDown} aria-label={`Stage ${index + 1} later`}>
            Later
          </Button>
          <Button look="quiet" size="small" onClick={onRemove} aria-label={`Take stage ${index + 1} out`}>
            Remove
          </Button>
        </span>
      </div>
      <ul className="divide-y divide-rule border-t border-rule">
        {units.fields.map((field, row) => (
          <UnitRow
            key={field.id}
            {...{ control, choices, stage: index, row, isOnly: units.fields.length === 1 }}
            onRemove={() => units.remove(row)}
          />
        ))}
      </ul>
      {fault ? <p className="text-xs text-over">{fault}</p> : null}
      <Button size="small" className="mt-3" onClick={() => units.append(emptyUnit() as never)}>
        Another unit can do it
      </Button>
      <UsesEditor control={control as never} name={`${name}.uses`} limits={choices.limits} />
    </li>
  );
}

interface RowProps {
  readonly control: RouteControl;
  readonly choices: RouteChoicesDto;
  readonly stage: number;
  readonly row: number;
  readonly isOnly: boolean;
  readonly onRemove: () => void;
}

function UnitRow({ control, choices, stage, row, isOnly, onRemove }: RowProps) {
  const name = `stages.${stage}.units.${row}` as const;
  const units = choices.units.map(({ id, name: unit, lineName }) => ({ value: id, label: `${unit}, ${lineName}` }));
  const duties = choices.duties.map(({ id, name: duty, title }) => ({ value: id, label: `${duty} (${title})` }));
  const minutes = (field: 'leadMin' | 'afterMin' | 'minutes') => {
    const { name: label, min, max } = ROUTE_RANGES[field];
    return { control, name: `${name}.${field}` as const, label, unit: 'min', min, max };
  };
  return (
    <li className="grid grid-cols-1 gap-x-4 pt-4 lg:grid-cols-[minmax(0,1fr)_15rem]">
      <div className="grid grid-cols-1 gap-x-3 gap-y-1 sm:grid-cols-6">
        <SelectInput
          {...{ control, name: `${name}.unitId`, label: 'Unit', options: [{ value: '', label: 'choose…' }, ...units] }}
          className="sm:col-span-3"
        />
        <SelectInput
          {...{ control, name: `${name}.dutyId`, label: 'Duty', options: duties, none: 'none: draws no steam' }}
          className="sm:col-span-3"
        />
        <NumberField {...minutes('leadMin')} className="sm:col-span-2" />
        <NumberField {...minutes('afterMin')} className="sm:col-span-2" />
        <NumberField {...minutes('minutes')} className="sm:col-span-2" />
      </div>
      <div className="flex items-start justify-between gap-3 pb-3">
        <ModeShown {...{ control, choices, stage, row }} />
        <Button look="quiet" size="small" disabled={isOnly} onClick={onRemove} aria-label="Take this unit out">
          Remove
        </Button>
      </div>
    </li>
  );
}

function ModeShown({ control, choices, stage, row }: Pick<RowProps, 'control' | 'choices' | 'stage' | 'row'>) {
  const units = useUnits();
  const typed = useWatch({ control, name: `stages.${stage}` }) as unknown as TypedStage | undefined;
  const unit = typed?.units[row];
  if (!unit) return null;
  const mode = modeOf(choices, unit);
  if (!mode.ok) return <p className="text-xs text-ink-muted">{units.sentence(mode.error.message)}</p>;
  const { phases, minutes, between, warm, neverMoved } = mode.value;
  const header = choices.headers.find(({ id }) => id === choices.units.find((u) => u.id === unit.unitId)?.headerId);
  const peak = Math.max(0, ...phases.map((phase) => phase.steamKgPerH));
  const more = [
    between ? `kept hot for up to ${between.idleUpToMin} min between runs` : '',
    warm ? 'less after a short gap' : '',
    neverMoved ? 'never moved once it runs' : '',
  ].filter((text) => text !== '');
  return (
    <div className="min-w-0 space-y-1">
      {phases.length > 0 ? <DemandOutline small grid={phases} minutes={minutes} /> : null}
      <p className="text-sm">
        {minutes} min door to door{peak > 0 ? `, at most ${units.text('steamRate', peak)}` : ', no steam'}
      </p>
      <p className="text-xs text-ink-muted">
        {[header ? `on the ${header.name.toLowerCase()}` : '', ...more].filter(Boolean).join('; ')}
      </p>
    </div>
  );
}
