import type { Activity, CleaningKind } from '../plant/activity';
import type { CleaningRule, UnitKind } from '../plant/plant';
import { derivedActivity } from './derived';
import { occupationsByUnit, type Occupation } from './occupation';
import type { Week } from './week';
import { indexOf } from './weekIndex';

/** A cleaning that the sequence on a unit asks for, between two runs. */
export interface Changeover {
  /** `clean:` and the id of the run before. It draws steam and uses limits like any other activity. */
  readonly cleaning: Activity;
  readonly unitId: string;
  readonly previousId: string;
  readonly nextId: string;
  readonly rule: CleaningRule;
  /** When the unit is free for it. */
  readonly from: number;
  /** Minutes until the next run starts; less than 0 where the runs overlap. */
  readonly availableMin: number;
}

/**
 * The cleanings between runs of product families on each unit, in order of unit and time. Cleanliness is a state: an
 * allergen clean that the next family asks for after any family since the last allergen clean is asked for here, even
 * where others ran between. A stored cleaning between the runs of at least the rule's length and kind stands in for it.
 */
export function changeovers(week: Week): readonly Changeover[] {
  return cleaningsOf(week, occupationsByUnit(week.activities, week)).changeovers;
}

/** The same with the allergen cleans that there are, for occupations worked out before. */
export function cleaningsOf(week: Week, byUnit: ReadonlyMap<string, readonly Occupation[]>): Cleanings {
  const units = [...byUnit.keys()].sort().map((unitId) => unitCleanings(byUnit.get(unitId) ?? [], week));
  return {
    changeovers: units.flatMap((unit) => unit.changeovers),
    allergenCleans: units.flatMap((unit) => unit.allergenCleans),
  };
}

/** An allergen clean before a run: one that follows from the sequence, or a stored one that stands in for it. */
export interface AllergenClean {
  readonly cleaningId: string;
  readonly nextId: string;
  readonly doneAt: number;
  readonly nextFrom: number;
}

/** What a week's sequences ask for: see {@link changeovers}; and its allergen cleans, those that are stored included. */
export interface Cleanings {
  readonly changeovers: readonly Changeover[];
  readonly allergenCleans: readonly AllergenClean[];
}

/** The rule for a change of family on a kind of unit; undefined where nothing has to be done. */
export function cleaningRule(
  rules: readonly CleaningRule[],
  unitKind: UnitKind,
  fromFamilyId: string,
  toFamilyId: string,
): CleaningRule | undefined {
  return rules.find(
    (rule) => rule.unitKind === unitKind && rule.fromFamilyId === fromFamilyId && rule.toFamilyId === toFamilyId,
  );
}

interface UnitState {
  previous: { readonly run: Activity; readonly taken: Occupation } | null;
  /** Families run since the last allergen clean. */
  families: Set<string>;
  /** Stored cleanings since the previous run. */
  stored: StoredClean[];
}

interface StoredClean {
  readonly clean: Activity;
  readonly span: Occupation;
}

const KINDS: readonly CleaningKind[] = ['rinse', 'wash', 'allergen'];

/** True where a stored cleaning does what a rule asks for: as long, and as much of a clean where its kind is known. */
function standsIn({ clean, span }: StoredClean, { minutes, kind }: CleaningRule): boolean {
  const enough = clean.cleaning === undefined || KINDS.indexOf(clean.cleaning) >= KINDS.indexOf(kind);
  return enough && span.to - span.from >= minutes;
}

/** The longest of some cleanings, the first of those that are as long. */
const longestOf = (cleans: readonly StoredClean[]): StoredClean | undefined =>
  [...cleans].sort((a, b) => b.span.to - b.span.from - (a.span.to - a.span.from))[0];

