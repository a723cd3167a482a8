import type { StartUp } from '@/core/house/startUp';
import type { Clock } from '../time';
import { StartUpList } from './StartUpList';
import type { StartUpNames } from './startUpWords';

interface Props {
  readonly starts: readonly StartUp[];
  readonly names: StartUpNames;
  readonly clock: Clock;
  /** The sequence on a page of its own, to be printed. */
  readonly href: string;
}

/** The sequences that start the boiler house up. */
export function StartUpPanel({ starts, names, clock, href }: Props) {
  return (
    <section aria-labelledby="start-up-heading">
      <div className="mb-3 flex flex-wrap items-baseline justify-between gap-2">
        <h2 id="start-up-heading" className="text-md font-semibold">
          Starting up
        </h2>
        {starts.length > 0 ? (
          <a className="link text-sm" href={href}>
            To print
          </a>
        ) : null}
      </div>
      {starts.length === 0 ? (
        <p className="text-sm text-ink-muted">
          Nothing starts from cold this week: a boiler is in fire all along, or nothing draws steam after an outage.
        </p>
      ) : (
        <div className="space-y-6">
          {starts.map((start) => (
            <StartUpList key={start.outSinceMin} {...{ start, names, clock }} />
          ))}
        </div>
      )}
    </section>
  );
}
