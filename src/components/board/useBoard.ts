import { useCallback, useMemo, useState } from 'react';
import type { MeDto } from '../../contracts/account';
import type { FloorEventDto, WeekDto } from '../../contracts/week';
import { createEvaluator } from '../../core/pipeline';
import type { Activity } from '../../core/plant/activity';
import { mergeIntervals } from '../../core/time/interval';
import { sayingIn } from '../../core/quantity/saying';
import { breachSentence, namesOf } from '../../core/schedule/sentences';
import { makeClock } from '../time';
import { useUnits } from '../ui/units';
import { breachesByActivity, drawnByUnit, notYetPlaced, waitingGroups } from './drawn';
import { addNotice, type BoardNotice } from './notices';
import { boardPeakKgPerH } from './outline';
import { layOutRows } from './rows';
import { withEdits } from './saving';
import { createStore, useStore } from './store';
import { threadsOf } from './threads';
import { closedSpans, shiftSpells } from './ticks';
import { useCarry, type Carrying } from './useCarry';
import { useFrozen } from './useFrozen';
import { useLevelling } from './useLevelling';
import { useNowMin } from './useNowMin';
import { useSaves } from './useSaves';
import { useStartSpread } from './useStartSpread';
import { useWeek } from './useWeek';
import { useBoardView } from './useBoardView';
import { blockLabel } from './words';

/** All that the board knows and can do, put together once. */
export function useBoard(me: MeDto, initial: WeekDto) {
  const [notices, setNotices] = useState<readonly BoardNotice[]>([]);
  const tell = useCallback((notice: Omit<BoardNotice, 'id'>) => setNotices((now) => addNotice(now, notice)), []);
  const dismiss = useCallback((id: number) => setNotices((now) => now.filter((n) => n.id !== id)), []);

  const server = useWeek(initial);
  const saves = useSaves(initial.weekStart, tell);
  const store = useMemo(() => createStore<Carrying | null>(null), []);
  const carryingBy = useStore(store, (c) => c?.carry.by ?? null);
  const live = useMemo(() => withEdits(server.dto, saves.pending), [server.dto, saves.pending]);
  const dto = useFrozen(live, carryingBy !== null);

  const evaluator = useMemo(() => createEvaluator(dto.week), [dto.week]);
  const levelling = useLevelling({ dto, tell, made: saves.made });
  const shown = useShown(evaluator, dto, levelling.open ? levelling.chosen : []);
  const ground = useGround(dto);
  const firstMinute = ground.nowMin >= 0 && ground.nowMin < dto.week.horizonMin ? ground.nowMin : 720;
  const view = useBoardView(dto.week.horizonMin, firstMinute);
  const spread = useStartSpread({
    personId: me.personId,
    week: dto.week,
    startSpreads: dto.startSpreads,
    carrying: store,
    chosen: shown.chosen,
  });
  const carry = useCarry(store, { week: dto.week, evaluator, rows: ground.rows, scale: view.scale });

  return {
    me,
    server,
    saves,
    dto,
    evaluator,
    levelling,
    carry,
    carryingBy,
    spread,
    view,
    notices,
    tell,
    dismiss,
    ...ground,
    ...shown,
    mayPlan: me.roles.includes('planner'),
    mayAgree: me.roles.includes('utilitiesLead'),
    mayEdit: me.roles.includes('planner') && !shown.isProposal,
  };
}

export type BoardModel = ReturnType<typeof useBoard>;

/** A longer time over the limit is no place to lead the eye to: boilers are shut, or no limit is met at all. */
const LONGEST_BAND_MIN = 240;

type Chosen = ReturnType<typeof useLevelling>['chosen'];

/** The week as drawn: the plan, or a proposal over it. */
function useShown(evaluator: ReturnType<typeof createEvaluator>, dto: WeekDto, chosen: Chosen) {
  const moves = useMemo(() => chosen.map((move) => ({ activityId: move.activityId, placement: move.to })), [chosen]);
  const preview = useMemo(() => (moves.length === 0 ? null : evaluator.preview(moves)), [evaluator, moves]);
  const week = preview?.week ?? dto.week;
  const evaluation = preview?.evaluation ?? evaluator.evaluation;
  const { firstInstant, timeZone } = dto;
  const clock = useMemo(() => makeClock({ firstInstant, timeZone }), [firstInstant, timeZone]);
  const units = useUnits();
  const names = useMemo(() => namesOf(week, sayingIn(units.system)), [week, units]);
  const { drawn } = evaluation;
  const byUnit = useMemo(() => drawnByUnit(drawn), [drawn]);
  const breaches = useMemo(() => breachesByActivity(evaluation.breaches), [evaluation]);
  const labels = useMemo(() => {
    const titles = (activity: Activity): string[] =>
      (breaches.get(activity.id) ?? []).map((breach) => breachSentence(breach, names, clock.dayTime).title);
    return new Map(drawn.map((a) => [a.id, blockLabel(a, week.plant, clock, titles(a), units)]));
  }, [drawn, breaches, names, clock, week.plant, units]);
  const over = useMemo(
    () =>
      mergeIntervals(evaluation.headers.flatMap((h) => [...(h.over?.spans ?? []), ...(h.letdown?.spans ?? [])])).filter(
        (span) => span.to - span.from <= LONGEST_BAND_MIN,
      ),
    [evaluation],
  );
  const waiting = useMemo(() => waitingGroups(notYetPlaced(week.activities), week.links), [week]);
  const isProposal = preview !== null;
  const before = isProposal ? evaluator.evaluation : null;
  return {
    week,
    evaluation,
    before,
    isProposal,
    chosen: moves,
    clock,
    names,
    drawn,
    byUnit,
    breaches,
    labels,
    over,
    waiting,
  };
}

/** What the plant and the calendar give. */
function useGround(dto: WeekDto) {
  const { plant, calendars, horizonMin, activities } = dto.week;
  const rows = useMemo(() => layOutRows(plant), [plant]);
  const peak = useMemo(() => boardPeakKgPerH(activities), [activities]);
  const closed = useMemo(
    () => new Map(calendars.map((calendar) => [calendar.unitId, closedSpans(calendar.open, horizonMin)])),
    [calendars, horizonMin],
  );
  const shifts = useMemo(() => shiftSpells(dto.shifts), [dto.shifts]);
  const events = useMemo(() => {
    const byActivity = new Map<string, FloorEventDto[]>();
    for (const event of dto.floorEvents) {
      byActivity.set(event.activityId, [...(byActivity.get(event.activityId) ?? []), event]);
    }
    return byActivity;
  }, [dto.floorEvents]);
  const nowMin = useNowMin(dto);
  return { rows, peak, closed, shifts, events, nowMin };
}

/** The waits of the selected activity's batch. */
export function useThreads(model: BoardModel, selectedId: string | null) {
  const { week } = model;
  const threads = useMemo(
    () => (selectedId === null ? [] : threadsOf(week.links, week.activities, selectedId)),
    [week, selectedId],
  );
  const kin = useMemo(() => {
    const batchId = week.activities.find((a) => a.id === selectedId)?.batchId;
    const ids = batchId ? week.activities.filter((a) => a.batchId === batchId && a.id !== selectedId) : [];
    const joined = threads.flatMap((thread) => [thread.fromId, thread.toId]).filter((id) => id !== selectedId);
    return new Set([...ids.map((a) => a.id), ...joined]);
  }, [week, selectedId, threads]);
  return { threads, kin };
}
