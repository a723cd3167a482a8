/** `ventGroup`: vents and steam ons at once, margin, least header pressure, the study's greatest load. `cleanliness`: running, standing dirty, allergen release. */
export const PRACTICE_RULE_KINDS = ['ventGroup', 'cleanliness', 'waits'] as const;
export type PracticeRuleKind = (typeof PRACTICE_RULE_KINDS)[number];
