import { daysAfter } from '../../calendar/dates';
import type { DayOfWeek } from './wallTime';

interface Props {
  /** The page, without its week. */
  readonly path: string;
  readonly weekStart: string;
  readonly days: readonly DayOfWeek[];
}

const ARROW =
  'grid size-9 place-items-center rounded-md border border-transparent hover:border-edge [&>svg]:size-4 [&>svg]:fill-none [&>svg]:stroke-current';

/** The week shown, and the ways to the one before and after. */
export function WeekLinks({ path, weekStart, days }: Props) {
  const words = (label: string | undefined): string => (label ?? '').split(' ').slice(1).join(' ');
  return (
    <nav aria-label="Week" className="-ml-2 flex items-center gap-1">
      <a className={ARROW} href={`${path}/${daysAfter(weekStart, -7)}`} aria-label="The week before">
        <svg viewBox="0 0 16 16" aria-hidden="true">
          <path d="m10 3-5 5 5 5" strokeWidth="1.5" />
        </svg>
      </a>
      <h1 className="text-lg font-semibold">
        {words(days[0]?.label)} to {words(days.at(-1)?.label)}
      </h1>
      <a className={ARROW} href={`${path}/${daysAfter(weekStart, 7)}`} aria-label="The week after">
        <svg viewBox="0 0 16 16" aria-hidden="true">
          <path d="m6 3 5 5-5 5" strokeWidth="1.5" />
        </svg>
      </a>
    </nav>
  );
}
