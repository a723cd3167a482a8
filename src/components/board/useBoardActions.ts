import { useCallback, useRef, useState } from 'react';
import type { Activity } from '../../core/plant/activity';
import { fixActivity, moveActivity, slipLine, takeOffActivity } from '../../core/schedule/hand';
import { placeBatch } from '../../core/schedule/placeBatch';
import type { Breach } from '../../core/schedule/breach';
import type { Edit } from '../../core/schedule/edit';
import type { Result } from '../../core/result';
import { drawnOf, type WaitingGroup } from './drawn';
import { neighbourOf, type Direction } from './navigate';
import type { BoardModel } from './useBoard';
import { useLatest } from './useLatest';
import { activityName, placeText, unitName } from './words';
import { verdictOf } from './verdict';
import { isPlanned, type Carry } from './carry';

/** Gives the focus to a block once it is drawn. */
export function focusBlock(id: string): void {
  requestAnimationFrame(() => {
    const block = document.querySelector<HTMLElement>(`.board [data-activity="${CSS.escape(id)}"]`);
    block?.focus({ preventScroll: true });
  });
}

/** What people do on the board, by hand or by keys, and what is said of it. */
export function useBoardActions(model: BoardModel) {
  const [selectedId, setSelectedId] = useState<string | null>(null);
  const [said, setSaid] = useState('');
  const latest = useLatest({ model, selectedId });
  const liftAt = useRef(new Map<string, number>());
  const selected = model.drawn.find((activity) => activity.id === selectedId) ?? null;

  const make = useCallback(
    (edit: Result<Edit>, words: string): boolean => {
      const { saves, tell } = latest.current.model;
      if (!edit.ok) tell({ look: 'over', title: edit.error.message, lines: [] });
      else if (edit.value.changes.length > 0) {
        saves.save(edit.value);
        setSaid(words);
      }
      return edit.ok;
    },
    [latest],
  );

  const show = useCallback(
    (activity: Activity) => {
      const { view, rows } = latest.current.model;
      const drawn = drawnOf(activity);
      if (!drawn) return;
      view.reveal({ from: drawn.start, to: drawn.start + drawn.minutes }, rows.topOfUnit.get(drawn.unitId) ?? null);
    },
    [latest],
  );

  const selectAndShow = useCallback(
    (id: string) => {
      const activity = latest.current.model.drawn.find((a) => a.id === id);
      if (!activity) return;
      setSelectedId(id);
      show(activity);
      focusBlock(id);
    },
    [latest, show],
  );

  /** Selects an activity that is about to be drawn elsewhere. */
  const selectAfter = (id: string): void => {
    setSelectedId(id);
    requestAnimationFrame(() => selectAndShow(id));
  };

  const go = (direction: Direction): void => {
    const next = neighbourOf(model.byUnit, model.rows.unitIds, selectedId ?? '', direction);
    if (next !== null) selectAndShow(next);
  };

  const goTo = useCallback(
    (breach: Breach) => {
      const { view, rows, drawn } = latest.current.model;
      const first = breach.activityIds.map((id) => drawn.find((a) => a.id === id)).find((a) => a?.placement);
      if (first) {
        setSelectedId(first.id);
        focusBlock(first.id);
      }
      const top = first?.placement ? (rows.topOfUnit.get(first.placement.unitId) ?? null) : null;
      view.reveal({ from: breach.from, to: breach.to }, top);
    },
    [latest],
  );

  const firstMinuteFor = ({ id }: Activity): number => liftAt.current.get(id) ?? Math.max(0, model.nowMin);

  const lift = (activity: Activity | null): void => {
    if (!activity || !model.mayEdit) return;
    const at = firstMinuteFor(activity);
    if (!model.carry.lift(activity, 'keys', { atMinute: at })) {
      setSaid(
        isPlanned(activity)
          ? `${activityName(activity)} has started on the floor and stays where it is.`
          : `${activityName(activity)} follows from the sequence on its unit and moves with the runs.`,
      );
      return;
    }
    sayCarry(model.carry.store.get()?.carry ?? null, `Picked up ${activityName(activity)}. `);
  };

  const sayCarry = (carry: Carry | null, before = ''): void => {
    const held = model.carry.store.get();
    if (!carry?.target || !held) return;
    const { target } = carry;
    const { unitId, start } = target;
    const preview = model.evaluator.preview([{ activityId: carry.activity.id, placement: { unitId, start } }]);
    const verdict = verdictOf(carry.activity.id, target, held.fits, preview, model.names, model.clock);
    const words = [placeText(target, model.week.plant, model.clock), verdict.steam, ...verdict.others];
    setSaid(`${before}${words.join(', ')}.`);
    model.view.reveal({ from: target.start, to: target.start + 60 }, model.rows.topOfUnit.get(target.unitId) ?? null);
  };

  const drop = (): void => {
    const held = model.carry.store.get()?.carry;
    const dropped = model.carry.drop();
    if (!held) return;
    setSelectedId(held.activity.id);
    const words = `${activityName(held.activity)} put down: ${placeText(dropped?.placement ?? held.activity.placement, model.week.plant, model.clock)}.`;
    if (dropped) make(moveActivity(model.dto.week, dropped.activity.id, dropped.placement), words);
    else setSaid(stayWords(held));
    focusBlock(held.activity.id);
  };

  const stayWords = ({ activity, target }: Carry): string => {
    if (!target || target.eligible) return `${activityName(activity)} stays where it was.`;
    return `${activityName(activity)} can’t run on ${unitName(model.week.plant, target.unitId)}.`;
  };

  const cancel = (): void => {
    const held = model.carry.store.get()?.carry;
    model.carry.cancel();
    if (!held) return;
    setSaid(`${activityName(held.activity)} is back where it was.`);
    focusBlock(held.activity.id);
  };

  const toggleFix = (): void => {
    if (!selected || !model.mayEdit || !isPlanned(selected) || !selected.placement) return;
    const fixing = selected.fixing === 'fixed' ? 'free' : 'fixed';
    make(fixActivity(model.dto.week, selected.id, fixing), `${activityName(selected)} is ${fixing}.`);
  };

  const takeOff = (): void => {
    if (!selected || !model.mayEdit || !isPlanned(selected) || !selected.placement) return;
    make(takeOffActivity(model.dto.week, selected.id), `${activityName(selected)} is not yet placed.`);
  };

  const slip = (lineId: string, fromMinute: number, byMinutes: number): number => {
    const edit = slipLine(model.dto.week, lineId, fromMinute, byMinutes);
    const name = model.week.plant.lines.find((line) => line.id === lineId)?.name ?? lineId;
    make({ ok: true, value: edit }, `${edit.changes.length} on ${name} moved by ${byMinutes} minutes.`);
    return edit.changes.length;
  };

  const placeAll = (group: WaitingGroup): void => {
    const ids = new Set(group.activities.map((activity) => activity.id));
    const { week } = model.dto;
    const asBatch = week.activities.map((a) => (ids.has(a.id) ? { ...a, batchId: group.key } : a));
    const edit = placeBatch(
      { ...week, activities: asBatch },
      group.key,
      Math.max(...group.activities.map(firstMinuteFor)),
    );
    if (!make(edit, 'Placed where there is room.') || !edit.ok) return;
    const first = edit.value.changes.find((change) => change.after.placement !== null);
    if (!first?.after.placement) return;
    const { unitId, start } = first.after.placement;
    setSelectedId(first.activityId);
    model.view.reveal({ from: start, to: start + 60 }, model.rows.topOfUnit.get(unitId) ?? null);
    setSaid(`Placed from ${unitName(model.week.plant, unitId)} on, ${model.clock.dayTime(start)}.`);
  };

  const stepHistory = (which: 'undo' | 'redo'): void => {
    if (!model.mayEdit) return;
    const edit = model.saves[which]();
    const first = edit?.changes.find((change) => change.after.placement !== null);
    if (first) selectAfter(first.activityId);
    setSaid(
      edit ? `${which === 'undo' ? 'Undone' : 'Made again'}: ${edit.changes.length} changed.` : `Nothing to ${which}.`,
    );
  };

  return {
    selected,
    say: setSaid,
    /** From when a place is looked for, by keys or where there is room, for an activity that waits. */
    liftLater: (id: string, minute: number) => void liftAt.current.set(id, minute),
    selectedId,
    setSelectedId,
    said,
    selectAndShow,
    go,
    goTo,
    lift,
    sayCarry,
    drop,
    cancel,
    toggleFix,
    takeOff,
    slip,
    placeAll,
    undo: () => stepHistory('undo'),
    redo: () => stepHistory('redo'),
  };
}

export type BoardActions = ReturnType<typeof useBoardActions>;
