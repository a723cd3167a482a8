import { boilerExport, type BoilerExport } from '../../core/duty/boilerExport';
import { shortNumber } from '../../core/quantity/range';
import type { BarAbsolute } from '../../core/quantity/units';
import type { Result } from '../../core/result';
import { THING_SCHEMAS, type ThingValues } from '../plantLibrary';
import { ambientOf, inUse, steamOfHeader, type CheckContext, type Fault, type Given } from './context';

const FIELDS: Readonly<Record<string, string>> = {
  boilerPressureBarG: 'pressureBarG',
  feedTankPressureBarG: 'feedTankBarG',
};

/** What a boiler sends to a header, fully lit. @returns as core's `boilerExport`, or what is wrong with the header. */
export function exportOf(
  boiler: ThingValues<'boilers'>,
  header: Pick<ThingValues<'headers'>, 'pressureBarG' | 'dryness' | 'superheatK'>,
  ambient: BarAbsolute,
): Result<BoilerExport> {
  const steam = steamOfHeader(header, ambient);
  if (!steam.ok) return steam;
  const house = { ...boiler, boilerPressureBarG: boiler.pressureBarG, feedTankPressureBarG: boiler.feedTankBarG };
  return boilerExport(house, { header: steam.value, ambient });
}

function headerOf({ headerId, pressureBarG }: Given<'boilers'>, { library }: CheckContext): Fault[] {
  if (headerId === undefined) return [];
  const header = inUse(library, 'headers', headerId)?.values;
  if (!header) return [{ path: 'headerId', message: 'There is no such header in use.' }];
  if (header.feedKind !== 'boilers') {
    return [{ path: 'headerId', message: `${header.name} is fed by a letdown: choose a header that boilers feed.` }];
  }
  if (pressureBarG === undefined || pressureBarG >= header.pressureBarG) return [];
  const least = `${shortNumber(header.pressureBarG)} bar g (${header.name})`;
  return [
    {
      path: 'pressureBarG',
      message: `Boiler pressure is ${shortNumber(pressureBarG)} bar g; it must be at least ${least}.`,
    },
  ];
}

/** Feed tank against boiler, where the rest does not stand in the way of working the export out. */
function tank({ pressureBarG, feedTankBarG }: Given<'boilers'>): Fault[] {
  if (pressureBarG === undefined || feedTankBarG === undefined || feedTankBarG < pressureBarG) return [];
  const boiler = `${shortNumber(pressureBarG)} bar g (boiler)`;
  const message = `Feed tank pressure is ${shortNumber(feedTankBarG)} bar g; it must be below ${boiler}.`;
  return [{ path: 'feedTankBarG', message }];
}

function readiness({ warmReadyMinutes, coldReadyMinutes }: Given<'boilers'>): Fault[] {
  if (warmReadyMinutes === undefined || coldReadyMinutes === undefined) return [];
  if (warmReadyMinutes <= coldReadyMinutes) return [];
  const cold = `${coldReadyMinutes} min; it must be at least ${warmReadyMinutes} min (warm)`;
  return [{ path: 'coldReadyMinutes', message: `To pressure, cold, is ${cold}.` }];
}

const whole = (given: Given<'boilers'>): given is ThingValues<'boilers'> =>
  Object.keys(THING_SCHEMAS.boilers.shape).every((field) => given[field as keyof typeof given] !== undefined);

function works(boiler: Given<'boilers'>, { library }: CheckContext): Fault[] {
  const header = inUse(library, 'headers', boiler.headerId)?.values;
  if (!header || !whole(boiler)) return [];
  const found = exportOf(boiler, header, ambientOf(library));
  if (!found.ok) {
    const field = found.error.field ?? 'ratingFromAndAtKgPerH';
    return [{ path: FIELDS[field] ?? field, message: found.error.message }];
  }
  if (found.value.netKgPerH > 0) return [];
  const takes = `${Math.round(found.value.feedTankSteamKgPerH)} kg/h of the ${Math.round(found.value.grossKgPerH)} kg/h`;
  return [{ path: 'ratingFromAndAtKgPerH', message: `Nothing is left to export: the feed tank takes ${takes}.` }];
}

/** Everything about a boiler that its ranges don't say. */
export function boilerFaults(boiler: Given<'boilers'>, context: CheckContext): Fault[] {
  const own = [...headerOf(boiler, context), ...tank(boiler), ...readiness(boiler)];
  return own.length > 0 ? own : works(boiler, context);
}
