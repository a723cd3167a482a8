import { useMemo } from 'react';
import type { Activity } from '../../core/plant/activity';
import type { WeekEvaluation } from '../../core/pipeline';
import { whoUses } from '../../core/schedule/limitUse';
import type { Week } from '../../core/schedule/week';
import { valueAt } from '../../core/time/stepFunction';
import type { Clock } from '../time';
import { amountText, shownLimits, type ShownLimit } from './limits';
import type { PointedAt } from './Pointed';
import { useStore, type Store } from './store';
import { unitName } from './words';

interface Props {
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  readonly clock: Clock;
  readonly pointed: Store<PointedAt | null>;
  readonly onGo: (minute: number) => void;
}

/** The limits that units share: what there is, the most that is used, and who uses it at the pointed minute. */
export function LimitTable({ week, evaluation, clock, pointed, onGo }: Props) {
  const at = useStore(pointed, (p) => p?.minute ?? null);
  const limits = useMemo(
    () => shownLimits(week.plant.sharedLimits, evaluation.drawn, week.horizonMin),
    [week, evaluation],
  );
  const byId = useMemo(() => new Map(evaluation.drawn.map((activity) => [activity.id, activity])), [evaluation]);
  return (
    <section aria-labelledby="shared-limits">
      <h2 id="shared-limits" className="text-base font-semibold">
        Shared limits
      </h2>
      <table className="mt-2 w-full text-xs" data-testid="limit-table">
        <thead>
          <tr className="label text-left [&>th]:py-1 [&>th]:font-medium [&>th]:whitespace-nowrap">
            <th scope="col">Limit</th>
            <th scope="col" className="pl-2 text-right">
              there is
            </th>
            <th scope="col" className="pl-2 text-right">
              most used
            </th>
            <th scope="col" className="pl-2">
              at
            </th>
          </tr>
        </thead>
        <tbody className="divide-y divide-rule border-y border-rule">
          {limits.map((one) => (
            <LimitLine key={one.limit.id} shown={one} {...{ clock, onGo }} />
          ))}
        </tbody>
      </table>
      <div className="mt-2 min-h-16 text-xs">
        {at === null ? (
          <p className="text-ink-muted">Point at a minute of a strip to see who uses what there.</p>
        ) : (
          limits.map((one) => <Users key={one.limit.id} shown={one} minute={at} {...{ byId, week, clock }} />)
        )}
      </div>
    </section>
  );
}

function LimitLine({ shown, clock, onGo }: { shown: ShownLimit } & Pick<Props, 'clock' | 'onGo'>) {
  const { limit, usage } = shown;
  const { greatest, over } = usage;
  return (
    <tr className="[&>*]:py-1.5">
      <th scope="row" className="text-left font-medium">
        {limit.name}
        <span className="block font-normal text-ink-muted">{limit.unit}</span>
      </th>
      <td className="text-right">{thereIs(shown)}</td>
      <td className={`text-right font-medium ${over.length > 0 ? 'text-over' : ''}`}>
        {greatest ? amountText(greatest.amount) : '–'}
      </td>
      <td className="pl-2 whitespace-nowrap">
        {greatest ? (
          <button type="button" className="link" onClick={() => onGo(greatest.minute)}>
            {clock.dayTime(greatest.minute)}
          </button>
        ) : (
          ''
        )}
      </td>
    </tr>
  );
}

/** What there is: one figure, or the least and the most of a limit that changes by the hour. */
function thereIs({ limit }: ShownLimit): string {
  const values = limit.capacity.map((step) => step.value);
  if (valueAt(limit.capacity, 0) === 0) values.push(0);
  const [least, most] = [Math.min(...values), Math.max(...values)];
  return least === most ? amountText(most) : `${amountText(least)} to ${amountText(most)}`;
}

interface UsersProps extends Pick<Props, 'week' | 'clock'> {
  readonly shown: ShownLimit;
  readonly minute: number;
  readonly byId: ReadonlyMap<string, Activity>;
}

function Users({ shown, minute, byId, week, clock }: UsersProps) {
  const shares = whoUses(shown.uses, minute);
  const used = shares.reduce((sum, { amount }) => sum + amount, 0);
  return (
    <div className="mt-1.5">
      <p className="flex justify-between gap-2 font-medium">
        <span>
          {shown.limit.name}, {clock.dayTime(minute)}
        </span>
        <span>
          {amountText(used)} of {amountText(valueAt(shown.limit.capacity, minute))}
        </span>
      </p>
      <UserList {...{ shares, byId, week }} />
    </div>
  );
}

interface ListProps extends Pick<UsersProps, 'byId' | 'week'> {
  readonly shares: ReturnType<typeof whoUses>;
}

/** Who uses how much, each with its unit. */
export function UserList({ shares, byId, week }: ListProps) {
  return (
    <ul className="text-2xs leading-[17px]">
      {shares.map(({ activityId, amount }) => {
        const activity = byId.get(activityId);
        return (
          <li key={activityId} className="flex gap-2">
            <span className="w-17 shrink-0 truncate text-ink-muted">
              {activity?.placement ? unitName(week.plant, activity.placement.unitId) : ''}
            </span>
            <span className="min-w-0 flex-1 truncate">{activity?.title}</span>
            <span>{amountText(amount)}</span>
          </li>
        );
      })}
      {shares.length === 0 ? <li className="text-ink-muted">Nobody uses it.</li> : null}
    </ul>
  );
}
