import { useWatch } from 'react-hook-form';
import { PLANT_RANGES, plantSettingsSchema, type PlantSettings, type PlantSettingsDto } from '@/contracts/settings';
import { api } from '../query/api';
import { Button } from '../ui/Button';
import { Form } from '../ui/form/Form';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave, type SaveState } from '../ui/form/useSave';
import { useZodForm, type ZodForm } from '../ui/form/useZodForm';
import { useUnits } from '../ui/units';
import { altitudeMeans } from './ambient';
import { TimeZone } from './PlantFacts';
import { optionsOf, UNIT_WORDS } from './words';

interface Props {
  readonly plant: PlantSettingsDto;
  readonly onSaved: (plant: PlantSettingsDto) => void;
}

type Form = ZodForm<typeof plantSettingsSchema>;

const END = ({ min, max }: { readonly min: number; readonly max: number }) => ({ min, max });

/** What the administrator sets for the plant. */
export function PlantForm({ plant, onSaved }: Props) {
  const form = useZodForm(plantSettingsSchema, plant.values);
  const take = (next: PlantSettingsDto): void => {
    form.reset(next.values);
    onSaved(next);
  };
  const save = (values: PlantSettings): Promise<PlantSettingsDto> =>
    api<PlantSettingsDto>('/api/settings/plant', { method: 'POST', body: { values, was: plant.values } });
  const { state, submit, clear } = useSave(form, save, take);
  const standing = standingOf(state);
  return (
    <Form onSubmit={submit}>
      <Place form={form} timeZone={plant.timeZone} />
      <Judging form={form} />
      <Fuel form={form} />
      <FormActions state={state} save="Save the plant’s settings" saved="Saved, and in force for everybody.">
        {standing ? (
          <Button
            onClick={() => {
              clear();
              take(standing);
            }}
          >
            Show what is now
          </Button>
        ) : null}
      </FormActions>
    </Form>
  );
}

/** The settings as somebody else has left them, where the save came too late. */
function standingOf(state: SaveState): PlantSettingsDto | null {
  const body = state.kind === 'failed' && state.problem?.problem.code === 'SETTINGS-STALE' ? state.problem.body : null;
  return typeof body === 'object' && body !== null && 'now' in body ? (body.now as PlantSettingsDto) : null;
}

function Place({ form, timeZone }: { readonly form: Form; readonly timeZone: string }) {
  const units = useUnits();
  const { control } = form;
  const altitudeM = useWatch({ control, name: 'altitudeM' });
  return (
    <fieldset>
      <legend className="sr-only">Place and units</legend>
      <TimeZone timeZone={timeZone} />
      <div className="mt-4 grid gap-x-5 sm:grid-cols-2">
        <SelectInput
          control={control}
          name="units"
          label="Units of the plant"
          options={optionsOf(UNIT_WORDS)}
          hint="For all who have not chosen their own."
        />
        <NumberField
          control={control}
          name="altitudeM"
          label="Altitude"
          quantity="length"
          {...END(PLANT_RANGES.altitudeM)}
        />
      </div>
      <p className="mb-4 text-sm text-ink-muted" aria-live="polite" data-testid="altitude-means">
        {altitudeMeans(altitudeM, units) ?? 'Gauge pressures are counted from the ambient pressure at this altitude.'}
      </p>
    </fieldset>
  );
}

function Judging({ form: { control } }: { readonly form: Form }) {
  return (
    <fieldset className="mt-3 border-t border-rule pt-4">
      <legend className="label float-left mb-2 w-full">How a plan is judged</legend>
      <div className="clear-both grid gap-x-5 sm:grid-cols-3">
        <NumberField
          control={control}
          name="reserveFraction"
          label="Reserve"
          quantity="share"
          hint="Of the net export, kept back from the plan."
          {...END(PLANT_RANGES.reserveFraction)}
        />
        <NumberField
          control={control}
          name="sagToleranceBar"
          label="Pressure sag at a step"
          quantity="pressureDifference"
          hint="A step is too steep beyond it."
          {...END(PLANT_RANGES.sagToleranceBar)}
        />
        <NumberField
          control={control}
          name="snapMinutes"
          label="Snap on the board"
          unit="min"
          hint="For the hand only, not for levelling."
          {...END(PLANT_RANGES.snapMinutes)}
        />
      </div>
    </fieldset>
  );
}

function Fuel({ form: { control } }: { readonly form: Form }) {
  return (
    <fieldset className="mt-3 border-t border-rule pt-4">
      <legend className="label float-left mb-2 w-full">Fuel</legend>
      <div className="clear-both grid gap-x-5 sm:grid-cols-3">
        <TextInput control={control} name="currency" label="Currency" maxLength={3} hint="Three letters." />
        <NumberField
          className="sm:col-span-2"
          control={control}
          name="fuelPricePerKWh"
          label="Fuel price"
          quantity="energyPrice"
          hint="On the heating value that the boilers’ fuel is counted on. Left empty: no cost is shown."
          {...END(PLANT_RANGES.fuelPricePerKWh)}
        />
      </div>
    </fieldset>
  );
}
