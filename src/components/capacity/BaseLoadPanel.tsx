import type { BaseLoadDto } from '@/contracts/capacity';
import { useUnits } from '../ui/units';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly loads: readonly BaseLoadDto[];
  readonly days: readonly DayOfWeek[];
}

/** 'Mon 04:00', 'Sat 24:00' of an hour of the week. */
export function hourText(hour: number, days: readonly DayOfWeek[], isEnd = false): string {
  const day = isEnd && hour % 24 === 0 ? hour / 24 - 1 : Math.floor(hour / 24);
  return `${(days[day]?.label ?? '').slice(0, 3)} ${String(hour - day * 24).padStart(2, '0')}:00`;
}

/** Losses and users outside the plan, by hour of the week. */
export function BaseLoadPanel({ loads, days }: Props) {
  const units = useUnits();
  return (
    <section aria-labelledby="base-heading">
      <h2 id="base-heading" className="mb-3 text-md font-semibold">
        Losses and users outside the plan
      </h2>
      {loads.length === 0 ? (
        <p className="text-sm text-ink-muted">None is entered: mains lose steam all the same.</p>
      ) : (
        <ol className="divide-y divide-rule border-y border-rule text-sm">
          {loads.map((load) => (
            <li key={load.id} className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 py-1.5">
              <span>
                <span className="font-medium">{load.note}</span>
                <span className="text-ink-muted">
                  , every week {hourText(load.fromHour, days)} to {hourText(load.toHour, days, true)}
                </span>
              </span>
              <span className="whitespace-nowrap">{units.text('steamRate', load.kgPerH)}</span>
            </li>
          ))}
        </ol>
      )}
    </section>
  );
}
