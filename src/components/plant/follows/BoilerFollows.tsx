import { boilerHorsepower } from '../../../core/quantity/display';
import { groupDigits } from '../../time';
import { useUnits } from '../../ui/units';
import { boilerFacts } from '../facts';
import type { FormContext } from '../fields';
import { Facts, NotYet, WorkingLink } from './Facts';

/** US plants know a boiler by its horsepower. */
const horsepowerText = (fromAndAtKgPerH: number): string =>
  `${groupDigits(boilerHorsepower(fromAndAtKgPerH))}\u00a0boiler hp`;

/** From rating to net export, as typed. */
export function BoilerFollows({ typed, id, library }: FormContext) {
  const units = useUnits();
  const found = boilerFacts(typed, library);
  if (!found.ok) return <NotYet>{units.sentence(found.error.message)}</NotYet>;
  const of = found.value;
  const facts = [
    ...(units.system === 'si' ? [] : [{ name: 'Rating', value: horsepowerText(of.grossKgPerH / of.factor) }]),
    { name: 'Factor from the rating', value: of.factor.toFixed(3) },
    { name: 'Gross evaporation', value: units.text('steamRate', of.grossKgPerH) },
    { name: 'Steam for the feed tank', value: units.text('steamRate', of.feedTankSteamKgPerH) },
    { name: `Net export at ${of.headerName}`, value: units.text('steamRate', of.netKgPerH) },
    { name: 'Greatest rise', value: units.text('steamRateRise', of.riseKgPerHPerMin) },
    { name: 'Turned down to', value: units.text('steamRate', of.turnedDownKgPerH) },
    {
      name: 'Stored in its water',
      value: `${units.text('mass', of.storedKgPerBar / (units.shown('pressureDifference', 1) || 1))} per ${units.symbol('pressureDifference')}`,
    },
  ];
  return <Facts facts={facts}>{id ? <WorkingLink href={`/working/boiler/${id}`} /> : null}</Facts>;
}
