import { useMemo } from 'react';
import type { Carried } from '../../core/header/carry';
import type { WeekEvaluation } from '../../core/pipeline';
import { usesByLimit, whoUses } from '../../core/schedule/limitUse';
import type { Week } from '../../core/schedule/week';
import { valueAt } from '../../core/time/stepFunction';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import { errorText, percentText } from './chance';
import { UserList } from './LimitTable';
import { amountText } from './limits';
import type { PointedAt } from './Pointed';
import { SAMPLES } from './spreadDesk';
import { useStore } from './store';
import type { SpreadControl } from './useStartSpread';

interface AtProps {
  readonly at: PointedAt;
  readonly spread: SpreadControl;
}

const useSpreadAt = ({ at, spread }: AtProps) => useStore(spread.store, (s) => s?.byHeader[at.id]) ?? null;

/** The chance of going over at the pointed minute, beside who draws. */
export function ChanceLine(props: AtProps) {
  const chance = useSpreadAt(props)?.overChance?.[props.at.minute];
  if (chance === undefined) return null;
  const tooMuch = chance > 1 - props.spread.confidence;
  return (
    <p className="flex justify-between gap-3 text-xs">
      <span className="text-ink-muted">chance of going over</span>
      <span className={`font-medium ${tooMuch ? 'text-over' : ''}`}>{percentText(chance)}</span>
    </p>
  );
}

/** The pointed minute under early and late starts, and how it was found. */
export function ChanceCard({ evaluation, clock, ...props }: AtProps & { evaluation: WeekEvaluation; clock: Clock }) {
  const units = useUnits();
  const { at, spread } = props;
  const found = useSpreadAt(props);
  const header = evaluation.headers.find((one) => one.headerId === at.id);
  const chance = found?.overChance?.[at.minute];
  if (!found || chance === undefined) return null;
  const helped = header?.carried || header?.flashKgPerH;
  return (
    <>
      <p className="flex justify-between gap-3 text-sm font-semibold">
        <span>{clock.dayTime(at.minute)}</span>
        <span>
          {percentText(chance)} <span className="font-normal text-ink-muted">{errorText(chance, SAMPLES)}</span>
        </span>
      </p>
      <dl className="mt-1 grid grid-cols-[1fr_auto] gap-x-3 text-xs">
        <Fact name="limit" value={units.rate(header?.limitKgPerH?.[at.minute] ?? 0)} />
        <Fact name="as planned" value={units.rate(header?.drawnKgPerH[at.minute] ?? 0)} />
        <Fact name="on average" value={units.rate(found.expectedKgPerH[at.minute] ?? 0)} />
        <Fact
          name={`not passed in ${percentText(spread.confidence)} of weeks`}
          value={units.rate(found.confidentKgPerH[at.minute] ?? 0)}
        />
        <Fact name="over at any minute of the week" value={percentText(found.anyOverChance ?? 0)} />
      </dl>
      <p className="mt-1.5 border-t border-rule pt-1.5 text-2xs leading-4 text-ink-muted">
        Found by sampling {SAMPLES} weeks. Every batch is early or late by its units’ spread and keeps its random
        numbers when it is moved, so that what changes is the move and not luck; ± is one standard error. What has
        started on the floor stays where it is.
        {helped ? ' Flash steam and accumulators are left out: with them it is less.' : ''}
      </p>
    </>
  );
}

function Fact({ name, value }: { readonly name: string; readonly value: string }) {
  return (
    <>
      <dt className="text-ink-muted">{name}</dt>
      <dd className="text-right">{value}</dd>
    </>
  );
}

/** What accumulators carry at the pointed minute. */
export function CarriedLine({ carried, minute }: { readonly carried: Carried; readonly minute: number }) {
  const units = useUnits();
  const discharge = carried.dischargeKgPerH[minute] ?? 0;
  const charge = carried.chargeKgPerH[minute] ?? 0;
  const doing =
    discharge > 0 ? `carries ${units.rate(discharge)}` : charge > 0 ? `takes ${units.rate(charge)}` : 'stands by';
  return (
    <p className="flex justify-between gap-3 text-xs">
      <span className="text-ink-muted">accumulator, {units.mass(carried.storeKg[minute] ?? 0)} in store</span>
      <span className="font-medium whitespace-nowrap">{doing}</span>
    </p>
  );
}

interface LimitProps {
  readonly at: PointedAt;
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly clock: Clock;
}

/** Who uses a shared limit at the pointed minute. */
export function LimitCard({ at, week, evaluation, clock }: LimitProps) {
  const { drawn } = evaluation;
  const uses = useMemo(() => usesByLimit(drawn), [drawn]);
  const byId = useMemo(() => new Map(drawn.map((activity) => [activity.id, activity])), [drawn]);
  const limit = week.plant.sharedLimits.find(({ id }) => id === at.id);
  if (!limit) return null;
  const shares = whoUses(uses.get(limit.id) ?? [], at.minute);
  const used = shares.reduce((sum, { amount }) => sum + amount, 0);
  const there = valueAt(limit.capacity, at.minute);
  return (
    <>
      <p className="flex justify-between gap-3 text-sm font-semibold">
        <span>{clock.dayTime(at.minute)}</span>
        <span className={used > there + 1e-9 ? 'text-over' : ''}>
          {amountText(used)} of {amountText(there)} {limit.unit}
        </span>
      </p>
      <p className="text-xs text-ink-muted">{limit.name}</p>
      <div className="mt-1.5 border-t border-rule pt-1.5">
        <UserList {...{ shares, byId, week }} />
      </div>
    </>
  );
}
