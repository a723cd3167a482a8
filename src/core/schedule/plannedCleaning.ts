import type { CleaningKind } from '../plant/activity';
import type { CleaningRule, PlantModel, Unit, UnitKind } from '../plant/plant';
import { CLEANING_TITLES } from './changeovers';

/** A unit that can be cleaned by hand of the planner, and how. */
export interface CleanableUnit {
  readonly unit: Unit;
  /** Least first. */
  readonly kinds: readonly CleaningKind[];
}

const LEAST_FIRST: readonly CleaningKind[] = ['rinse', 'wash', 'allergen'];

/** What a clean of one kind takes on a kind of unit: the longest rule of it, the first of those as long. [min] */
export function longestRule<Rule extends Pick<CleaningRule, 'unitKind' | 'kind' | 'minutes'>>(
  rules: readonly Rule[],
  unitKind: UnitKind,
  kind: CleaningKind,
): Rule | null {
  const asked = rules.filter((rule) => rule.unitKind === unitKind && rule.kind === kind);
  return asked.reduce<Rule | null>(
    (longest, rule) => (longest && longest.minutes >= rule.minutes ? longest : rule),
    null,
  );
}

/** Units that the plant has cleaning rules for, in its order, with the kinds of clean that have a rule. */
export function cleanableUnits({ units, cleaning }: Pick<PlantModel, 'units' | 'cleaning'>): CleanableUnit[] {
  return units.flatMap((unit) => {
    const kinds = LEAST_FIRST.filter((kind) => longestRule(cleaning, unit.kind, kind) !== null);
    return kinds.length > 0 ? [{ unit, kinds }] : [];
  });
}

/** What a planned clean is called: "Wash of Kettle 2". */
export const plannedCleaningTitle = (kind: CleaningKind, unitName: string): string =>
  `${CLEANING_TITLES[kind]} of ${unitName}`;

/** The first code of planned cleans that none of a week's activities has: "C1", "C2", ... */
export function nextCleaningCode(taken: readonly string[]): string {
  const codes = new Set(taken);
  for (let number = 1; ; number++) if (!codes.has(`C${number}`)) return `C${number}`;
}
