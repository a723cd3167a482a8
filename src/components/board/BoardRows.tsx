import {
  useCallback,
  useEffect,
  useMemo,
  useRef,
  useState,
  type FocusEvent,
  type KeyboardEvent,
  type PointerEvent,
  type RefObject,
} from 'react';
import { Backdrop } from './Backdrop';
import { CarryLayer } from './CarryLayer';
import { Ghosts } from './Ghosts';
import { HoverCard } from './HoverCard';
import { Pointed, type PointedAt } from './Pointed';
import { createStore, useStore, type Store } from './store';
import { Threads } from './Threads';
import type { Tick } from './ticks';
import { UnitRow, type RowShare } from './UnitRow';
import { useThreads, type BoardModel } from './useBoard';
import { focusBlock, type BoardActions } from './useBoardActions';

interface Props {
  readonly model: BoardModel;
  readonly actions: BoardActions;
  readonly ticks: readonly Tick[];
  readonly pointed: Store<PointedAt | null>;
  readonly rowsRef: RefObject<HTMLDivElement | null>;
  readonly onKeyDown: (event: KeyboardEvent) => void;
  readonly onSlip: (lineId: string) => void;
}

const NONE: readonly never[] = [];
const HOVER_MS = 160;

const activityIdOf = (target: EventTarget): string | null =>
  target instanceof Element ? (target.closest<HTMLElement>('.batch')?.dataset.activity ?? null) : null;

/** The units and what they do, with all that lies behind and above the blocks. */
export function BoardRows({ model, actions, ticks, pointed, rowsRef, onKeyDown, onSlip }: Props) {
  const { rows, view, week, evaluation, clock } = model;
  const { scale } = view;
  const { selectedId, setSelectedId } = actions;
  const { threads, kin } = useThreads(model, selectedId);
  const carriedId = useStore(model.carry.store, (c) => c?.carry.activity.id ?? null);
  const [hovered] = useState(() => createStore<string | null>(null));
  const timer = useRef(0);
  const first = useMemo(
    () => rows.unitIds.flatMap((id) => model.byUnit.get(id) ?? [])[0]?.activity.id,
    [rows, model.byUnit],
  );
  const focusId =
    selectedId !== null && model.drawn.some((a) => a.id === selectedId && a.placement) ? selectedId : (first ?? null);

  const share = useMemo(
    (): RowShare => ({
      pxPerMin: scale.pxPerMin,
      peak: model.peak,
      breaches: model.breaches,
      events: model.events,
      labelOf: (drawn) => model.labels.get(drawn.activity.id) ?? drawn.activity.title,
      selectedId,
      kin,
      focusId,
      carriedId,
      readOnly: !model.mayEdit,
    }),
    [
      scale.pxPerMin,
      model.peak,
      model.breaches,
      model.events,
      model.labels,
      selectedId,
      kin,
      focusId,
      carriedId,
      model.mayEdit,
    ],
  );

  const keepsFocus = useRef(false);
  // A block that goes to another unit is drawn anew, and the browser drops the focus with the old one.
  useEffect(() => {
    if (keepsFocus.current && selectedId !== null && document.activeElement === document.body) focusBlock(selectedId);
  }, [model.byUnit, selectedId]);

  const onFocus = useCallback(
    (event: FocusEvent) => {
      const id = activityIdOf(event.target);
      if (id === null) return;
      keepsFocus.current = true;
      setSelectedId(id);
      if (event.target.matches(':focus-visible')) hovered.set(id);
    },
    [setSelectedId, hovered],
  );
  const onOver = useCallback(
    (event: PointerEvent) => {
      const id = event.buttons === 0 && event.pointerType === 'mouse' ? activityIdOf(event.target) : null;
      window.clearTimeout(timer.current);
      if (id === null) hovered.set(null);
      else timer.current = window.setTimeout(() => hovered.set(id), HOVER_MS);
    },
    [hovered],
  );
  const hide = useCallback(() => {
    window.clearTimeout(timer.current);
    hovered.set(null);
  }, [hovered]);

  return (
    <div
      ref={rowsRef}
      className="relative"
      style={{ height: rows.heightPx }}
      onKeyDown={onKeyDown}
      onFocus={onFocus}
      onBlur={(event) => {
        if (event.relatedTarget !== null) keepsFocus.current = false;
        hide();
      }}
      onPointerOver={onOver}
      onPointerLeave={hide}
      onPointerDown={hide}
      data-testid="rows"
    >
      <Backdrop {...{ rows, scale, ticks, over: model.over, closed: model.closed, nowMin: model.nowMin }} />
      {rows.rows.map((row) =>
        row.kind === 'line' ? (
          <div key={row.line.id} className="absolute left-0 flex" style={{ top: row.top, height: row.height }}>
            <LineName name={row.line.name} onSlip={model.mayEdit ? () => onSlip(row.line.id) : null} />
            <div className="board-track border-b border-rule" style={{ width: scale.widthPx }} />
          </div>
        ) : (
          <UnitRow
            key={row.unit.id}
            unit={row.unit}
            top={row.top}
            height={row.height}
            drawn={model.byUnit.get(row.unit.id) ?? NONE}
            widthPx={scale.widthPx}
            share={share}
          />
        ),
      )}
      <Ghosts
        moves={model.isProposal ? model.levelling.chosen : NONE}
        week={model.dto.week}
        rows={rows}
        scale={scale}
      />
      <Threads {...{ threads, rows, scale }} />
      <CarryLayer
        {...{ rows, scale, clock }}

        carried={model.carry.store}
        peak={model.peak}
        names={model.names}
      />
      <Pointed {...{ pointed, week, evaluation, scale, clock }} spread={model.spread} />
      {carriedId === null ? (
        <HoverCard
          {...{ hovered, rows, scale, clock, week, evaluation }}
          drawn={model.drawn}
          breaches={model.breaches}
          names={model.names}
        />
      ) : null}
    </div>
  );
}

function LineName({ name, onSlip }: { readonly name: string; readonly onSlip: (() => void) | null }) {
  return (
    <div className="board-label group flex items-end border-b border-b-rule pb-1 pl-4 max-sm:pl-2">
      <span className="truncate text-xs font-semibold text-ink-muted">{name}</span>
      {onSlip ? (
        <button
          type="button"
          onClick={onSlip}
          aria-label={`Slip ${name}`}
          className="absolute right-1 bottom-0.5 rounded-sm bg-paper px-1.5 text-2xs text-ink-muted opacity-0 group-hover:opacity-100 hover:text-ink focus-visible:opacity-100 max-sm:hidden"
        >
          Slip…
        </button>
      ) : null}
    </div>
  );
}
