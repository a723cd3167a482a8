import type { CapacityEntryDto } from '@/contracts/capacity';
import type { Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { shareText } from './BoilerRow';

interface Props {
  readonly entries: readonly CapacityEntryDto[];
  readonly clock: Clock;
  readonly horizonMin: number;
}

function valueText(entry: CapacityEntryDto, units: Units): string {
  if (entry.kind === 'firing') return shareText(entry.value ?? 0);
  return entry.value === null ? 'taken back' : units.rate(entry.value);
}

function spanWords({ fromMin, toMin }: CapacityEntryDto, clock: Clock, horizonMin: number): string {
  if (fromMin <= 0 && toMin >= horizonMin) return 'the whole week';
  const sameDay = clock.date(fromMin) === clock.date(toMin);
  const from = fromMin <= 0 ? 'until' : `${clock.dayTime(fromMin)} to`;
  const to = toMin >= horizonMin ? 'the week’s end' : sameDay ? clock.time(toMin) : clock.dayTime(toMin);
  return `${from} ${to}`;
}

/** Who has set what, when and why; newest first. */
export function RecordTable({ entries, clock, horizonMin }: Props) {
  const units = useUnits();
  if (entries.length === 0)
    return <p className="text-sm text-ink-muted">Nothing has been set for this week: the boilers run as they are.</p>;
  return (
    <ol className="divide-y divide-rule border-y border-rule">
      {entries.map((entry) => (
        <li key={entry.id} className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 py-2 text-sm">
          <p className="min-w-0">
            <span className="font-medium">
              {entry.subject} {valueText(entry, units)}
            </span>
            <span className="text-ink-muted">, {spanWords(entry, clock, horizonMin)}</span>
          </p>
          <p className="text-right text-xs text-ink-muted">{clock.instantDayTime(entry.at)}</p>
          <p className="col-span-2 min-w-0 text-ink-muted">
            {entry.by}: {entry.reason}
          </p>
        </li>
      ))}
    </ol>
  );
}
