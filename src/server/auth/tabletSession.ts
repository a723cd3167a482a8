import { and, eq, isNull } from 'drizzle-orm';
import type { Session } from 'lucia';
import { db } from '@/db/client';
import { sessions, tablets } from '@/db/schema/index';
import { now } from '../clock';
import { hashSessionId } from './hashedSessions';
import { hashToken } from './token';

export const IDLE_MINUTES = 15;
const NOTED_EVERY_MS = 20_000;

/** The tablet that a token belongs to, if it may still sign people in. */
export async function tabletByToken(token: string | null) {
  if (!token) return null;
  const [tablet] = await db
    .select({ id: tablets.id, plantId: tablets.plantId, name: tablets.name, lineId: tablets.lineId })
    .from(tablets)
    .where(and(eq(tablets.tokenHash, hashToken(token)), isNull(tablets.revokedAt)));
  return tablet ?? null;
}

/** The id of the tablet that a session by badge holds on; null where it holds no more: elsewhere, untouched, over. */
export async function tabletHolds(session: Session, token: string | null): Promise<string | null> {
  const at = now().getTime();
  if (!session.touchedAt || at - session.touchedAt.getTime() > IDLE_MINUTES * 60_000) return null;
  if (!session.endsAt || at > session.endsAt.getTime()) return null;
  const tablet = await tabletByToken(token);
  return tablet !== null && tablet.id === session.tabletId ? tablet.id : null;
}

/** Notes that somebody touched the tablet. */
export async function touchTabletSession(session: Session): Promise<void> {
  if (now().getTime() - (session.touchedAt?.getTime() ?? 0) < NOTED_EVERY_MS) return;
  await db
    .update(sessions)
    .set({ touchedAt: now() })
    .where(eq(sessions.id, hashSessionId(session.id)));
}
