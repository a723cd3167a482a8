import type { Db } from '@/db/client';
import { record as records } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { now } from '../clock';
import { newId } from '../id';

/** Appends to the plant's record of changes: who did what to which thing, within the change's own transaction. */
export async function record(
  tx: Db,
  actor: Actor,
  action: string,
  subject: string,
  details: Readonly<Record<string, unknown>> = {},
): Promise<void> {
  await tx.insert(records).values({
    id: newId(),
    plantId: actor.plantId,
    authorId: actor.personId,
    action,
    subject,
    details: { ...details },
    createdAt: now(),
  });
}
