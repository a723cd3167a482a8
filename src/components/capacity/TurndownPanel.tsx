import type { CapacityDto } from '@/contracts/capacity';
import type { TurndownSpan } from '@/core/house/turndown';
import { spanText, type Clock } from '../time';
import { useUnits } from '../ui/units';

interface Props {
  readonly spans: readonly TurndownSpan[];
  readonly dto: CapacityDto;
  readonly clock: Clock;
}

/** Shorter ones are dips that the water in the boilers takes: counted, not listed. [min] */
const LISTED_FROM_MIN = 60;
const SHOWN = 6;

/** When the boilers in fire can't turn down to the load, and which could be shut. */
export function TurndownPanel({ spans, dto, clock }: Props) {
  const long = spans.filter((span) => span.to - span.from >= LISTED_FROM_MIN);
  const short = spans.filter((span) => !long.includes(span));
  const shortMin = short.reduce((sum, span) => sum + span.to - span.from, 0);
  const rows = (list: readonly TurndownSpan[]) => <Rows {...{ dto, clock }} spans={list} />;
  return (
    <section aria-labelledby="turndown-heading">
      <h2 id="turndown-heading" className="mb-1 text-md font-semibold">
        Below turndown
      </h2>
      <p className="mb-3 text-sm text-ink-muted">
        {spans.length === 0
          ? 'The load never falls under what the boilers in fire can turn down to.'
          : 'The load is under what the boilers in fire can turn down to: they stop and purge again and again.'}
      </p>
      {long.length > 0 ? rows(long.slice(0, SHOWN)) : null}
      {long.length > SHOWN ? (
        <details className="text-sm">
          <summary className="cursor-pointer py-2 text-ink-muted">{long.length - SHOWN} more</summary>
          {rows(long.slice(SHOWN))}
        </details>
      ) : null}
      {short.length > 0 ? (
        <p className="mt-2 text-xs text-ink-muted">
          And {short.length} of less than {LISTED_FROM_MIN} min each, {spanText(shortMin)} together.
        </p>
      ) : null}
    </section>
  );
}

function Rate({ kgPerH }: { readonly kgPerH: number }) {
  return <span className="whitespace-nowrap">{useUnits().rate(kgPerH)}</span>;
}

function Rows({ spans, dto, clock }: Props) {
  const end = (span: TurndownSpan): string =>
    span.to >= dto.horizonMin
      ? 'the week’s end'
      : clock.date(span.from) === clock.date(span.to)
        ? clock.time(span.to)
        : clock.dayTime(span.to);
  return (
    <ol className="divide-y divide-rule border-y border-rule text-sm">
      {spans.map((span) => {
        const shut = dto.boilers.find((boiler) => boiler.id === span.couldShutId);
        return (
          <li key={span.from} className="py-1.5">
            <span className="font-medium">
              {clock.dayTime(span.from)} to {end(span)}
            </span>
            <span className="text-ink-muted">
              {' '}
              ({spanText(span.to - span.from)}): load down to <Rate kgPerH={span.leastLoadKgPerH} />, the boilers to{' '}
              <Rate kgPerH={span.leastExportKgPerH} />
            </span>
            {shut ? <span>. {shut.name} could be shut.</span> : null}
          </li>
        );
      })}
    </ol>
  );
}
