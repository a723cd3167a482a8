import type { PlantLibraryDto, Thing, ThingKind, ThingValues } from '../../contracts/plantLibrary';
import type { Units } from '../units';
import { boilerFacts, releaseKg } from './facts';
import { hourText } from './hours';
import { UNIT_KIND_WORDS } from './kinds';

/** Figures stand to the right. */
export interface Column {
  readonly title: string;
  readonly isFigure?: boolean;
  /** Stays where there is little room. */
  readonly isKey?: boolean;
}

export interface Listing<K extends ThingKind> {
  readonly columns: readonly Column[];
  readonly name: (values: ThingValues<K>) => string;
  /** The cells after the name. */
  readonly cells: (thing: Thing<K>, library: PlantLibraryDto, units: Units) => readonly string[];
}

const NONE = '–';
const column = (title: string): Column => ({ title });
const figure = (title: string): Column => ({ title, isFigure: true });
const key = (its: Column): Column => ({ ...its, isKey: true });

/** A thing's name, retired or not; a dash for none. */
export function nameOf(library: PlantLibraryDto, kind: 'headers' | 'lines' | 'ventGroups', id: string | null): string {
  const things: readonly { readonly id: string; readonly values: { readonly name: string } }[] = library.things[kind];
  return things.find((thing) => thing.id === id)?.values.name ?? NONE;
}

/** How dry a header is: 'x 0.98', '20 K superheat'. */
export function qualityText({ dryness, superheatK }: ThingValues<'headers'>, units: Units): string {
  if (superheatK !== null) return `${units.text('temperatureDifference', superheatK)} superheat`;
  return dryness === 1 || dryness === null ? 'dry' : `x ${dryness}`;
}

function capacityText({ capacity, unit }: ThingValues<'sharedLimits'>): string {
  const values = capacity.map(({ value }) => value);
  const [least, greatest] = [Math.min(...values), Math.max(...values)];
  return least === greatest ? `${least} ${unit}` : `${least} to ${greatest} ${unit}`;
}

export const LISTINGS: { readonly [K in ThingKind]: Listing<K> } = {
  headers: {
    columns: [column('Header'), key(figure('Pressure')), column('State'), column('Fed by')],
    name: ({ name }) => name,
    cells: ({ values }, library, units) => [
      units.text('gaugePressure', values.pressureBarG),
      qualityText(values, units),
      values.feedKind === 'boilers' ? 'boilers' : nameOf(library, 'headers', values.feedFromHeaderId),
    ],
  },
  boilers: {
    columns: [column('Boiler'), column('Header'), figure('Rating'), key(figure('Net export'))],
    name: ({ name }) => name,
    cells: ({ values }, library, units) => {
      const facts = boilerFacts(values, library);
      return [
        nameOf(library, 'headers', values.headerId),
        units.text('steamRate', values.ratingFromAndAtKgPerH),
        facts.ok ? units.text('steamRate', facts.value.netKgPerH) : NONE,
      ];
    },
  },
  units: {
    columns: [column('Unit'), column('Line'), key(column('Kind')), column('Header'), column('Vent group')],
    name: ({ name }) => name,
    cells: ({ values }, library) => [
      nameOf(library, 'lines', values.lineId),
      UNIT_KIND_WORDS[values.kind],
      nameOf(library, 'headers', values.headerId),
      nameOf(library, 'ventGroups', values.ventGroupId),
    ],
  },
  ventGroups: {
    columns: [column('Vent group'), key(figure('Vents at once')), figure('Steam ons at once'), figure('Retorts')],
    name: ({ name }) => name,
    cells: ({ id }, library) => {
      const numbers = library.ventNumbers[id];
      const retorts = library.things.units.filter(({ retiredAt, values }) => !retiredAt && values.ventGroupId === id);
      return [String(numbers?.ventsAtOnce ?? NONE), String(numbers?.steamOnsAtOnce ?? NONE), String(retorts.length)];
    },
  },
  accumulators: {
    columns: [column('Accumulator'), column('Charged from'), column('Feeds'), key(figure('Gives up'))],
    name: ({ name }) => name,
    cells: ({ values }, library, units) => {
      const kg = releaseKg(values, library);
      return [
        nameOf(library, 'headers', values.chargedFromHeaderId),
        nameOf(library, 'headers', values.feedsHeaderId),
        kg.ok ? units.text('mass', kg.value) : NONE,
      ];
    },
  },
  sharedLimits: {
    columns: [column('Shared limit'), key(figure('Capacity'))],
    name: ({ name }) => name,
    cells: ({ values }) => [capacityText(values)],
  },
  baseLoads: {
    columns: [column('Base load'), column('Header'), column('Hours'), key(figure('Draws'))],
    name: ({ note }) => note,
    cells: ({ values }, library, units) => [
      nameOf(library, 'headers', values.headerId),
      `${hourText(values.fromHour, library.weekStartsOn)} to ${hourText(values.toHour, library.weekStartsOn)}`,
      units.text('steamRate', values.kgPerH),
    ],
  },
  lines: {
    columns: [column('Line'), key(figure('Units'))],
    name: ({ name }) => name,
    cells: ({ id }, library) => [
      String(library.things.units.filter(({ retiredAt, values }) => !retiredAt && values.lineId === id).length),
    ],
  },
};
