import type {
  OwnSettings,
  OwnSettingsDto,
  OwnSettingsRequest,
  PlantSettings,
  PlantSettingsDto,
  PlantSettingsRequest,
} from '@/contracts/settings';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { notify } from '../events/notify';
import { conflict, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { ownSettings, plantSettings, writeOwnSettings, writePlantSettings } from './settings.repo';

async function ownOf(tx: Db, actor: Actor, lock = false): Promise<OwnSettings> {
  const own = await ownSettings(tx, actor.personId, lock);
  if (!own) throw new Error(`person ${actor.personId} of a session is not there`);
  return own;
}

async function plantOf(tx: Db, actor: Actor, lock = false): Promise<PlantSettingsDto> {
  const plant = await plantSettings(tx, actor.plantId, lock);
  if (!plant) throw new Error(`plant ${actor.plantId} of a session is not there`);
  return plant;
}

/** The person's own settings and the plant's, to be read. */
export async function readSettings(
  actor: Authorized<'settings.own'>,
): Promise<{ readonly own: OwnSettings; readonly plant: PlantSettingsDto }> {
  return { own: await ownOf(db, actor), plant: await plantOf(db, actor) };
}

/** Keeps what the person chose; what the request leaves out stays. */
export function saveOwnSettings(
  actor: Authorized<'settings.own'>,
  request: OwnSettingsRequest,
): Promise<Result<OwnSettingsDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const before = await ownOf(tx, actor, true);
    const own = { ...before, ...request };
    await writeOwnSettings(tx, actor.personId, own);
    const plant = await plantOf(tx, actor);
    return ok({ own, units: own.units ?? plant.values.units });
  });
}

/** Names of what differs between two sets of settings. */
function changed(before: PlantSettings, after: PlantSettings): (keyof PlantSettings)[] {
  return (Object.keys(before) as (keyof PlantSettings)[]).filter((key) => before[key] !== after[key]);
}

/** Sets the plant's settings, unless they have changed since the form was filled. */
export function savePlantSettings(
  actor: Authorized<'settings.plant'>,
  { values, was }: PlantSettingsRequest,
): Promise<Result<PlantSettingsDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const before = await plantOf(tx, actor, true);
    if (changed(before.values, was).length > 0) {
      const message = 'Somebody changed the plant’s settings while you had them open. Nothing was saved.';
      return fail(conflict('SETTINGS-STALE', message, { now: before }));
    }
    const keys = changed(before.values, values);
    if (keys.length === 0) return ok(before);
    await writePlantSettings(tx, actor.plantId, values);
    const pick = (from: PlantSettings) => Object.fromEntries(keys.map((key) => [key, from[key]]));
    const details = { before: pick(before.values), after: pick(values) };
    await record(tx, actor, 'plant.settings', actor.plantId, details);
    await notify(tx, actor.plantId, { kind: 'plant' });
    await notify(tx, actor.plantId, { kind: 'capacity' });
    return ok({ ...before, values });
  });
}
