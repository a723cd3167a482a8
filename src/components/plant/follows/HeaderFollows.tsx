import type { ThingValues } from '../../../contracts/plantLibrary';
import { toGauge } from '../../../core/quantity/pressure';
import type { SteamState } from '../../../core/steam/steamState';
import { ambientOf } from '../../../contracts/plantChecks';
import type { Units } from '../../units';
import { Notice } from '../../ui/Notice';
import { useUnits } from '../../ui/units';
import { arrivalsOf, headerState, type Arrival, type Typed } from '../facts';
import type { FormContext } from '../fields';
import { Facts, NotYet, WorkingLink } from './Facts';

function stateText(state: SteamState, ambient: ReturnType<typeof ambientOf>, units: Units): string {
  const pressure = units.text('gaugePressure', toGauge(state.pressure, ambient));
  if (state.kind === 'superheated') {
    return `${pressure}, ${units.text('temperatureDifference', state.superheatK)} superheat`;
  }
  return `${pressure}, ${state.dryness === 1 ? 'dry' : `x ${state.dryness.toFixed(3)}`}`;
}

function ArrivalSaid({ arrival, library }: { readonly arrival: Arrival; readonly library: FormContext['library'] }) {
  const units = useUnits();
  const { name, byValve, says, isWrong } = arrival;
  if (!byValve.ok) return <Notice look="over">{units.sentence(byValve.error.message)}</Notice>;
  return (
    <div className="space-y-2">
      {isWrong || says.length === 0 ? (
        <p className="text-sm">
          By the valve alone, steam of {name} arrives at {stateText(byValve.value, ambientOf(library), units)},{' '}
          {units.text('enthalpy', byValve.value.h, 1)}.
        </p>
      ) : null}
      {says.map((said) => (
        <Notice key={said} look={isWrong ? 'over' : 'note'}>
          {units.sentence(said)}
        </Notice>
      ))}
    </div>
  );
}

/** State of a header as typed, and what the valves that feed it would give. */
export function HeaderFollows({ typed, id, library }: FormContext) {
  const units = useUnits();
  const header = typed as Typed<ThingValues<'headers'>>;
  const state = headerState(header, library);
  if (!state.ok) return <NotYet>{units.sentence(state.error.message)}</NotYet>;
  const { temperature, h, hg, v } = state.value;
  const facts = [
    { name: 'Temperature', value: units.text('temperature', temperature) },
    { name: 'Enthalpy of the steam', value: units.text('enthalpy', h, 1) },
    { name: 'Of dry steam at this pressure', value: units.text('enthalpy', hg, 1) },
    { name: 'Density', value: units.text('density', 1 / v, 2) },
  ];
  const arrivals = arrivalsOf(header, id, library);
  return (
    <Facts facts={facts}>
      {arrivals.map((arrival) => (
        <ArrivalSaid key={arrival.name} {...{ arrival, library }} />
      ))}
      {arrivals.length === 0 ? <NotYet>Nothing feeds it yet.</NotYet> : null}
      {id ? <WorkingLink href={`/working/header/${id}`} /> : null}
    </Facts>
  );
}
