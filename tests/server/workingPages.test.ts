import { beforeAll, describe, expect, it } from 'vitest';
import { ROLES, type Role } from '@/contracts/account';
import { db } from '@/db/client';
import { accumulators, headers, plants } from '@/db/schema/index';
import { authorize } from '@/server/auth/permissions';
import { loadBoilerWorking } from '@/server/working/loadBoilerWorking';
import { loadHeaderMoment } from '@/server/working/loadHeaderMoment';
import { loadHeaderWorking } from '@/server/working/loadHeaderWorking';
import { findWeek, planOf } from '@/server/weeks/findWeek';
import { weekOfPlan } from '@/server/weeks/weekOfPlan';
import { eq } from 'drizzle-orm';
import { openWorld, WEEK } from '../support/world';

beforeAll(openWorld);

function reader(role: Role = 'planner', plantId = 'north') {
  const actor = {
    personId: `${plantId}-${role}`,
    name: role,
    plantId,
    plantName: plantId,
    isDemo: false,
    roles: [role],
  };
  const found = authorize({ ...actor, email: '', units: 'si' } as Parameters<typeof authorize>[0], 'plan.read');
  if (!found.ok) throw new Error(found.error.message);
  return found.value;
}

const stepOf = (steps: readonly { symbol: string; value: number }[], symbol: string) =>
  steps.find((step) => step.symbol === symbol)?.value ?? NaN;

describe('the working of a boiler', () => {
  // Worked boiler (invented plant), computed with an independent IAPWS-IF97 implementation.
  it('goes from the plate to the net export, for everybody of the plant', async () => {
    for (const role of ROLES) {
      const found = await loadBoilerWorking(reader(role), 'north-boiler-1');
      expect(found.ok && found.value.worked.netKgPerH).toBeCloseTo(3546.94, 2);
    }
    const found = await loadBoilerWorking(reader(), 'north-boiler-1');
    if (!found.ok) throw new Error(found.error.message);
    const { steps } = found.value.worked.working;
    expect(stepOf(steps, 'f')).toBeCloseTo(0.964304, 6);
    expect(stepOf(steps, 'ṁ_ft')).toBeCloseTo(310.277, 3);
    expect(stepOf(steps, 'ṁ_n')).toBeCloseTo(3546.94, 2);
    const further = found.value.further.flatMap((working) => working.steps);
    expect(stepOf(further, 'r')).toBeCloseTo(354.694, 3);
    expect(stepOf(further, 'ṁ_min')).toBeCloseTo(886.735, 3);
    // 8 t of water at 10 bar g, 8.876 kg per bar and tonne.
    expect(stepOf(further, 'm_bar')).toBeCloseTo(71.01, 1);
    // 2526.49 kW into the water at the plant's 80 %.
    expect(stepOf(further, 'q_fuel')).toBeCloseTo(2526.49 / 0.8, 1);
  });

  it('stands at the plant’s altitude', async () => {
    await db.update(plants).set({ altitudeM: 1500 }).where(eq(plants.id, 'south'));
    const found = await loadBoilerWorking(reader('planner', 'south'), 'south-boiler-1');
    // ICAO standard atmosphere at 1 500 m: 0.84556 bar a.
    expect(found.ok && found.value.ambientBarA).toBeCloseTo(0.8456, 3);
    expect(found.ok && found.value.steam.pressure).toBeCloseTo(7.8456, 3);
  });

  it('is not there for another plant, nor where there is none', async () => {
    for (const id of ['south-boiler-1', 'nothing']) {
      expect(await loadBoilerWorking(reader(), id)).toMatchObject({ ok: false, error: { status: 404 } });
    }
  });
});

