import { z } from 'zod';
import type { DutyModel } from '../core/duty/model';
import type { SpecificHeatBasis } from '../core/duty/specificHeat';
import type { LimitUse, Mode, Stage } from '../core/plant/activity';
import type { CleaningRule, UnitKind } from '../core/plant/plant';
import type { Range } from '../core/quantity/range';
import type { DutyHeaderDto, DutyProcessDataDto } from './duties';
import { numberIn, specificHeatBasisSchema, words } from './dutyInputs';

const idText = z.string().min(1).max(80);
const range = (name: string, unit: string, min: number, max: number) => ({ name, unit, min, max });

/** Ranges of a product's figures. */
export const PRODUCT_RANGES = {
  containerKg: range('Empty container', 'kg', 0, 20),
  fillKg: range('Fill of a container', 'kg', 0.001, 1000),
  casePieces: range('Containers in a case', '', 1, 10_000),
  initialC: range('Initial temperature', '°C', 0, 100),
} as const;

const product = {
  name: words('Give the product a name.', 120),
  familyId: idText,
  basis: specificHeatBasisSchema,
  containerKg: numberIn(PRODUCT_RANGES.containerKg),
  fillKg: numberIn(PRODUCT_RANGES.fillKg),
  casePieces: numberIn(PRODUCT_RANGES.casePieces).refine(Number.isInteger, {
    error: 'Containers in a case: enter a whole number.',
  }),
  /** Contents at steam on, as it usually is; null: not said. [degC] */
  initialC: numberIn(PRODUCT_RANGES.initialC).nullable(),
};

/** POST /api/products */
export const newProductSchema = z.object(product);
export type ProductRequest = z.infer<typeof newProductSchema>;

/** POST /api/products/:id; `read` is what the form was opened with: a save over somebody else's is refused. */
export const changeProductSchema = z.object({ ...product, read: idText });
export type ChangeProductRequest = z.infer<typeof changeProductSchema>;

/** POST /api/products/:id/retire */
export const retireProductSchema = z.object({ read: idText });

export const STAGES = [
  'prepare',
  'blanch',
  'cook',
  'fill',
  'retort',
  'pasteurise',
  'other',
] as const satisfies readonly Stage[];

/** Stages as screens name them. */
export const STAGE_NAMES: Readonly<Record<Stage, string>> = {
  prepare: 'preparation',
  blanch: 'blanching',
  cook: 'cooking',
  fill: 'fill and close',
  retort: 'retort',
  pasteurise: 'pasteurising',
  other: 'other',
};

export const UNIT_KINDS = [
  'blancher',
  'kettle',
  'cooker',
  'filler',
  'retort',
  'pasteuriser',
  'other',
] as const satisfies readonly UnitKind[];

/** Ranges of a stage's minutes and uses. */
export const ROUTE_RANGES = {
  minutes: range('Door to door, at least', 'min', 0, 10_080),
  leadMin: range('Start to steam on', 'min', 0, 1440),
  afterMin: range('Last steam to unit free', 'min', 0, 1440),
  offsetMin: range('From the start', 'min', 0, 10_080),
  useMinutes: range('For', 'min', 1, 10_080),
  amount: range('Amount', '', 0.001, 100_000),
} as const;

const whole = (of: Range) => numberIn(of).refine(Number.isInteger, { error: `${of.name}: enter whole minutes.` });

export const limitUseSchema = z.object({
  limitId: idText,
  offsetMin: whole(ROUTE_RANGES.offsetMin),
  minutes: whole(ROUTE_RANGES.useMinutes),
  amount: numberIn(ROUTE_RANGES.amount),
});

const routeUnitSchema = z.object({
  unitId: z.string().min(1, { error: 'Choose a unit.' }).max(80),
  /** null: draws no steam. */
  dutyId: idText.nullable(),
  minutes: whole(ROUTE_RANGES.minutes),
  leadMin: whole(ROUTE_RANGES.leadMin),
  afterMin: whole(ROUTE_RANGES.afterMin),
});

