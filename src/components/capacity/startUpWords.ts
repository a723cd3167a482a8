import type { LateFiring, StartUp, StartUpStep } from '@/core/house/startUp';
import type { StartUpDraw } from '@/core/house/startUpDraws';
import { LOOK_BACK_MIN } from '@/core/house/readiness';
import { spanText, type Clock } from '../time';
import type { Units } from '../units';

/** What a sequence is told with. */
export interface StartUpNames {
  readonly boiler: (id: string) => string;
  readonly header: (id: string) => string;
  readonly unit: (id: string) => string;
  /** 'A01 Sweetcorn' of an activity. */
  readonly activity: (id: string) => string;
}

export interface StartUpLine {
  /** 'Mon 03:05' */
  readonly at: string;
  readonly text: string;
  readonly reason: string;
  /** What the whole sequence is for. */
  readonly isGoal: boolean;
}

interface Told {
  readonly text: string;
  readonly reason: string;
}

function drawWords(kind: 'warmUp' | 'steamOn', draw: StartUpDraw, names: StartUpNames): Told {
  const unit = names.unit(draw.unitId);
  if (kind === 'steamOn') return { text: `First steam on: ${unit}`, reason: names.activity(draw.activityId) };
  return { text: `${unit} warms up`, reason: `cold, ${spanText(draw.toMin - draw.fromMin)}` };
}

function mainsReason(minutes: number, kg: number, units: Units): string {
  const steam = kg > 0 ? `, about ${units.text('mass', kg)} of steam` : '';
  return `open slowly, warm and drain: ${minutes} min${steam}`;
}

function told(step: StartUpStep, names: StartUpNames, units: Units): Told {
  switch (step.kind) {
    case 'light':
      return {
        text: `Light ${names.boiler(step.boilerId)}`,
        reason: `${step.start}: ${spanText(step.minutes)} to pressure, purge included`,
      };
    case 'purged':
      return { text: `${names.boiler(step.boilerId)}: purge over`, reason: `${step.minutes} min` };
    case 'pressure':
      return {
        text: `${names.boiler(step.boilerId)} at pressure`,
        reason:
          step.forLoadKgPerH === null
            ? 'before the mains are opened'
            : `the load comes to ${units.text('steamRate', step.forLoadKgPerH)}, more than the boilers before it carry`,
      };
    case 'openMains':
      return {
        text: `Mains of the ${lower(names.header(step.headerId))}`,
        reason: mainsReason(step.minutes, step.kg, units),
      };
    case 'mainsReady':
      return { text: `${names.header(step.headerId)} ready`, reason: 'mains opened, warmed and drained' };
    case 'warmUp':
    case 'steamOn':
      return drawWords(step.kind, step.draw, names);
  }
}

const lower = (name: string): string => name.charAt(0).toLowerCase() + name.slice(1);

/** A sequence as lines to be read from the top. */
export function startUpLines(start: StartUp, names: StartUpNames, clock: Clock, units: Units): StartUpLine[] {
  return start.steps.map((step) => ({
    at: clock.dayTime(step.atMin),
    ...told(step, names, units),
    isGoal: step.kind === 'steamOn',
  }));
}

/** 'Out of fire since before Sat 00:00', 'Out of fire since Wed 12:00'. */
export function outSinceText({ outSinceMin }: StartUp, clock: Clock): string {
  return outSinceMin <= -LOOK_BACK_MIN
    ? `Out of fire since ${clock.dayTime(outSinceMin)} or before.`
    : `Out of fire since ${clock.dayTime(outSinceMin)}.`;
}

/** What the firing that is set lacks. */
export function lateText(late: LateFiring, names: StartUpNames, clock: Clock): string {
  const name = names.boiler(late.boilerId);
  const needed = `must be lit by ${clock.dayTime(late.neededLitMin)}`;
  if (late.setLitMin === null) return `${name} ${needed}; no firing is set.`;
  const set = `it is set to be lit at ${clock.dayTime(late.setLitMin)}`;
  if (late.lateMin === null) return `${name} ${needed}; ${set} and goes out before it is at pressure.`;
  return `${name} ${needed}; ${set} and comes to pressure ${spanText(late.lateMin)} too late.`;
}
