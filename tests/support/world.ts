import { closeDb, db } from '@/db/client';
import * as t from '@/db/schema/index';
import type { Role } from '@/contracts/account';
import { hashPassword } from '@/server/auth/password';
import { lucia } from '@/server/auth/lucia';
import { stopEvents } from '@/server/events/hub';
import { createTestDatabase } from './database';

export const PASSWORD = 'four kettles and a filler';
export const WEEK = '2026-11-30';

/** One person a role at the plant "north", the same roles at "south", and one who works at both. */
const PEOPLE: readonly { id: string; plants: Readonly<Record<string, readonly Role[]>> }[] = [
  { id: 'north-planner', plants: { north: ['planner'] } },
  { id: 'north-utilitiesLead', plants: { north: ['utilitiesLead'] } },
  { id: 'north-lineSupervisor', plants: { north: ['lineSupervisor'] } },
  { id: 'north-qualityLead', plants: { north: ['qualityLead'] } },
  { id: 'north-qualityLead-2', plants: { north: ['qualityLead'] } },
  { id: 'north-administrator', plants: { north: ['administrator'] } },
  { id: 'south-utilitiesLead', plants: { south: ['utilitiesLead'] } },
  { id: 'south-qualityLead', plants: { south: ['qualityLead'] } },
  { id: 'both', plants: { north: ['planner'], south: ['utilitiesLead'] } },
  { id: 'nowhere', plants: {} },
];

export const emailOf = (personId: string): string => `${personId.toLowerCase()}@plant.example`;
export const nameOf = (personId: string): string => `Name of ${personId}`;

/** The worked boiler: 4 t/h from and at, 10 bar g, feed tank at 0.2 bar g, 5 % blowdown, 60 % condensate at 90 degC. */
const workedBoiler = {
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
};

const processValues = {
  processC: 121.1,
  processMinutes: 26,
  ventMinutes: 6,
  ventToC: 107.2,
  comeUpMinutes: 6,
  leastInitialC: 60,
  longestWaitSinceClosingMinutes: 60,
  longestWaitForInitialTemperatureMinutes: null,
};

async function insertPlant(plantId: string): Promise<void> {
  const own = (id: string) => ({ id: `${plantId}-${id}`, plantId, position: 0 });
  await db.insert(t.plants).values({
    id: plantId,
    name: `Plant ${plantId}`,
    timeZone: 'Europe/London',
    reserveFraction: 0.1,
  });
  const mainHeader = `${plantId}-main`;
  const letdown = { kind: 'letdown', fromHeaderId: mainHeader, greatestKgPerH: 1_600 } as const;
  await db.insert(t.headers).values([
    { ...own('main'), name: 'Main header', pressureBarG: 7, dryness: 0.98, feed: { kind: 'boilers' } },
    { ...own('low'), name: 'Kettle header', pressureBarG: 3, dryness: 1, feed: letdown, position: 1 },
  ]);
  await db.insert(t.boilers).values([
    { ...own('boiler-1'), name: 'Boiler 1', headerId: mainHeader, ...workedBoiler },
    { ...own('boiler-2'), name: 'Boiler 2', headerId: mainHeader, ...workedBoiler, position: 1 },
  ]);
  await db
    .insert(t.baseLoads)
    .values({ ...own('base'), headerId: mainHeader, fromHour: 4, toHour: 136, kgPerH: 240, note: 'losses' });
  await db.insert(t.families).values({ ...own('soups'), name: 'Soups' });
  await db.insert(t.products).values({
    ...own('soup'),
    name: 'Leek soup',
    familyId: `${plantId}-soups`,
    composition: { water: 1 },
    containerKg: 0.05,
    fillKg: 0.4,
    casePieces: 12,
  });
  await db.insert(t.processData).values({
    ...own('process'),
    productId: `${plantId}-soup`,
    document: 'SP-12',
    issue: '3',
    values: processValues,
    enteredBy: `${plantId}-qualityLead`,
  });
}

async function insertPeople(): Promise<void> {
  const passwordHash = await hashPassword(PASSWORD);
  await db
    .insert(t.people)
    .values(PEOPLE.map(({ id }) => ({ id, email: emailOf(id), name: nameOf(id), passwordHash })));
  await db
    .insert(t.memberships)
    .values(
      PEOPLE.flatMap(({ id, plants }) =>
        Object.entries(plants).flatMap(([plantId, roles]) => roles.map((role) => ({ personId: id, plantId, role }))),
      ),
    );
}

/**
 * A migrated database with two small plants and their people, for `db` of the application. Gives what closes it again:
 * as a hook's result, `beforeAll(openWorld)`, the runner calls that by itself.
 */
export async function openWorld(): Promise<() => Promise<void>> {
  const database = await createTestDatabase();
  process.env.DATABASE_URL = database.url;
  await insertPlant('north');
  await insertPlant('south');
  await insertPeople();
  return async () => {
    await stopEvents();
    await closeDb();
    await database.close();
  };
}

/** A session of a person at a plant, as the cookie would carry it. */
export async function sessionOf(personId: string, plantId = personId.split('-')[0] ?? null): Promise<string> {
  return (await lucia.createSession(personId, { plantId })).id;
}
