import { stationBalance } from '../../core/header/station';
import { shortNumber } from '../../core/quantity/range';
import type { Thing } from '../plantLibrary';
import { ambientOf, inUse, others, steamOfHeader, type CheckContext, type Fault, type Given } from './context';

type Header = Given<'headers'>;

/** Critical pressure of water and steam: IAPWS R7-97(2012), 22.064 MPa. [bar a] */
const CRITICAL_BAR_A = 220.64;

const FIELDS: Readonly<Record<string, string>> = { pressure: 'pressureBarG' };

function quality({ dryness, superheatK }: Header): Fault[] {
  if (dryness === undefined || superheatK === undefined) return [];
  if (dryness !== null && superheatK !== null) {
    const message = `Dryness ${shortNumber(dryness)} and superheat ${shortNumber(superheatK)} K exclude each other: give one.`;
    return [{ path: 'superheatK', message }];
  }
  if (dryness !== null || superheatK !== null) return [];
  return [{ path: 'dryness', message: 'Give the dryness fraction (1 is dry saturated), or the superheat.' }];
}

/** Wet steam above the critical pressure; else what core says of the state. */
function state(header: Header, raw: Readonly<Record<string, unknown>>, context: CheckContext): Fault[] {
  const gauge = raw.pressureBarG;
  const wet = typeof raw.dryness === 'number';
  if (wet && typeof gauge === 'number' && gauge + context.library.ambientBarA >= CRITICAL_BAR_A) {
    const at = `${shortNumber(gauge)} bar g`;
    const message = `At ${at} there is no wet steam: it ends at the critical pressure, ${CRITICAL_BAR_A} bar a.`;
    return [{ path: 'dryness', message }];
  }
  const { pressureBarG, dryness, superheatK } = header;
  if (pressureBarG === undefined || dryness === undefined || superheatK === undefined) return [];
  const found = steamOfHeader({ pressureBarG, dryness, superheatK }, ambientOf(context.library));
  if (found.ok) return [];
  const field = found.error.field ?? 'pressure';
  return [{ path: FIELDS[field] ?? field, message: found.error.message }];
}

/** True where the headers that feed `fromId`, upwards, come back to the header edited. */
function ring(fromId: string, context: CheckContext): boolean {
  const seen = new Set<string>();
  let next: string | null = fromId;
  while (next !== null && !seen.has(next)) {
    if (next === context.id) return true;
    seen.add(next);
    const feeding: Thing<'headers'> | undefined = inUse(context.library, 'headers', next);
    next = feeding?.values.feedKind === 'letdown' ? feeding.values.feedFromHeaderId : null;
  }
  return false;
}

function feedingHeader({ feedFromHeaderId, pressureBarG }: Header, context: CheckContext): Fault[] {
  const at = (message: string): Fault[] => [{ path: 'feedFromHeaderId', message }];
  if (!feedFromHeaderId) return at('Choose the header that the letdown takes its steam from.');
  if (feedFromHeaderId === context.id) return at('A header can’t be let down from itself.');
  const from = inUse(context.library, 'headers', feedFromHeaderId);
  if (!from) return at('There is no such header in use.');
  if (ring(feedFromHeaderId, context))
    return at(`${from.values.name} is itself fed from here: letdowns can’t go round.`);
  if (pressureBarG === undefined || pressureBarG < from.values.pressureBarG) return [];
  const pressures = `${shortNumber(pressureBarG)} bar g, ${from.values.name} ${shortNumber(from.values.pressureBarG)} bar g`;
  return [{ path: 'pressureBarG', message: `A letdown’s pressure is below its feed’s: this is ${pressures}.` }];
}

/** Steam stated with more heat than the valve can bring: nothing between the two headers heats it. */
function hotterThanFed(header: Header, context: CheckContext): Fault[] {
  const { name = '', feedFromHeaderId, pressureBarG, dryness, superheatK } = header;
  const from = feedFromHeaderId ? inUse(context.library, 'headers', feedFromHeaderId) : undefined;
  if (!from || pressureBarG === undefined || dryness === undefined || superheatK === undefined) return [];
  const ambient = ambientOf(context.library);
  const upstream = steamOfHeader(from.values, ambient);
  const stated = steamOfHeader({ pressureBarG, dryness, superheatK }, ambient);
  if (!upstream.ok || !stated.ok) return [];
  const balance = stationBalance({
    upstreamName: from.values.name,
    upstream: upstream.value,
    headerName: name || 'This header',
    stated: stated.value,
    kgPerH: 1,
    ambient,
  });
  if (balance.ok || balance.error.code !== 'STATION-HOTTER') return [];
  return [{ path: balance.error.field ?? 'dryness', message: balance.error.message }];
}

