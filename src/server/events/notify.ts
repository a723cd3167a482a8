import { sql } from 'drizzle-orm';
import type { PlantNotice } from '@/contracts/week';
import type { Db } from '@/db/client';

/** The database's channels: what changed at a plant, and which session ended. */
export const NOTICE_CHANNEL = 'steadmain_notice';
export const SESSION_CHANNEL = 'steadmain_session_end';

/** What goes through the notices' channel: names of what changed, never data. */
export interface PlantNoticeMessage {
  readonly plantId: string;
  readonly notice: PlantNotice;
}

/** Tells everyone at the plant that something changed, when and only if the transaction commits. */
export async function notify(tx: Db, plantId: string, notice: PlantNotice): Promise<void> {
  const message: PlantNoticeMessage = { plantId, notice };
  await tx.execute(sql`select pg_notify(${NOTICE_CHANNEL}, ${JSON.stringify(message)})`);
}

/** Ends the session's event streams in every process; takes the hashed id. */
export async function notifySessionEnd(tx: Db, sessionHash: string): Promise<void> {
  await tx.execute(sql`select pg_notify(${SESSION_CHANNEL}, ${sessionHash})`);
}
