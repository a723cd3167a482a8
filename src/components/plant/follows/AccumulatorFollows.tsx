import type { ThingValues } from '../../../contracts/plantLibrary';
import { useUnits } from '../../ui/units';
import { releaseKg, type Typed } from '../facts';
import type { FormContext } from '../fields';
import { Facts, NotYet } from './Facts';

const minutes = (kg: number, kgPerH: number | null | undefined): string =>
  kgPerH && kgPerH > 0 ? `${Math.round((kg / kgPerH) * 60)} min` : '–';

/** What an accumulator carries, as typed. */
export function AccumulatorFollows({ typed, library }: FormContext) {
  const units = useUnits();
  const accumulator = typed as Typed<ThingValues<'accumulators'>>;
  const kg = releaseKg(accumulator, library);
  if (!kg.ok) return <NotYet>{units.sentence(kg.error.message)}</NotYet>;
  const facts = [
    { name: 'Gives up between the pressures', value: units.text('mass', kg.value) },
    { name: 'Lasts at its greatest discharge', value: minutes(kg.value, accumulator.greatestDischargeKgPerH) },
    { name: 'Filled at its greatest charge in', value: minutes(kg.value, accumulator.greatestChargeKgPerH) },
    {
      name: 'In store when the week begins',
      value: units.text('mass', kg.value * (accumulator.shareAtWeekStart ?? 0)),
    },
  ];
  return <Facts facts={facts} />;
}
