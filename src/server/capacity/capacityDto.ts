import type { BoilerDto, CapacityDto, CapacityEntryDto } from '@/contracts/capacity';
import type { Db } from '@/db/client';
import { now } from '../clock';
import { namesOf } from '../people/people.repo';
import type { WeekTime } from '../weeks/weekTime';
import { capacityRows, type BoilerRow, type CapacityRows, type FiringRow, type LimitRow } from './capacity.repo';
import { netExportKgPerH, shareOf, spanInWeek } from './inForce';
import { headerCapacities } from './loadCapacity';

function boilerDto(rows: CapacityRows, boiler: BoilerRow, time: WeekTime): BoilerDto {
  const { id, name, headerId, ratingFromAndAtKgPerH, pressureBarG, turndown, greatestRiseFractionPerMin } = boiler;
  const known = { id, name, headerId, ratingFromAndAtKgPerH, pressureBarG, turndown, greatestRiseFractionPerMin };
  return { ...known, netKgPerH: netExportKgPerH(rows, boiler), share: shareOf(time, id, rows.firings) };
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
  const people = await namesOf(
    tx,
    [...rows.firings, ...rows.limits].map((row) => row.authorId),
  );
  const named = (list: readonly { id: string; name: string }[], id: string) =>
    list.find((one) => one.id === id)?.name ?? id;
  return [
    ...rows.firings.map((row) => entryDto('firing', row, time, people, named(rows.boilers, row.boilerId))),
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
    headers: rows.headers.map(({ id, name, pressureBarG, dryness }) => ({ id, name, pressureBarG, dryness })),
    entries: await entries(tx, rows, time),
  };
}
