import { z } from 'zod';
import type { PartLoad } from '../core/orders/amounts';
import type { OrderRoute } from '../core/orders/route';
import { weekStartSchema } from './week';

/** Ranges of an order's figures. */
export const ORDER_RANGES = {
  quantity: { name: 'Quantity', unit: '', min: 0.001, max: 10_000_000 },
  priority: { name: 'Priority', unit: '', min: 1, max: 5 },
} as const;

export const QUANTITY_UNITS = ['cases', 'kg'] as const;
export type QuantityUnit = (typeof QUANTITY_UNITS)[number];

/** A time on the plant's clock, such as 2026-12-04T14:00. */
const WALL = /^\d{4}-(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])T([01]\d|2[0-3]):[0-5]\d$/;
const isMoment = (text: string): boolean => WALL.test(text) && !Number.isNaN(Date.parse(`${text}:00Z`));
const moment = (missing: string) => z.string({ error: missing }).refine(isMoment, { error: `${missing}` });

/** POST /api/orders */
export const orderSchema = z
  .object({
    number: z
      .string({ error: 'Give the order its number.' })
      .trim()
      .min(1, { error: 'Give the order its number.' })
      .max(40, { error: 'At most 40 characters.' }),
    productId: z.string({ error: 'Choose a product.' }).min(1, { error: 'Choose a product.' }).max(80),
    quantity: z
      .number({ error: 'Enter how much is ordered.' })
      .min(ORDER_RANGES.quantity.min, { error: 'Enter how much is ordered: more than 0.' })
      .max(ORDER_RANGES.quantity.max, { error: 'At most 10 000 000.' }),
    unit: z.enum(QUANTITY_UNITS, { error: 'Choose cases or kg.' }),
    earliest: moment('Say the earliest start, or leave it empty.').nullable(),
    latestStart: moment('Say the latest start, or leave it empty.').nullable(),
    due: moment('Say when it is due.'),
    priority: z
      .int({ error: 'Priority is a whole number, 1 to 5.' })
      .min(1, { error: 'Priority is 1 (usual) to 5.' })
      .max(5, { error: 'Priority is 1 (usual) to 5.' }),
  })
  .superRefine(({ earliest, latestStart, due }, context) => {
    const issue = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message });
    if (earliest !== null && earliest >= due) issue('earliest', 'The earliest start must lie before it is due.');
    if (latestStart !== null && latestStart >= due) issue('latestStart', 'The latest start must lie before it is due.');
    if (earliest !== null && latestStart !== null && latestStart < earliest) {
      issue('latestStart', 'The latest start lies before the earliest.');
    }
  });
export type OrderRequest = z.infer<typeof orderSchema>;

/** POST /api/orders/:id; `revision` is the order's that was read: a save over somebody else's is refused. */
export const changeOrderSchema = z.intersection(orderSchema, z.object({ revision: z.int().min(0) }));
export type ChangeOrderRequest = z.infer<typeof changeOrderSchema>;

export const PART_LOAD_CHOICES = ['levelled', 'remainder', 'carried'] as const satisfies readonly PartLoad[];

/** POST /api/orders/:id/plan: splits the order and adds its runs to a week, not yet placed. */
export const planOrderSchema = z.object({
  revision: z.int().min(0),
  part: z.enum(PART_LOAD_CHOICES, { error: 'Choose what becomes of the part load.' }),
  /** null: the week that it is due in. */
  weekStart: weekStartSchema.nullable(),
});
export type PlanOrderRequest = z.infer<typeof planOrderSchema>;

export type OrderStateKind = 'notPlanned' | 'planned' | 'onFloor';

/** How far an order has got. */
export interface OrderStateDto {
  readonly kind: OrderStateKind;
  /** Its runs, batches and loads, and those of them that are placed. */
  readonly total: number;
  readonly placed: number;
  /** The first day of the week that it is planned in. */
  readonly weekStart: string | null;
}

export interface OrderDto {
  readonly id: string;
  readonly number: string;
  readonly productId: string;
  readonly productName: string;
  readonly quantityKg: number;
  /** As it was typed, in `unit`. */
  readonly quantity: number;
  readonly unit: QuantityUnit;
  /** Times on the plant's clock, such as 2026-12-04T14:00. */
  readonly earliest: string | null;
  readonly latestStart: string | null;
  readonly due: string;
  /** The first day of the week that it is due in. */
  readonly dueWeek: string;
  readonly priority: number;
  readonly revision: number;
  readonly state: OrderStateDto;
}

/** A product that orders can name. */
export interface OrderProductDto {
  readonly id: string;
  readonly name: string;
  readonly fillKg: number;
  readonly casePieces: number;
  /** What it is split over; null where `refusal` says why not. */
  readonly route: OrderRoute | null;
  /** Shared limits that its loads use. */
  readonly limits: readonly LoadUseDto[];
  /** Why nothing can be planned of it, and whom to ask; null where it can. */
  readonly refusal: string | null;
}

/** What a retort load takes of a shared limit. */
export interface LoadUseDto {
  readonly name: string;
  readonly unit: string;
  readonly amount: number;
  readonly minutes: number;
}

/** GET /api/orders: those due since 90 days ago, by due time. */
export interface OrdersDto {
  readonly timeZone: string;
  readonly orders: readonly OrderDto[];
  readonly products: readonly OrderProductDto[];
}

/** A saved order. */
export interface SavedOrderDto {
  readonly id: string;
  readonly revision: number;
}

/** What was added to the week, or taken back from it. */
export interface PlannedOrderDto {
  readonly weekStart: string;
  readonly planRevision: number;
  readonly activities: number;
  /** The number of the order that takes what was carried over; null: nothing was. */
  readonly carriedTo: string | null;
}
