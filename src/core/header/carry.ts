/** Accumulators over the week: charged from what is to spare, discharged into what is over. */
import type { HeaderCapacity, PlantModel } from '../plant/plant';
import type { PlacedAccumulator } from './accumulator';
import { NOT_JUDGED_KG_PER_H } from './capacity';
import { capacityMinutes } from './capacityMinutes';
import { OVER_TOLERANCE_KG_PER_H } from './over';

/** What accumulators carry on a header, those below it included. Per minute, to be read only. */
export interface Carried {
  readonly chargeKgPerH: Float64Array;
  readonly dischargeKgPerH: Float64Array;
  /** In store when the minute begins. [kg] */
  readonly storeKg: Float64Array;
  /** What those accumulators hold when full. [kg] */
  readonly capacityKg: number;
}

export interface Carrying {
  /** What the feeds of the headers that an accumulator works on still bring. [kg/h] */
  readonly loads: ReadonlyMap<string, Float64Array>;
  readonly carried: ReadonlyMap<string, Carried>;
}

/** A header that accumulators work on. */
interface Header {
  readonly load: Float64Array;
  /** The lower of steam limit and greatest flow of the letdown; infinite where neither is known. */
  readonly bound: Float64Array;
  /** Whether a steam limit is known: without one there is nothing that is sure to be to spare. */
  readonly limit: Float64Array | null;
  readonly rise: Float64Array | null;
  readonly charge: Float64Array;
  readonly discharge: Float64Array;
  readonly store: Float64Array;
  capacityKg: number;
}

interface Vessel {
  readonly placed: PlacedAccumulator;
  readonly charges: readonly Header[];
  readonly relieves: readonly Header[];
  readonly all: readonly Header[];
  inStoreKg: number;
}

/**
 * Carries minute by minute, accumulators in the plant's order. One discharges what its header, or one that feeds it, is
 * over its limit or over its letdown, up to its greatest discharge, its store and the header's load. Else it is charged
 * with what its header and all that feed it have to spare under limits and letdowns, up to its greatest charge and its
 * room, and no faster than the boilers rise. Where no limit is known it is not charged.
 */
export function carry(
  placed: readonly PlacedAccumulator[],
  capacities: readonly HeaderCapacity[],
  plant: PlantModel,
  loadOf: (headerId: string) => Float64Array,
): Carrying {
  if (placed.length === 0) return { loads: new Map(), carried: new Map() };
  const headers = new Map<string, Header>();
  const headerOf = (headerId: string): Header => {
    const known = headers.get(headerId) ?? newHeader(headerId, loadOf(headerId), capacities, plant);
    headers.set(headerId, known);
    return known;
  };
  const vessels = placed.map((one) => newVessel(one, headerOf));
  const horizonMin = vessels[0]?.relieves[0]?.load.length ?? 0;
  for (let t = 0; t < horizonMin; t++) carryMinute(vessels, t);
  return {
    loads: new Map([...headers].map(([id, { load }]) => [id, load])),
    carried: new Map([...headers].map(([id, header]) => [id, carriedOf(header)])),
  };
}

function newHeader(
  headerId: string,
  load: Float64Array,
  capacities: readonly HeaderCapacity[],
  plant: PlantModel,
): Header {
  const feed = plant.headers.find(({ id }) => id === headerId)?.feed;
  const capacity = capacities.find((one) => one.headerId === headerId);
  const minutes = capacity && capacityMinutes(capacity, load.length);
  const limit = minutes?.limitKgPerH ?? null;
  const greatest = feed?.kind === 'letdown' ? feed.greatestKgPerH : Infinity;
  const zeros = () => new Float64Array(load.length);
  return {
    load,
    bound: Float64Array.from({ length: load.length }, (_, t) => Math.min(greatest, known(limit, t))),
    limit,
    rise: minutes?.greatestRiseKgPerHPerMin ?? null,
    charge: zeros(),
    discharge: zeros(),
    store: zeros(),
    capacityKg: 0,
  };
}

/** A limit, or infinite where none is known. */
function known(limit: Float64Array | null, t: number): number {
  const value = limit?.[t] ?? Infinity;
  return value < NOT_JUDGED_KG_PER_H ? value : Infinity;
}

function newVessel(placed: PlacedAccumulator, headerOf: (headerId: string) => Header): Vessel {
  const charges = placed.charges.map(headerOf);
  const relieves = placed.relieves.map(headerOf);
  const all = [...new Set([...charges, ...relieves])];
  const { capacityKg } = placed.figures;
  for (const header of all) header.capacityKg += capacityKg;
  return { placed, charges, relieves, all, inStoreKg: capacityKg * placed.accumulator.shareAtWeekStart };
}

function carryMinute(vessels: readonly Vessel[], t: number): void {
  const idle: Vessel[] = [];
  for (const vessel of vessels) {
    for (const { store } of vessel.all) store[t] = (store[t] as number) + vessel.inStoreKg;
    if (!discharge(vessel, t)) idle.push(vessel);
  }
  for (const vessel of idle) charge(vessel, t);
}

/** @returns false where nothing is over; true also where it is over and the store is empty. */
function discharge(vessel: Vessel, t: number): boolean {
  let need = 0;
  let load = Infinity;
  for (const header of vessel.relieves) {
    need = Math.max(need, (header.load[t] as number) - (header.bound[t] as number));
    load = Math.min(load, header.load[t] as number);
  }
  if (need <= OVER_TOLERANCE_KG_PER_H) return false;
  const kgPerH = Math.min(need, vessel.placed.accumulator.greatestDischargeKgPerH, 60 * vessel.inStoreKg, load);
  vessel.inStoreKg = Math.max(0, vessel.inStoreKg - kgPerH / 60);
  for (const header of vessel.relieves) {
    header.load[t] = (header.load[t] as number) - kgPerH;
    header.discharge[t] = (header.discharge[t] as number) + kgPerH;
  }
  return true;
}

function charge(vessel: Vessel, t: number): void {
  const { accumulator, figures } = vessel.placed;
  const room = (figures.capacityKg - vessel.inStoreKg) * figures.chargePerKg;
  let kgPerH = Math.min(accumulator.greatestChargeKgPerH, 60 * room);
  let limited = false;
  for (const header of vessel.charges) {
    kgPerH = Math.min(kgPerH, spareOf(header, t));
    limited ||= known(header.limit, t) < Infinity;
  }
  if (!limited || kgPerH <= 0) return;
  vessel.inStoreKg = Math.min(figures.capacityKg, vessel.inStoreKg + kgPerH / 60 / figures.chargePerKg);
  for (const header of vessel.charges) {
    header.load[t] = (header.load[t] as number) + kgPerH;
    header.charge[t] = (header.charge[t] as number) + kgPerH;
  }
}

/** What may be added to a header's load at a minute; below 0 where it is over. [kg/h] */
function spareOf({ load, bound, rise }: Header, t: number): number {
  const now = load[t] as number;
  const before = t === 0 ? now : (load[t - 1] as number);
  return Math.min((bound[t] as number) - now, before + (rise?.[t] ?? Infinity) - now);
}

function carriedOf({ charge: chargeKgPerH, discharge: dischargeKgPerH, store: storeKg, capacityKg }: Header): Carried {
  return { chargeKgPerH, dischargeKgPerH, storeKg, capacityKg };
}
