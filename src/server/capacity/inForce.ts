import { boilerExport } from '@/core/duty/boilerExport';
import type { BoilerInForce } from '@/core/header/capacity';
import { ambientAtAltitude, toAbsolute } from '@/core/quantity/pressure';
import { barGauge, type BarAbsolute } from '@/core/quantity/units';
import type { Problem, Result } from '@/core/result';
import { storedSteamKgPerBar } from '@/core/steam/flash';
import { steamState, type SteamQuality } from '@/core/steam/steamState';
import { stepsFromSpans, type ValuedSpan } from '@/core/time/stepMath';
import type { StepFunction } from '@/core/time/stepFunction';
import { instantOf, minuteOf, type WeekTime } from '../weeks/weekTime';
import type { BoilerRow, CapacityRows, FiringRow } from './capacity.repo';

interface Dated {
  readonly fromAt: Date;
  readonly toAt: Date;
}

/** A dated span on the week's minutes, cut to the week; it ends with the last minute that it touches. */
export function spanInWeek(time: WeekTime, { fromAt, toAt }: Dated): { from: number; to: number } {
  const last = minuteOf(time, toAt);
  const to = instantOf(time, last) < toAt ? last + 1 : last;
  return { from: Math.max(0, minuteOf(time, fromAt)), to: Math.min(time.horizonMin, to) };
}

/** Spans on which a step function has a value other than `ground`, without overlap. */
export function spansOf(fn: StepFunction, ground: number, horizonMin: number): ValuedSpan[] {
  return fn
    .map(({ from, value }, i) => ({ from, to: fn[i + 1]?.from ?? horizonMin, value }))
    .filter((span) => span.value !== ground && span.to > span.from);
}

/** A boiler's share of its full export over the week, 0 shut to 1 lit; what was said later holds. */
export function shareOf(time: WeekTime, boilerId: string, firings: readonly FiringRow[]): StepFunction {
  const own = firings.filter((firing) => firing.boilerId === boilerId);
  return stepsFromSpans(
    own.map((firing) => ({ ...spanInWeek(time, firing), value: firing.share })),
    0,
  );
}

/** The plant model is held to its ranges when it is entered: what does not fit here is a fault, not a refusal. */
function expected<T>(result: Result<T, Problem>, what: string): T {
  if (result.ok) return result.value;
  throw new Error(`${what}: ${result.error.message}`);
}

/** Ambient pressure where the plant stands. */
export const ambientOf = (rows: CapacityRows): BarAbsolute =>
  expected(ambientAtAltitude(rows.plant.altitudeM), 'the plant');

/** What a boiler sends out when fully lit: its rating at header conditions, less the feed tank's steam. [kg/h] */
export function netExportKgPerH(rows: CapacityRows, boiler: BoilerRow): number {
  const header = rows.headers.find(({ id }) => id === boiler.headerId);
  if (!header) throw new Error(`${boiler.name} feeds no header of its plant`);
  const quality: SteamQuality =
    header.superheatK === null
      ? { kind: 'wet', dryness: header.dryness ?? 1 }
      : { kind: 'superheated', superheatK: header.superheatK };
  const ambient = ambientOf(rows);
  const steam = steamState({ pressure: barGauge(header.pressureBarG), quality, ambient });
  const house = { ...boiler, boilerPressureBarG: boiler.pressureBarG, feedTankPressureBarG: boiler.feedTankBarG };
  const found = boilerExport(house, { header: expected(steam, header.name), ambient });
  return expected(found, boiler.name).netKgPerH;
}

/** A boiler over the week as core wants it. */
export function boilerInForce(rows: CapacityRows, boiler: BoilerRow, time: WeekTime): BoilerInForce {
  const lit = spansOf(shareOf(time, boiler.id, rows.firings), 0, time.horizonMin);
  const pressure = toAbsolute(barGauge(boiler.pressureBarG), ambientOf(rows));
  return {
    id: boiler.id,
    exportKgPerH: netExportKgPerH(rows, boiler),
    greatestRisePerMin: boiler.greatestRiseFractionPerMin,
    waterTonnes: boiler.waterTonnes,
    storedKgPerBarAndTonne: expected(storedSteamKgPerBar(pressure, 1_000), boiler.name),
    lit,
    outages: [],
    deratings: lit.filter((span) => span.value < 1),
  };
}
