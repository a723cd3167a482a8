import { sql } from 'drizzle-orm';
import type { PlantNotice } from '@/contracts/week';
import type { Db } from '@/db/client';

/** The one channel of the database that plants' notices go through. */
export const NOTICE_CHANNEL = 'steadmain_notice';

/** What goes through the channel: names of what changed, never data. */
export interface PlantNoticeMessage {
  readonly plantId: string;
  readonly notice: PlantNotice;
}

/** Tells everyone at the plant that something changed, when and only if the transaction commits. */
export async function notify(tx: Db, plantId: string, notice: PlantNotice): Promise<void> {
  const message: PlantNoticeMessage = { plantId, notice };
  await tx.execute(sql`select pg_notify(${NOTICE_CHANNEL}, ${JSON.stringify(message)})`);
}
