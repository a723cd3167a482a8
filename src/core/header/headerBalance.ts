/** Mass and heat into and out of every header at a moment: what the feeds bring is what is drawn, lost and put aside. */
import type { Header, PlantModel } from '../plant/plant';
import { placedAccumulators } from './accumulator';
import { flashCredits } from './condensate';
import { headerSteam } from './headerSteam';
import type { HeaderFlows } from './settle';

export type StreamKind = 'feed' | 'flash' | 'discharge' | 'users' | 'lower' | 'charge';

/** Steam in or out of a header. */
export interface Stream {
  readonly kind: StreamKind;
  /** The header at the other end, where there is one. */
  readonly headerId: string | null;
  readonly kgPerH: number;
  /** [kJ/kg] */
  readonly h: number;
}

export interface HeaderBalance {
  readonly headerId: string;
  /** Feed, flash steam and accumulators. */
  readonly into: readonly Stream[];
  /** Users with base load, lower headers, accumulators charged: all with the header's stated steam. */
  readonly out: readonly Stream[];
  /** Heat that the mains lose for the steam to be as stated; below 0 where it is stated hotter than it comes. [kW] */
  readonly lostKW: number;
}

/**
 * The balance of every header at a minute. `boilerH` is the enthalpy of what boilers send into a header that they feed
 * [kJ/kg]. In mass each header closes by itself; in heat, with what its mains lose. Headers whose steam cannot be worked out are left out.
 */
export function headerBalances(
  plant: PlantModel,
  flows: ReadonlyMap<string, HeaderFlows>,
  minute: number,
  boilerH: (headerId: string) => number | null,
): HeaderBalance[] {
  const at = (values: Float64Array | null | undefined) => values?.[minute] ?? 0;
  const credits = flashCredits(plant);
  return plant.headers.flatMap((header) => {
    const own = headerSteam(header, plant.ambientBarA);
    const feedH = feedEnthalpy(plant, header, boilerH);
    if (!own.ok || feedH === null) return [];
    const lower = plant.headers.filter(({ feed: f }) => f.kind === 'letdown' && f.fromHeaderId === header.id);
    const straight = (of: (flows: HeaderFlows) => Float64Array | null | undefined) =>
      at(read(flows, header, of)) - lower.reduce((sum, below) => sum + at(read(flows, below, of)), 0);
    const fedFrom = header.feed.kind === 'letdown' ? header.feed.fromHeaderId : null;
    const into = [
      stream('feed', fedFrom, at(read(flows, header, (f) => f.loadKgPerH)), feedH),
      stream(
        'flash',
        header.flash?.fromHeaderId ?? null,
        straight((f) => f.flashKgPerH),
        credits.get(header.id)?.hg ?? 0,
      ),
      stream(
        'discharge',
        null,
        straight((f) => f.carried?.dischargeKgPerH),
        dischargedH(plant, header),
      ),
    ];
    const out = [
      stream(
        'users',
        null,
        straight((f) => f.drawnKgPerH),
        own.value.h,
      ),
      ...lower.map(({ id }) => stream('lower', id, at(flows.get(id)?.loadKgPerH), own.value.h)),
      stream(
        'charge',
        null,
        straight((f) => f.carried?.chargeKgPerH),
        own.value.h,
      ),
    ];
    const lostKW = into.reduce((sum, { kgPerH, h }) => sum + (kgPerH * (h - own.value.h)) / 3600, 0);
    return [{ headerId: header.id, into: into.filter(flowing), out: out.filter(flowing), lostKW }];
  });
}

const stream = (kind: StreamKind, headerId: string | null, kgPerH: number, h: number): Stream => {
  return { kind, headerId, kgPerH, h };
};

const flowing = ({ kgPerH }: Stream): boolean => kgPerH !== 0;

function read(
  flows: ReadonlyMap<string, HeaderFlows>,
  header: Header,
  of: (flows: HeaderFlows) => Float64Array | null | undefined,
): Float64Array | null {
  const its = flows.get(header.id);
  return (its && of(its)) ?? null;
}

function feedEnthalpy(plant: PlantModel, header: Header, boilerH: (headerId: string) => number | null) {
  const { feed } = header;
  if (feed.kind === 'boilers') return boilerH(header.id);
  const above = plant.headers.find(({ id }) => id === feed.fromHeaderId);
  const steam = above && headerSteam(above, plant.ambientBarA);
  return steam?.ok ? steam.value.h : null;
}

/** What the accumulators that feed a header give up, several by what they hold. [kJ/kg] */
function dischargedH(plant: PlantModel, { id }: Header): number {
  const feeding = placedAccumulators(plant).filter(({ accumulator }) => accumulator.feedsHeaderId === id);
  const held = feeding.reduce((sum, { figures }) => sum + figures.capacityKg, 0);
  return held === 0 ? 0 : feeding.reduce((sum, { figures: f }) => sum + f.capacityKg * f.dischargedH, 0) / held;
}
