const MS_PER_MINUTE = 60_000;

/** A week's minutes as the plant's clock shows them. Elapsed minutes, so that a clock change is read off correctly. */
export interface Clock {
  /** '06:40' */
  readonly time: (minute: number) => string;
  /** 'Tue 06:40' */
  readonly dayTime: (minute: number) => string;
  /** 'Tue' */
  readonly weekday: (minute: number) => string;
  /** 'Tue 1 Dec' */
  readonly day: (minute: number) => string;
  /** '2026-12-01' */
  readonly date: (minute: number) => string;
  /** Minutes since the week's first instant of an ISO instant, rounded down. */
  readonly minuteOf: (instant: string) => number;
  /** 'Tue 05:40' of an ISO instant. */
  readonly instantDayTime: (instant: string) => string;
}

function partsReader(options: Intl.DateTimeFormatOptions): (at: Date) => Record<string, string> {
  const format = new Intl.DateTimeFormat('en-GB', options);
  return (at) => Object.fromEntries(format.formatToParts(at).map((part) => [part.type, part.value]));
}

/** The clock of a week in the plant's zone. */
export function makeClock(week: { readonly firstInstant: string; readonly timeZone: string }): Clock {
  const origin = Date.parse(week.firstInstant);
  const read = partsReader({
    timeZone: week.timeZone,
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  const readDate = partsReader({ timeZone: week.timeZone, year: 'numeric', month: '2-digit', day: '2-digit' });
  const cache = new Map<number, Record<string, string>>();
  const at = (minute: number): Record<string, string> => {
    let parts = cache.get(minute);
    if (!parts) {
      parts = read(new Date(origin + minute * MS_PER_MINUTE));
      cache.set(minute, parts);
    }
    return parts;
  };
  const time = (minute: number): string => `${at(minute).hour}:${at(minute).minute}`;
  const dayTime = (minute: number): string => `${at(minute).weekday} ${time(minute)}`;
  const minuteOf = (instant: string): number => Math.floor((Date.parse(instant) - origin) / MS_PER_MINUTE);
  return {
    time,
    dayTime,
    weekday: (minute) => at(minute).weekday ?? '',
    day: (minute) => `${at(minute).weekday} ${at(minute).day} ${at(minute).month}`,
    date: (minute) => {
      const parts = readDate(new Date(origin + minute * MS_PER_MINUTE));
      return `${parts.year}-${parts.month}-${parts.day}`;
    },
    minuteOf,
    instantDayTime: (instant) => dayTime(minuteOf(instant)),
  };
}

/** Minutes as people say them: '38 min', '2 h 05', '21 h', '3 d 4 h'. */
export function spanText(minutes: number): string {
  const whole = Math.round(Math.abs(minutes));
  if (whole < 120) return `${whole} min`;
  if (whole >= 48 * 60) {
    const hours = Math.round(whole / 60);
    return hours % 24 === 0 ? `${hours / 24} d` : `${Math.floor(hours / 24)} d ${hours % 24} h`;
  }
  const rest = whole % 60;
  return rest === 0 ? `${whole / 60} h` : `${Math.floor(whole / 60)} h ${String(rest).padStart(2, '0')}`;
}

/** Thin spaces in thousands: '12 345'. */
export function groupDigits(value: number): string {
  return String(Math.round(value)).replace(/\B(?=(\d{3})+(?!\d))/g, '\u2009');
}
