import { desc, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import type { OwnSettingsDto, PlantSettings, PlantSettingsDto } from '@/contracts/settings';
import { db } from '@/db/client';
import { people, plants, record } from '@/db/schema/index';
import { POST as OWN } from '@/pages/api/settings/own';
import { POST as PLANT } from '@/pages/api/settings/plant';
import { subscribe, untilListening } from '@/server/events/hub';
import { signedIn } from '@/server/auth/session';
import { callApi, outcome } from '../support/api';
import { openWorld, sessionOf } from '../support/world';

beforeAll(openWorld);

const AS_SEEDED: PlantSettings = {
  units: 'si',
  altitudeM: 0,
  snapMinutes: 5,
  reserveFraction: 0.1,
  sagToleranceBar: 0.5,
  fuelPricePerKWh: null,
  currency: 'EUR',
};

const own = async (personId: string, body: unknown) => callApi(OWN, { body, session: await sessionOf(personId) });
const plant = async (values: unknown, was: unknown, personId = 'north-administrator') =>
  callApi(PLANT, { body: { values, was }, session: await sessionOf(personId) });

const standing = async (plantId = 'north'): Promise<PlantSettings> => {
  const [row] = await db.select().from(plants).where(eq(plants.id, plantId));
  if (!row) throw new Error('no plant');
  const { altitudeM, snapMinutes, reserveFraction, sagToleranceBar, fuelPricePerKWh, currency } = row;
  const units = row.displayUnits === 'us' ? 'usCustomary' : 'si';
  return { units, altitudeM, snapMinutes, reserveFraction, sagToleranceBar, fuelPricePerKWh, currency };
};
const unitsFor = async (personId: string) => {
  const found = await signedIn(await sessionOf(personId), { tabletToken: null, isTouch: false });
  return found?.choices.units;
};

describe('a person’s own settings', () => {
  it('begin with the plant’s units, and are kept', async () => {
    expect(await unitsFor('north-planner')).toBe('si');
    const answer = await own('north-planner', { theme: 'dark', units: 'usCustomary' });
    expect(answer.status).toBe(200);
    expect((await answer.json()) as OwnSettingsDto).toEqual({
      own: { theme: 'dark', units: 'usCustomary' },
      units: 'usCustomary',
    });
    expect(await unitsFor('north-planner')).toBe('usCustomary');
    expect(await unitsFor('north-qualityLead')).toBe('si');
  });

  it('keep what a request leaves out, and go back to the plant’s units', async () => {
    await own('north-qualityLead', { theme: 'dark', units: 'usCustomary' });
    const themed = (await (await own('north-qualityLead', { theme: 'light' })).json()) as OwnSettingsDto;
    expect(themed.own).toEqual({ theme: 'light', units: 'usCustomary' });
    const back = (await (await own('north-qualityLead', { units: null })).json()) as OwnSettingsDto;
    expect(back).toEqual({ own: { theme: 'light', units: null }, units: 'si' });
    const [row] = await db.select({ settings: people.settings }).from(people).where(eq(people.id, 'north-qualityLead'));
    expect(row?.settings).toEqual({ theme: 'light' });
  });

  it('refuse units and themes that there are not', async () => {
    const answer = await own('north-planner', { theme: 'sepia', units: 'imperial' });
    const body = (await answer.json()) as { fields: { path: string }[] };
    expect([answer.status, body.fields.map(({ path }) => path)]).toEqual([400, ['theme', 'units']]);
    expect(await unitsFor('north-planner')).toBe('usCustomary');
  });
});

describe('the plant’s settings', () => {
  it('are set by the administrator, told to open pages and written to the record', async () => {
    const notices: string[] = [];
    await untilListening();
    const stop = subscribe({
      plantId: 'north',
      sessionHash: 'none',
      send: (notice) => notices.push((JSON.parse(notice) as { kind: string }).kind),
      beat: () => undefined,
      close: () => undefined,
    });
    const values: PlantSettings = {
      ...AS_SEEDED,
      units: 'usCustomary',
      altitudeM: 1500,
      reserveFraction: 0.12,
      fuelPricePerKWh: 0.062,
    };
    const answer = await plant(values, AS_SEEDED);
    expect([answer.status, ((await answer.json()) as PlantSettingsDto).values]).toEqual([200, values]);
    expect(await standing()).toEqual(values);
    expect(await standing('south')).toMatchObject({ units: 'si', altitudeM: 0, fuelPricePerKWh: null });
    const [last] = await db.select().from(record).orderBy(desc(record.createdAt)).limit(1);
    expect(last).toMatchObject({
      plantId: 'north',
      authorId: 'north-administrator',
      action: 'plant.settings',
      details: {
        before: { units: 'si', altitudeM: 0, reserveFraction: 0.1, fuelPricePerKWh: null },
        after: { units: 'usCustomary', altitudeM: 1500, reserveFraction: 0.12, fuelPricePerKWh: 0.062 },
      },
    });
    await expect.poll(() => notices).toContain('capacity');
    expect(notices).toContain('plant');
    stop();
  });

  it('give their units to those who have chosen none', async () => {
    expect(await unitsFor('north-lineSupervisor')).toBe('usCustomary');
    expect(await unitsFor('south-utilitiesLead')).toBe('si');
    await own('north-lineSupervisor', { units: 'si' });
    expect(await unitsFor('north-lineSupervisor')).toBe('si');
  });

  it('refuse a form that was filled before somebody else saved, and say what is now', async () => {
    const now = await standing();
    const answer = await plant({ ...AS_SEEDED, snapMinutes: 10 }, AS_SEEDED);
    const body = (await answer.json()) as { code: string; now: PlantSettingsDto };
    expect([answer.status, body.code, body.now.values]).toEqual([409, 'SETTINGS-STALE', now]);
    expect(await standing()).toEqual(now);
  });

  it('write nothing where nothing changes', async () => {
    const now = await standing();
    const before = await db.$count(record);
    expect((await plant(now, now)).status).toBe(200);
    expect(await db.$count(record)).toBe(before);
  });

  it.each<[string, Partial<Record<keyof PlantSettings, unknown>>, string]>([
    ['a plant in the stratosphere', { altitudeM: 12_000 }, 'Altitude is 12000 m; it must be -500 to 5000 m.'],
    ['a reserve that is no share', { reserveFraction: 7 }, 'Reserve: 0 to 50 %.'],
    ['a negative sag', { sagToleranceBar: -1 }, 'Pressure sag: 0.05 to 3 bar.'],
    ['half a minute of snap', { snapMinutes: 2.5 }, 'Whole minutes.'],
    ['a currency in words', { currency: 'pounds' }, 'Three capital letters, such as EUR.'],
    ['a negative price', { fuelPricePerKWh: -0.1 }, 'Fuel price: 0 to 10 per kWh.'],
    ['a missing altitude', { altitudeM: null }, 'expected number'],
  ])('refuse %s at its field, and save nothing', async (_, wrong, sentence) => {
    const now = await standing();
    const answer = await plant({ ...now, ...wrong, snapMinutes: wrong.snapMinutes ?? 15 }, now);
    const body = (await answer.json()) as { fields: { path: string; message: string }[] };
    expect(answer.status).toBe(400);
    expect(body.fields.map(({ path }) => path)).toEqual([`values.${Object.keys(wrong)[0]}`]);
    expect(body.fields[0]?.message).toContain(sentence);
    expect(await standing()).toEqual(now);
  });

  it('are not for a planner, nor for another plant’s administrator', async () => {
    const now = await standing();
    expect(await outcome(await plant(now, now, 'north-planner'))).toEqual({ status: 403, code: 'ROLE' });
    expect(await outcome(await plant(now, now, 'south-utilitiesLead'))).toEqual({ status: 403, code: 'ROLE' });
  });
});
