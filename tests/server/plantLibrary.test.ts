import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { PlantLibraryDto, SavedThingDto, Thing, ThingKind } from '@/contracts/plantLibrary';
import { db } from '@/db/client';
import {
  activities,
  boilerFirings,
  headers,
  lines,
  plans,
  record,
  steamLimits,
  units,
  ventGroups,
} from '@/db/schema/index';
import { GET } from '@/pages/api/plant/index';
import { POST as CREATE } from '@/pages/api/plant/[kind]/index';
import { POST as ORDER } from '@/pages/api/plant/[kind]/order';
import { POST as EDIT } from '@/pages/api/plant/[kind]/[id]/index';
import { POST as RETIRE } from '@/pages/api/plant/[kind]/[id]/retire';
import { GET as CAPACITY } from '@/pages/api/weeks/[week]/capacity';
import { callApi, outcome } from '../support/api';
import { boiler, header } from '../support/plantLibrary';
import { openWorld, sessionOf, WEEK } from '../support/world';

let lead: string;
beforeAll(async () => {
  const close = await openWorld();
  process.env.STEADMAIN_NOW = '2026-12-01T09:00:00Z';
  lead = await sessionOf('north-utilitiesLead');
  for (const plantId of ['north', 'south']) {
    await db.insert(lines).values({ id: `${plantId}-line`, plantId, name: 'Line A', position: 0 });
    await db.insert(ventGroups).values({
      id: `${plantId}-vents`,
      plantId,
      name: 'North manifold',
      ventsAtOnce: 2,
      steamOnsAtOnce: 2,
      source: 'invented study',
    });
  }
  return close;
});
beforeEach(async () => {
  await db.delete(record);
});

const library = async (session = lead): Promise<PlantLibraryDto> =>
  (await (await callApi(GET, { session })).json()) as PlantLibraryDto;
const create = (kind: string, values: unknown, session = lead) =>
  callApi(CREATE, { session, params: { kind }, body: { values } });
const edit = (kind: string, id: string, values: unknown, was: unknown, session = lead) =>
  callApi(EDIT, { session, params: { kind, id }, body: { values, was } });
const retire = (kind: string, id: string, session = lead) =>
  callApi(RETIRE, { session, method: 'POST', params: { kind, id } });
const saved = async (response: Response): Promise<SavedThingDto> => {
  const body: unknown = await response.json();
  expect([response.status, body]).toEqual([response.status < 300 ? response.status : 0, body]);
  return body as SavedThingDto;
};
const thingIn = (dto: PlantLibraryDto, kind: ThingKind, id: string) =>
  (dto.things[kind] as readonly Thing<ThingKind>[]).find((thing) => thing.id === id);
const fieldsOf = async (response: Response): Promise<string[]> => {
  const body = (await response.json()) as { fields?: { path: string }[] };
  return (body.fields ?? []).map(({ path }) => path).sort();
};

const letdown = { feedKind: 'letdown', feedFromHeaderId: 'north-main', greatestKgPerH: 900 } as const;
const GOOD: Readonly<Record<ThingKind, Record<string, unknown>>> = {
  headers: { ...header({ name: 'Wash header', pressureBarG: 2, ...letdown }) },
  boilers: { ...boiler({ name: 'Boiler 3', headerId: 'north-main' }) },
  units: { name: 'Retort 9', lineId: 'north-line', kind: 'retort', headerId: 'north-main', ventGroupId: 'north-vents' },
  ventGroups: { name: 'South manifold' },
  accumulators: {
    name: 'Accumulator',
    chargedFromHeaderId: 'north-main',
    feedsHeaderId: 'north-low',
    waterTonnes: 20,
    highBarG: 7,
    lowBarG: 3,
    greatestChargeKgPerH: 800,
    greatestDischargeKgPerH: 2_000,
    shareAtWeekStart: 0,
  },
  sharedLimits: { name: 'Hoist', unit: 'hoists', capacity: [{ fromHour: 0, value: 1 }] },
  baseLoads: { headerId: 'north-low', fromHour: 4, toHour: 136, kgPerH: 60, note: 'space heating' },
  lines: { name: 'Line B' },
};
const BAD: Readonly<Record<ThingKind, [Record<string, unknown>, string[]]>> = {
  headers: [
    { dryness: 1.1, pressureBarG: -1, feedFromHeaderId: 'south-main' },
    ['dryness', 'feedFromHeaderId', 'pressureBarG'],
  ],
  boilers: [
    { ratingFromAndAtKgPerH: -1, pressureBarG: 6, headerId: 'south-main' },
    ['headerId', 'ratingFromAndAtKgPerH'],
  ],
  units: [
    { lineId: 'south-line', headerId: 'south-main', ventGroupId: 'south-vents' },
    ['headerId', 'lineId', 'ventGroupId'],
  ],
  ventGroups: [{ name: ' ' }, ['name']],
  accumulators: [{ lowBarG: 7, chargedFromHeaderId: 'south-main' }, ['chargedFromHeaderId', 'lowBarG']],
  sharedLimits: [{ unit: '', capacity: [] }, ['capacity', 'unit']],
  baseLoads: [{ headerId: 'south-main', toHour: 4, note: '' }, ['headerId', 'note', 'toHour']],
  lines: [{ name: 'Line A' }, ['name']],
};
const kinds = Object.keys(GOOD) as ThingKind[];

