import type { Db } from '@/db/client';
import type { PlanRow } from '../plans/plans.repo';
import type { WeekTime } from '../weeks/weekTime';
import { agreementToPresent, capacityMark, type AgreementRow } from './issues.repo';

/** The agreement that the plan can be issued under: it holds for the revision and the capacity it was given to. */
export async function agreementInForce(tx: Db, plan: PlanRow, time: WeekTime): Promise<AgreementRow | null> {
  const agreement = await agreementToPresent(tx, plan);
  if (!agreement) return null;
  return agreement.capacityMark === (await capacityMark(tx, plan.plantId, time)) ? agreement : null;
}
