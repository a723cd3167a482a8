import { and, asc, eq, isNull } from 'drizzle-orm';
import type { TabletDto } from '@/contracts/people';
import type { Db } from '@/db/client';
import { people, shifts, tablets } from '@/db/schema/index';

/** The plant's tablets that may sign people in, by name. */
export async function tabletsAt(tx: Db, plantId: string): Promise<TabletDto[]> {
  const rows = await tx
    .select({ row: tablets, by: people.name })
    .from(tablets)
    .leftJoin(people, eq(people.id, tablets.enrolledBy))
    .where(and(eq(tablets.plantId, plantId), isNull(tablets.revokedAt)))
    .orderBy(asc(tablets.name), asc(tablets.id));
  return rows.map(({ row, by }) => ({
    id: row.id,
    name: row.name,
    lineId: row.lineId,
    enrolledBy: by ?? 'somebody who has left',
    enrolledAt: row.createdAt.toISOString(),
    lastSeenAt: row.lastSeenAt?.toISOString() ?? null,
  }));
}

const minutesOf = (clock: string): number => {
  const [hours, minutes] = clock.split(':').map(Number);
  return (hours ?? 0) * 60 + (minutes ?? 0);
};

/** The longest shift of the plant; 12 h where it has none. [min] */
export async function longestShiftMinutes(tx: Db, plantId: string): Promise<number> {
  const rows = await tx
    .select({ startsAt: shifts.startsAt, endsAt: shifts.endsAt })
    .from(shifts)
    .where(eq(shifts.plantId, plantId));
  const lengths = rows.map(
    ({ startsAt, endsAt }) => (minutesOf(endsAt) - minutesOf(startsAt) + 1_440) % 1_440 || 1_440,
  );
  return lengths.length === 0 ? 720 : Math.max(...lengths);
}
