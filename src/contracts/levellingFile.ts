import { z } from 'zod';
import { PROBLEM_VERSION, type Problem } from '../core/levelling/problem';
import { admitPlan, admitProblem } from '../core/levelling/problemDoor';
import type { Plan } from '../core/levelling/problem';
import { PHASE_KINDS } from './dutyInputs';
import { fail, problem as fault, type Problem as Fault, type Result } from '../core/result';

/**
 * The file form of a levelling problem and of a plan for it, version 1: UTF-8 JSON. Times are whole minutes since the
 * week's first instant, steam is in kg/h. tests/support/files/levellingProblem.json is an example.
 */
const id = z.string().min(1).max(120);
const minute = z.int().min(-20_160).max(40_320);
const length = z.int().min(0).max(40_320);
const amount = z.number().min(-1e9).max(1e13);

const step = z.strictObject({ from: minute, value: amount });
const stepFunction = z
  .array(step)
  .refine((steps) => steps.every((s, i) => i === 0 || s.from > (steps[i - 1]?.from ?? 0)), {
    message: 'Steps must ascend in “from”, each minute once.',
  });
const phase = z.enum(PHASE_KINDS);
const use = z.strictObject({
  resourceId: id,
  offsetMin: minute,
  minutes: length,
  amount: z.number().min(0).max(1e9),
  phase: phase.nullable(),
});
const linkEnd = z.strictObject({ activityId: id, anchor: z.enum(['start', 'end']), offsetMin: minute });

const uses = z.array(use).max(200);
const mode = z.strictObject({
  unitId: id,
  minutes: length,
  uses,
  warm: z
    .array(z.strictObject({ gapUpToMin: length, uses }))
    .max(20)
    .refine((classes) => classes.every((c, i) => i === 0 || c.gapUpToMin > (classes[i - 1]?.gapUpToMin ?? 0)), {
      message: 'Classes of gaps must ascend in “gapUpToMin”.',
    })
    .optional(),
  before: z
    .strictObject({
      idle: z.array(z.strictObject({ resourceId: id, amount: z.number().min(0).max(1e9) })).max(20),
      idleUpToMin: length,
      warmUp: uses,
    })
    .optional(),
});

const activity = z.strictObject({
  id,
  batchId: id,
  familyId: id.nullable(),
  isCleaning: z.boolean().optional(),
  modes: z.array(mode).min(1),
  plan: z.strictObject({ unitId: id, start: minute }),
  movable: z.boolean(),
  takenOffBy: id.nullable(),
  cleanAfterMin: length,
  earliestStart: minute,
  latestStart: minute,
  due: minute.nullable(),
  weight: z.number().min(0).max(1e6),
});

const link = z.strictObject({
  id,
  from: linkEnd,
  to: linkEnd,
  leastMin: minute,
  greatestMin: minute.nullable(),
  processGreatestMin: minute.nullable(),
});

/** A levelling problem as a file holds it. */
export const problemFileSchema = z.strictObject({
  version: z.literal(PROBLEM_VERSION),
  horizonMin: z.int().min(1).max(20_160),
  units: z.array(z.strictObject({ id, open: z.array(z.strictObject({ from: minute, to: minute })) })),
  cleaning: z.array(
    z.strictObject({
      unitIds: z.array(id),
      fromFamilyId: id,
      toFamilyId: id,
      minutes: length,
      uses,
    }),
  ),
  resources: z.array(
    z.strictObject({
      id,
      class: z.enum(['steam', 'process', 'shared']),
      sourceId: id,
      capacity: stepFunction,
      baseLoad: stepFunction,
    }),
  ),
  activities: z.array(activity).max(5_000),
  links: z.array(link).max(20_000),
  prices: z.strictObject({
    batchMoved: z.number().min(0),
    minuteMoved: z.number().min(0),
    unitChanged: z.number().min(0),
  }),
}) satisfies z.ZodType<Problem>;

/** A plan for a problem as a file holds it; what else is in the file is passed over. */
export const planFileSchema = z.object({
  version: z.literal(PROBLEM_VERSION),
  activities: z.array(z.object({ id, unitId: id, start: minute })).max(5_000),
});

/** A problem out of a file's text, or every fault with its place. */
export function readProblemFile(text: string): Result<Problem, readonly Fault[]> {
  const parsed = parse(problemFileSchema, text);
  return parsed.ok ? admitProblem(parsed.value) : parsed;
}

/** A plan for a problem out of a file's text, or every fault with its place. */
export function readPlanFile(problem: Problem, text: string): Result<Plan, readonly Fault[]> {
  const parsed = parse(planFileSchema, text);
  return parsed.ok ? admitPlan(problem, parsed.value) : parsed;
}

function parse<T>(schema: z.ZodType<T>, text: string): Result<T, readonly Fault[]> {
  let given: unknown;
  try {
    given = JSON.parse(text);
  } catch (error) {
    const why = error instanceof Error ? error.message : 'not readable';
    return fail([fault('FILE-JSON', `The file is no JSON: ${why}.`)]);
  }
  const parsed = schema.safeParse(given);
  if (parsed.success) return { ok: true, value: parsed.data };
  return fail(parsed.error.issues.map((issue) => fault('FILE-FORM', issue.message, issue.path.join('.'))));
}
