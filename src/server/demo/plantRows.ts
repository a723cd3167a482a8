/** Rows of the demo plant that do not depend on the week. */
import { uniformSpread, type StartSpread } from '../../core/header/spread/startSpread';
import type { Unit } from '../../core/plant/plant';
import type { Db } from '../../db/client';
import * as schema from '../../db/schema';
import { hashPassword } from '../auth/password';
import { DEMO_DUTIES, demoCleaning, demoModes, demoStageEnds } from './duties';
import { DEMO_PASSWORD, DEMO_PEOPLE } from './people';
import * as demo from './plant';
import { DEMO_PRODUCTS, type DemoProduct } from './products';

const plantId = demo.DEMO_PLANT.id;
const quality = 'demo-person-quality';
const administrator = 'demo-person-admin';

/** Writes plant, people, library and base load; the caller has seen that none of it is there. */
export async function insertDemoPlant(db: Db, now: Date): Promise<void> {
  const { ambientBarA: _, ...plant } = demo.DEMO_PLANT;
  await db.insert(schema.plants).values({ ...plant, ...demo.DEMO_RULES, isDemo: true });
  await insertPeople(db);
  await insertUnits(db);
  await insertPractice(db, now);
  await insertBoilerHouse(db);
  await insertLibrary(db, now);
}

async function insertPeople(db: Db): Promise<void> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  await db.insert(schema.people).values(DEMO_PEOPLE.map(({ id, name, email }) => ({ id, name, email, passwordHash })));
  await db
    .insert(schema.memberships)
    .values(DEMO_PEOPLE.flatMap((p) => p.roles.map((role) => ({ personId: p.id, plantId, role }))));
}

const inOrder = <T>(rows: readonly T[]) => rows.map((row, position) => ({ ...row, plantId, position }));

async function insertUnits(db: Db): Promise<void> {
  await db.insert(schema.lines).values(inOrder(demo.DEMO_LINES));
  await db
    .insert(schema.headers)
    .values(inOrder(demo.DEMO_HEADERS.map((header) => ({ ...header, ...demo.DEMO_MAINS[header.id] }))));
  await db.insert(schema.ventGroups).values(inOrder(demo.DEMO_VENT_GROUPS));
  await db.insert(schema.units).values(inOrder(demo.DEMO_UNITS.map((unit) => ({ ...unit, ...spreadOf(unit) }))));
  await db.insert(schema.shifts).values(inOrder(demo.DEMO_SHIFTS).map((s) => ({ ...s, days: [...s.days] })));
}

function spreadOf({ kind }: Unit): { startSpread: StartSpread | null; startSpreadSource: string | null } {
  const [early, late] = demo.DEMO_START_SPREADS[kind] ?? [0, 0];
  const spread = uniformSpread(early, late);
  if (!spread.ok || early + late === 0) return { startSpread: null, startSpreadSource: null };
  return { startSpread: spread.value, startSpreadSource: demo.DEMO_START_SPREAD_SOURCE };
}

/** The numbers of the vent groups as released rules, so that the page of practice rules says where they are from. */
async function insertPractice(db: Db, now: Date): Promise<void> {
  await db.insert(schema.practiceRules).values(
    demo.DEMO_VENT_GROUPS.map(({ id, name: _, source, ...numbers }) => ({
      id: `${id}-rule`,
      plantId,
      kind: 'ventGroup' as const,
      ventGroupId: id,
      values: { leastHeaderBarG: null, studyGreatestLoadKgPerH: null, ...numbers },
      source,
      enteredBy: administrator,
      createdAt: now,
      releasedBy: quality,
      releasedAt: now,
    })),
  );
}

async function insertBoilerHouse(db: Db): Promise<void> {
  await db.insert(schema.boilers).values(inOrder(demo.DEMO_BOILERS).map((b) => ({ ...b, headerId: demo.MAIN_HEADER })));
  await db
    .insert(schema.baseLoads)
    .values(demo.DEMO_BASE_LOADS.map((load, i) => ({ ...load, id: `demo-base-${i + 1}`, plantId })));
  await db
    .insert(schema.sharedLimits)
    .values(inOrder(demo.DEMO_SHARED_LIMITS).map((limit) => ({ ...limit, capacity: [...limit.capacity] })));
}

async function insertLibrary(db: Db, now: Date): Promise<void> {
  await db.insert(schema.families).values(demo.DEMO_FAMILIES.map((family) => ({ ...family, plantId })));
  await db.insert(schema.products).values(DEMO_PRODUCTS.map(productRow));
  await db.insert(schema.processData).values(DEMO_PRODUCTS.map((product) => processRow(product, now)));
  await db
    .insert(schema.duties)
    .values(DEMO_DUTIES.map(({ id, name, model, inputs }) => ({ id, name, model, inputs: { ...inputs }, plantId })));
  await db.insert(schema.routeModes).values(DEMO_PRODUCTS.flatMap(routeRows));
  await db.insert(schema.cleaningRules).values(
    demoCleaning().map((rule) => ({
      ...rule,
      phases: [...rule.phases],
      uses: [...rule.uses],
      id: `${rule.unitKind}-${rule.fromFamilyId}-${rule.toFamilyId}`,
      plantId,
    })),
  );
}

const productRow = (product: DemoProduct) => ({
  id: product.id,
  plantId,
  name: product.name,
  familyId: product.familyId,
  composition: { ...product.composition },
  containerKg: 0.055,
  fillKg: 0.425,
  casePieces: 24,
  initialC: product.initialC,
});

const processRow = (product: DemoProduct, now: Date) => ({
  id: `${product.id}-process`,
  plantId,
  productId: product.id,
  document: 'TH-TP-12 demo',
  issue: '1',
  values: {
    processC: product.processC,
    processMinutes: product.processMinutes,
    ventMinutes: 6,
    ventToC: 107.2,
    comeUpMinutes: 6,
    leastInitialC: product.initialC - 10,
    longestWaitSinceClosingMinutes: 120,
    longestWaitForInitialTemperatureMinutes: product.initialTemperatureWaitMin,
  },
  enteredBy: administrator,
  releasedBy: product.released ? quality : null,
  releasedAt: product.released ? now : null,
});

function routeRows(product: DemoProduct) {
  const stages = (['blanch', 'cook', 'fill', 'retort'] as const).filter((stage) =>
    stage === 'blanch' ? product.line === 'a' || product.id === 'demo-rice' : stage !== 'cook' || product.cook,
  );
  return stages.flatMap((stage, position) =>
    demoModes(product, stage, 1).map((mode) => ({
      id: `${product.id}-${stage}-${mode.unitId}`,
      plantId,
      productId: product.id,
      position,
      stage,
      unitId: mode.unitId,
      minutes: mode.dutyId === null ? mode.minutes : 0,
      dutyId: mode.dutyId,
      ...demoStageEnds(stage),
      uses: [...mode.uses],
    })),
  );
}
