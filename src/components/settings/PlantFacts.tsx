import type { ReactNode } from 'react';
import type { PlantSettingsDto } from '@/contracts/settings';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import { altitudeMeans } from './ambient';
import { UNIT_WORDS } from './words';

/** The plant's settings to be read, by those who may not set them. */
export function PlantFacts({ plant, whoMay }: { readonly plant: PlantSettingsDto; readonly whoMay: string }) {
  const units = useUnits();
  const { values, timeZone } = plant;
  const price = values.fuelPricePerKWh;
  return (
    <>
      <Notice title="To be read">{whoMay}</Notice>
      <div className="mt-5">
        <TimeZone timeZone={timeZone} />
      </div>
      <dl className="mt-4 grid grid-cols-[10rem_1fr] gap-y-2 border-t border-rule pt-4 text-sm">
        <Fact name="Units of the plant">{UNIT_WORDS[values.units]}</Fact>
        <Fact name="Altitude">
          {units.text('length', values.altitudeM, 0)}
          <span className="block text-ink-muted">{altitudeMeans(values.altitudeM, units)}</span>
        </Fact>
        <Fact name="Reserve">{units.text('share', values.reserveFraction)} of the net export</Fact>
        <Fact name="Pressure sag at a step">{units.text('pressureDifference', values.sagToleranceBar, 2)}</Fact>
        <Fact name="Snap on the board">{values.snapMinutes} min</Fact>
        <Fact name="Fuel price">
          {price === null ? 'not said' : `${values.currency} ${units.text('energyPrice', price)}`}
        </Fact>
      </dl>
    </>
  );
}

function Fact({ name, children }: { readonly name: string; readonly children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-muted">{name}</dt>
      <dd className="font-medium">{children}</dd>
    </>
  );
}

/** The plant's clock, and why nobody changes it here. */
export function TimeZone({ timeZone }: { readonly timeZone: string }) {
  return (
    <p className="text-sm">
      <span className="label block">Time zone</span>
      <span className="font-medium">{timeZone}</span>
      <span className="block text-ink-muted">
        Fixed: plans, issues and the record stand on the plant’s clock, and a change would move them all.
      </span>
    </p>
  );
}
