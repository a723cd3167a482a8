import { describe, expect, it } from 'vitest';
import { thingFaults, thingSchema } from '@/contracts/plantChecks';
import type { CheckContext } from '@/contracts/plantChecks/context';
import { enterPracticeSchema } from '@/contracts/practice';
import type { ThingKind, ThingValues } from '@/contracts/plantLibrary';
import { boiler, header, library } from '../../support/plantLibrary';

const NEW: CheckContext = { library: library(), id: null };
const faultsOf = (kind: ThingKind, values: object, context: CheckContext = NEW): [string, string][] =>
  thingFaults(kind, values as Record<string, unknown>, context).map(({ path, message }) => [path, message]);
const fieldsOf = (kind: ThingKind, values: object, context?: CheckContext) =>
  faultsOf(kind, values, context)
    .map(([path]) => path)
    .sort();

describe('a header', () => {
  it('is taken wet, dry and superheated, on boilers and behind a letdown', () => {
    const letdown = { feedKind: 'letdown', feedFromHeaderId: 'main', greatestKgPerH: 900 } as const;
    expect(faultsOf('headers', header({ name: 'New' }))).toEqual([]);
    expect(faultsOf('headers', header({ name: 'New', dryness: null, superheatK: 20 }))).toEqual([]);
    expect(faultsOf('headers', header({ name: 'New', pressureBarG: 3, ...letdown }))).toEqual([]);
  });

  const bad: [string, Partial<Record<keyof ThingValues<'headers'>, unknown>>, string, RegExp][] = [
    ['a pressure out of range', { pressureBarG: 90 }, 'pressureBarG', /90 bar g; it must be 0 to 60 bar g/],
    ['a negative pressure', { pressureBarG: -1 }, 'pressureBarG', /-1 bar g; it must be 0 to 60/],
    ['a missing pressure', { pressureBarG: null }, 'pressureBarG', /missing; it must be 0 to 60 bar g/],
    ['a mistyped pressure', { pressureBarG: '7' }, 'pressureBarG', /must be 0 to 60/],
    ['no number', { pressureBarG: Number.NaN }, 'pressureBarG', /must be 0 to 60/],
    ['dryness over 1', { dryness: 1.2 }, 'dryness', /1\.2; it must be 0\.5 to 1/],
    ['dryness and superheat', { superheatK: 20 }, 'superheatK', /exclude each other/],
    ['neither of them', { dryness: null }, 'dryness', /dryness fraction .*, or the superheat/],
    ['no name', { name: '  ' }, 'name', /called/],
    ['a name that is taken', { name: 'main header' }, 'name', /already/],
    ['a letdown from nowhere', { feedKind: 'letdown', greatestKgPerH: 9 }, 'feedFromHeaderId', /Choose/],
    ['half a minute of warming', { warmUpMinutes: 0.5 }, 'warmUpMinutes', /whole/],
  ];
  it.each(bad)('is refused with %s', (_, change, field, sentence) => {
    const faults = faultsOf('headers', { ...header({ name: 'New' }), ...change });
    expect(faults).toEqual([[field, expect.stringMatching(sentence)]]);
  });

  it('has no wet steam above the critical pressure', () => {
    const faults = faultsOf('headers', header({ name: 'New', pressureBarG: 225 }));
    expect(faults).toEqual([
      ['pressureBarG', expect.stringContaining('225 bar g')],
      ['dryness', expect.stringMatching(/no wet steam.*220\.64 bar a/)],
    ]);
  });

  it('is let down to a lower pressure, never from itself or in a ring', () => {
    const edited = (values: object, id: string) => fieldsOf('headers', values, { library: library(), id });
    const letdown = { feedKind: 'letdown' as const, greatestKgPerH: 900 };
    const low = header({ name: 'Kettle header', pressureBarG: 3 });
    expect(edited({ ...low, ...letdown, feedFromHeaderId: 'low' }, 'low')).toEqual(['feedFromHeaderId']);
    expect(edited({ ...low, ...letdown, feedFromHeaderId: 'main', pressureBarG: 7 }, 'low')).toEqual(['pressureBarG']);
    const main = header({ name: 'Main header', pressureBarG: 2 });
    const ring = edited({ ...main, ...letdown, feedFromHeaderId: 'low' }, 'main');
    expect(ring).toEqual(['feedFromHeaderId', 'feedKind', 'pressureBarG']);
    expect(edited({ ...low, ...letdown, feedFromHeaderId: 'main', leastKgPerH: 900 }, 'low')).toEqual(['leastKgPerH']);
    expect(edited({ ...low, ...letdown, feedFromHeaderId: 'main', greatestKgPerH: null }, 'low')).toEqual([
      'greatestKgPerH',
    ]);
  });

  it('is never stated hotter than its letdown can bring', () => {
    // 7 bar g at x 0.98 is 2727.43 kJ/kg: at 3 bar g x 0.9949; dry steam there has 2738.21 (IAPWS-IF97).
    const low = { ...header({ name: 'Low', pressureBarG: 3 }), feedKind: 'letdown' as const, feedFromHeaderId: 'main' };
    const at = (state: object) => faultsOf('headers', { ...low, greatestKgPerH: 900, ...state });
    const main = library().things.headers.find(({ id }) => id === 'main')?.values;
    expect(main).toMatchObject({ pressureBarG: 7, dryness: 0.98 });
    expect(at({ dryness: 0.994 })).toEqual([]);
    expect(at({ dryness: 1 })).toEqual([['dryness', expect.stringMatching(/lower the dryness/)]]);
    expect(at({ dryness: null, superheatK: 20 })).toEqual([['superheatK', expect.stringMatching(/lower the/)]]);
  });

  it('stays between its boilers and the headers let down from it', () => {
    const main = (pressureBarG: number) => header({ name: 'Main header', pressureBarG });
    const context = { library: library(), id: 'main' };
    expect(faultsOf('headers', main(7), context)).toEqual([]);
    expect(faultsOf('headers', main(11), context)).toEqual([['pressureBarG', expect.stringContaining('Boiler 1')]]);
    expect(faultsOf('headers', main(3), context)).toEqual([['pressureBarG', expect.stringContaining('Kettle header')]]);
  });

  it('takes flash from hotter condensate alone, whole or not at all', () => {
    const flash = { name: 'New', pressureBarG: 1, flashFromHeaderId: 'main', flashShare: 0.5, flashCondensateBarG: 5 };
    expect(faultsOf('headers', header(flash))).toEqual([]);
    expect(fieldsOf('headers', header({ ...flash, flashCondensateBarG: 8 }))).toEqual(['flashCondensateBarG']);
    expect(fieldsOf('headers', header({ ...flash, flashCondensateBarG: 1 }))).toEqual(['flashCondensateBarG']);
    expect(fieldsOf('headers', header({ ...flash, flashShare: null, flashCondensateBarG: null }))).toEqual([
      'flashCondensateBarG',
      'flashShare',
    ]);
  });

  it('is told all of its faults at once', () => {
    const all = { ...header({ name: '' }), pressureBarG: -3, superheatK: 500, warmUpKg: -1 };
    expect(fieldsOf('headers', all)).toEqual(['name', 'pressureBarG', 'superheatK', 'warmUpKg']);
  });
});

