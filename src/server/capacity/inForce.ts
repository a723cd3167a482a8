import { boilerExport, type BoilerExport } from '@/core/duty/boilerExport';
import type { BoilerInForce } from '@/core/header/capacity';
import { firesOf, LOOK_BACK_MIN, readySpans, type Fire } from '@/core/house/readiness';
import { ambientAtAltitude, toAbsolute } from '@/core/quantity/pressure';
import { barGauge, type BarAbsolute } from '@/core/quantity/units';
import type { Problem, Result } from '@/core/result';
import { storedSteamKgPerBar } from '@/core/steam/flash';
import { steamState, type SteamQuality } from '@/core/steam/steamState';
import type { Interval } from '@/core/time/interval';
import { stepsFromSpans, type ValuedSpan } from '@/core/time/stepMath';
import type { StepFunction } from '@/core/time/stepFunction';
import { instantOf, minuteOf, type WeekTime } from '../weeks/weekTime';
import type { BoilerRow, CapacityRows, FiringRow } from './capacity.repo';

interface Dated {
  readonly fromAt: Date;
  readonly toAt: Date;
}

/** A dated span on the week's minutes, cut to the week; it ends with the last minute that it touches. */
export function spanInWeek(time: WeekTime, dated: Dated, since = 0): Interval {
  const last = minuteOf(time, dated.toAt);
  const to = instantOf(time, last) < dated.toAt ? last + 1 : last;
  return { from: Math.max(since, minuteOf(time, dated.fromAt)), to: Math.min(time.horizonMin, to) };
}

/** True where a dated span has a minute in the week. */
export function touchesWeek(time: WeekTime, { fromAt, toAt }: Dated): boolean {
  return fromAt < time.endInstant && toAt > time.firstInstant;
}

/** Spans on which a step function has a value other than `ground`, without overlap. */
export function spansOf(fn: StepFunction, ground: number, horizonMin: number): ValuedSpan[] {
  return fn
    .map(({ from, value }, i) => ({ from, to: fn[i + 1]?.from ?? horizonMin, value }))
    .filter((span) => span.value !== ground && span.to > span.from);
}

/** A boiler's share of its full export, 0 shut to 1 lit, the look back included; what was said later holds. */
export function shareOf(time: WeekTime, boilerId: string, firings: readonly FiringRow[]): StepFunction {
  const own = firings.filter((firing) => firing.boilerId === boilerId);
  return stepsFromSpans(
    own.map((firing) => ({ ...spanInWeek(time, firing, -LOOK_BACK_MIN), value: firing.share })),
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

/** A boiler's spells in fire, with when they are ready. */
export function firesInWeek(rows: CapacityRows, boiler: BoilerRow, time: WeekTime): Fire[] {
  return firesOf(shareOf(time, boiler.id, rows.firings), boiler, time.horizonMin);
}

/** What a boiler sends out when fully lit: its rating at header conditions, less the feed tank's steam. */
export function exportOf(rows: CapacityRows, boiler: BoilerRow): BoilerExport {
  const header = rows.headers.find(({ id }) => id === boiler.headerId);
  if (!header) throw new Error(`${boiler.name} feeds no header of its plant`);
  const quality: SteamQuality =
    header.superheatK === null
      ? { kind: 'wet', dryness: header.dryness ?? 1 }
      : { kind: 'superheated', superheatK: header.superheatK };
  const ambient = ambientOf(rows);
  const steam = steamState({ pressure: barGauge(header.pressureBarG), quality, ambient });
  const house = { ...boiler, boilerPressureBarG: boiler.pressureBarG, feedTankPressureBarG: boiler.feedTankBarG };
  return expected(boilerExport(house, { header: expected(steam, header.name), ambient }), boiler.name);
}

/** A boiler over the week as core wants it: lit is ready to export, purge and coming up are over. */
export function boilerInForce(rows: CapacityRows, boiler: BoilerRow, time: WeekTime): BoilerInForce {
  const shares = spansOf(shareOf(time, boiler.id, rows.firings), 0, time.horizonMin);
  const pressure = toAbsolute(barGauge(boiler.pressureBarG), ambientOf(rows));
  return {
    id: boiler.id,
    exportKgPerH: exportOf(rows, boiler).netKgPerH,
    greatestRisePerMin: boiler.greatestRiseFractionPerMin,
    waterTonnes: boiler.waterTonnes,
    storedKgPerBarAndTonne: expected(storedSteamKgPerBar(pressure, 1_000), boiler.name),
    lit: readySpans(firesInWeek(rows, boiler, time)).flatMap((span) => inWeek(span, time)),
    outages: [],
    deratings: shares.filter((span) => span.value < 1),
  };
}

function inWeek({ from, to }: Interval, { horizonMin }: WeekTime): Interval[] {
  const cut = { from: Math.max(0, from), to: Math.min(horizonMin, to) };
  return cut.from < cut.to ? [cut] : [];
}