describe.each(kinds)('%s', (kind) => {
  it('are created, edited and retired, each step in the record', async () => {
    const made = await saved(await create(kind, GOOD[kind]));
    const was = thingIn(made.library, kind, made.id)?.values;
    expect(was).toEqual(GOOD[kind]);
    const change = kind === 'baseLoads' ? { note: 'washing' } : { name: 'Renamed' };
    const edited = await saved(await edit(kind, made.id, { ...GOOD[kind], ...change }, was));
    expect(thingIn(edited.library, kind, made.id)?.values).toEqual({ ...GOOD[kind], ...change });
    const gone = await saved(await retire(kind, made.id));
    expect(thingIn(gone.library, kind, made.id)?.retiredAt).toEqual(expect.any(String));
    const kept = await db.select().from(record).orderBy(record.createdAt);
    expect(kept.map(({ action }) => action).sort()).toEqual(['plant.create', 'plant.edit', 'plant.retire']);
    expect(kept.every(({ subject, authorId }) => subject === made.id && authorId === 'north-utilitiesLead')).toBe(true);
    expect(await outcome(await retire(kind, made.id))).toEqual({ status: 409, code: 'THING-RETIRED' });
  });

  it('are refused at every field that is wrong, another plant’s things too, and nothing is saved', async () => {
    const before = await library();
    const [change, fields] = BAD[kind];
    const response = await create(kind, { ...GOOD[kind], ...change });
    expect(response.status).toBe(400);
    expect(await fieldsOf(response)).toEqual(fields);
    expect(await library()).toEqual(before);
    expect(await db.$count(record)).toBe(0);
  });

  it('are refused where they changed since they were read, with what is there now', async () => {
    const made = await saved(await create(kind, GOOD[kind]));
    const was = GOOD[kind];
    const change = kind === 'baseLoads' ? { note: 'first' } : { name: 'First' };
    await saved(await edit(kind, made.id, { ...was, ...change }, was));
    const late = await edit(kind, made.id, { ...was, ...(kind === 'baseLoads' ? { note: 'x' } : { name: 'x' }) }, was);
    expect(late.status).toBe(409);
    expect(await late.json()).toMatchObject({ code: 'THING-STALE', now: { values: change } });
    expect(thingIn(await library(), kind, made.id)?.values).toMatchObject(change);
    await saved(await retire(kind, made.id));
  });

  it('of another plant are neither edited nor retired', async () => {
    const south = await sessionOf('south-utilitiesLead');
    const made = await saved(await create(kind, GOOD[kind]));
    expect(await outcome(await edit(kind, made.id, GOOD[kind], GOOD[kind], south))).toMatchObject({ status: 404 });
    expect(await outcome(await retire(kind, made.id, south))).toMatchObject({ status: 404 });
    expect(thingIn(await library(south), kind, made.id)).toBeUndefined();
    await saved(await retire(kind, made.id));
  });
});

describe('the library', () => {
  it('knows no other kinds', async () => {
    expect(await outcome(await create('people', { name: 'x' }))).toEqual({ status: 404, code: 'NOT-FOUND' });
  });

  it('is ordered whole or not at all', async () => {
    const order = (ids: string[]) => callApi(ORDER, { session: lead, params: { kind: 'boilers' }, body: { ids } });
    const ids = (dto: PlantLibraryDto) =>
      dto.things.boilers.filter(({ retiredAt }) => retiredAt === null).map(({ id }) => id);
    const { library: dto } = await saved(await order(['north-boiler-2', 'north-boiler-1']));
    expect(ids(dto)).toEqual(['north-boiler-2', 'north-boiler-1']);
    expect(await outcome(await order(['north-boiler-1']))).toEqual({ status: 400, code: 'PLANT-ORDER' });
    expect(await outcome(await order(['north-boiler-1', 'south-boiler-1']))).toMatchObject({ status: 400 });
    expect(ids(await library())).toEqual(['north-boiler-2', 'north-boiler-1']);
  });

  it('starts a vent group with one vent and one steam on at a time, whatever is sent', async () => {
    const made = await saved(await create('ventGroups', { name: 'East manifold', ventsAtOnce: 9 }));
    expect(made.library.ventNumbers[made.id]).toMatchObject({ ventsAtOnce: 1, steamOnsAtOnce: 1 });
    await saved(await retire('ventGroups', made.id));
  });
});