function unitCleanings(taken: readonly Occupation[], week: Week): Cleanings {
  const index = indexOf(week);
  const found: { changeovers: Changeover[]; allergenCleans: AllergenClean[] } = { changeovers: [], allergenCleans: [] };
  const kind = index.units.get(taken[0]?.unitId ?? '')?.kind;
  if (!kind) return found;
  const state: UnitState = { previous: null, families: new Set(), stored: [] };
  for (const span of taken) {
    const activity = index.activities.get(span.activityId) as Activity;
    if (activity.kind === 'cleaning') {
      state.stored.push({ clean: activity, span });
    } else if (activity.kind === 'stage' && activity.familyId !== null) {
      const rule = requiredRule(week.plant.cleaning, kind, state, activity.familyId);
      if (rule) addCleaning(found, rule, state, activity, span);
      if (rule?.kind === 'allergen') state.families.clear();
      forgetCleaned(week.plant.cleaning, kind, state);
      state.families.add(activity.familyId);
      state.previous = { run: activity, taken: span };
      state.stored = [];
    }
  }
  return found;
}

/** A stored allergen clean of full length does away with a family, whatever runs next; one of no known kind does not. */
function forgetCleaned(rules: readonly CleaningRule[], unitKind: UnitKind, { families, stored }: UnitState): void {
  const cleans = stored.filter(({ clean }) => clean.cleaning === 'allergen');
  if (cleans.length === 0) return;
  for (const familyId of families) {
    const asked = rules.filter(
      (rule) => rule.unitKind === unitKind && rule.fromFamilyId === familyId && rule.kind === 'allergen',
    );
    if (asked.every((rule) => cleans.some((clean) => standsIn(clean, rule)))) families.delete(familyId);
  }
}

/** A cleaning that follows from the sequence, unless a stored one of its length and kind stands in for it. */
function addCleaning(
  found: { changeovers: Changeover[]; allergenCleans: AllergenClean[] },
  rule: CleaningRule,
  { previous, stored }: UnitState,
  next: Activity,
  span: Occupation,
): void {
  const allergen = (cleaningId: string, doneAt: number): void => {
    if (rule.kind !== 'allergen') return;
    found.allergenCleans.push({ cleaningId, nextId: next.id, doneAt, nextFrom: span.from });
  };
  const instead = longestOf(stored.filter((clean) => standsIn(clean, rule)));
  if (instead) allergen(instead.clean.id, instead.span.to);
  else if (previous) {
    const follows = changeover(rule, previous.run, previous.taken, next, span);
    found.changeovers.push(follows);
    allergen(follows.cleaning.id, follows.from + rule.minutes);
  }
}

function requiredRule(
  rules: readonly CleaningRule[],
  kind: UnitKind,
  state: UnitState,
  toFamilyId: string,
): CleaningRule | undefined {
  const fromFamilyId = state.previous?.run.familyId;
  const pair = fromFamilyId ? cleaningRule(rules, kind, fromFamilyId, toFamilyId) : undefined;
  if (pair?.kind === 'allergen') return pair;
  const allergen = [...state.families]
    .map((familyId) => cleaningRule(rules, kind, familyId, toFamilyId))
    .filter((rule) => rule?.kind === 'allergen')
    .sort((a, b) => (b?.minutes ?? 0) - (a?.minutes ?? 0));
  return allergen[0] ?? pair;
}

function changeover(
  rule: CleaningRule,
  previous: Activity,
  taken: Occupation,
  next: Activity,
  nextTaken: Occupation,
): Changeover {
  const from = taken.to + (previous.placement?.cleanAfterMin ?? 0);
  return {
    cleaning: cleaningActivity(rule, previous, taken.unitId, from),
    unitId: taken.unitId,
    previousId: previous.id,
    nextId: next.id,
    rule,
    from,
    availableMin: nextTaken.from - from,
  };
}

/** Cleanings as they are called. */
export const CLEANING_TITLES: Readonly<Record<CleaningKind, string>> = {
  rinse: 'Rinse',
  wash: 'Wash',
  allergen: 'Allergen clean',
};

function cleaningActivity(rule: CleaningRule, run: Activity, unitId: string, start: number): Activity {
  const { minutes, phases, uses, dutyId = null } = rule;
  const title = `${CLEANING_TITLES[rule.kind]} after ${run.code}`;
  return derivedActivity({
    id: `clean:${run.id}`,
    kind: 'cleaning',
    run,
    title,
    unitId,
    start,
    minutes,
    phases,
    uses,
    dutyId,
  });
}
