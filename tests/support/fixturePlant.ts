import type { Role } from '@/contracts/account';
import type { WeekDto } from '@/contracts/week';
import type { Activity, Mode, Phase } from '@/core/plant/activity';
import { closeDb, db } from '@/db/client';
import * as t from '@/db/schema/index';
import { lucia } from '@/server/auth/lucia';
import { instantOf, weekTimeOf } from '@/server/weeks/weekTime';
import { createTestDatabase } from './database';

/** An invented plant of four units with a week of five activities, and a second plant that is not to be seen. */
export const WEEK = '2026-11-30';
export const ZONE = 'Europe/Berlin';
export const time = weekTimeOf(WEEK, ZONE);
export const PLAN = 'quay-plan';

const PEOPLE: Readonly<Record<string, { name: string; plants: Readonly<Record<string, readonly Role[]>> }>> = {
  kim: { name: 'Kim Example', plants: { quay: ['planner'] } },
  ola: { name: 'Ola Example', plants: { quay: ['planner'] } },
  uli: { name: 'Uli Example', plants: { quay: ['utilitiesLead'] } },
  sam: { name: 'Sam Example', plants: { quay: ['lineSupervisor'] } },
  hal: { name: 'Hal Example', plants: { hill: ['planner', 'utilitiesLead', 'lineSupervisor'] } },
};
export type Person = 'kim' | 'ola' | 'uli' | 'sam' | 'hal';

const phase = (kind: Phase['kind'], offsetMin: number, minutes: number, steamKgPerH: number): Phase => {
  return { kind, offsetMin, minutes, steamKgPerH };
};
const retortPhases = [phase('vent', 5, 8, 2_000), phase('comeUp', 13, 7, 1_500), phase('process', 20, 40, 300)];
const mode = (unitId: string, minutes: number, phases: readonly Phase[]): Mode => {
  return { unitId, minutes, phases, uses: [], dutyId: null };
};
const retortModes = [mode('R1', 80, retortPhases), mode('R2', 80, retortPhases)];

type Row = typeof t.activities.$inferInsert;

/** An activity's row; `start` in minutes of the week, null: not yet placed. */
function activityRow(id: string, unitId: string | null, start: number | null, more: Partial<Row>): Row {
  return {
    id,
    plantId: 'quay',
    planId: PLAN,
    kind: 'stage',
    stage: 'retort',
    code: id,
    title: 'Leek soup 400 g',
    productId: 'soup',
    familyId: 'soups',
    modes: retortModes,
    unitId,
    startAt: start === null ? null : instantOf(time, start),
    earliestAt: time.firstInstant,
    processDataId: 'released',
    ...more,
  };
}

const cook = { stage: 'cook' as const, modes: [mode('K1', 60, [phase('run', 0, 60, 800)])], processDataId: null };
const ACTIVITIES: readonly Row[] = [
  activityRow('K7', 'K1', 480, { ...cook, batchId: 'b1' }),
  activityRow('A107', 'R1', 600, { batchId: 'b1', dueAt: instantOf(time, 1_000) }),
  activityRow('A108', 'R2', 700, { batchId: 'b2' }),
  activityRow('A109', 'R1', 1_320, { batchId: 'b3' }),
  activityRow('A110', null, null, { batchId: 'b4' }),
];

async function insertPlant(plantId: string, timeZone: string): Promise<void> {
  const own = (id: string) => ({ id, plantId, position: 0 });
  const p = plantId === 'quay' ? '' : `${plantId}-`;
  await db.insert(t.plants).values({ id: plantId, name: `${plantId} works`, timeZone, altitudeM: 120 });
  await db.insert(t.lines).values([
    { ...own(`${p}l1`), name: 'Line 1' },
    { ...own(`${p}l2`), name: 'Line 2', position: 1 },
  ]);
  const feed = { kind: 'boilers' } as const;
  await db.insert(t.headers).values({ ...own(`${p}main`), name: 'Main header', pressureBarG: 7, dryness: 1, feed });
  const group = { name: 'North manifold', ventsAtOnce: 1, steamOnsAtOnce: 2, source: 'distribution study DS-1' };
  await db.insert(t.ventGroups).values({ id: `${p}vg`, plantId, ...group });
  const unit = (id: string, kind: 'retort' | 'kettle', lineId: string, position: number) => {
    const ventGroupId = kind === 'retort' ? `${p}vg` : null;
    return { id: p + id, plantId, lineId: p + lineId, name: id, kind, headerId: `${p}main`, ventGroupId, position };
  };
  await db
    .insert(t.units)
    .values([
      unit('R1', 'retort', 'l1', 0),
      unit('R2', 'retort', 'l1', 1),
      unit('K1', 'kettle', 'l1', 2),
      unit('K2', 'kettle', 'l2', 3),
    ]);
  const days = [1, 2, 3, 4, 5, 6, 7];
  const shift = (id: string, startsAt: string, endsAt: string, position: number) => {
    return { id: p + id, plantId, name: id, days, startsAt, endsAt, position };
  };
  await db
    .insert(t.shifts)
    .values([
      shift('early', '06:00', '14:00', 0),
      shift('late', '14:00', '22:00', 1),
      shift('night', '22:00', '06:00', 2),
    ]);
}

