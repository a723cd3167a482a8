import { db } from '@/db/client';
import type { Actor } from '../auth/actor';
import { now } from '../clock';
import { plantRow } from './plantParts.repo';
import { weekStartOf } from './weekTime';

/** The first day of the week that it is at the actor's plant, such as 2026-11-30. */
export async function currentWeek(actor: Pick<Actor, 'plantId'>): Promise<string> {
  const plant = await plantRow(db, actor.plantId);
  if (!plant) throw new Error(`plant ${actor.plantId} of a session is not there`);
  return weekStartOf(now(), plant);
}