describe('the working of a header', () => {
  it('balances the station that the boilers feed it through', async () => {
    const found = await loadHeaderWorking(reader(), 'north-main');
    if (!found.ok) throw new Error(found.error.message);
    const [station, ...more] = found.value.stations;
    expect(more).toEqual([]);
    expect(station?.boilers.map(({ name }) => name)).toEqual(['Boiler 1', 'Boiler 2']);
    expect(station?.kgPerH).toBeCloseTo(7093.88, 2);
    expect(station?.balance.ok && station.balance.value.lostKJPerKg).toBeCloseTo(53.2819, 4);
    expect(found.value.feeds).toEqual([{ id: 'north-low', name: 'Kettle header' }]);
  });

  it('says where a header is stated drier than its letdown can make it', async () => {
    const found = await loadHeaderWorking(reader(), 'north-low');
    const [station] = found.ok ? found.value.stations : [];
    expect(station?.from).toEqual({ id: 'north-main', name: 'Main header' });
    expect(station?.balance).toMatchObject({ ok: false, error: { code: 'STATION-HOTTER', field: 'dryness' } });
  });

  it('is not there for another plant', async () => {
    expect(await loadHeaderWorking(reader(), 'south-main')).toMatchObject({ ok: false, error: { status: 404 } });
    expect(await loadHeaderMoment(reader(), 'south-main', { weekStart: WEEK, minute: null })).toEqual({
      ok: true,
      value: null,
    });
  });

  it('closes in kg/h at a minute of a week', async () => {
    const found = await loadHeaderMoment(reader(), 'north-main', { weekStart: WEEK, minute: 600 });
    if (!found.ok || !found.value) throw new Error('no moment');
    const { balance, baseKgPerH, clock, isPeak } = found.value;
    expect(balance.into).toMatchObject([{ kind: 'feed', headerId: null, kgPerH: 240 }]);
    expect(balance.out).toMatchObject([{ kind: 'users', kgPerH: 240 }]);
    expect(baseKgPerH).toBe(240);
    expect(balance.lostKW).toBeCloseTo((240 * 53.2819) / 3600, 3);
    expect([clock, isPeak]).toEqual(['Mon 10:00', false]);
    const peak = await loadHeaderMoment(reader(), 'north-main', { weekStart: WEEK, minute: 99_999 });
    expect(peak.ok && peak.value?.isPeak).toBe(true);
  });

  it('refuses a week that is none', async () => {
    const found = await loadHeaderMoment(reader(), 'north-main', { weekStart: '2026-12-01', minute: null });
    expect(found).toMatchObject({ ok: false, error: { status: 404 } });
  });
});

describe('flash steam and accumulators of a plant', () => {
  const vessel = {
    plantId: 'north',
    name: 'Accumulator',
    chargedFromHeaderId: 'north-main',
    feedsHeaderId: 'north-low',
    waterTonnes: 5,
    highBarG: 6.5,
    lowBarG: 3.5,
    greatestChargeKgPerH: 600,
    greatestDischargeKgPerH: 900,
    position: 0,
  };
  const modelOf = async () => {
    const found = await findWeek(reader(), WEEK);
    if (!found.ok) throw new Error(found.error.message);
    return (await weekOfPlan(db, found.value, await planOf(db, found.value))).week.plant;
  };

  it('come with the week, what was retired before its end left out', async () => {
    await db.insert(accumulators).values([
      { ...vessel, id: 'acc' },
      { ...vessel, id: 'gone', retiredAt: new Date('2026-11-01T00:00:00Z') },
      { ...vessel, id: 'later', retiredAt: new Date('2027-01-01T00:00:00Z') },
    ]);
    const flash = { fromHeaderId: 'north-main', share: 0.5, condensateBarG: 7 };
    await db.update(headers).set({ flash }).where(eq(headers.id, 'north-low'));
    const plant = await modelOf();
    expect(plant.accumulators?.map(({ id }) => id)).toEqual(['acc', 'later']);
    expect(plant.accumulators?.[0]).not.toHaveProperty('plantId');
    expect(plant.headers.find(({ id }) => id === 'north-low')?.flash).toEqual(flash);
  });

  it('open to their working', async () => {
    const found = await loadHeaderWorking(reader(), 'north-low');
    if (!found.ok) throw new Error(found.error.message);
    expect(found.value.accumulators.map(({ role }) => role)).toContain(
      'Charged from Main header, discharged into Kettle header',
    );
    expect(found.value.flash?.from?.id).toBe('north-main');
    expect(found.value.problems).toEqual([]);
  });

  it('say in a sentence what cannot be worked out', async () => {
    const flash = { fromHeaderId: 'north-main', share: 0.5, condensateBarG: 1 };
    await db.update(headers).set({ flash }).where(eq(headers.id, 'north-low'));
    const found = await loadHeaderWorking(reader(), 'north-low');
    expect(found.ok && found.value.flash).toBeNull();
    expect(found.ok && found.value.problems[0]).toMatch(/^Water flashes only when the pressure falls/);
  });
});
