import type { AgreementDto, CommentRequest, IssueDto } from '@/contracts/week';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { conflict, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { namesOf } from '../people/people.repo';
import { tellOfIssue } from '../people/tellOfIssue';
import { latestIssueRow, type PlanRow } from '../plans/plans.repo';
import { someOf } from '../plans/words';
import { record } from '../record/record';
import { findWeek, planOf, type FoundWeek } from '../weeks/findWeek';
import { agreementDto, issueDto } from '../weeks/weekDtos';
import { weekOfPlan } from '../weeks/weekOfPlan';
import { agreementInForce } from './agreementInForce';
import { capacityMark, insertAgreement, insertIssue } from './issues.repo';
import { judgeForFloor, type Verdict } from './judge';

interface SeenPlan {
  readonly found: FoundWeek;
  /** Locked until the end of the transaction, so that nothing changes between judging and writing. */
  readonly plan: PlanRow;
}

/** The plan, locked, if it still is the one that the person saw. */
async function lockSeenPlan(
  tx: Db,
  actor: Actor,
  weekStart: string,
  planRevision: number,
): Promise<Result<SeenPlan, HttpProblem>> {
  const found = await findWeek(actor, weekStart, tx);
  if (!found.ok) return found;
  const plan = await planOf(tx, found.value, true);
  if (plan.revision === planRevision) return ok({ found: found.value, plan });
  const message = 'The plan has been changed since you looked at it; nothing was done. Look at it again, then decide.';
  return fail(conflict('PLAN-STALE', message, { planRevision: plan.revision, stale: [] }));
}

/** A utilities lead agrees to what the present revision of the plan has over the steam limits. */
export async function agree(
  actor: Authorized<'steam.agree'>,
  weekStart: string,
  { planRevision, comment }: CommentRequest,
): Promise<Result<AgreementDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const seen = await lockSeenPlan(tx, actor, weekStart, planRevision);
    if (!seen.ok) return seen;
    const { found, plan } = seen.value;
    // Read before judging: a word said in between leaves the agreement without effect, never the other way round.
    const mark = { capacityMark: await capacityMark(tx, plan.plantId, found.time), createdAt: now() };
    const { week } = await weekOfPlan(tx, found, plan);
    const { steam } = judgeForFloor(week, found.time);
    if (steam.length === 0) {
      return fail(conflict('NOTHING-OVER', 'The plan stays within the steam limits: there is nothing to agree to.'));
    }
    const row = { id: newId(), ...ownerOf(plan), comment, authorId: actor.personId, ...mark };
    await insertAgreement(tx, row);
    // Without a revision: the plan is the same, but whoever shows it has something new to read.
    await notify(tx, plan.plantId, { kind: 'plan', planId: plan.id });
    await record(tx, actor, 'plan.agree', plan.id, { revision: plan.revision, comment, breaches: steam.length });
    return ok(agreementDto(row, await namesOf(tx, [actor.personId])));
  });
}

/** Puts the plan as it is on the floor: an immutable copy under the next number. */
export async function issuePlan(
  actor: Authorized<'plan.issue'>,
  weekStart: string,
  { planRevision, comment }: CommentRequest,
): Promise<Result<IssueDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const seen = await lockSeenPlan(tx, actor, weekStart, planRevision);
    if (!seen.ok) return seen;
    const { found, plan } = seen.value;
    const { week } = await weekOfPlan(tx, found, plan);
    const verdict = judgeForFloor(week, found.time);
    if (verdict.process.length > 0) return fail(overProcessLimit(verdict));
    const agreement = verdict.steam.length > 0 ? await agreementInForce(tx, plan, found.time) : null;
    if (verdict.steam.length > 0 && !agreement) return fail(needsAgreement(verdict));
    const number = ((await latestIssueRow(tx, plan))?.number ?? 0) + 1;
    const author = { authorId: actor.personId, createdAt: now() };
    const agreementId = agreement?.id ?? null;
    const row = { id: newId(), ...ownerOf(plan), number, week, comment, agreementId, ...author };
    await insertIssue(tx, row);
    await notify(tx, plan.plantId, { kind: 'issue', planId: plan.id, revision: plan.revision });
    await tellOfIssue(tx, actor, { number, weekStart, comment, week });
    await record(tx, actor, 'plan.issue', row.id, { number, revision: plan.revision, comment, agreementId });
    const names = await namesOf(tx, [actor.personId, ...(agreement ? [agreement.authorId] : [])]);
    return ok(issueDto(row, agreement, names));
  });
}

const ownerOf = ({ plantId, id, revision }: PlanRow) => ({ plantId, planId: id, revision });

function overProcessLimit(verdict: Verdict): HttpProblem {
  const breaches = verdict.sentences(verdict.process);
  const named = someOf(breaches.map(({ title }) => title));
  const message = `Not put on the floor. ${named}. Nobody can agree to a process limit: move these first.`;
  return conflict('OVER-PROCESS-LIMIT', message, { breaches });
}

function needsAgreement(verdict: Verdict): HttpProblem {
  const breaches = verdict.sentences(verdict.steam);
  const named = someOf(breaches.map(({ title }) => title));
  const message = `Not put on the floor. ${named}. A utilities lead has to agree to this plan first, or level it.`;
  return conflict('NEEDS-AGREEMENT', message, { breaches });
}