describe('retiring', () => {
  const usesOf = async (response: Response) => {
    const body = (await response.json()) as { code: string; uses: string[] };
    expect([response.status, body.code]).toEqual([409, 'THING-IN-USE']);
    return body.uses;
  };

  it('a header is refused with what stands on it, hangs from it and is set for it', async () => {
    await db.insert(steamLimits).values({
      id: 'limit',
      plantId: 'north',
      headerId: 'north-low',
      fromAt: new Date('2026-12-02T00:00:00Z'),
      toAt: new Date('2026-12-03T00:00:00Z'),
      limitKgPerH: 900,
      reason: 'tests',
      authorId: 'north-utilitiesLead',
    });
    expect(await usesOf(await retire('headers', 'north-main'))).toEqual([
      'Boiler 2',
      'Boiler 1',
      'Kettle header',
      'base load “losses”',
    ]);
    expect(await usesOf(await retire('headers', 'north-low'))).toEqual(['a steam limit set for this week or later']);
    const [row] = await db.select().from(headers).where(eq(headers.id, 'north-main'));
    expect(row?.retiredAt).toBeNull();
  });

  it('a unit is refused while this week or a later one has a batch for it, not for weeks gone by', async () => {
    const { id: unitId } = await saved(await create('units', GOOD.units));
    const batch = async (weekStart: string, code: string) => {
      const planId = `plan-${weekStart}`;
      await db.insert(plans).values({ id: planId, plantId: 'north', weekStart }).onConflictDoNothing();
      const modes = [{ unitId, minutes: 60, phases: [], uses: [], dutyId: null }];
      const at = new Date(`${weekStart}T08:00:00Z`);
      const row = { id: code, plantId: 'north', planId, kind: 'stage', code, title: code, modes } as const;
      await db.insert(activities).values({ ...row, modes, earliestAt: at });
    };
    await batch('2026-11-23', 'OLD-1');
    await batch(WEEK, 'A01-1');
    await batch('2026-12-07', 'B01-1');
    expect(await usesOf(await retire('units', unitId))).toEqual([
      `A01-1 in the week of ${WEEK}`,
      'B01-1 in the week of 2026-12-07',
    ]);
    await db.delete(activities).where(eq(activities.code, 'A01-1'));
    await db.delete(activities).where(eq(activities.code, 'B01-1'));
    await saved(await retire('units', unitId));
    expect((await db.select().from(units).where(eq(units.id, unitId)))[0]?.retiredAt).toEqual(expect.any(Date));
  });

  it('a boiler is refused while it is in fire, and then goes from this week and not from weeks that ended', async () => {
    const made = await saved(await create('boilers', GOOD.boilers));
    const fire = { fromAt: new Date('2026-11-30T04:00:00Z'), toAt: new Date('2026-12-04T22:00:00Z') };
    const row = { id: 'fire', plantId: 'north', boilerId: made.id, share: 1, reason: 'week in fire', authorId: 'x' };
    await db.insert(boilerFirings).values({ ...row, ...fire });
    expect(await usesOf(await retire('boilers', made.id))).toEqual(['firings of this week or later (week in fire)']);
    await db.delete(boilerFirings);
    await saved(await retire('boilers', made.id));
    const boilersOf = async (week: string) => {
      const dto = (await (await callApi(CAPACITY, { session: lead, params: { week } })).json()) as {
        boilers: { id: string }[];
      };
      return dto.boilers.map(({ id }) => id).includes(made.id);
    };
    expect([await boilersOf('2026-11-23'), await boilersOf(WEEK)]).toEqual([true, false]);
  });

  it('a line and a vent group are refused while units stand on them', async () => {
    const made = await saved(await create('units', GOOD.units));
    expect(await usesOf(await retire('lines', 'north-line'))).toEqual(['Retort 9']);
    expect(await usesOf(await retire('ventGroups', 'north-vents'))).toEqual(['Retort 9']);
    await saved(await retire('units', made.id));
  });
});
