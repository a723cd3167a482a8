import type { Header, HeaderCapacity } from '../plant/plant';
import type { Week } from '../schedule/week';
import { fromMinutes, toMinutes, type StepFunction } from '../time/stepFunction';
import { UNLIMITED, type ProblemResource } from './problem';
import { headerResource, letdownResource, limitResource, steamOnResource, ventResource } from './uses';

const NONE: StepFunction = [];
const constant = (value: number): StepFunction => [{ from: 0, value }];

/** Every limit that levelling keeps to, sorted by id; a header without a limit is there for its load alone. */
export function toResources(week: Week): ProblemResource[] {
  return [...steamLimits(week), ...ventLimits(week), ...sharedLimits(week)].sort((a, b) => (a.id < b.id ? -1 : 1));
}

/** Headers and letdowns; what is drawn below passes through everything above, base load included. */
function steamLimits(week: Week): ProblemResource[] {
  const capacities = new Map(week.capacities.map((c) => [c.headerId, c]));
  return week.plant.headers.flatMap((header) => {
    const baseLoad = baseLoadBelow(header, week.plant.headers, capacities, week.horizonMin);
    const limit = capacities.get(header.id)?.limitKgPerH ?? constant(UNLIMITED);
    const resources = [steamResource(headerResource(header.id), header.id, limit, baseLoad, week.horizonMin)];
    if (header.feed.kind === 'letdown') {
      const greatest = constant(header.feed.greatestKgPerH);
      resources.push(steamResource(letdownResource(header.id), header.id, greatest, baseLoad, week.horizonMin));
    }
    return resources;
  });
}

function steamResource(
  id: string,
  sourceId: string,
  limit: StepFunction,
  baseLoad: Float64Array,
  horizonMin: number,
): ProblemResource {
  const left = knownLimit(toMinutes(limit, horizonMin)).map((v, t) => v - (baseLoad[t] as number));
  return { id, class: 'steam', sourceId, capacity: fromMinutes(left), baseLoad: fromMinutes(baseLoad) };
}

/** Minutes without a known limit in a week that has one get ten times the greatest, which nothing reaches. */
function knownLimit(limit: Float64Array): Float64Array {
  const greatest = limit.reduce((m, v) => (v < UNLIMITED / 10 ? Math.max(m, v) : m), 0);
  return greatest === 0 ? limit : limit.map((v) => (v < UNLIMITED / 10 ? v : 10 * greatest));
}

/** Base load of a header and of all headers that it feeds, per minute. [kg/h] */
function baseLoadBelow(
  header: Header,
  headers: readonly Header[],
  capacities: ReadonlyMap<string, HeaderCapacity>,
  horizonMin: number,
  above: readonly string[] = [],
): Float64Array {
  const sum = toMinutes(capacities.get(header.id)?.baseLoadKgPerH ?? NONE, horizonMin);
  for (const below of headers) {
    if (below.feed.kind !== 'letdown' || below.feed.fromHeaderId !== header.id || above.includes(below.id)) continue;
    const part = baseLoadBelow(below, headers, capacities, horizonMin, [...above, header.id]);
    for (let t = 0; t < horizonMin; t++) sum[t] = (sum[t] as number) + (part[t] as number);
  }
  return sum;
}

function ventLimits(week: Week): ProblemResource[] {
  return week.plant.ventGroups.flatMap((group) => [
    limit(ventResource(group.id), 'process', group.id, constant(group.ventsAtOnce)),
    limit(steamOnResource(group.id), 'process', group.id, constant(group.steamOnsAtOnce)),
  ]);
}

function sharedLimits(week: Week): ProblemResource[] {
  return week.plant.sharedLimits.map((l) => limit(limitResource(l.id), 'shared', l.id, l.capacity));
}

function limit(
  id: string,
  resourceClass: ProblemResource['class'],
  sourceId: string,
  capacity: StepFunction,
): ProblemResource {
  return { id, class: resourceClass, sourceId, capacity, baseLoad: NONE };
}
