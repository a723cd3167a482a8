import {
  PRACTICE_RANGES,
  PRACTICE_RULE_KINDS,
  type PracticeRuleDto,
  type PracticeRuleKind,
} from '../../contracts/practice';
import type { Range } from '../../core/quantity/range';
import { inUnits, type Units } from '../units';

export const KIND_WORDS: Readonly<Record<PracticeRuleKind, { readonly title: string; readonly says: string }>> = {
  ventGroup: {
    title: 'Vents of a vent group',
    says: 'How many retorts of a manifold may vent and take steam on at once, as the distribution study validated.',
  },
  cleanliness: {
    title: 'Cleanliness',
    says: 'How long a unit runs between two full cleans and stands dirty, and when it is free after an allergen clean.',
  },
  waits: {
    title: 'Longest waits',
    says: 'From the first container closed to steam on, whatever longer wait a product’s document allows.',
  },
};

export interface FieldOfRule {
  readonly name: string;
  readonly range: Range;
  readonly mayBeEmpty: boolean;
}

const MAY_BE_EMPTY = new Set([
  'leastHeaderBarG',
  'studyGreatestLoadKgPerH',
  'greatestRunningMin',
  'greatestStandingDirtyMin',
  'allergenReleaseMin',
  'longestWaitForInitialTemperatureMin',
]);

/** The numbers of a kind of rule in the order of its form. */
export const fieldsOf = (kind: PracticeRuleKind): FieldOfRule[] =>
  Object.entries(PRACTICE_RANGES[kind]).map(([name, range]) => ({ name, range, mayBeEmpty: MAY_BE_EMPTY.has(name) }));

/** The values of a rule in words; what is not set says so. */
export function valueTexts({ kind, values }: Pick<PracticeRuleDto, 'kind' | 'values'>, units: Units) {
  return fieldsOf(kind).map(({ name, range }) => {
    const value = values[name];
    if (typeof value !== 'number') return { name: range.name, value: 'not set' };
    const shown = inUnits(units, value, range.unit);
    const text = String(Number(shown.value.toPrecision(4)));
    return { name: range.name, value: shown.unit === '' ? text : `${text} ${shown.unit}` };
  });
}

export type RuleState = 'inForce' | 'waiting' | 'past';

/** In force: released and not withdrawn; a rule that was replaced counts as withdrawn. */
export function stateOf({ released, withdrawnAt }: PracticeRuleDto): RuleState {
  if (withdrawnAt) return 'past';
  return released ? 'inForce' : 'waiting';
}

/** Rules of one state by kind, kinds in their order. */
export function byKind(rules: readonly PracticeRuleDto[], state: RuleState) {
  const nameOf = ({ ventGroup }: PracticeRuleDto): string => ventGroup?.name ?? '';
  return PRACTICE_RULE_KINDS.flatMap((kind) =>
    rules
      .filter((rule) => rule.kind === kind && stateOf(rule) === state)
      .sort((a, b) => (state === 'past' ? 0 : nameOf(a).localeCompare(nameOf(b)))),
  );
}
