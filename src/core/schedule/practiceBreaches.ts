/** Breaches of the practice rules that the quality lead has released; none where a rule is not set. */
import type { Activity } from '../plant/activity';
import type { ProcessBreach } from './breach';
import type { JudgedWeek } from './judged';
import type { Occupation } from './occupation';
import { indexOf } from './weekIndex';

/**
 * Running without a full clean, standing dirty, and runs before an allergen clean is released. Only units of a kind that
 * the plant has cleaning rules for: a retort is not cleaned between loads.
 */
export function practiceBreaches(judged: JudgedWeek): ProcessBreach[] {
  const limits = judged.week.plant.rules.practice;
  if (!limits) return [];
  const { greatestRunningMin, greatestStandingDirtyMin, allergenReleaseMin } = limits;
  const { units: byId } = indexOf(judged.week);
  const cleaned = new Set(judged.week.plant.cleaning.map(({ unitKind }) => unitKind));
  const isCleaned = (unitId: string): boolean => {
    const kind = byId.get(unitId)?.kind;
    return kind !== undefined && cleaned.has(kind);
  };
  const units = [...judged.occupations.keys()]
    .filter(isCleaned)
    .sort()
    .map((unitId) => unitHistory(judged, unitId));
  return [
    ...(greatestRunningMin === null ? [] : units.flatMap((unit) => runningTooLong(unit, greatestRunningMin))),
    ...(greatestStandingDirtyMin === null
      ? []
      : units.flatMap((unit) => standingDirty(unit, greatestStandingDirtyMin))),
    ...(allergenReleaseMin === null ? [] : notReleased(judged, allergenReleaseMin)),
  ];
}

/** A run or a cleaning on a unit. */
interface Spell {
  readonly activityId: string;
  readonly from: number;
  readonly to: number;
  readonly cleans: 'no' | 'rinse' | 'full';
}

/**
 * Runs and cleanings of a unit in order of time, those included that follow from the sequence. Anything but a rinse is a
 * full clean; a stored cleaning of no known kind is taken for one.
 */
function unitHistory({ week, occupations, changeovers }: JudgedWeek, unitId: string): Spell[] {
  const { activities } = indexOf(week);
  const taken = occupations.get(unitId) ?? [];
  const stored = taken.map(({ activityId, from, to }: Occupation): Spell => {
    const { kind, cleaning } = activities.get(activityId) as Activity;
    return { activityId, from, to, cleans: kind !== 'cleaning' ? 'no' : cleaning === 'rinse' ? 'rinse' : 'full' };
  });
  const derived = changeovers
    .filter((changeover) => changeover.unitId === unitId)
    .map(({ cleaning, from, rule }): Spell => {
      const cleans = rule.kind === 'rinse' ? 'rinse' : 'full';
      return { activityId: cleaning.id, from, to: from + rule.minutes, cleans };
    });
  return [...stored, ...derived].sort((a, b) => a.from - b.from || (a.activityId < b.activityId ? -1 : 1));
}

/** One breach for each stretch between two full cleans that is run for too long, from the minute that passes the rule. */
function runningTooLong(unit: readonly Spell[], limit: number): ProcessBreach[] {
  const found: ProcessBreach[] = [];
  let runs: Spell[] = [];
  const close = () => {
    const breach = stretchBreach(runs, limit);
    if (breach) found.push(breach);
    runs = [];
  };
  for (const spell of unit) {
    if (spell.cleans === 'full') close();
    else if (spell.cleans === 'no') runs.push(spell);
  }
  close();
  return found;
}

function stretchBreach(runs: readonly Spell[], limit: number): ProcessBreach | null {
  let ran = 0;
  for (const [i, run] of runs.entries()) {
    const before = ran;
    ran += run.to - run.from;
    if (ran <= limit) continue;
    const total = runs.slice(i + 1).reduce((sum, later) => sum + later.to - later.from, ran);
    const others = runs.filter((other) => other !== run).map(({ activityId }) => activityId);
    return {
      ...breachAt('runningTooLong', run.activityId, run.from + (limit - before), (runs.at(-1) as Spell).to),
      activityIds: [run.activityId, ...others],
      found: total,
      limit,
    };
  }
  return null;
}

/** Between a run and whatever comes next on its unit; after the last run of the week nothing is known. */
function standingDirty(unit: readonly Spell[], limit: number): ProcessBreach[] {
  return unit.slice(1).flatMap((next, i) => {
    const before = unit[i] as Spell;
    const stood = next.from - before.to;
    if (before.cleans !== 'no' || stood <= limit) return [];
    const breach = breachAt('standingDirty', before.activityId, before.to + limit, next.from);
    return [{ ...breach, activityIds: [before.activityId, next.activityId], found: stood, limit }];
  });
}

/** A run that begins before the unit is released after an allergen clean of full length. */
function notReleased({ allergenCleans }: JudgedWeek, limit: number): ProcessBreach[] {
  return allergenCleans.flatMap(({ cleaningId, nextId, doneAt, nextFrom }) => {
    const waited = nextFrom - doneAt;
    if (waited < 0 || waited >= limit) return [];
    const breach = breachAt('allergenRelease', nextId, nextFrom, doneAt + limit);
    return [{ ...breach, activityIds: [nextId, cleaningId], found: waited, limit }];
  });
}

function breachAt(code: ProcessBreach['code'], activityId: string, from: number, to: number): ProcessBreach {
  const id = `${code}:${activityId}`;
  return {
    id,
    class: 'process',
    code,
    from,
    to,
    activityIds: [activityId],
    found: null,
    limit: null,
    ventGroupId: null,
  };
}
