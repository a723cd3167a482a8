import type { Step, StepFunction } from '@/core/time/stepFunction';
import { daysAfter } from '@/calendar/dates';
import { wallMinute, type WeekTime } from './weekTime';

/** A value from an hour of the week on; 0 is the first hour of the week, by the clocks of the plant's zone. */
export interface HourStep {
  readonly fromHour: number;
  readonly value: number;
}

/** An amount for some hours of every week. */
export interface HourSpan {
  readonly fromHour: number;
  readonly toHour: number;
  readonly value: number;
}

/** The elapsed minute at which an hour of the week begins by the clock, clock changes counted in. */
export function minuteOfHour(time: WeekTime, hour: number): number {
  return wallMinute(time, daysAfter(time.weekStart, Math.floor(hour / 24)), (hour % 24) * 60);
}

/** A value by hour of the week over one week; before the first hour named it is 0. */
export function stepsByHour(time: WeekTime, hourSteps: readonly HourStep[]): StepFunction {
  const byHour = [...hourSteps].sort((a, b) => a.fromHour - b.fromHour);
  return joined(byHour.map(({ fromHour, value }) => ({ from: minuteOfHour(time, fromHour), value })));
}

/** The sum of amounts by hours of the week over one week. */
export function sumByHour(time: WeekTime, spans: readonly HourSpan[]): StepFunction {
  const hours = [...new Set([0, ...spans.flatMap((span) => [span.fromHour, span.toHour])])].sort((a, b) => a - b);
  const valueAtHour = (hour: number): number =>
    spans.reduce((sum, span) => (span.fromHour <= hour && hour < span.toHour ? sum + span.value : sum), 0);
  return stepsByHour(
    time,
    hours.filter((hour) => hour < 168).map((fromHour) => ({ fromHour, value: valueAtHour(fromHour) })),
  );
}

/** Steps at one minute become the last of them (the hour that a clock change leaves out); equal neighbours one. */
function joined(steps: readonly Step[]): Step[] {
  const kept = steps.filter((step, i) => steps[i + 1]?.from !== step.from);
  return kept.filter((step, i) => i === 0 || kept[i - 1]?.value !== step.value);
}
