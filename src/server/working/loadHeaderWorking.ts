import { and, asc, eq, isNull } from 'drizzle-orm';
import { boilerExport } from '@/core/duty/boilerExport';
import { supplyOf } from '@/core/duty/supply';
import type { SteamSupply } from '@/core/duty/duty';
import type { Working } from '@/core/duty/working';
import { accumulatorBetween } from '@/core/header/accumulator';
import { flashCredit } from '@/core/header/condensate';
import { boilerOutlet } from '@/core/header/headerSteam';
import { stationBalance, type Station } from '@/core/header/station';
import { fail, ok, type Problem, type Result } from '@/core/result';
import type { SteamState } from '@/core/steam/steamState';
import { db } from '@/db/client';
import { accumulators, boilers, headers, plants } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { notFound, withStatus, type HttpProblem } from '../http/problem';
import { houseOf, type BoilerRow } from './loadBoilerWorking';

export type HeaderRow = typeof headers.$inferSelect;
type Named = Pick<HeaderRow, 'id' | 'name'>;

/** What feeds a header through a valve, balanced at the greatest rate. */
export interface StationWorking {
  readonly boilers: readonly { readonly id: string; readonly name: string; readonly netKgPerH: number }[];
  readonly from: Named | null;
  readonly kgPerH: number;
  readonly balance: Result<Station>;
}

/** How a header's steam comes about, and what works on it. */
export interface HeaderWorking {
  readonly header: HeaderRow;
  readonly steam: SteamState;
  readonly stations: readonly StationWorking[];
  readonly feeds: readonly Named[];
  readonly flash: { readonly from: Named | null; readonly share: number; readonly working: Working } | null;
  readonly accumulators: readonly { readonly name: string; readonly role: string; readonly working: Working }[];
  /** What of it cannot be worked out, in sentences. */
  readonly problems: readonly string[];
}

interface Rows {
  readonly altitudeM: number;
  readonly headers: readonly HeaderRow[];
  readonly boilers: readonly BoilerRow[];
  readonly accumulators: readonly (typeof accumulators.$inferSelect)[];
}

async function rowsOf(plantId: string): Promise<Rows> {
  const [plant] = await db.select().from(plants).where(eq(plants.id, plantId));
  if (!plant) throw new Error(`plant ${plantId} of a session is not there`);
  const present = <T extends typeof headers | typeof boilers | typeof accumulators>(table: T) =>
    and(eq(table.plantId, plantId), isNull(table.retiredAt));
  return {
    altitudeM: plant.altitudeM,
    headers: await db.select().from(headers).where(eq(headers.plantId, plantId)).orderBy(asc(headers.position)),
    boilers: await db.select().from(boilers).where(present(boilers)).orderBy(asc(boilers.position), asc(boilers.id)),
    accumulators: await db.select().from(accumulators).where(present(accumulators)).orderBy(asc(accumulators.position)),
  };
}

/** A header of the plant with its stations, flash steam and accumulators, from the plant's present data. */
export async function loadHeaderWorking(
  actor: Authorized<'plan.read'>,
  headerId: string,
): Promise<Result<HeaderWorking, HttpProblem>> {
  const rows = await rowsOf(actor.plantId);
  const header = rows.headers.find(({ id }) => id === headerId);
  if (!header) return fail(notFound('There is no such header at your plant.'));
  const supply = supplyOf(header, rows.altitudeM);
  if (!supply.ok) return fail(withStatus(409, supply.error));
  const flash = flashCredit(header, supply.value.ambient);
  const stored = accumulatorsOf(rows, header, supply.value);
  const lower = rows.headers.filter(
    ({ feed, retiredAt }) => retiredAt === null && feed.kind === 'letdown' && feed.fromHeaderId === headerId,
  );
  return ok({
    header,
    steam: supply.value.header,
    stations:
      header.feed.kind === 'boilers'
        ? boilerStations(rows, header, supply.value)
        : letdownStation(rows, header, supply.value),
    feeds: lower.map(named),
    flash:
      flash.ok && flash.value && header.flash
        ? { from: namedIn(rows, header.flash.fromHeaderId), share: header.flash.share, working: flash.value.working }
        : null,
    accumulators: stored.flatMap(({ name, role, figures }) =>
      figures.ok ? [{ name, role, working: figures.value.working }] : [],
    ),
    problems: [flash, ...stored.map(({ figures }) => figures)].flatMap((result) =>
      result.ok ? [] : [result.error.message],
    ),
  });
}

const named = ({ id, name }: Named): Named => ({ id, name });

function namedIn(rows: Rows, headerId: string): Named | null {
  const found = rows.headers.find(({ id }) => id === headerId);
  return found ? named(found) : null;
}

/** Boilers of one pressure feed a header through one balance, all at full export. */
function boilerStations(rows: Rows, header: HeaderRow, supply: SteamSupply): StationWorking[] {
  const feeding = rows.boilers.filter((boiler) => boiler.headerId === header.id);
  const pressures = [...new Set(feeding.map(({ pressureBarG }) => pressureBarG))];
  return pressures.map((pressureBarG) => {
    const sending = feeding
      .filter((boiler) => boiler.pressureBarG === pressureBarG)
      .map((boiler) => {
        const worked = boilerExport(houseOf(boiler), supply);
        return { id: boiler.id, name: boiler.name, netKgPerH: worked.ok ? worked.value.netKgPerH : 0 };
      });
    const kgPerH = sending.reduce((sum, { netKgPerH }) => sum + netKgPerH, 0);
    const outlet = boilerOutlet(pressureBarG, supply.ambient);
    const upstreamName = sending.map(({ name }) => name).join(' and ');
    return { boilers: sending, from: null, kgPerH, balance: balanceOf(upstreamName, outlet, header, supply, kgPerH) };
  });
}

function letdownStation(rows: Rows, header: HeaderRow, supply: SteamSupply): StationWorking[] {
  const { feed } = header;
  const above = feed.kind === 'letdown' ? rows.headers.find(({ id }) => id === feed.fromHeaderId) : undefined;
  if (feed.kind !== 'letdown' || !above) return [];
  const upstream = supplyOf(above, rows.altitudeM);
  const steam: Result<SteamState> = upstream.ok ? ok(upstream.value.header) : upstream;
  const kgPerH = feed.greatestKgPerH;
  return [{ boilers: [], from: named(above), kgPerH, balance: balanceOf(above.name, steam, header, supply, kgPerH) }];
}

function balanceOf(
  upstreamName: string,
  upstream: Result<SteamState>,
  header: HeaderRow,
  supply: SteamSupply,
  kgPerH: number,
): Result<Station, Problem> {
  if (!upstream.ok) return upstream;
  const place = { upstreamName, upstream: upstream.value, headerName: header.name, stated: supply.header };
  return stationBalance({ ...place, kgPerH, ambient: supply.ambient });
}

function accumulatorsOf(rows: Rows, header: HeaderRow, supply: SteamSupply) {
  return rows.accumulators
    .filter((one) => one.chargedFromHeaderId === header.id || one.feedsHeaderId === header.id)
    .map((one) => {
      const from = rows.headers.find(({ id }) => id === one.chargedFromHeaderId);
      const into = rows.headers.find(({ id }) => id === one.feedsHeaderId);
      if (!from || !into) throw new Error(`${one.name} stands between no headers of its plant`);
      const figures = accumulatorBetween(one, from, into, supply.ambient);
      const role = `Charged from ${from.name}, discharged into ${into.name}`;
      return { name: one.name, role, figures };
    });
}
