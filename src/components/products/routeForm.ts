/** A product's route while it is typed, and the modes that follow. Pure. */
import type { z } from 'zod';
import { routeSchema, type ProductDto, type RouteChoicesDto, type RouteRequest } from '@/contracts/products';
import { workMode } from '@/core/demand/workMode';
import { supplyOf } from '@/core/duty/supply';
import type { LimitUse, Mode } from '@/core/plant/activity';
import { fail, ok, problem, type Result } from '@/core/result';
import type { Blank } from '../ui/form/useZodForm';

export type TypedUnit = Blank<RouteRequest['stages'][number]['units'][number]>;
export type TypedStage = Blank<RouteRequest['stages'][number]>;

/** A unit's row that nobody has filled in. */
export const emptyUnit = (unitId = ''): TypedUnit => ({ unitId, dutyId: null, minutes: 0, leadMin: 0, afterMin: 0 });

/** A stage that nobody has filled in. */
export const emptyStage = (): TypedStage => ({ stage: 'cook', units: [emptyUnit()], uses: [] });

/** What the form starts from. */
export const routeStart = ({ stages, routeRead }: ProductDto): Blank<RouteRequest> => ({
  read: routeRead,
  stages: stages.map(({ stage, units, uses }) => ({
    stage,
    units: units.map(({ unitId, dutyId, minutes, leadMin, afterMin }) => ({
      unitId,
      dutyId,
      minutes,
      leadMin,
      afterMin,
    })),
    uses: uses.map((use) => ({ ...use })),
  })),
});

const whole = (value: unknown): value is number => typeof value === 'number' && Number.isInteger(value) && value >= 0;

/** The mode of a unit's row as typed; refuses with what is missing or can't be worked out. */
export function modeOf(choices: RouteChoicesDto, unit: TypedUnit, uses: readonly LimitUse[] = []): Result<Mode> {
  const place = choices.units.find(({ id }) => id === unit.unitId);
  if (!place) return fail(problem('ROUTE-UNIT', 'Choose a unit.', 'unitId'));
  const { minutes, leadMin, afterMin, dutyId } = unit;
  if (!whole(minutes) || !whole(leadMin) || !whole(afterMin)) {
    return fail(problem('ROUTE-MINUTES', 'Enter whole minutes.', 'minutes'));
  }
  const duty = dutyId === null ? null : choices.duties.find(({ id }) => id === dutyId)?.duty;
  if (duty === undefined) return fail(problem('ROUTE-DUTY', 'Choose a duty.', 'dutyId'));
  const header = choices.headers.find(({ id }) => id === place.headerId);
  const supply = header ? supplyOf(header, choices.altitudeM) : ok(null);
  if (!supply.ok) return supply;
  return workMode({ unitId: place.id, dutyId, duty, supply: supply.value, leadMin, afterMin, minutes, uses });
}

/** The form's schema: what has to be entered, then whether each stage can be worked out on each of its units. */
export function routeFormSchema(choices: RouteChoicesDto): z.ZodType<RouteRequest, RouteRequest> {
  return routeSchema.superRefine(({ stages }, context) => {
    stages.forEach(({ units }, s) =>
      units.forEach((unit, u) => {
        const mode = modeOf(choices, unit);
        if (mode.ok) return;
        const field = ['unitId', 'leadMin', 'afterMin', 'minutes'].find((known) => known === mode.error.field);
        const path = ['stages', s, 'units', u, field ?? 'dutyId'];
        context.addIssue({ code: 'custom', message: mode.error.message, path });
      }),
    );
  });
}
