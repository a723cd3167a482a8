import { beforeAll, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { activities, cleaningRules, duties, families, plans, units } from '@/db/schema/index';
import type { Role } from '@/contracts/account';
import { workMode } from '@/core/demand/workMode';
import { authorize, type Authorized } from '@/server/auth/permissions';
import { loadDutyWorking, loadWorking } from '@/server/working/loadWorking';
import { insertUnits } from '../support/library';
import { openWorld, WEEK } from '../support/world';
import { blancherA, supply } from '../verification/dutyWorkedBatches';

const own = { plantId: 'north' };
/** Monday 06:00 and 12:00 of the week, in London in winter. */
const SIX = new Date('2026-11-30T06:00:00Z');
const NOON = new Date('2026-11-30T12:00:00Z');

beforeAll(async () => {
  const close = await openWorld();
  await insertUnits('north');
  const blancher = { id: 'north-blancher', lineId: 'north-line', name: 'Blancher 1', kind: 'blancher' as const };
  await db.insert(units).values({ ...own, ...blancher, headerId: 'north-main', position: 4 });
  await db.insert(families).values({ ...own, id: 'north-sauces', name: 'Sauces' });
  const water = { kind: 'wash', waterKg: 600, fromC: 15, toC: 82, minutes: 10 };
  const typed = { phases: [{ kind: 'vent', minutes: 8, steamKgPerH: 2000 }], source: 'meter 2' };
  await db.insert(duties).values([
    { ...own, id: 'blanch', name: 'Blanch', model: 'steamBlancher', inputs: { ...blancherA } },
    { ...own, id: 'wash', name: 'Wash', model: 'waterHeating', inputs: water },
    { ...own, id: 'typed', name: 'By the meter', model: 'typed', inputs: typed },
    { ...own, id: 'broken', name: 'Broken', model: 'steamBlancher', inputs: { ...blancherA, steelKg: -1 } },
  ]);
  const pair = { fromFamilyId: 'north-soups', toFamilyId: 'north-sauces', unitKind: 'blancher' as const };
  const wash = { kind: 'wash' as const, minutes: 15, dutyId: 'wash', uses: [] };
  const phases = [{ kind: 'wash' as const, offsetMin: 0, minutes: 10, steamKgPerH: 500 }];
  await db.insert(cleaningRules).values({ ...own, id: 'rule', ...pair, ...wash, phases });
  await insertRuns();
  return close;
});

async function insertRuns(): Promise<void> {
  const duty = { model: 'steamBlancher', inputs: blancherA } as const;
  const ends = { leadMin: 0, afterMin: 0, minutes: 0, uses: [] };
  const mode = workMode({ unitId: 'north-blancher', dutyId: 'blanch', duty, supply, ...ends });
  if (!mode.ok) throw new Error(mode.error.message);
  await db.insert(plans).values({ ...own, id: 'plan', weekStart: WEEK });
  const run = { ...own, planId: 'plan', kind: 'stage' as const, stage: 'blanch' as const, earliestAt: SIX };
  const placed = { unitId: 'north-blancher', modes: [mode.value] };
  await db.insert(activities).values([
    { ...run, ...placed, id: 'a1', code: 'A1', title: 'Soup', familyId: 'north-soups', startAt: SIX },
    { ...run, ...placed, id: 'a2', code: 'A2', title: 'Sauce', familyId: 'north-sauces', startAt: NOON },
  ]);
}

function reader<P extends 'plan.read' | 'library.read'>(permission: P, plantId = 'north'): Authorized<P> {
  const roles: Role[] = ['lineSupervisor'];
  const actor = {
    personId: 'p',
    name: 'P',
    plantId,
    plantName: plantId,
    isDemo: false,
    roles,
  };
  const authorized = authorize(actor, permission);
  if (!authorized.ok) throw new Error(authorized.error.message);
  return authorized.value;
}
const workingOf = async (id: string, plantId?: string) => loadWorking(reader('plan.read', plantId), id);

describe('the working of what is drawn', () => {
  it('is that of a run’s duty, on its unit and header', async () => {
    const found = await workingOf('a1');
    expect(found).toMatchObject({ ok: true, value: { code: 'A1', unitName: 'Blancher 1', duty: { name: 'Blanch' } } });
    expect(found.ok && found.value.header.name).toBe('Main header');
  });

  it.each([
    ['warm:a1', 'warmUp', 'Blanch'],
    ['warm:a2', 'warmUp', 'Blanch'],
    ['clean:a1', 'cleaning', 'Wash'],
  ])('opens what follows from the sequence: %s', async (id, kind, name) => {
    expect(await workingOf(id)).toMatchObject({ ok: true, value: { kind, weekStart: WEEK, duty: { name } } });
  });

  it.each(['idle:a1', 'clean:a2', 'warm:none', 'none'])('is not there for %s', async (id) => {
    expect(await workingOf(id)).toMatchObject({ ok: false, error: { status: 404 } });
  });

  it('is not shown to another plant', async () => {
    expect(await workingOf('a1', 'south')).toMatchObject({ ok: false, error: { status: 404 } });
    expect(await workingOf('clean:a1', 'south')).toMatchObject({ ok: false, error: { status: 404 } });
  });
});

describe('the working of a duty', () => {
  const dutyOn = (id: string, header: string | null, plantId?: string) =>
    loadDutyWorking(reader('library.read', plantId), id, header);

  it('stands on the header that is named, else on the first', async () => {
    expect(await dutyOn('blanch', null)).toMatchObject({ ok: true, value: { header: { id: 'north-main' } } });
    expect(await dutyOn('blanch', 'north-low')).toMatchObject({ ok: true, value: { header: { id: 'north-low' } } });
    expect(await dutyOn('typed', null)).toMatchObject({ ok: true, value: { duty: { source: 'meter 2' } } });
  });

  it('says what no longer fits of a stored duty', async () => {
    expect(await dutyOn('broken', null)).toMatchObject({
      ok: false,
      error: { status: 409, message: 'Steel is -1 kg; it must be 0 to 20000 kg.' },
    });
  });

  it('is not there for a duty or a header of another plant', async () => {
    expect(await dutyOn('blanch', 'south-main')).toMatchObject({ ok: false, error: { status: 404 } });
    expect(await dutyOn('blanch', null, 'south')).toMatchObject({ ok: false, error: { status: 404 } });
  });
});
