import { useMemo } from 'react';
import { whoDraws } from '../../core/header/whoDraws';
import type { WeekEvaluation } from '../../core/pipeline';
import { valueAt } from '../../core/time/stepFunction';
import type { Week } from '../../core/schedule/week';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import { CarriedLine, ChanceCard, ChanceLine, LimitCard } from './PointedCards';
import { useStore, type Store } from './store';
import { xOf, type TimeScale } from './timeScale';
import type { SpreadControl } from './useStartSpread';
import { unitName } from './words';

/** A minute pointed at: on a header's load, on its row of chances, or on a shared limit. */
export interface PointedAt {
  readonly kind: 'header' | 'chance' | 'limit';
  /** The header's or the limit's id. */
  readonly id: string;
  readonly minute: number;
}

interface Props {
  readonly pointed: Store<PointedAt | null>;
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly scale: TimeScale;
  readonly clock: Clock;
  readonly spread: SpreadControl;
}

const SHOWN = 9;

/** A hair line at the pointed minute, and who draws or uses what at it. */
export function Pointed({ pointed, week, evaluation, scale, clock, spread }: Props) {
  const at = useStore(pointed, (p) => p);
  if (!at) return null;
  const x = xOf(scale, at.minute);
  const leftwards = x > scale.widthPx - 320;
  return (
    <div className="pointer-events-none absolute top-0 left-(--label-w) z-[7] h-full">
      <div className="absolute top-0 h-full w-px bg-ink" style={{ left: x }} />
      <div
        className="float absolute top-2 w-76 px-3 py-2"
        style={leftwards ? { left: x - 10, transform: 'translateX(-100%)' } : { left: x + 10 }}
        data-testid="who-draws"
      >
        {at.kind === 'header' ? <WhoDraws {...{ at, week, evaluation, clock, spread }} /> : null}
        {at.kind === 'chance' ? <ChanceCard {...{ at, evaluation, clock, spread }} /> : null}
        {at.kind === 'limit' ? <LimitCard {...{ at, week, evaluation, clock }} /> : null}
      </div>
    </div>
  );
}

interface WhoProps extends Pick<Props, 'week' | 'evaluation' | 'clock' | 'spread'> {
  readonly at: PointedAt;
}

function WhoDraws({ at, week, evaluation, clock, spread }: WhoProps) {
  const { drawn } = evaluation;
  const units = useUnits();
  const header = evaluation.headers.find((h) => h.headerId === at.id);
  const shares = useMemo(
    () => whoDraws({ plant: week.plant, activities: drawn }, at.id, at.minute),
    [week.plant, drawn, at.id, at.minute],
  );
  const byId = useMemo(() => new Map(drawn.map((activity) => [activity.id, activity])), [drawn]);
  const base = week.capacities.find((c) => c.headerId === at.id)?.baseLoadKgPerH;
  const baseKgPerH = base ? valueAt(base, at.minute) : 0;
  const rest = shares.slice(SHOWN);
  return (
    <>
      <p className="flex justify-between gap-3 text-sm font-semibold">
        <span>{clock.dayTime(at.minute)}</span>
        <span>{units.rate(header?.loadKgPerH[at.minute] ?? 0)}</span>
      </p>
      <LimitLine load={header?.loadKgPerH[at.minute] ?? 0} limit={header?.limitKgPerH?.[at.minute] ?? null} />
      {header?.carried ? <CarriedLine carried={header.carried} minute={at.minute} /> : null}
      {spread.on ? <ChanceLine {...{ at, spread }} /> : null}
      <ul className="mt-1.5 border-t border-rule pt-1.5 text-2xs leading-[17px]">
        {shares.slice(0, SHOWN).map((share) => (
          <li key={share.activityId} className="flex gap-2">
            <span className="w-17 shrink-0 truncate text-ink-muted">{unitName(week.plant, share.unitId)}</span>
            <span className="min-w-0 flex-1 truncate">{byId.get(share.activityId)?.title}</span>
            <span>{units.number('steamRate', share.kgPerH)}</span>
          </li>
        ))}
        {rest.length > 0 ? (
          <Sum words={`${rest.length} more`} kgPerH={rest.reduce((sum, share) => sum + share.kgPerH, 0)} />
        ) : null}
        {baseKgPerH > 0 ? <Sum words="Base load and losses" kgPerH={baseKgPerH} /> : null}
        {shares.length === 0 && baseKgPerH === 0 ? <li className="text-ink-muted">Nothing draws steam.</li> : null}
      </ul>
    </>
  );
}

function Sum({ words, kgPerH }: { readonly words: string; readonly kgPerH: number }) {
  const units = useUnits();
  return (
    <li className="flex justify-between gap-2 text-ink-muted">
      <span>{words}</span>
      <span>{units.number('steamRate', kgPerH)}</span>
    </li>
  );
}

function LimitLine({ load, limit }: { readonly load: number; readonly limit: number | null }) {
  const units = useUnits();
  if (limit === null || limit >= 1e9) return <p className="text-xs text-ink-muted">not judged: no limit is set</p>;
  const over = load - limit;
  return (
    <p className="flex justify-between gap-3 text-xs">
      <span className="text-ink-muted">limit {units.rate(limit)}</span>
      {over > 1e-3 ? (
        <span className="font-medium text-over">{units.rate(over)} over</span>
      ) : (
        <span className="font-medium text-room">{units.rate(-over)} to spare</span>
      )}
    </p>
  );
}