describe('a boiler', () => {
  const bad: [string, Partial<ThingValues<'boilers'>>, string, RegExp][] = [
    ['a pressure below its header’s', { pressureBarG: 6 }, 'pressureBarG', /6 bar g; it must be at least 7 bar g/],
    ['a feed tank above its pressure', { pressureBarG: 7, feedTankBarG: 7.5 }, 'feedTankBarG', /0 to 5 bar g/],
    ['a negative rating', { ratingFromAndAtKgPerH: -5 }, 'ratingFromAndAtKgPerH', /-5 kg\/h; it must be 50 to/],
    ['blowdown over a half', { blowdownFraction: 0.6 }, 'blowdownFraction', /0\.6; it must be 0 to 0\.5/],
    ['efficiency over 1', { efficiency: 1.1 }, 'efficiency', /1\.1; it must be 0\.5 to 1/],
    ['cold before warm', { coldReadyMinutes: 10 }, 'coldReadyMinutes', /at least 30 min/],
    ['a header behind a letdown', { headerId: 'low' }, 'headerId', /letdown/],
    ['a header that there is not', { headerId: 'gone' }, 'headerId', /no such header/],
  ];
  it.each(bad)('is refused with %s', (_, change, field, sentence) => {
    expect(faultsOf('boilers', { ...boiler(), name: 'Boiler 9', ...change })).toEqual([
      [field, expect.stringMatching(sentence)],
    ]);
  });

  it('is told of a feed tank above the boiler’s pressure, within both ranges', () => {
    const low = library();
    const things = {
      ...low.things,
      headers: low.things.headers.map((one) => ({ ...one, values: { ...one.values, pressureBarG: 1 } })),
    };
    const context = { library: { ...low, things }, id: null };
    const faults = faultsOf('boilers', { ...boiler(), name: 'B', pressureBarG: 3, feedTankBarG: 4 }, context);
    expect(faults).toEqual([['feedTankBarG', expect.stringMatching(/4 bar g; it must be below 3 bar g/)]]);
  });

  it('is saved when right', () => {
    const schema = thingSchema('boilers', NEW);
    expect(schema.safeParse({ ...boiler(), name: ' Boiler 9 ' })).toMatchObject({
      success: true,
      data: { name: 'Boiler 9' },
    });
  });
});

