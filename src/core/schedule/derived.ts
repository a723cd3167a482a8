import type { Activity, LimitUse, Phase } from '../plant/activity';

/** What is drawn for a run without being planned by anybody. */
export interface Derived {
  readonly id: string;
  readonly kind: 'cleaning' | 'idle' | 'warmUp';
  /** The run it belongs to, for its code. */
  readonly run: Activity;
  readonly title: string;
  readonly unitId: string;
  readonly start: number;
  readonly minutes: number;
  readonly phases: readonly Phase[];
  readonly uses: readonly LimitUse[];
  readonly dutyId: string | null;
}

/** An activity that follows from the sequence on a unit; it is never stored and has no time of its own to keep. */
export function derivedActivity(derived: Derived): Activity {
  const { id, kind, run, title, unitId, start, minutes, phases, uses, dutyId } = derived;
  return {
    id,
    kind,
    stage: null,
    batchId: null,
    code: run.code,
    title,
    productId: null,
    familyId: null,
    modes: [{ unitId, minutes, phases, uses, dutyId }],
    placement: { unitId, start },
    fixing: 'free',
    occupiesUntil: 'end',
    earliestStart: 0,
    latestStart: null,
    due: null,
    weight: 1,
    processData: null,
    revision: 0,
  };
}

/** True for what follows from the sequence on a unit; what is stored has an id of its own. */
export function isDerived({ id }: Pick<Activity, 'id'>): boolean {
  return /^(clean|idle|warm):/.test(id);
}
