import type { AgreementDto, FloorEventDto, IssueDto } from '@/contracts/week';
import type { agreements, floorEvents, issues } from '@/db/schema/index';
import { minuteOf, type WeekTime } from './weekTime';

type Names = ReadonlyMap<string, string>;
type EventRow = typeof floorEvents.$inferSelect;
type IssueRow = Omit<typeof issues.$inferSelect, 'week' | 'plantId' | 'planId'>;
type AgreementRow = typeof agreements.$inferSelect;

/** A person's name, or that the person is gone. */
export const nameIn = (names: Names, personId: string): string => names.get(personId) ?? 'someone no longer here';

/** A floor event as the board and the shift sheet show it. */
export function floorEventDto(row: EventRow, time: WeekTime, names: Names): FloorEventDto {
  const { id, activityId, event } = row;
  return { id, activityId, event, minute: minuteOf(time, row.happenedAt), by: nameIn(names, row.authorId) };
}

/** An issue without its copy of the week. */
export function issueDto(row: IssueRow, agreement: AgreementRow | null, names: Names): IssueDto {
  return {
    id: row.id,
    number: row.number,
    revision: row.revision,
    at: row.createdAt.toISOString(),
    by: nameIn(names, row.authorId),
    comment: row.comment,
    agreedBy: agreement ? nameIn(names, agreement.authorId) : null,
  };
}

/** A utilities lead's agreement. */
export function agreementDto(row: AgreementRow, names: Names): AgreementDto {
  const { revision, comment } = row;
  return { revision, at: row.createdAt.toISOString(), by: nameIn(names, row.authorId), comment };
}
