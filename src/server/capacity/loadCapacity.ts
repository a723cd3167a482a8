import { buildHeaderCapacity, NOT_JUDGED_KG_PER_H, type BoilerInForce } from '@/core/header/capacity';
import { withoutLargest } from '@/core/house/largestOut';
import type { HeaderCapacity } from '@/core/plant/plant';
import { stepsFromSpans, type ValuedSpan } from '@/core/time/stepMath';
import type { Db } from '@/db/client';
import { sumByHour } from '../weeks/weeklySteps';
import type { WeekTime } from '../weeks/weekTime';
import { capacityRows, type CapacityRows } from './capacity.repo';
import { boilerInForce, spanInWeek, spansOf, touchesWeek } from './inForce';

/** Limits in force on a header: what was said later holds, and a row without a limit takes earlier ones back. */
function setLimits(rows: CapacityRows, headerId: string, time: WeekTime): ValuedSpan[] {
  const own = rows.limits.filter((limit) => limit.headerId === headerId);
  const said = own.map((row) => ({ ...spanInWeek(time, row), value: row.limitKgPerH ?? NOT_JUDGED_KG_PER_H }));
  return spansOf(stepsFromSpans(said, NOT_JUDGED_KG_PER_H), NOT_JUDGED_KG_PER_H, time.horizonMin);
}

/** Boilers that feed a header; none where nothing was said of any of them for the week: then they are not known. */
function boilersOf(rows: CapacityRows, headerId: string, time: WeekTime): BoilerInForce[] {
  const own = rows.boilers.filter((boiler) => boiler.headerId === headerId);
  const ids = new Set(own.map((boiler) => boiler.id));
  const said = rows.firings.some((firing) => ids.has(firing.boilerId) && touchesWeek(time, firing));
  return said ? own.map((boiler) => boilerInForce(rows, boiler, time)) : [];
}

/** Every header's capacity over a week, from rows; with all boilers, or with the largest one of each header out. */
export function headerCapacities(rows: CapacityRows, time: WeekTime, largestOut = false): HeaderCapacity[] {
  return rows.headers.map((header) => {
    const boilers = boilersOf(rows, header.id, time);
    return buildHeaderCapacity({
      headerId: header.id,
      boilers: largestOut ? withoutLargest(boilers) : boilers,
      reserveFraction: rows.plant.reserveFraction,
      setLimits: setLimits(rows, header.id, time),
      baseLoadKgPerH: sumByHour(
        time,
        rows.baseLoads
          .filter((load) => load.headerId === header.id)
          .map(({ fromHour, toHour, kgPerH }) => ({ fromHour, toHour, value: kgPerH })),
      ),
    });
  });
}

/** Every header's capacity over a plant's week, in the plant's order of headers. */
export async function loadCapacity(tx: Db, plantId: string, time: WeekTime): Promise<HeaderCapacity[]> {
  return headerCapacities(await capacityRows(tx, plantId, time), time);
}
