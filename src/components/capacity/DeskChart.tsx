import { useMemo } from 'react';
import type { CapacityDto } from '@/contracts/capacity';
import type { HeaderJudgement } from '@/core/header/judgement';
import type { HeaderCapacity } from '@/core/plant/plant';
import type { Clock } from '../time';
import { useWidth } from '../ui/useWidth';
import { useUnits } from '../ui/units';
import { Axis } from './Axis';
import { BoilerRow } from './BoilerRow';
import { StoreStrip } from './StoreStrip';
import type { Draft } from './draft';
import { LoadStrip, RateLabels } from './LoadStrip';
import { limitSnap, roundTop, type DeskScale } from './scale';
import { useSpanDrag } from './useSpanDrag';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly dto: CapacityDto;
  readonly headerId: string;
  readonly capacity: HeaderCapacity | undefined;
  /** The same header with the largest boiler out. */
  readonly largestOut: HeaderCapacity | undefined;
  readonly judged: HeaderJudgement;
  /** The day shown; null: the week. */
  readonly day: DayOfWeek | null;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  readonly nowMin: number;
  readonly draft: Draft | null;
  readonly canSet: boolean;
  readonly onDraft: (draft: Draft | null) => void;
}

const STRIP_HEIGHT = 300;
const BOILER_HEIGHT = 52;
const STORE_HEIGHT = 44;

/** Load, limit and boilers on one time axis. */
export function DeskChart(props: Props) {
  const { dto, headerId, capacity, judged, day, days, clock, nowMin, draft, canSet, onDraft } = props;
  const units = useUnits();
  const [ref, width] = useWidth<HTMLDivElement>(720);
  const topKgPerH = useMemo(() => {
    const sent = Math.max(0, ...(capacity?.exportKgPerH ?? []).map((step) => step.value));
    const drawn = judged.carried ? judged.drawnKgPerH.reduce((most, rate) => Math.max(most, rate), 0) : 0;
    return roundTop(Math.max(sent, judged.peak.kgPerH, drawn), units);
  }, [capacity, judged, units]);
  const scale = useMemo<DeskScale>(
    () => ({ from: day?.from ?? 0, to: day?.to ?? dto.horizonMin, width, height: STRIP_HEIGHT, topKgPerH }),
    [day, dto.horizonMin, width, topKgPerH],
  );
  const boilerScale = useMemo<DeskScale>(() => ({ ...scale, height: BOILER_HEIGHT }), [scale]);
  const drag = useSpanDrag(
    { minutes: (scale.to - scale.from) / width, kgPerH: topKgPerH / STRIP_HEIGHT },
    { horizonMin: dto.horizonMin, snapMin: day ? 5 : 15, topKgPerH, snapKgPerH: limitSnap(units) },
    onDraft,
    draft,
  );
  const shared = {
    days,
    clock,
    nowMin,
    horizonMin: dto.horizonMin,
    draft,
    canSet,
    onHold: drag.hold,
    onMove: drag.move,
    onRelease: drag.release,
    onKey: drag.key,
  };
  const boilers = dto.boilers.filter((boiler) => boiler.headerId === headerId);

  return (
    <div className="grid grid-cols-[4.5rem_minmax(0,1fr)] border-y border-rule sm:grid-cols-[9.5rem_minmax(0,1fr)]">
      <div />
      <div ref={ref} className="border-l border-rule">
        <Axis scale={scale} days={days} clock={clock} />
      </div>
      <div className="flex justify-end bg-surface">
        <RateLabels scale={scale} />
      </div>
      <div className="border-l border-rule">
        <LoadStrip
          {...{ scale, capacity, judged }}
          largestOutLimit={props.largestOut?.exportKgPerH ? props.largestOut.limitKgPerH : null}
          {...shared}
        />
      </div>
      {judged.carried ? (
        <>
          <div className="border-t border-rule py-2 pr-2">
            <p className="text-sm leading-4 font-semibold">In store</p>
            <p className="mt-1 text-2xs text-ink-muted max-sm:hidden">up to {units.mass(judged.carried.capacityKg)}</p>
          </div>
          <div className="border-t border-l border-rule">
            <StoreStrip scale={{ ...scale, height: STORE_HEIGHT }} carried={judged.carried} />
          </div>
        </>
      ) : null}
      {boilers.map((boiler) => (
        <div key={boiler.id} className="contents">
          <div className="border-t border-rule py-2 pr-2">
            <a className="text-sm leading-4 font-semibold hover:underline" href={`/working/boiler/${boiler.id}`}>
              {boiler.name}
            </a>
            <p className="mt-1 text-2xs text-ink-muted max-sm:hidden">{units.rate(boiler.netKgPerH)} net</p>
          </div>
          <div className="border-t border-l border-rule">
            <BoilerRow boiler={boiler} scale={boilerScale} {...shared} />
          </div>
        </div>
      ))}
    </div>
  );
}
