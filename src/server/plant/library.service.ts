import { z } from 'zod';
import { thingSchema } from '@/contracts/plantChecks';
import {
  THING_KINDS,
  type PlantLibraryDto,
  type SavedThingDto,
  type Thing,
  type ThingKind,
  type ThingValues,
} from '@/contracts/plantLibrary';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { check } from '../http/body';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { currentWeek } from '../weeks/currentWeek';
import { insertThing, lockLibrary, orderRows, readPlantLibrary, retireRow, updateThing } from './library.repo';
import { named, usesOf } from './uses';

type Raw = Readonly<Record<string, unknown>>;
type Outcome = Promise<Result<SavedThingDto, HttpProblem>>;
type Editor = Authorized<'plant.edit'>;

const kindSchema = z.enum(THING_KINDS);

function kindOf(kind: string | undefined): Result<ThingKind, HttpProblem> {
  const parsed = kindSchema.safeParse(kind);
  return parsed.success ? ok(parsed.data) : fail(notFound('There is no such part of the plant.'));
}

async function present(tx: Db, actor: Actor): Promise<PlantLibraryDto> {
  const library = await readPlantLibrary(tx, actor.plantId);
  if (!library) throw new Error(`plant ${actor.plantId} of a session is not there`);
  return library;
}

/** The plant's library as it stands. */
export async function readLibrary(actor: Authorized<'plant.read'>): Promise<Result<PlantLibraryDto, HttpProblem>> {
  return ok(await present(db, actor));
}

/** A refusal rolls back what was written before it. */
class Refused extends Error {
  constructor(readonly problem: HttpProblem) {
    super(problem.message);
  }
}

interface Standing {
  readonly tx: Db;
  readonly kind: ThingKind;
  readonly library: PlantLibraryDto;
}

/** One change of the library: alone at its plant, written to the record and told to open pages, or nothing at all. */
async function change(
  actor: Editor,
  kindText: string | undefined,
  write: (standing: Standing) => Promise<Result<string, HttpProblem>>,
): Outcome {
  const kind = kindOf(kindText);
  if (!kind.ok) return kind;
  const changed = async (tx: Db): Promise<SavedThingDto> => {
    await lockLibrary(tx, actor.plantId);
    const id = await write({ tx, kind: kind.value, library: await present(tx, actor) });
    if (!id.ok) throw new Refused(id.error);
    await notify(tx, actor.plantId, { kind: 'plant' });
    await notify(tx, actor.plantId, { kind: 'capacity' });
    return { id: id.value, library: await present(tx, actor) };
  };
  try {
    return ok(await db.transaction(changed));
  } catch (error) {
    if (error instanceof Refused) return fail(error.problem);
    throw error;
  }
}

function found(actor: Actor, { library, kind }: Standing, id: string): Result<Thing<ThingKind>, HttpProblem> {
  const things: readonly Thing<ThingKind>[] = library.things[kind];
  const thing = things.find((one) => one.id === id);
  if (!thing) return fail(notFound(`There is no such thing at ${actor.plantName}.`));
  if (thing.retiredAt === null) return ok(thing);
  return fail(conflict('THING-RETIRED', 'It was retired meanwhile. Nothing was saved.'));
}

/** Adds a thing at the end of its list. */
export function createThing(actor: Editor, kind: string | undefined, values: Raw): Outcome {
  return change(actor, kind, async ({ tx, kind: its, library }) => {
    const read = check(thingSchema(its, { library, id: null }), values);
    if (!read.ok) return read;
    const id = await insertThing(tx, actor.plantId, its, read.value);
    await record(tx, actor, 'plant.create', id, { kind: its, after: read.value });
    return ok(id);
  });
}

/** Key order does not tell two values apart. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_, part: unknown) => {
    if (typeof part !== 'object' || part === null || Array.isArray(part)) return part;
    return Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}

function stale(thing: Thing<ThingKind>, was: Raw): HttpProblem | null {
  if (canonical(thing.values) === canonical(was)) return null;
  const message = 'Somebody changed it while you had it open. Nothing was saved: look at what it is now.';
  return conflict('THING-STALE', message, { now: thing });
}

/** Writes a form over a thing, unless the thing has changed since the form was filled. */
export function editThing(actor: Editor, kind: string | undefined, id: string, values: Raw, was: Raw): Outcome {
  return change(actor, kind, async (standing) => {
    const { tx, kind: its, library } = standing;
    const thing = found(actor, standing, id);
    if (!thing.ok) return thing;
    const refusal = stale(thing.value, was);
    if (refusal) return fail(refusal);
    const read = check(thingSchema(its, { library, id }), values);
    if (!read.ok) return read;
    const after = read.value as ThingValues<typeof its>;
    await updateThing(tx, actor.plantId, its, id, after);
    await record(tx, actor, 'plant.edit', id, { kind: its, before: thing.value.values, after });
    return ok(id);
  });
}

/** Takes a thing out of use, where nothing of present and future weeks uses it. */
export function retireThing(actor: Editor, kind: string | undefined, id: string): Outcome {
  return change(actor, kind, async (standing) => {
    const { tx, kind: its, library } = standing;
    const thing = found(actor, standing, id);
    if (!thing.ok) return thing;
    const weekStart = await currentWeek(actor);
    const uses = await usesOf({ tx, plantId: actor.plantId, library, now: now(), weekStart }, its, id);
    if (uses.length > 0) {
      return fail(conflict('THING-IN-USE', `It is still used by ${named(uses)}. Take it out there first.`, { uses }));
    }
    await retireRow(tx, actor.plantId, its, id, now());
    await record(tx, actor, 'plant.retire', id, { kind: its, before: thing.value.values });
    return ok(id);
  });
}

/** Puts things of a kind in an order; the list must name all in use, so that two who order at once don't mix. */
export function orderThings(actor: Editor, kind: string | undefined, ids: readonly string[]): Outcome {
  return change(actor, kind, async ({ tx, kind: its, library }) => {
    const things: readonly Thing<ThingKind>[] = library.things[its];
    const known = things.filter(({ retiredAt }) => retiredAt === null).map((thing) => thing.id);
    if ([...ids].sort().join('\n') !== [...known].sort().join('\n')) {
      return fail(badInput('PLANT-ORDER', 'The list has changed meanwhile: order it again.', 'ids'));
    }
    await orderRows(tx, actor.plantId, its, ids);
    await record(tx, actor, 'plant.order', its, { ids });
    return ok(its);
  });
}
