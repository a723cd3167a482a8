import { useEffect, useMemo, useState } from 'react';
import type { WeekDto } from '../../contracts/week';
import { makeClock } from '../time';

const LOOK_MS = 15_000;
const MS_PER_MINUTE = 60_000;

/** The present minute of the week: the server's clock when the week was read, and what has gone by since. */
export function useNowMin(dto: Pick<WeekDto, 'now' | 'firstInstant' | 'timeZone'>): number {
  const { now, firstInstant, timeZone } = dto;
  const read = useMemo(() => makeClock({ firstInstant, timeZone }).minuteOf(now), [now, firstInstant, timeZone]);
  const [gone, setGone] = useState({ since: now, minutes: 0 });
  useEffect(() => {
    const from = performance.now();
    const look = (): void => {
      const minutes = Math.floor((performance.now() - from) / MS_PER_MINUTE);
      setGone((was) => (was.since === now && was.minutes === minutes ? was : { since: now, minutes }));
    };
    const timer = window.setInterval(look, LOOK_MS);
    return () => window.clearInterval(timer);
  }, [now]);
  return read + (gone.since === now ? gone.minutes : 0);
}
