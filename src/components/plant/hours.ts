const DAYS = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'] as const;

/** The days of a plant's week in order; 1 is Monday. */
export const daysFrom = (weekStartsOn: number): readonly string[] =>
  DAYS.map((_, i) => DAYS[(weekStartsOn - 1 + i + 7) % 7] ?? 'Mon');

/** An hour of the week in words: 4 is 'Mon 04:00', 168 the end of the week. */
export function hourText(hour: number, weekStartsOn: number): string {
  if (hour >= 168) return 'the end of the week';
  const day = daysFrom(weekStartsOn)[Math.floor(hour / 24)] ?? '';
  return `${day} ${String(hour % 24).padStart(2, '0')}:00`;
}

/** A value that holds from an hour of the week on. */
export interface HourStep {
  readonly fromHour: number;
  readonly value: number;
}

/** Amounts over spans of hours, summed into steps over the week. */
export function summed(
  spans: readonly { readonly fromHour: number; readonly toHour: number; readonly value: number }[],
) {
  const hours = [...new Set([0, ...spans.flatMap(({ fromHour, toHour }) => [fromHour, toHour])])]
    .filter((hour) => hour >= 0 && hour < 168)
    .sort((a, b) => a - b);
  return hours.map((fromHour) => ({
    fromHour,
    value: spans.reduce((sum, s) => (s.fromHour <= fromHour && fromHour < s.toHour ? sum + s.value : sum), 0),
  }));
}

export interface Bar {
  readonly from: number;
  readonly to: number;
  readonly value: number;
}

/** Steps as bars over the hours of the week, in order, what has no hour or value left out. */
export function barsOf(steps: readonly { readonly fromHour: unknown; readonly value: unknown }[]): Bar[] {
  const whole = steps.filter(
    (step): step is HourStep =>
      Number.isFinite(step.fromHour) && Number.isFinite(step.value) && Number(step.fromHour) < 168,
  );
  const sorted = [...whole].sort((a, b) => a.fromHour - b.fromHour);
  return sorted.map(({ fromHour, value }, i) => ({ from: fromHour, to: sorted[i + 1]?.fromHour ?? 168, value }));
}
