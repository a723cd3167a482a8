/** What flash steam and accumulators take off the headers' loads, minute by minute. */
import type { Header, HeaderCapacity, PlantModel } from '../plant/plant';
import { addableKgPerH } from '../demand/activityLoad';
import { toMinutes } from '../time/stepFunction';
import { placedAccumulators, type PlacedAccumulator } from './accumulator';
import { carry, type Carried, type Carrying } from './carry';
import { flashCredits, type FlashCredit } from './condensate';
import { feedPath } from './network';

/**
 * A header's flows per minute [kg/h]. What is drawn is what its users, base load and lower headers take by mass alone; what
 * its own feed brings, the load that is judged, is drawn + charge − flash − discharge, to the bit where there are none.
 */
export interface HeaderFlows {
  readonly drawnKgPerH: Float64Array;
  readonly loadKgPerH: Float64Array;
  /** Flash steam credited to this header and those below it; null where there is none. */
  readonly flashKgPerH: Float64Array | null;
  readonly carried: Carried | null;
}

/** A load as {@link LoadCurve} keeps it. */
interface DrawnLoad {
  readonly horizonMin: number;
  kgPerH(headerId: string): Float64Array;
}

interface Network {
  /** Lower headers before those that feed them. */
  readonly upwards: readonly Header[];
  readonly below: ReadonlyMap<string, readonly string[]>;
  readonly credits: ReadonlyMap<string, FlashCredit>;
  readonly accumulators: readonly PlacedAccumulator[];
}

const networks = new WeakMap<PlantModel, Network>();

function networkOf(plant: PlantModel): Network {
  const known = networks.get(plant);
  if (known) return known;
  const depth = new Map(plant.headers.map(({ id }) => [id, feedPath(plant, id).length]));
  const below = new Map(plant.headers.map(({ id }) => [id, lowerHeaders(plant, id)]));
  const network = {
    upwards: [...plant.headers].sort((a, b) => (depth.get(b.id) ?? 0) - (depth.get(a.id) ?? 0)),
    below,
    credits: flashCredits(plant),
    accumulators: placedAccumulators(plant),
  };
  networks.set(plant, network);
  return network;
}

/** Headers that a letdown feeds straight from this one. */
const lowerHeaders = (plant: PlantModel, headerId: string): string[] =>
  plant.headers.flatMap(({ id, feed }) => (feed.kind === 'letdown' && feed.fromHeaderId === headerId ? [id] : []));

/**
 * The flows of every header, by header. Flash steam is credited up to the header's own load at the minute, what is more
 * is lost; accumulators carry as {@link carry} has it. A plant without either gets back what is drawn.
 */
export function settleFlows(
  plant: PlantModel,
  capacities: readonly HeaderCapacity[],
  drawn: DrawnLoad,
): ReadonlyMap<string, HeaderFlows> {
  const network = networkOf(plant);
  const drawnOf = (headerId: string) => drawn.kgPerH(headerId);
  const flash = network.credits.size === 0 ? null : flashOf(network, capacities, drawn);
  const carrying = carry(network.accumulators, capacities, plant, (headerId) =>
    minus(drawnOf(headerId), flash?.get(headerId)),
  );
  return new Map(
    plant.headers.map(({ id }) => [id, flowsOf(drawnOf(id).slice(), flash?.get(id) ?? null, carrying, id)]),
  );
}

function flowsOf(drawnKgPerH: Float64Array, flash: Float64Array | null, carrying: Carrying, id: string): HeaderFlows {
  const loadKgPerH = carrying.loads.get(id) ?? (flash ? minus(drawnKgPerH, flash) : drawnKgPerH);
  return { drawnKgPerH, loadKgPerH, flashKgPerH: flash, carried: carrying.carried.get(id) ?? null };
}

/** Flash credited to each header and those below it. [kg/h] */
function flashOf(network: Network, capacities: readonly HeaderCapacity[], drawn: DrawnLoad) {
  const credited = new Map<string, Float64Array>();
  for (const header of network.upwards) {
    const total = new Float64Array(drawn.horizonMin);
    for (const lower of network.below.get(header.id) ?? []) addTo(total, credited.get(lower));
    const credit = network.credits.get(header.id);
    if (credit) {
      const load = drawn.kgPerH(header.id);
      const users = usersOf(credit.fromHeaderId, network, capacities, drawn);
      for (let t = 0; t < total.length; t++) {
        const left = (load[t] as number) - (total[t] as number);
        total[t] = (total[t] as number) + Math.min(left, credit.steamPerDraw * (users[t] as number));
      }
    }
    credited.set(header.id, total);
  }
  return credited;
}

/** What a header's own units draw: without lower headers and base load. [kg/h] */
function usersOf(headerId: string, network: Network, capacities: readonly HeaderCapacity[], drawn: DrawnLoad) {
  const users = drawn.kgPerH(headerId).slice();
  for (const lower of network.below.get(headerId) ?? []) takeFrom(users, drawn.kgPerH(lower));
  const capacity = capacities.find((one) => one.headerId === headerId);
  if (capacity) takeFrom(users, toMinutes(capacity.baseLoadKgPerH, drawn.horizonMin).map(addableKgPerH));
  return users;
}

function addTo(sum: Float64Array, part: Float64Array | undefined): void {
  if (part) for (let t = 0; t < sum.length; t++) sum[t] = (sum[t] as number) + (part[t] as number);
}

function takeFrom(sum: Float64Array, part: Float64Array): void {
  for (let t = 0; t < sum.length; t++) sum[t] = (sum[t] as number) - (part[t] as number);
}

function minus(values: Float64Array, part: Float64Array | null | undefined): Float64Array {
  const left = values.slice();
  if (part) takeFrom(left, part);
  return left;
}
