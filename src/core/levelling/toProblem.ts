import { drawnMode, isNeverMoved, type Activity, type Link, type LinkEnd, type Mode } from '../plant/activity';
import { releaseAfterMin, type PlantModel, type Unit } from '../plant/plant';
import type { Week } from '../schedule/week';
import { mergeIntervals } from '../time/interval';
import { passedCleanings, type PassedCleaning, type PassedCleanings } from './passedCleanings';
import { fullOptions, type FullOptions, type LevellingOptions } from './options';
import {
  PROBLEM_VERSION,
  type Problem,
  type ProblemActivity,
  type ProblemCleaning,
  type ProblemLink,
  type ProblemMode,
  type ProblemUnit,
} from './problem';
import { toResources } from './resources';
import { limitUses, modeUses, steamResources, steamUses, usesBefore } from './uses';

const byId = <T extends { readonly id: string }>(a: T, b: T): number => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);

/**
 * States a week as a levelling problem. Activities not yet placed stay out, with their links. Everything is sorted by
 * id, so the week's own order doesn't matter.
 */
export function toProblem(week: Week, options: LevellingOptions = {}): Problem {
  const full = fullOptions(options);
  const placed = week.activities.filter((a) => a.placement !== null && a.modes.length > 0).sort(byId);
  const links = toLinks(week.links, placed);
  const linkIds = new Set(links.map((l) => l.id));
  const passed = passedCleanings(week);
  const activities = placed.map((a) => toActivity(a, week, full, linkIds, passed));
  return {
    version: PROBLEM_VERSION,
    horizonMin: week.horizonMin,
    units: toUnits(week),
    cleaning: toCleaning(week.plant),
    resources: toResources(week),
    activities,
    links,
    prices: full.prices,
  };
}

function toUnits(week: Week): ProblemUnit[] {
  const open = new Map(week.calendars.map((c) => [c.unitId, c.open]));
  return [...week.plant.units].sort(byId).map((u) => ({
    id: u.id,
    open: mergeIntervals(open.get(u.id) ?? [{ from: 0, to: week.horizonMin }]),
  }));
}

/**
 * Cleaning draws on the header of its unit: a rule is stated once for the units of its kind on each header. The release
 * after an allergen clean is time that the unit is not free.
 */
function toCleaning(plant: PlantModel): ProblemCleaning[] {
  const stated = plant.cleaning.flatMap((rule) => {
    const units = [...plant.units].filter((u) => u.kind === rule.unitKind).sort(byId);
    return [...new Set(units.map((u) => u.headerId))].map((headerId) => ({
      unitIds: units.filter((u) => u.headerId === headerId).map((u) => u.id),
      fromFamilyId: rule.fromFamilyId,
      toFamilyId: rule.toFamilyId,
      minutes: rule.minutes + releaseAfterMin(plant, rule),
      uses: [...steamUses(rule.phases, steamResources(plant, headerId)), ...limitUses(rule.uses)],
    }));
  });
  return stated.sort((a, b) => (cleaningKey(a) < cleaningKey(b) ? -1 : 1));
}

const cleaningKey = (c: ProblemCleaning): string => [c.unitIds[0], c.fromFamilyId, c.toFamilyId].join('|');

function toActivity(
  a: Activity,
  week: Week,
  options: FullOptions,
  linkIds: ReadonlySet<string>,
  passed: PassedCleanings,
): ProblemActivity {
  const placement = a.placement ?? { unitId: '', start: 0 };
  const movable = isMovable(a, options, week.horizonMin) && !passed.still.has(a.id);
  const [earliest, latest] = startBounds(a, placement.start, options, week.horizonMin);
  const takenOffBy = a.occupiesUntil === 'end' ? null : a.occupiesUntil.linkId;
  return {
    id: a.id,
    batchId: a.batchId ?? a.id,
    familyId: a.kind === 'stage' ? a.familyId : null,
    ...(a.kind === 'cleaning' ? { isCleaning: true } : {}),
    modes: toModes(a, week.plant, movable && options.mayChangeUnit).map((m) =>
      withCleaning(m, passed.after.get(a.id), week),
    ),
    plan: { unitId: placement.unitId, start: placement.start },
    movable,
    takenOffBy: takenOffBy !== null && linkIds.has(takenOffBy) ? takenOffBy : null,
    cleanAfterMin: placement.cleanAfterMin ?? 0,
    earliestStart: movable ? earliest : placement.start,
    latestStart: movable ? latest : placement.start,
    due: a.due,
    weight: a.weight,
  };
}

