import type { StartUp } from '@/core/house/startUp';
import type { Clock } from '../time';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import { lateText, outSinceText, startUpLines, type StartUpNames } from './startUpWords';

interface Props {
  readonly start: StartUp;
  readonly names: StartUpNames;
  readonly clock: Clock;
}

/** One start of the boiler house, from the fire to the first steam-on. */
export function StartUpList({ start, names, clock }: Props) {
  const units = useUnits();
  return (
    <div>
      <p className="mb-2 text-sm text-ink-muted">
        {outSinceText(start, clock)} Tied back from the plan; users outside it are not counted.
      </p>
      {start.late.map((late) => (
        <Notice key={late.boilerId} look="over" className="mb-3">
          {lateText(late, names, clock)}
        </Notice>
      ))}
      <ol className="divide-y divide-rule border-y border-rule text-sm">
        {startUpLines(start, names, clock, units).map((line, i) => (
          <li
            key={i}
            className="grid grid-cols-[5.25rem_minmax(0,1fr)] gap-x-3 py-1.5 print:grid-cols-[6rem_minmax(0,1fr)_2rem]"
          >
            <span className="font-medium whitespace-nowrap">{line.at}</span>
            <span>
              <span className={line.isGoal ? 'font-semibold text-steam-deep' : 'font-medium'}>{line.text}</span>
              <span className="text-ink-muted"> · {line.reason}</span>
            </span>
            <span className="hidden size-4 border border-edge print:block" aria-hidden="true" />
          </li>
        ))}
      </ol>
    </div>
  );
}