async function insertLibrary(): Promise<void> {
  await db.insert(t.families).values({ id: 'soups', plantId: 'quay', name: 'Soups' });
  await db.insert(t.products).values({
    id: 'soup',
    plantId: 'quay',
    name: 'Leek soup 400 g',
    familyId: 'soups',
    composition: { water: 1 },
    containerKg: 0.05,
    fillKg: 0.4,
    casePieces: 12,
  });
  const values = {
    processC: 121.1,
    processMinutes: 40,
    ventMinutes: 8,
    ventToC: 107.2,
    comeUpMinutes: 7,
    leastInitialC: 60,
    longestWaitSinceClosingMinutes: 120,
    longestWaitForInitialTemperatureMinutes: null,
  };
  const data = { plantId: 'quay', productId: 'soup', document: 'SP-12', values, enteredBy: 'qua' };
  await db.insert(t.processData).values([
    { ...data, id: 'released', issue: '3', releasedBy: 'qub', releasedAt: new Date('2026-11-01T08:00:00Z') },
    { ...data, id: 'unreleased', issue: '4' },
  ]);
}

/** Puts the plan of the week back as it was: limit 3,000 kg/h, nothing issued, nothing recorded. */
export async function resetPlan(): Promise<void> {
  await db.delete(t.floorEvents);
  await db.delete(t.issues);
  await db.delete(t.agreements);
  await db.delete(t.levellingRuns);
  await db.delete(t.edits);
  await db.delete(t.record);
  await db.delete(t.activities);
  await db.delete(t.links);
  await db.delete(t.plans);
  await db.delete(t.steamLimits);
  await db.insert(t.plans).values({ id: PLAN, plantId: 'quay', weekStart: WEEK });
  await db.insert(t.activities).values([...ACTIVITIES]);
  await db.insert(t.links).values({
    id: 'k7-a107',
    plantId: 'quay',
    planId: PLAN,
    from: { activityId: 'K7', anchor: 'end', offsetMin: 0 },
    to: { activityId: 'A107', anchor: 'start', offsetMin: 0 },
    leastMin: 0,
    greatestMin: 240,
    rule: 'flow',
    greatestBreach: 'process',
    source: null,
  });
  await setLimit(3_000);
}

/** Sets the main header's limit for the whole week; it overrules the one before. [kg/h] */
export async function setLimit(limitKgPerH: number, id = `limit-${limitKgPerH}`): Promise<void> {
  const span = { fromAt: time.firstInstant, toAt: time.endInstant };
  const row = { id, plantId: 'quay', headerId: 'main', limitKgPerH, reason: 'as tested', authorId: 'uli', ...span };
  await db.insert(t.steamLimits).values(row);
}

let settings = 0;

/** Sets the clock of the tests, an instant or a minute of the fixture's week; it runs on from there. */
export function setClock(at: number | string): void {
  const instant = typeof at === 'string' ? new Date(at) : instantOf(time, at);
  // Said in two ways by turns: the clock is set anew only where the text is a new one.
  const zone = settings++ % 2 === 0 ? 'Z' : '+00:00';
  process.env.STEADMAIN_NOW = instant.toISOString().replace('Z', zone);
}

/** A migrated database with both plants; Monday 06:00 by the plant's clock. `db` works on it until closed. */
export async function openPlant(): Promise<() => Promise<void>> {
  const database = await createTestDatabase();
  process.env.DATABASE_URL = database.url;
  setClock(360);
  await insertPlant('quay', ZONE);
  await insertPlant('hill', 'America/Chicago');
  await insertLibrary();
  const people = Object.entries(PEOPLE);
  await db.insert(t.people).values(people.map(([id, { name }]) => ({ id, name, email: `${id}@plant.example` })));
  const memberships = people.flatMap(([personId, { plants }]) =>
    Object.entries(plants).flatMap(([plantId, roles]) => roles.map((role) => ({ personId, plantId, role }))),
  );
  await db.insert(t.memberships).values(memberships);
  await resetPlan();
  return async () => {
    await closeDb();
    await database.close();
  };
}

/** A session of a person at their plant, as the cookie would carry it. */
export async function sessionOf(person: Person): Promise<string> {
  const plantId = Object.keys(PEOPLE[person]?.plants ?? {})[0] ?? null;
  return (await lucia.createSession(person, { plantId })).id;
}

/** A session of each person of the plant. */
export async function everySession(): Promise<Readonly<Record<Person, string>>> {
  const people = Object.keys(PEOPLE) as Person[];
  const sessions = await Promise.all(people.map(async (person) => [person, await sessionOf(person)] as const));
  return Object.fromEntries(sessions) as Record<Person, string>;
}

/** An activity of a loaded week. */
export function activityIn(dto: WeekDto, id: string): Activity {
  const found = dto.week.activities.find((activity) => activity.id === id);
  if (!found) throw new Error(`no activity ${id}`);
  return found;
}

/** Everything that a refused request must leave as it was. */
export async function planContents() {
  return {
    plans: await db.select().from(t.plans).orderBy(t.plans.id),
    activities: await db.select().from(t.activities).orderBy(t.activities.id),
    edits: await db.select().from(t.edits).orderBy(t.edits.id),
    agreements: await db.select().from(t.agreements).orderBy(t.agreements.id),
    issues: await db.select().from(t.issues).orderBy(t.issues.id),
    floorEvents: await db.select().from(t.floorEvents).orderBy(t.floorEvents.id),
    levellingRuns: await db.select().from(t.levellingRuns).orderBy(t.levellingRuns.id),
    record: await db.select().from(t.record).orderBy(t.record.id),
  };
}