/** A run's mode with the draws of a cleaning that follows it past what comes next on its unit. */
function withCleaning(mode: ProblemMode, cleaning: PassedCleaning | undefined, { plant }: Week): ProblemMode {
  if (!cleaning) return mode;
  const { rule, offsetMin } = cleaning;
  const headerId = plant.units.find(({ id }) => id === mode.unitId)?.headerId ?? null;
  const draws = [...steamUses(rule.phases, steamResources(plant, headerId)), ...limitUses(rule.uses)];
  const besides = draws.map((use) => ({ ...use, offsetMin: use.offsetMin + offsetMin }));
  const warm = mode.warm?.map((one) => ({ ...one, uses: [...one.uses, ...besides] }));
  return { ...mode, uses: [...mode.uses, ...besides], ...(warm ? { warm } : {}) };
}

function isMovable(a: Activity, options: FullOptions, horizonMin: number): boolean {
  const start = a.placement?.start ?? -1;
  const minutes = drawnMode(a)?.minutes ?? 0;
  if (a.fixing !== 'free' || isNeverMoved(a) || start < 0 || start + minutes > horizonMin) return false;
  return options.span === null || (start >= options.span.from && start < options.span.to);
}

/** Own bounds, the span and the greatest shift together; never narrower than where the plan has it. */
function startBounds(a: Activity, start: number, options: FullOptions, horizonMin: number): [number, number] {
  const { span, greatestShiftMin, mayMoveEarlier } = options;
  const least = Math.max(0, a.earliestStart, span?.from ?? 0, mayMoveEarlier ? start - greatestShiftMin : start);
  const greatest = Math.min(a.latestStart ?? horizonMin, (span?.to ?? horizonMin) - 1, start + greatestShiftMin);
  return [Math.min(start, least), Math.max(start, greatest)];
}

/** The placed unit's mode, drawn as judged even where the unit is not eligible, and the eligible others if allowed. */
function toModes(a: Activity, plant: PlantModel, mayChangeUnit: boolean): ProblemMode[] {
  const units = new Map<string, Unit>(plant.units.map((u) => [u.id, u]));
  const home = a.placement?.unitId ?? '';
  const drawn = drawnMode(a);
  const here = drawn ? [{ ...drawn, unitId: home }] : [];
  const others = mayChangeUnit ? a.modes.filter((m) => m.unitId !== home) : [];
  return [...here, ...others]
    .map((m) => toMode(a, m, plant, units.get(m.unitId)))
    .sort((x, y) => (x.unitId < y.unitId ? -1 : 1));
}

function toMode(a: Activity, mode: Mode, plant: PlantModel, unit: Unit | undefined): ProblemMode {
  const usesOf = (phases: Mode['phases']) => modeUses(plant, unit, a, { ...mode, phases });
  const warm = mode.warm?.map(({ gapUpToMin, phases }) => ({ gapUpToMin, uses: usesOf(phases) }));
  return {
    unitId: mode.unitId,
    minutes: mode.minutes,
    uses: usesOf(mode.phases),
    ...(warm ? { warm } : {}),
    ...(mode.between ? { before: usesBefore(mode.between, steamResources(plant, unit?.headerId ?? null)) } : {}),
  };
}

function toLinks(links: readonly Link[], placed: readonly Activity[]): ProblemLink[] {
  const activities = new Map(placed.map((a) => [a.id, a]));
  return [...links].sort(byId).flatMap((link) => {
    const from = activities.get(link.from.activityId);
    const to = activities.get(link.to.activityId);
    if (!from || !to || from === to) return [];
    const wait = momentOf(to, link.to) - momentOf(from, link.from);
    return [
      {
        id: link.id,
        from: link.from,
        to: link.to,
        leastMin: Math.min(link.leastMin, wait),
        greatestMin: link.greatestMin === null ? null : Math.max(link.greatestMin, wait),
        processGreatestMin: link.greatestBreach === 'process' ? link.greatestMin : null,
      },
    ];
  });
}

function momentOf(a: Activity, end: LinkEnd): number {
  const minutes = end.anchor === 'end' ? (drawnMode(a)?.minutes ?? 0) : 0;
  return (a.placement?.start ?? 0) + minutes + end.offsetMin;
}
