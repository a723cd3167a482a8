import { and, eq, isNull } from 'drizzle-orm';
import { zonedText } from '@/calendar/dates';
import { headerBalances, type HeaderBalance } from '@/core/header/headerBalance';
import { boilerOutlet } from '@/core/header/headerSteam';
import type { HeaderJudgement } from '@/core/header/judgement';
import { drawFinder } from '@/core/header/whoDraws';
import { evaluateWeek, type WeekEvaluation } from '@/core/pipeline';
import { barAbsolute } from '@/core/quantity/units';
import { ok, type Result } from '@/core/result';
import type { Week } from '@/core/schedule/week';
import { db } from '@/db/client';
import { boilers } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import type { HttpProblem } from '../http/problem';
import { weekClock } from '../issues/judge';
import { currentWeek } from '../weeks/currentWeek';
import { findWeek, planOf } from '../weeks/findWeek';
import { weekOfPlan } from '../weeks/weekOfPlan';

/** A run that draws on the header itself. */
export interface DrawingRun {
  readonly id: string;
  readonly code: string;
  readonly title: string;
  readonly unitName: string;
  readonly kgPerH: number;
}

/** A span in words of the plant's clock. */
export interface SpanText {
  readonly text: string;
  readonly leastKgPerH: number;
}

/** A header's flows at one minute of a week. */
export interface HeaderMoment {
  readonly weekStart: string;
  /** "30 November" */
  readonly weekText: string;
  readonly minute: number;
  /** "Tue 06:40" */
  readonly clock: string;
  readonly isPeak: boolean;
  readonly balance: HeaderBalance;
  readonly runs: readonly DrawingRun[];
  /** Losses and users outside the plan. [kg/h] */
  readonly baseKgPerH: number;
  /** null: not judged. [kg/h] */
  readonly limitKgPerH: number | null;
  /** Steam in the accumulators that work on the header; null: none does. [kg] */
  readonly storeKg: number | null;
  readonly names: Readonly<Record<string, string>>;
  /** Spans in which the letdown passes less than its least flow. */
  readonly low: readonly SpanText[];
}

/** Which minute; without one, that of the header's greatest load. */
export interface MomentQuery {
  readonly weekStart: string | null;
  readonly minute: number | null;
}

/** A header's balance at a minute of a week, the present one where none is named; null where the week has no such header. */
export async function loadHeaderMoment(
  actor: Authorized<'plan.read'>,
  headerId: string,
  query: MomentQuery,
): Promise<Result<HeaderMoment | null, HttpProblem>> {
  const found = await findWeek(actor, query.weekStart ?? (await currentWeek(actor)));
  if (!found.ok) return found;
  const { week } = await weekOfPlan(db, found.value, await planOf(db, found.value));
  const evaluation = evaluateWeek(week);
  const judged = evaluation.headers.find((header) => header.headerId === headerId);
  if (!judged) return ok(null);
  const asked = query.minute !== null && query.minute < week.horizonMin ? query.minute : null;
  const minute = asked ?? judged.peak.minute;
  const balance = await balanceAt(week, evaluation, headerId, minute);
  if (!balance) return ok(null);
  const { time } = found.value;
  const clock = weekClock(time);
  const runs = runsAt(week, evaluation, headerId, minute);
  const users = balance.out.find(({ kind }) => kind === 'users')?.kgPerH ?? 0;
  return ok({
    weekStart: time.weekStart,
    weekText: zonedText(time.firstInstant, time.timeZone, 'd MMMM'),
    minute,
    clock: clock(minute),
    isPeak: minute === judged.peak.minute,
    balance,
    runs,
    baseKgPerH: Math.max(0, users - runs.reduce((sum, run) => sum + run.kgPerH, 0)),
    limitKgPerH: limitAt(judged, minute),
    storeKg: judged.carried?.storeKg[minute] ?? null,
    names: Object.fromEntries(week.plant.headers.map(({ id, name }) => [id, name])),
    low: judged.letdownLow.map(({ from, to, leastKgPerH }) => ({
      text: `${clock(from)} to ${clock(to)}`,
      leastKgPerH,
    })),
  });
}

/** Stands for "no limit known at this minute". [kg/h] */
const UNKNOWN_KG_PER_H = 1e11;

function limitAt({ limitKgPerH }: HeaderJudgement, minute: number): number | null {
  const limit = limitKgPerH?.[minute] ?? Infinity;
  return limit < UNKNOWN_KG_PER_H ? limit : null;
}

async function balanceAt(week: Week, { headers }: WeekEvaluation, headerId: string, minute: number) {
  const rows = await db
    .select()
    .from(boilers)
    .where(and(eq(boilers.plantId, week.plant.id), isNull(boilers.retiredAt)));
  const boilerH = (fedId: string): number | null => {
    const feeding = rows.filter((boiler) => boiler.headerId === fedId);
    const rated = feeding.reduce((sum, boiler) => sum + boiler.ratingFromAndAtKgPerH, 0);
    const heat = feeding.reduce((sum, { pressureBarG, ratingFromAndAtKgPerH }) => {
      const steam = boilerOutlet(pressureBarG, barAbsolute(week.plant.ambientBarA));
      return sum + (steam.ok ? steam.value.h : NaN) * ratingFromAndAtKgPerH;
    }, 0);
    return rated > 0 && Number.isFinite(heat) ? heat / rated : null;
  };
  const flows = new Map(headers.map((header) => [header.headerId, header]));
  return headerBalances(week.plant, flows, minute, boilerH).find((balance) => balance.headerId === headerId) ?? null;
}

/** Runs on the header's own units, greatest first. */
function runsAt(week: Week, { drawn }: WeekEvaluation, headerId: string, minute: number): DrawingRun[] {
  const units = new Map(week.plant.units.map((unit) => [unit.id, unit]));
  const activities = new Map(drawn.map((activity) => [activity.id, activity]));
  return drawFinder({ plant: week.plant, activities: drawn })
    .whoDraws(headerId, minute)
    .flatMap(({ activityId, unitId, kgPerH }) => {
      const unit = units.get(unitId);
      const activity = activities.get(activityId);
      if (unit?.headerId !== headerId || !activity) return [];
      return [{ id: activityId, code: activity.code, title: activity.title, unitName: unit.name, kgPerH }];
    });
}
