export { ambientOf, inUse, steamOfHeader } from './context';
export { exportOf } from './boiler';
import { z } from 'zod';
import { THING_SCHEMAS, type ThingKind, type ThingValues } from '../plantLibrary';
import { accumulatorFaults } from './accumulator';
import { boilerFaults } from './boiler';
import { inUse, takenName, type CheckContext, type Fault, type Given } from './context';
import { headerFaults } from './header';

type Raw = Readonly<Record<string, unknown>>;

function unitFaults({ kind, lineId, headerId, ventGroupId }: Given<'units'>, { library }: CheckContext): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, message: string): void => void faults.push({ path, message });
  if (lineId !== undefined && !inUse(library, 'lines', lineId)) add('lineId', 'There is no such line in use.');
  if (headerId && !inUse(library, 'headers', headerId)) add('headerId', 'There is no such header in use.');
  if (ventGroupId && !inUse(library, 'ventGroups', ventGroupId)) {
    add('ventGroupId', 'There is no such vent group in use.');
  }
  if (ventGroupId && kind !== undefined && kind !== 'retort') add('ventGroupId', `A ${kind} is in no vent group.`);
  if (kind === 'retort' && headerId === null) add('headerId', 'A retort draws steam: choose its header.');
  return faults;
}

function stepFaults({ capacity }: Given<'sharedLimits'>): Fault[] {
  const first = capacity?.[0];
  const faults: Fault[] =
    first && first.fromHour !== 0
      ? [{ path: 'capacity.0.fromHour', message: 'The first step begins with the week, at hour 0.' }]
      : [];
  const falling = (capacity ?? []).flatMap(({ fromHour }, i) => {
    const before = capacity?.[i - 1];
    if (!before || fromHour > before.fromHour) return [];
    return [
      {
        path: `capacity.${i}.fromHour`,
        message: `From hour is ${fromHour}; it must be after ${before.fromHour} (the step before).`,
      },
    ];
  });
  return [...faults, ...falling];
}

function baseFaults({ headerId, fromHour, toHour }: Given<'baseLoads'>, { library }: CheckContext): Fault[] {
  const faults: Fault[] = [];
  if (headerId !== undefined && !inUse(library, 'headers', headerId)) {
    faults.push({ path: 'headerId', message: 'There is no such header in use.' });
  }
  if (fromHour !== undefined && toHour !== undefined && toHour <= fromHour) {
    faults.push({ path: 'toHour', message: `To is hour ${toHour}; it must be after hour ${fromHour} (from).` });
  }
  return faults;
}

type Checks = { readonly [K in ThingKind]: (given: Given<K>, raw: Raw, context: CheckContext) => Fault[] };

const CHECKS: Checks = {
  headers: (given, raw, context) => [
    ...takenName(context, 'headers', given.name),
    ...headerFaults(given, raw, context),
  ],
  boilers: (given, _, context) => [...takenName(context, 'boilers', given.name), ...boilerFaults(given, context)],
  units: (given, _, context) => [...takenName(context, 'units', given.name), ...unitFaults(given, context)],
  ventGroups: (given, _, context) => takenName(context, 'ventGroups', given.name),
  accumulators: (given, _, context) => [
    ...takenName(context, 'accumulators', given.name),
    ...accumulatorFaults(given, context),
  ],
  sharedLimits: (given, _, context) => [...takenName(context, 'sharedLimits', given.name), ...stepFaults(given)],
  baseLoads: (given, _, context) => baseFaults(given, context),
  lines: (given, _, context) => takenName(context, 'lines', given.name),
};

/** The fields that are right by themselves, so that the rest is checked in spite of a fault elsewhere. */
function rightOnes<K extends ThingKind>(kind: K, raw: Raw): { given: Given<K>; faults: Fault[] } {
  const parsed = THING_SCHEMAS[kind].safeParse(raw);
  if (parsed.success) return { given: parsed.data as unknown as Given<K>, faults: [] };
  const faults = parsed.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
  const wrong = new Set(parsed.error.issues.map(({ path }) => String(path[0])));
  const right = Object.entries(THING_SCHEMAS[kind].shape).flatMap(([field, schema]) => {
    const one = wrong.has(field) ? null : (schema as z.ZodType).safeParse(raw[field]);
    return one?.success ? [[field, one.data] as const] : [];
  });
  return { given: Object.fromEntries(right) as Given<K>, faults };
}

/** What does not apply is kept empty: a header on boilers has no letdown, one without flash no condensate. */
function tidied<K extends ThingKind>(kind: K, values: ThingValues<K>): ThingValues<K> {
  if (kind !== 'headers') return values;
  const header = values as ThingValues<'headers'>;
  const noLetdown = { feedFromHeaderId: null, greatestKgPerH: null, leastKgPerH: null };
  const noFlash = { flashFromHeaderId: null, flashShare: null, flashCondensateBarG: null };
  return {
    ...header,
    ...(header.feedKind === 'boilers' ? noLetdown : {}),
    ...(header.flashFromHeaderId ? {} : noFlash),
  } as ThingValues<K>;
}

/** Everything that is wrong with a form, each at its field; empty where it can be saved. */
export function thingFaults(kind: ThingKind, raw: Raw, context: CheckContext): Fault[] {
  const { given, faults } = rightOnes(kind, raw);
  const check = CHECKS[kind] as (given: unknown, raw: Raw, context: CheckContext) => Fault[];
  const cross = check(given, raw, context);
  const said = new Set(faults.map(({ path }) => path));
  return [...faults, ...cross.filter(({ path }) => !said.has(path))];
}

/** The schema of a thing at a plant: ranges and what only the plant as it stands can tell, on client and server alike. */
export function thingSchema<K extends ThingKind>(kind: K, context: CheckContext): z.ZodType<ThingValues<K>, Raw> {
  return z.record(z.string(), z.unknown()).transform((raw, checks) => {
    const faults = thingFaults(kind, raw, context);
    for (const { path, message } of faults) checks.addIssue({ code: 'custom', path: path.split('.'), message });
    const parsed = THING_SCHEMAS[kind].safeParse(raw);
    if (faults.length > 0 || !parsed.success) return z.NEVER;
    return tidied(kind, parsed.data as ThingValues<K>);
  });
}
