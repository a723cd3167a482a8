import { z } from 'zod';
import type { Range } from '../core/quantity/range';
import { ranged, rangedWhole, type VentNumbersDto } from './plantLibrary';

/**
 * `ventGroup`: vents and steam ons at once, margin, least header pressure, the study's greatest load. `cleanliness`:
 * running, standing dirty, allergen release. `waits`: longest waits, whatever a product's document allows.
 */
export const PRACTICE_RULE_KINDS = ['ventGroup', 'cleanliness', 'waits'] as const;
export type PracticeRuleKind = (typeof PRACTICE_RULE_KINDS)[number];

export const NO_SOURCE = 'common practice, no source';

const range = (name: string, unit: string, min: number, max: number): Range => ({ name, unit, min, max });
const DAYS_14 = 20_160;

/** Ranges of the rules' numbers, in the order of their forms. */
export const PRACTICE_RANGES = {
  ventGroup: {
    ventsAtOnce: range('Vents at once', '', 1, 40),
    steamOnsAtOnce: range('Steam ons at once', '', 1, 40),
    steamOnMinutes: range('Length of a steam on', 'min', 1, 60),
    marginMinutes: range('Margin after a vent', 'min', 0, 60),
    leastHeaderBarG: range('Least header pressure for a vent', 'bar g', 0, 60),
    studyGreatestLoadKgPerH: range('Greatest load that the study saw', 'kg/h', 1, 500_000),
  },
  cleanliness: {
    greatestRunningMin: range('Running between two full cleans', 'min', 30, DAYS_14),
    greatestStandingDirtyMin: range('Standing dirty', 'min', 1, DAYS_14),
    allergenReleaseMin: range('Release after an allergen clean', 'min', 1, 2_880),
  },
  waits: {
    longestWaitSinceClosingMin: range('Longest wait since closing, first container', 'min', 1, 1_440),
    longestWaitForInitialTemperatureMin: range('Longest wait for initial temperature', 'min', 1, 1_440),
  },
} as const satisfies Record<PracticeRuleKind, Record<string, Range>>;

const { ventGroup: V, cleanliness: C, waits: W } = PRACTICE_RANGES;
const MISSING_SOURCE = `Name the study, regulation or document; without one write “${NO_SOURCE}”.`;
const source = z.string({ error: MISSING_SOURCE }).trim().min(1, MISSING_SOURCE).max(300, 'At most 300 characters.');
const missingGroup = 'Choose the vent group.';

const ventGroupRule = z.object({
  kind: z.literal('ventGroup'),
  ventGroupId: z.string({ error: missingGroup }).min(1, missingGroup).max(80),
  values: z.object({
    ventsAtOnce: rangedWhole(V.ventsAtOnce),
    steamOnsAtOnce: rangedWhole(V.steamOnsAtOnce),
    steamOnMinutes: rangedWhole(V.steamOnMinutes),
    marginMinutes: rangedWhole(V.marginMinutes),
    leastHeaderBarG: ranged(V.leastHeaderBarG).nullable(),
    studyGreatestLoadKgPerH: ranged(V.studyGreatestLoadKgPerH).nullable(),
  }),
  source,
});

const cleanlinessRule = z.object({
  kind: z.literal('cleanliness'),
  ventGroupId: z.null().default(null),
  values: z
    .object({
      greatestRunningMin: rangedWhole(C.greatestRunningMin).nullable(),
      greatestStandingDirtyMin: rangedWhole(C.greatestStandingDirtyMin).nullable(),
      allergenReleaseMin: rangedWhole(C.allergenReleaseMin).nullable(),
    })
    .refine((values) => Object.values(values).some((value) => value !== null), {
      path: ['greatestRunningMin'],
      message: 'Set at least one of the three; withdraw the rule where none is to hold.',
    }),
  source,
});

const waitsRule = z.object({
  kind: z.literal('waits'),
  ventGroupId: z.null().default(null),
  values: z.object({
    longestWaitSinceClosingMin: rangedWhole(W.longestWaitSinceClosingMin),
    longestWaitForInitialTemperatureMin: rangedWhole(W.longestWaitForInitialTemperatureMin).nullable(),
  }),
  source,
});

/** Schemas of the rules by kind. */
export const PRACTICE_SCHEMAS = { ventGroup: ventGroupRule, cleanliness: cleanlinessRule, waits: waitsRule } as const;

/** POST /api/practice: a rule as it shall be; it holds once somebody else has released it. */
export const enterPracticeSchema = z.discriminatedUnion('kind', [ventGroupRule, cleanlinessRule, waitsRule], {
  error: 'Choose the kind of rule.',
});
export type EnterPractice = z.infer<typeof enterPracticeSchema>;

export interface PracticeRuleDto {
  readonly id: string;
  readonly kind: PracticeRuleKind;
  /** null: the whole plant. */
  readonly ventGroup: { readonly id: string; readonly name: string } | null;
  readonly values: Readonly<Record<string, number | null>>;
  readonly source: string;
  readonly enteredBy: string;
  /** ISO instant. */
  readonly enteredAt: string;
  readonly released: { readonly by: string; readonly at: string } | null;
  /** ISO instant; null while it may hold. */
  readonly withdrawnAt: string | null;
  /** Why the person asking can't release it; null where they can. */
  readonly releaseRefusal: string | null;
}

/** GET /api/practice and the answer to every change. */
export interface PracticeDto {
  readonly timeZone: string;
  /** Newest first. */
  readonly rules: readonly PracticeRuleDto[];
  readonly ventGroups: readonly {
    readonly id: string;
    readonly name: string;
    readonly numbers: VentNumbersDto;
    /** Headers that its retorts draw from. */
    readonly headers: readonly { readonly name: string; readonly pressureBarG: number }[];
  }[];
  /** Process data in force that allows a longer wait than the plant's rule; the rule holds. */
  readonly longerWaits: readonly { readonly product: string; readonly document: string; readonly minutes: number }[];
}
