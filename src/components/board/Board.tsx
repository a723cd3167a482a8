import { DndContext, DragOverlay } from '@dnd-kit/core';
import { useMemo, useRef, useState } from 'react';
import type { MeDto } from '../../contracts/account';
import type { WeekDto } from '../../contracts/week';
import { Hatch } from '../ui/Hatch';
import { AddClean } from './AddClean';
import { BarActions } from './BarActions';
import { BoardBar } from './BoardBar';
import { BoardRows } from './BoardRows';
import { CarriedChip } from './CarriedChip';
import { IssueDialog } from './IssueDialog';
import { KeyHelp } from './KeyHelp';
import { LevelPanel } from './LevelPanel';
import { Notices } from './Notices';
import { Panel } from './Panel';
import { ReadTrouble } from './ReadTrouble';
import type { PointedAt } from './Pointed';
import { SlipDialog } from './SlipDialog';
import { createStore } from './store';
import { Strips } from './Strips';
import { ticksOf } from './ticks';
import { TimeHead } from './TimeHead';
import { useBoard } from './useBoard';
import { useBoardActions } from './useBoardActions';
import { useBoardKeys } from './useBoardKeys';
import { useCleans } from './useCleans';
import { useHandDrag } from './useHandDrag';
import { weekWords } from './weekWords';

/** dnd-kit's own words are for its own keys; the board has others and says what happens itself. */
const OWN_WORDS = {
  screenReaderInstructions: { draggable: '' },
  announcements: {
    onDragStart: () => undefined,
    onDragOver: () => undefined,
    onDragEnd: () => undefined,
    onDragCancel: () => undefined,
  },
};

interface Props {
  readonly me: MeDto;
  readonly initial: WeekDto;
}

export function Board({ me, initial }: Props) {
  const model = useBoard(me, initial);
  const actions = useBoardActions(model);
  const cleans = useCleans(model, actions);
  const { view, week, clock, carry, dto } = model;
  const { scale, scrollRef, headRef } = view;
  const rowsRef = useRef<HTMLDivElement>(null);
  const [pointed] = useState(() => createStore<PointedAt | null>(null));
  const [issuing, setIssuing] = useState(false);
  const [limitsOpen, setLimitsOpen] = useState(false);
  const [slipping, setSlipping] = useState<string | null>(null);
  const ticks = useMemo(
    () => ticksOf(clock, week.horizonMin, scale.pxPerMin),
    [clock, week.horizonMin, scale.pxPerMin],
  );
  const hand = useHandDrag({
    carry,
    scale,
    activityOf: (id) => dto.week.activities.find((activity) => activity.id === id),
    rowsRef,
    scrollRef,
    headRef,
  });
  const onKeyDown = useBoardKeys({
    carryingByKeys: model.carryingBy === 'keys',
    mayEdit: model.mayEdit,
    snapMinutes: week.plant.rules.snapMinutes,
    go: actions.go,
    select: () => undefined,
    lift: () => actions.lift(actions.selected),
    stepMinutes: (minutes) => actions.sayCarry(carry.stepBy({ minutes })),
    stepUnits: (units) => actions.sayCarry(carry.stepBy({ units })),
    drop: actions.drop,
    cancel: actions.cancel,
    toggleFix: actions.toggleFix,
    takeOff: actions.takeOff,
    undo: actions.undo,
    redo: actions.redo,
    clear: () => actions.setSelectedId(null),
  });

  return (
    <DndContext
      sensors={hand.sensors}
      accessibility={OWN_WORDS}
      autoScroll={{ threshold: { x: 0.06, y: 0.08 } }}
      onDragStart={hand.start}
      onDragEnd={actions.drop}
      onDragCancel={actions.cancel}
    >
      <div className="board flex flex-col" data-testid="board">
        <svg className="absolute size-0" aria-hidden="true">
          <defs>
            <Hatch id="board-hatch-over" />
          </defs>
        </svg>
        <BoardBar
          week={weekWords(dto)}
          clock={clock}
          issue={dto.issue}
          agreedBy={dto.agreement?.by ?? null}
          changedSince={dto.issue !== null && dto.issue.revision !== dto.planRevision}
          zoom={view.zoom}
          onZoom={view.setZoom}
          history={
            model.mayPlan
              ? {
                  canUndo: model.saves.canUndo && model.mayEdit,
                  canRedo: model.saves.canRedo && model.mayEdit,
                  undo: actions.undo,
                  redo: actions.redo,
                }
              : null
          }
        >
          <BarActions
            model={model}
            onSlip={() => setSlipping(week.plant.lines[0]?.id ?? null)}
            onIssue={() => setIssuing(true)}
          />
        </BoardBar>
        <ReadTrouble server={model.server} />
        <div className="board-body">
          <div ref={scrollRef} className="board-scroll" tabIndex={-1}>
            <div style={{ width: `calc(var(--label-w) + ${scale.widthPx}px)` }}>
              <div ref={headRef} className="sticky top-0 z-20">
                <TimeHead
                  {...{ ticks, clock }}
                  shifts={model.shifts}
                  scale={scale}
                  nowMin={model.nowMin}
                  corner={<KeyHelp />}
                />
                <Strips {...{ model, pointed, limitsOpen }} onLimits={() => setLimitsOpen(!limitsOpen)} />
              </div>
              <BoardRows {...{ model, actions, ticks, pointed, rowsRef, onKeyDown }} onSlip={setSlipping} />
            </div>
          </div>
          <aside className="board-panel flex min-h-0 flex-col border-l border-rule bg-surface" aria-label="Week">
            {model.levelling.open ? (
              <LevelPanel {...{ model, actions }} />
            ) : (
              <Panel {...{ model, actions, pointed, limitsOpen, cleans }} />
            )}
          </aside>
        </div>
        <p className="sr-only" aria-live="assertive" data-testid="said">
          {actions.said}
        </p>
        <Notices notices={model.notices} onDismiss={model.dismiss} />
        {issuing ? <IssueDialog model={model} onClose={() => setIssuing(false)} onGo={actions.goTo} /> : null}
        {cleans.asked !== null ? (
          <AddClean
            weekStart={dto.weekStart}
            plant={dto.week.plant}
            unitId={cleans.asked === 'any' ? null : cleans.asked.unitId}
            onClose={cleans.close}
            onAdded={cleans.added}
          />
        ) : null}
        {slipping !== null ? (
          <SlipDialog
            lines={week.plant.lines}
            lineId={slipping}
            week={dto.week}
            clock={clock}
            nowMin={model.nowMin}
            onClose={() => setSlipping(null)}
            onSlip={actions.slip}
          />
        ) : null}
      </div>
      <DragOverlay dropAnimation={null}>
        <CarriedChip carried={carry.store} />
      </DragOverlay>
    </DndContext>
  );
}