const stageSchema = z
  .object({
    stage: z.enum(STAGES, { error: 'Choose a stage.' }),
    units: z.array(routeUnitSchema).min(1, { error: 'Name at least one unit that can do it.' }).max(60),
    uses: z.array(limitUseSchema).max(20),
  })
  .superRefine(({ units }, context) => {
    units.forEach(({ unitId, dutyId, minutes }, index) => {
      if (units.findIndex((unit) => unit.unitId === unitId) < index) {
        context.addIssue({ code: 'custom', message: 'This unit is named twice.', path: ['units', index, 'unitId'] });
      }
      if (dutyId === null && minutes === 0) {
        const message = 'Without a duty, say how long it takes.';
        context.addIssue({ code: 'custom', message, path: ['units', index, 'minutes'] });
      }
    });
  });

/** POST /api/products/:id/route: the whole route, in order. */
export const routeSchema = z.object({
  /** What the form was opened with. */
  read: idText,
  stages: z.array(stageSchema).max(20),
});
export type RouteRequest = z.infer<typeof routeSchema>;

/** POST /api/families and POST /api/families/:id */
export const familySchema = z.object({ name: words('Give the family a name.', 80) });
export type FamilyRequest = z.infer<typeof familySchema>;

/** Length of a cleaning. */
export const CLEANING_MINUTES = range('Cleaning', 'min', 1, 1440);

export const CLEANING_KINDS = ['rinse', 'wash', 'allergen'] as const satisfies readonly CleaningRule['kind'][];

/** POST /api/families/cleaning: what follows on a kind of unit between two families; `rule` null takes it back. */
export const cleaningRequestSchema = z.object({
  unitKind: z.enum(UNIT_KINDS, { error: 'Choose a kind of unit.' }),
  fromFamilyId: idText,
  toFamilyId: idText,
  rule: z
    .object({
      kind: z.enum(CLEANING_KINDS, { error: 'Choose what is done.' }),
      minutes: whole(CLEANING_MINUTES),
      dutyId: idText.nullable(),
      uses: z.array(limitUseSchema).max(20),
    })
    .nullable(),
});
export type CleaningRequest = z.infer<typeof cleaningRequestSchema>;

export interface FamilyDto {
  readonly id: string;
  readonly name: string;
  /** Products of it that are made. */
  readonly products: number;
}

/** A unit's mode as its stage stands now; `fault` where it can't be worked out. */
export interface RouteUnitDto {
  readonly unitId: string;
  readonly dutyId: string | null;
  readonly minutes: number;
  readonly leadMin: number;
  readonly afterMin: number;
  readonly mode: Mode | null;
  readonly fault: string | null;
}

export interface RouteStageDto {
  readonly stage: Stage;
  readonly units: readonly RouteUnitDto[];
  readonly uses: readonly LimitUse[];
}

export interface ProductDto {
  readonly id: string;
  readonly name: string;
  readonly familyId: string;
  readonly basis: SpecificHeatBasis;
  readonly containerKg: number;
  readonly fillKg: number;
  readonly casePieces: number;
  readonly initialC: number | null;
  readonly isRetired: boolean;
  /** Stands for what was read. */
  readonly read: string;
  readonly stages: readonly RouteStageDto[];
  /** Stands for the route that was read. */
  readonly routeRead: string;
  readonly processData: DutyProcessDataDto | null;
  /** Runs planned and not yet started. */
  readonly plannedRuns: number;
}

export interface RouteChoicesDto {
  readonly units: readonly {
    readonly id: string;
    readonly name: string;
    readonly kind: UnitKind;
    readonly lineName: string;
    readonly headerId: string | null;
  }[];
  readonly duties: readonly {
    readonly id: string;
    readonly name: string;
    readonly title: string;
    /** null: what is stored no longer fits its model. */
    readonly duty: DutyModel | null;
  }[];
  readonly limits: readonly { readonly id: string; readonly name: string; readonly unit: string }[];
  readonly headers: readonly DutyHeaderDto[];
  readonly altitudeM: number;
}

export interface CleaningRuleDto {
  readonly unitKind: UnitKind;
  readonly fromFamilyId: string;
  readonly toFamilyId: string;
  readonly minutes: number;
  readonly kind: CleaningRule['kind'];
  readonly dutyId: string | null;
  readonly uses: readonly LimitUse[];
  readonly steamKg: number;
  readonly greatestKgPerH: number;
}

/** GET /api/products */
export interface ProductsDto {
  readonly families: readonly FamilyDto[];
  readonly products: readonly ProductDto[];
  readonly choices: RouteChoicesDto;
  readonly cleaning: readonly CleaningRuleDto[];
}
