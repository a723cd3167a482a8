import { lazy, Suspense, useMemo, useState } from 'react';
import { NOT_JUDGED_KG_PER_H } from '@/core/header/capacity';
import { Button } from '../ui/Button';
import { Fallible } from '../ui/Fallible';
import { useWidth } from '../ui/useWidth';
import { useUnits } from '../ui/units';
import { durationCurve, hoursAbove } from './durationCurve';

const DurationChart = lazy(() => import('./DurationChart'));
const HEIGHT = 240;

interface Props {
  readonly loadKgPerH: Float64Array;
  readonly limitKgPerH: Float64Array | null;
}

/** The limit that holds for most of the week; null: not judged. [kg/h] */
function usualLimit(limit: Float64Array | null): number | null {
  const minutes = new Map<number, number>();
  for (const value of limit ?? [])
    if (value < NOT_JUDGED_KG_PER_H) minutes.set(Math.round(value), (minutes.get(Math.round(value)) ?? 0) + 1);
  const [most] = [...minutes].sort((a, b) => b[1] - a[1]);
  return most?.[0] ?? null;
}

/** For how long the steam load stands how high: asked for, then loaded and drawn. */
export function Duration({ loadKgPerH, limitKgPerH }: Props) {
  const units = useUnits();
  const [asked, setAsked] = useState(false);
  const [ref, width] = useWidth<HTMLDivElement>(600);
  const points = useMemo(() => (asked ? durationCurve(loadKgPerH) : []), [asked, loadKgPerH]);
  const limit = useMemo(() => usualLimit(limitKgPerH), [limitKgPerH]);
  const above = limit === null ? null : hoursAbove(loadKgPerH, limit);
  return (
    <section aria-labelledby="duration-heading">
      <h2 id="duration-heading" className="mb-1 text-md font-semibold">
        For how long the steam load stands how high
      </h2>
      <p className="mb-3 min-h-5 text-sm text-ink-muted">
        {limit === null || above === null
          ? 'No limit is set to compare with.'
          : `Above the usual limit of ${units.rate(limit)} for ${above.toFixed(1)} h of the week.`}
      </p>
      <div
        ref={ref}
        className="grid place-items-center rounded-md border border-rule bg-surface"
        style={{ height: HEIGHT }}
      >
        {asked ? (
          <Fallible instead={<p className="text-sm">The curve could not be loaded. Reload the page to try again.</p>}>
            <Suspense fallback={<p className="text-sm text-ink-muted">Drawing the curve…</p>}>
              <DurationChart points={points} width={width} height={HEIGHT - 2} limitKgPerH={limit} />
            </Suspense>
          </Fallible>
        ) : (
          <Button onClick={() => setAsked(true)}>Draw the load-duration curve</Button>
        )}
      </div>
    </section>
  );
}
