import type { LevellingRunDto } from '@/contracts/levelling';
import type { LevellingProposal } from '@/core/levelling/proposal';
import type { levellingRuns } from '@/db/schema/index';

export type RunRow = typeof levellingRuns.$inferSelect;

/** A levelling run as the planner's page shows it. */
export function runDto(row: RunRow, names: ReadonlyMap<string, string>): LevellingRunDto {
  return {
    id: row.id,
    planRevision: row.revision,
    state: row.state,
    by: names.get(row.authorId) ?? 'someone no longer here',
    seconds: typeof row.options.seconds === 'number' ? row.options.seconds : 0,
    progress: row.progress,
    proposal: (row.proposal ?? null) as LevellingProposal | null,
    failure: row.failure,
  };
}
