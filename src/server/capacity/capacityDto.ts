import type { BoilerDto, CapacityDto, CapacityEntryDto, DeskHeaderDto } from '@/contracts/capacity';
import type { Db } from '@/db/client';
import { now } from '../clock';
import { namesOf } from '../people/people.repo';
import type { WeekTime } from '../weeks/weekTime';
import {
  capacityRows,
  placedKg,
  type BoilerRow,
  type CapacityRows,
  type FiringRow,
  type LimitRow,
} from './capacity.repo';
import { exportOf, firesInWeek, shareOf, spanInWeek, touchesWeek } from './inForce';
import { headerCapacities } from './loadCapacity';

function boilerDto(rows: CapacityRows, boiler: BoilerRow, time: WeekTime): BoilerDto {
  const { netKgPerH, heatToWaterKW } = exportOf(rows, boiler);
  return {
    id: boiler.id,
    name: boiler.name,
    headerId: boiler.headerId,
    ratingFromAndAtKgPerH: boiler.ratingFromAndAtKgPerH,
    pressureBarG: boiler.pressureBarG,
    turndown: boiler.turndown,
    greatestRiseFractionPerMin: boiler.greatestRiseFractionPerMin,
    purgeMinutes: boiler.purgeMinutes,
    warmReadyMinutes: boiler.warmReadyMinutes,
    coldReadyMinutes: boiler.coldReadyMinutes,
    efficiency: boiler.efficiency,
    fuel: boiler.fuel,
    netKgPerH,
    heatToWaterKW,
    share: shareOf(time, boiler.id, rows.firings),
    fires: firesInWeek(rows, boiler, time),
  };
}

function headerDto(header: CapacityRows['headers'][number]): DeskHeaderDto {
  const { id, name, pressureBarG, dryness, feed, warmUpMinutes, warmUpKg } = header;
  const fromHeaderId = feed.kind === 'letdown' ? feed.fromHeaderId : null;
  return { id, name, pressureBarG, dryness, fromHeaderId, warmUpMinutes, warmUpKg };
}

type Names = ReadonlyMap<string, string>;

function entryDto(kind: 'firing' | 'limit', row: FiringRow | LimitRow, time: WeekTime, names: Names, subject: string) {
  const { from, to } = spanInWeek(time, row);
  return {
    id: row.id,
    kind,
    subject,
    fromMin: from,
    toMin: to,
    value: 'share' in row ? row.share : row.limitKgPerH,
    reason: row.reason,
    by: names.get(row.authorId) ?? 'somebody who has left',
    at: row.createdAt.toISOString(),
    sequence: row.sequence,
  };
}

async function entries(tx: Db, rows: CapacityRows, time: WeekTime): Promise<CapacityEntryDto[]> {
  const firings = rows.firings.filter((row) => touchesWeek(time, row));
  const people = await namesOf(
    tx,
    [...firings, ...rows.limits].map((row) => row.authorId),
  );
  const named = (list: readonly { id: string; name: string }[], id: string) =>
    list.find((one) => one.id === id)?.name ?? id;
  return [
    ...firings.map((row) => entryDto('firing', row, time, people, named(rows.boilers, row.boilerId))),
    ...rows.limits.map((row) => entryDto('limit', row, time, people, named(rows.headers, row.headerId))),
  ]
    .sort((a, b) => b.at.localeCompare(a.at) || b.sequence - a.sequence)
    .map(({ sequence: _, ...entry }) => entry);
}

/** The boiler house over a week: boilers, capacities, and who said what, newest first. */
export async function capacityDto(tx: Db, plantId: string, time: WeekTime): Promise<CapacityDto> {
  const rows = await capacityRows(tx, plantId, time);
  return {
    weekStart: time.weekStart,
    timeZone: time.timeZone,
    firstInstant: time.firstInstant.toISOString(),
    now: now().toISOString(),
    horizonMin: time.horizonMin,
    reserveFraction: rows.plant.reserveFraction,
    boilers: rows.boilers.map((boiler) => boilerDto(rows, boiler, time)),
    capacities: headerCapacities(rows, time),
    largestOut: headerCapacities(rows, time, true),
    headers: rows.headers.map(headerDto),
    baseLoads: rows.baseLoads.map(({ id, headerId, fromHour, toHour, kgPerH, note }) => {
      return { id, headerId, fromHour, toHour, kgPerH, note };
    }),
    fuelPricePerKWh: rows.plant.fuelPricePerKWh,
    currency: rows.plant.currency,
    placedKg: await placedKg(tx, plantId, time),
    entries: await entries(tx, rows, time),
  };
}