function letdownFlow({ greatestKgPerH, leastKgPerH }: Header): Fault[] {
  if (greatestKgPerH === null) {
    return [{ path: 'greatestKgPerH', message: 'Give the greatest flow that the letdown passes.' }];
  }
  if (greatestKgPerH === undefined || leastKgPerH === undefined || leastKgPerH === null) return [];
  if (leastKgPerH < greatestKgPerH) return [];
  const flows = `${shortNumber(leastKgPerH)} kg/h; it must be below ${shortNumber(greatestKgPerH)} kg/h (greatest flow)`;
  return [{ path: 'leastKgPerH', message: `Least flow of the letdown is ${flows}.` }];
}

function feed(header: Header, context: CheckContext): Fault[] {
  if (header.feedKind !== 'letdown') return [];
  const fed = context.library.things.boilers.filter(
    (boiler) => boiler.retiredAt === null && context.id !== null && boiler.values.headerId === context.id,
  );
  const boilers = fed.map(({ values }) => values.name).join(', ');
  const onIt: Fault[] = boilers
    ? [{ path: 'feedKind', message: `${boilers} stands on this header: it is fed by boilers.` }]
    : [];
  const feeding = feedingHeader(header, context);
  const hotter = feeding.length === 0 ? hotterThanFed(header, context) : [];
  return [...onIt, ...feeding, ...hotter, ...letdownFlow(header)];
}

function flashPressure(header: Header, from: { name: string; pressureBarG: number }): Fault[] {
  const { flashCondensateBarG: at, pressureBarG } = header;
  if (at === undefined || at === null) return [];
  const fault = (rest: string): Fault[] => [
    { path: 'flashCondensateBarG', message: `Condensate pressure is ${shortNumber(at)} bar g; it must be ${rest}.` },
  ];
  if (at > from.pressureBarG) return fault(`at most ${shortNumber(from.pressureBarG)} bar g (${from.name})`);
  if (pressureBarG === undefined || at > pressureBarG) return [];
  return fault(`above ${shortNumber(pressureBarG)} bar g (this header): else nothing flashes`);
}

function flash(header: Header, context: CheckContext): Fault[] {
  const { flashFromHeaderId, flashShare, flashCondensateBarG } = header;
  if (!flashFromHeaderId) return [];
  const at = (path: string, message: string): Fault[] => [{ path, message }];
  const missing = [
    ...(flashShare === null
      ? at('flashShare', 'Give the share of the condensate that comes to the flash vessel.')
      : []),
    ...(flashCondensateBarG === null
      ? at('flashCondensateBarG', 'Give the pressure that the condensate comes from.')
      : []),
  ];
  if (flashFromHeaderId === context.id) {
    return [...at('flashFromHeaderId', 'A header’s own condensate can’t flash into it.'), ...missing];
  }
  const from = inUse(context.library, 'headers', flashFromHeaderId);
  if (!from) return [...at('flashFromHeaderId', 'There is no such header in use.'), ...missing];
  return [...missing, ...flashPressure(header, from.values)];
}

/** What stands on or hangs from the header at the pressure that it had. */
function neighbours({ pressureBarG }: Header, context: CheckContext): Fault[] {
  if (pressureBarG === undefined || context.id === null) return [];
  const at = (rest: string): Fault => ({
    path: 'pressureBarG',
    message: `Header pressure is ${shortNumber(pressureBarG)} bar g; it must be ${rest}.`,
  });
  const boilers = context.library.things.boilers
    .filter(({ retiredAt, values }) => retiredAt === null && values.headerId === context.id)
    .filter(({ values }) => values.pressureBarG < pressureBarG)
    .map(({ values }) => at(`at most ${shortNumber(values.pressureBarG)} bar g (${values.name})`));
  const lower = others(context, 'headers')
    .filter(({ values }) => values.feedKind === 'letdown' && values.feedFromHeaderId === context.id)
    .filter(({ values }) => values.pressureBarG >= pressureBarG)
    .map(({ values }) => at(`above ${shortNumber(values.pressureBarG)} bar g (${values.name} is let down from it)`));
  return [...boilers, ...lower].slice(0, 1);
}

/** Everything about a header that its ranges don't say. */
export function headerFaults(header: Header, raw: Readonly<Record<string, unknown>>, context: CheckContext): Fault[] {
  return [
    ...quality(header),
    ...state(header, raw, context),
    ...feed(header, context),
    ...flash(header, context),
    ...neighbours(header, context),
  ];
}
