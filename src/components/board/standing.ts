import type { AgreementDto } from '../../contracts/week';
import type { Activity } from '../../core/plant/activity';
import type { Breach } from '../../core/schedule/breach';

/** What stands between a plan and the floor. */
export interface Standing {
  /** No override by anybody: these have to be put right. */
  readonly process: readonly Breach[];
  /** A utilities lead has to agree to these. */
  readonly steam: readonly Breach[];
  readonly agreed: boolean;
  readonly mayGo: boolean;
}

/** What stands in the way of putting a revision of the plan on the floor. The server judges again and has the last word. */
export function standingOf(
  breaches: readonly Breach[],
  activities: readonly Activity[],
  agreement: AgreementDto | null,
  planRevision: number,
): Standing {
  const done = new Set(activities.filter((activity) => activity.fixing === 'done').map((activity) => activity.id));
  const isPast = (breach: Breach): boolean =>
    breach.code === 'unreleasedData' && breach.activityIds.every((id) => done.has(id));
  const process = breaches.filter((breach) => breach.class === 'process' && !isPast(breach));
  const steam = breaches.filter((breach) => breach.class === 'steam').sort((a, b) => b.kg - a.kg);
  const agreed = agreement !== null && agreement.revision === planRevision;
  return { process, steam, agreed, mayGo: process.length === 0 && (steam.length === 0 || agreed) };
}
