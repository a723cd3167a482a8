import { ambientOf, exportOf, inUse, steamOfHeader } from '../../contracts/plantChecks';
import type { PlantLibraryDto, ThingValues } from '../../contracts/plantLibrary';
import { boilerOutlet } from '../../core/header/headerSteam';
import { headerStateFrom, stationBalance } from '../../core/header/station';
import { toAbsolute } from '../../core/quantity/pressure';
import { barGauge } from '../../core/quantity/units';
import { fail, ok, problem, type Result } from '../../core/result';
import { accumulatorReleaseKg, storedSteamKgPerBar } from '../../core/steam/flash';
import type { SteamState } from '../../core/steam/steamState';

export type Typed<T> = { readonly [K in keyof T]?: T[K] | null | undefined };

const isFigure = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
const missing = <T>(what: string): Result<T> => fail(problem('MISSING', what));

/** The steam of a header as it is being typed. */
export function headerState(header: Typed<ThingValues<'headers'>>, library: PlantLibraryDto): Result<SteamState> {
  const { pressureBarG, dryness = null, superheatK = null } = header;
  const isStated = isFigure(dryness) !== isFigure(superheatK);
  if (!isFigure(pressureBarG) || !isStated) return missing('Pressure and dryness or superheat give its state.');
  return steamOfHeader({ pressureBarG, dryness, superheatK }, ambientOf(library));
}

export interface Feed {
  readonly name: string;
  readonly state: SteamState;
  /** What passes at most. [kg/h] */
  readonly kgPerH: number;
}

/** What feeds a header as it is being typed: the header above its letdown, or the boilers that stand on it. */
export function feedsOf(header: Typed<ThingValues<'headers'>>, id: string | null, library: PlantLibraryDto): Feed[] {
  const ambient = ambientOf(library);
  if (header.feedKind === 'letdown') {
    const from = inUse(library, 'headers', header.feedFromHeaderId)?.values;
    const state = from && steamOfHeader(from, ambient);
    const kgPerH = isFigure(header.greatestKgPerH) ? header.greatestKgPerH : 0;
    return from && state?.ok ? [{ name: from.name, state: state.value, kgPerH }] : [];
  }
  const boilers = library.things.boilers.filter((boiler) => boiler.retiredAt === null && boiler.values.headerId === id);
  return boilers.flatMap(({ values }) => {
    const state = boilerOutlet(values.pressureBarG, ambient);
    const on = inUse(library, 'headers', id)?.values;
    const out = on ? exportOf(values, on, ambient) : null;
    return state.ok ? [{ name: values.name, state: state.value, kgPerH: out?.ok ? out.value.netKgPerH : 0 }] : [];
  });
}

export interface Arrival {
  readonly name: string;
  readonly byValve: Result<SteamState>;
  /** Where the header is stated otherwise: what that means, or why it can't be. */
  readonly says: readonly string[];
  readonly isWrong: boolean;
}

/** What each feed would give by its valve alone, held against the state that the header is stated with. */
export function arrivalsOf(
  header: Typed<ThingValues<'headers'>>,
  id: string | null,
  library: PlantLibraryDto,
): Arrival[] {
  const stated = headerState(header, library);
  const ambient = ambientOf(library);
  const { pressureBarG } = header;
  if (!isFigure(pressureBarG)) return [];
  return feedsOf(header, id, library).map(({ name, state, kgPerH }) => {
    const byValve = headerStateFrom(state, pressureBarG, ambient);
    if (!stated.ok || !byValve.ok) return { name, byValve, says: [], isWrong: false };
    const headerName = header.name?.trim() ? header.name : 'This header';
    const station = stationBalance({
      upstreamName: name,
      upstream: state,
      headerName,
      stated: stated.value,
      kgPerH,
      ambient,
    });
    if (!station.ok) return { name, byValve, says: [station.error.message], isWrong: true };
    return { name, byValve, says: station.value.says, isWrong: false };
  });
}

export interface BoilerFacts {
  readonly factor: number;
  readonly grossKgPerH: number;
  readonly feedTankSteamKgPerH: number;
  readonly netKgPerH: number;
  /** Greatest rise. [kg/h per min] */
  readonly riseKgPerHPerMin: number;
  /** The least that it holds without going out. [kg/h] */
  readonly turnedDownKgPerH: number;
  readonly storedKgPerBar: number;
  readonly headerName: string;
}

/** What follows from a boiler as it is being typed. */
export function boilerFacts(boiler: Typed<ThingValues<'boilers'>>, library: PlantLibraryDto): Result<BoilerFacts> {
  const header = inUse(library, 'headers', boiler.headerId)?.values;
  if (!header) return missing('Choose its header to see what it sends there.');
  const {
    ratingFromAndAtKgPerH: rating,
    pressureBarG,
    greatestRiseFractionPerMin: rise,
    turndown,
    waterTonnes,
  } = boiler;
  if (!isFigure(rating) || !isFigure(pressureBarG)) return missing('Rating and pressure are missing.');
  const found = exportOf(boiler as ThingValues<'boilers'>, header, ambientOf(library));
  if (!found.ok) return found;
  const { grossKgPerH, feedTankSteamKgPerH, netKgPerH } = found.value;
  const water = isFigure(waterTonnes) ? waterTonnes * 1_000 : 0;
  const stored = storedSteamKgPerBar(toAbsolute(barGauge(pressureBarG), ambientOf(library)), water);
  return ok({
    factor: grossKgPerH / rating,
    grossKgPerH,
    feedTankSteamKgPerH,
    netKgPerH,
    riseKgPerHPerMin: isFigure(rise) ? rise * netKgPerH : Number.NaN,
    turnedDownKgPerH: isFigure(turndown) && turndown > 0 ? netKgPerH / turndown : Number.NaN,
    storedKgPerBar: stored.ok ? stored.value : Number.NaN,
    headerName: header.name,
  });
}

/** Steam that an accumulator gives up between its pressures, as it is being typed. [kg] */
export function releaseKg(accumulator: Typed<ThingValues<'accumulators'>>, library: PlantLibraryDto): Result<number> {
  const { highBarG, lowBarG, waterTonnes } = accumulator;
  if (!isFigure(highBarG) || !isFigure(lowBarG) || !isFigure(waterTonnes)) {
    return missing('Water and both pressures give what it can carry.');
  }
  const ambient = ambientOf(library);
  const high = toAbsolute(barGauge(highBarG), ambient);
  return accumulatorReleaseKg(high, toAbsolute(barGauge(lowBarG), ambient), waterTonnes * 1_000);
}
