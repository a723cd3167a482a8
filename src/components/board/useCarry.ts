import { useCallback, useMemo, useRef } from 'react';
import type { Activity, Placement } from '../../core/plant/activity';
import type { Preview, WeekEvaluator } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import { canCarry, carryTo, firstTarget, pickUp, putDown, stepCarry, type Carry, type Pointer } from './carry';
import type { Rows } from './rows';
import type { Store } from './store';
import type { TimeScale } from './timeScale';
import { useLatest } from './useLatest';
import { fitsOf, type Fits } from './verdict';

export interface Carrying {
  readonly carry: Carry;
  readonly fits: Fits;
  /** The week judged with the activity at its target; null until that is worked out. */
  readonly preview: Preview | null;
}

export interface CarryGround {
  readonly week: Week;
  readonly evaluator: WeekEvaluator;
  readonly rows: Rows;
  readonly scale: TimeScale;
}

export interface CarryControl {
  readonly store: Store<Carrying | null>;
  readonly lift: (activity: Activity, by: Carry['by'], options?: { heldAtMin?: number; atMinute?: number }) => boolean;
  readonly moveTo: (pointer: Pointer | null) => void;
  readonly stepBy: (step: Parameters<typeof stepCarry>[1]) => Carry | null;
  /** Puts the activity down; gives where, or null where nothing changes. */
  readonly drop: () => { readonly activity: Activity; readonly placement: Placement } | null;
  readonly cancel: () => void;
}

/** Picking up, carrying and putting down: one activity at a time, judged at most once a frame. */
export function useCarry(store: Store<Carrying | null>, ground: CarryGround): CarryControl {
  const latest = useLatest(ground);
  const frame = useRef(0);

  const show = useCallback(
    (carry: Carry) => {
      const now = store.get();
      if (!now) return;
      const { target } = carry;
      const before = now.carry.target;
      if (before?.unitId === target?.unitId && before?.start === target?.start) return;
      store.set({ ...now, carry });
      cancelAnimationFrame(frame.current);
      frame.current = requestAnimationFrame(() => {
        const held = store.get();
        if (held) store.set({ ...held, preview: previewOf(held.carry, latest.current.evaluator) });
      });
    },
    [store, latest],
  );

  const finish = useCallback(() => {
    cancelAnimationFrame(frame.current);
    store.set(null);
  }, [store]);

  return useMemo(
    (): CarryControl => ({
      store,
      lift: (activity, by, options = {}) => {
        if (!canCarry(activity)) return false;
        const { week, evaluator } = latest.current;
        let carry = pickUp(activity, by, options.heldAtMin);
        if (by === 'keys' && !carry.target) {
          const target = firstTarget(activity, options.atMinute ?? 0, week.plant.rules.snapMinutes, week.horizonMin);
          carry = { ...carry, target };
        }
        store.set({ carry, fits: fitsOf(activity, week, evaluator), preview: previewOf(carry, evaluator) });
        return true;
      },
      moveTo: (pointer) => {
        const now = store.get();
        if (!now) return;
        const { rows, scale, week } = latest.current;
        show(
          pointer
            ? carryTo(now.carry, pointer, rows, scale, week.plant.rules.snapMinutes)
            : { ...now.carry, target: null },
        );
      },
      stepBy: (step) => {
        const now = store.get();
        if (!now) return null;
        const carry = stepCarry(now.carry, step, latest.current.rows, latest.current.week.horizonMin);
        show(carry);
        return carry;
      },
      drop: () => {
        const now = store.get();
        finish();
        const placement = now && putDown(now.carry);
        return placement ? { activity: now.carry.activity, placement } : null;
      },
      cancel: finish,
    }),
    [store, show, finish, latest],
  );
}

function previewOf(carry: Carry, evaluator: WeekEvaluator): Preview {
  const { target, activity } = carry;
  const placement = target?.eligible ? { unitId: target.unitId, start: target.start } : null;
  return evaluator.preview([{ activityId: activity.id, placement }]);
}
