import type { ShiftRowDto } from '@/contracts/floor';
import { phasesPeakKgPerH } from '@/core/demand/activityLoad';
import { drawnMode } from '@/core/plant/activity';
import type { FloorEventKind } from '@/core/shift/floorEvent';
import { Button } from '../ui/Button';
import type { Clock } from '../time';
import { OutlineTime } from './OutlineTime';
import { dueText, eventName, happenedText, rowState, type RowEvent } from './rows';

interface Props {
  readonly row: ShiftRowDto;
  readonly clock: Clock;
  readonly nowMin: number;
  readonly topKgPerH: number;
  /** In hand: the whole card with its action; to come: without the action. */
  readonly inHand: boolean;
  readonly canRecord: boolean;
  readonly busy: boolean;
  readonly failure: string | null;
  readonly onRecord: (event: FloorEventKind) => void;
}

/** A batch on its unit: where, what, what happens next, and one large action. */
export function ShiftCard(props: Props) {
  const { row, clock, nowMin, topKgPerH, inHand, canRecord } = props;
  const state = rowState(row);
  const { next } = state;
  const late = next !== null && nowMin > next.plannedMin;
  return (
    <li
      className={`overflow-hidden rounded-md border bg-surface ${state.begun ? 'border-steam' : 'border-rule'}`}
      aria-label={`${row.unitName}, ${row.activity.code}`}
    >
      <header className="flex items-baseline justify-between gap-3 px-4 pt-3">
        <h3 className="text-xl">{row.unitName}</h3>
        <p className={`text-lg whitespace-nowrap ${late ? 'font-semibold text-over' : 'text-ink-muted'}`}>
          {next ? dueText(next.plannedMin, nowMin) : ''}
        </p>
      </header>
      <p className="px-4 text-lg">
        <span className="font-semibold">{row.activity.code}</span> {row.activity.title}
      </p>
      <WaitLine {...{ row, clock, nowMin }} begun={state.begun} />
      <div className="mt-3 px-4">
        {drawsSteam(row) ? <OutlineTime row={row} events={state.events} nowMin={nowMin} topKgPerH={topKgPerH} /> : null}
      </div>
      <ol className="grid auto-cols-fr grid-flow-col px-2 pt-1 pb-3">
        {state.events.map((event) => (
          <EventCell key={event.kind} event={event} row={row} clock={clock} isNext={event === next} />
        ))}
      </ol>
      {inHand && canRecord && next ? (
        <div className="px-3 pb-3">
          <Button look="main" size="floor" busy={props.busy} onClick={() => props.onRecord(next.kind)}>
            {eventName(next.kind, row.activity.stage)}
          </Button>
          <p role="alert" className="text-md text-over empty:hidden [&:not(:empty)]:mt-2">
            {props.failure}
          </p>
        </div>
      ) : null}
    </li>
  );
}

const drawsSteam = ({ activity }: ShiftRowDto): boolean => phasesPeakKgPerH(drawnMode(activity)?.phases ?? []) > 0;

/** 'Steam on by 07:00: 120 min since closing of the first can', until steam is on. */
function WaitLine(props: { row: ShiftRowDto; clock: Clock; nowMin: number; begun: boolean }) {
  const { row, clock, nowMin, begun } = props;
  const by = row.steamOnBy;
  if (!by || begun) return null;
  const passed = nowMin > by.minute;
  const why =
    by.rule === 'sinceClosing'
      ? `${by.greatestMin} min since closing of the first can`
      : `${by.greatestMin} min from closing, for the initial temperature`;
  return (
    <p className={`mt-2 flex gap-2.5 px-4 text-md ${passed ? 'text-over' : ''}`}>
      <span className={`w-1 shrink-0 rounded-sm ${passed ? 'hatch-over' : 'bg-edge'}`} aria-hidden="true" />
      <span>
        <strong className="font-semibold">Steam on by {clock.time(by.minute)}</strong>: {why}
        {passed ? '. Passed: ask the quality lead before steam on.' : ''}
      </span>
    </p>
  );
}

const SHORT: Partial<Record<FloorEventKind, string>> = { timingStarted: 'timing started' };

interface CellProps {
  readonly event: RowEvent;
  readonly row: ShiftRowDto;
  readonly clock: Clock;
  readonly isNext: boolean;
}

function EventCell({ event, row, clock, isNext }: CellProps) {
  const name = SHORT[event.kind] ?? eventName(event.kind, row.activity.stage).toLowerCase();
  const happened = event.happenedMin !== null;
  return (
    <li
      className={`min-w-0 border-t-[3px] px-2 pt-1.5 ${isNext ? 'border-steam' : happened ? 'border-ink' : 'border-rule'}`}
    >
      <p className={`text-md tabular-nums ${happened || isNext ? 'font-semibold' : 'text-ink-muted'}`}>
        {clock.time(event.happenedMin ?? event.plannedMin)}
      </p>
      <p className="text-xs leading-4 text-ink-muted">
        {name}
        {event.happenedMin !== null ? (
          <span className="block">{happenedText(event.plannedMin, event.happenedMin)}</span>
        ) : null}
      </p>
    </li>
  );
}