describe('an accumulator', () => {
  const good: ThingValues<'accumulators'> = {
    name: 'Accumulator',
    chargedFromHeaderId: 'main',
    feedsHeaderId: 'low',
    waterTonnes: 20,
    highBarG: 7,
    lowBarG: 3,
    greatestChargeKgPerH: 800,
    greatestDischargeKgPerH: 2_000,
    shareAtWeekStart: 0.5,
  };
  it.each<[string, Partial<ThingValues<'accumulators'>>, string]>([
    ['low at high', { lowBarG: 7 }, 'lowBarG'],
    ['high above its charging header', { highBarG: 8 }, 'highBarG'],
    ['low below the header that it feeds', { lowBarG: 2 }, 'lowBarG'],
    ['a share over 1', { shareAtWeekStart: 1.5 }, 'shareAtWeekStart'],
    ['no water', { waterTonnes: 0 }, 'waterTonnes'],
    ['a feed of the charging header', { feedsHeaderId: 'main', lowBarG: 7, highBarG: 7 }, 'lowBarG'],
  ])('is refused with %s', (_, change, field) => {
    expect(fieldsOf('accumulators', good)).toEqual([]);
    expect(fieldsOf('accumulators', { ...good, ...change })).toContain(field);
  });
});

describe('units, limits and base loads', () => {
  it('put retorts alone in vent groups, and on a header', () => {
    const unit = { name: 'Retort 9', lineId: 'line', kind: 'retort', headerId: 'main', ventGroupId: 'vents' };
    expect(faultsOf('units', unit)).toEqual([]);
    expect(fieldsOf('units', { ...unit, kind: 'kettle' })).toEqual(['ventGroupId']);
    expect(fieldsOf('units', { ...unit, headerId: null })).toEqual(['headerId']);
    expect(fieldsOf('units', { ...unit, lineId: 'gone', headerId: 'gone', ventGroupId: 'gone' })).toEqual([
      'headerId',
      'lineId',
      'ventGroupId',
    ]);
  });

  it('take rising steps from the first hour on', () => {
    const limit = (...hours: number[]) => ({
      name: 'Hoist',
      unit: 'hoists',
      capacity: hours.map((fromHour) => ({ fromHour, value: 1 })),
    });
    expect(faultsOf('sharedLimits', limit(0, 6, 22))).toEqual([]);
    expect(fieldsOf('sharedLimits', limit(2, 6))).toEqual(['capacity.0.fromHour']);
    expect(fieldsOf('sharedLimits', limit(0, 6, 6))).toEqual(['capacity.2.fromHour']);
    expect(fieldsOf('sharedLimits', limit())).toEqual(['capacity']);
    expect(fieldsOf('sharedLimits', limit(0, 168))).toEqual(['capacity.1.fromHour']);
  });

  it('end a base load after it begins', () => {
    const load = { headerId: 'main', fromHour: 4, toHour: 136, kgPerH: 240, note: 'losses' };
    expect(faultsOf('baseLoads', load)).toEqual([]);
    expect(faultsOf('baseLoads', { ...load, toHour: 4 })).toEqual([
      ['toHour', expect.stringContaining('after hour 4')],
    ]);
    expect(fieldsOf('baseLoads', { ...load, kgPerH: -1, note: '' })).toEqual(['kgPerH', 'note']);
  });
});

describe('a practice rule', () => {
  const vents = {
    kind: 'ventGroup',
    ventGroupId: 'vents',
    values: {
      ventsAtOnce: 2,
      steamOnsAtOnce: 2,
      steamOnMinutes: 1,
      marginMinutes: 1,
      leastHeaderBarG: 6.5,
      studyGreatestLoadKgPerH: null,
    },
    source: 'invented study',
  };
  const pathsOf = (rule: unknown) =>
    enterPracticeSchema.safeParse(rule).error?.issues.map(({ path }) => path.join('.'));
  it('needs whole numbers in range, a group and a source', () => {
    expect(pathsOf(vents)).toBeUndefined();
    expect(pathsOf({ ...vents, values: { ...vents.values, ventsAtOnce: 0, marginMinutes: 1.5 } })).toEqual([
      'values.ventsAtOnce',
      'values.marginMinutes',
    ]);
    expect(pathsOf({ ...vents, ventGroupId: null, source: ' ' })).toEqual(['ventGroupId', 'source']);
  });

  it('sets at least one of cleanliness', () => {
    const none = { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: null };
    const rule = (values: object) => ({ kind: 'cleanliness', values: { ...none, ...values }, source: 'x' });
    expect(pathsOf(rule({}))).toEqual(['values.greatestRunningMin']);
    expect(pathsOf(rule({ allergenReleaseMin: 30 }))).toBeUndefined();
    expect(pathsOf({ kind: 'unknown', values: {}, source: 'x' })).toEqual(['kind']);
  });
});
