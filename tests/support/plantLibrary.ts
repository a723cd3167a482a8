import type { PlantLibraryDto, ThingValues } from '@/contracts/plantLibrary';

/** A header on boilers at 7 bar g, x = 0.98. */
export function header(change: Partial<ThingValues<'headers'>> = {}): ThingValues<'headers'> {
  return {
    name: 'Main header',
    pressureBarG: 7,
    dryness: 0.98,
    superheatK: null,
    feedKind: 'boilers',
    feedFromHeaderId: null,
    greatestKgPerH: null,
    leastKgPerH: null,
    flashFromHeaderId: null,
    flashShare: null,
    flashCondensateBarG: null,
    warmUpMinutes: 20,
    warmUpKg: 0,
    ...change,
  };
}

/** The worked boiler (invented plant): 4 t/h from and at, 10 bar g, feed tank at 0.2 bar g. */
export function boiler(change: Partial<ThingValues<'boilers'>> = {}): ThingValues<'boilers'> {
  return {
    name: 'Boiler 1',
    headerId: 'main',
    ratingFromAndAtKgPerH: 4_000,
    pressureBarG: 10,
    feedTankBarG: 0.2,
    blowdownFraction: 0.05,
    condensateReturnFraction: 0.6,
    condensateC: 90,
    makeUpC: 15,
    turndown: 4,
    greatestRiseFractionPerMin: 0.1,
    waterTonnes: 8,
    efficiency: 0.8,
    fuel: 'naturalGasUs',
    purgeMinutes: 5,
    warmReadyMinutes: 30,
    coldReadyMinutes: 120,
    ...change,
  };
}

/** A main header with one boiler, a kettle header let down from it, a line and a vent group. */
export function library(): PlantLibraryDto {
  const thing = <V>(id: string, values: V) => ({ id, values, retiredAt: null });
  const low = header({
    name: 'Kettle header',
    pressureBarG: 3,
    dryness: 0.995,
    feedKind: 'letdown',
    feedFromHeaderId: 'main',
    greatestKgPerH: 1_600,
  });
  return {
    ambientBarA: 1.01325,
    weekStartsOn: 1,
    things: {
      headers: [thing('main', header()), thing('low', low)],
      boilers: [thing('boiler-1', boiler())],
      units: [],
      ventGroups: [thing('vents', { name: 'North manifold' })],
      accumulators: [],
      sharedLimits: [],
      baseLoads: [],
      lines: [thing('line', { name: 'Line A' })],
    },
    ventNumbers: {},
  };
}
