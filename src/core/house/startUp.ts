/** Starting the boiler house after an outage: what must be done by when, tied back from the first steam-on. */
import { subtractIntervals } from '../time/spans';
import type { Interval } from '../time/interval';
import { headerNeeds, type HeaderNeed, type StartUpHeader } from './headerNeeds';
import { LOOK_BACK_MIN, minutesToReady, startOf, type Fire, type FireStart, type ReadyTimes } from './readiness';
import type { StartUpDraw } from './startUpDraws';

export interface StartUpBoiler {
  readonly id: string;
  readonly times: ReadyTimes;
  /** [kg/h] */
  readonly netKgPerH: number;
  readonly fires: readonly Fire[];
}

export interface StartUpInput {
  /** Fed by the boilers. */
  readonly headerId: string;
  readonly headers: readonly StartUpHeader[];
  /** In the order in which they are lit where nothing else is set. */
  readonly boilers: readonly StartUpBoiler[];
  /** By time. */
  readonly draws: readonly StartUpDraw[];
  /** Load of the header per minute. [kg/h] */
  readonly loadKgPerH: ArrayLike<number>;
  readonly reserveFraction: number;
}

/** One line of a sequence; minutes of the week, negative before it. */
export type StartUpStep = { readonly atMin: number } & (
  | { readonly kind: 'light'; readonly boilerId: string; readonly start: FireStart; readonly minutes: number }
  | { readonly kind: 'purged'; readonly boilerId: string; readonly minutes: number }
  | { readonly kind: 'pressure'; readonly boilerId: string; readonly forLoadKgPerH: number | null }
  | { readonly kind: 'openMains'; readonly headerId: string; readonly minutes: number; readonly kg: number }
  | { readonly kind: 'mainsReady'; readonly headerId: string }
  | { readonly kind: 'warmUp' | 'steamOn'; readonly draw: StartUpDraw }
);

/** A boiler whose firing comes later than the sequence needs, or is not set. */
export interface LateFiring {
  readonly boilerId: string;
  readonly neededLitMin: number;
  /** null: no firing is set. */
  readonly setLitMin: number | null;
  /** At pressure so much after it is needed; null: never. [min] */
  readonly lateMin: number | null;
}

export interface StartUp {
  /** Since when nothing burns; where that is before what was looked at, the look back's begin. */
  readonly outSinceMin: number;
  readonly firstDrawMin: number;
  /** By time. */
  readonly steps: readonly StartUpStep[];
  readonly late: readonly LateFiring[];
}

/** The sequence of every start of a boiler-fed header in the week; none where something burns all along. */
export function startUpSequence(input: StartUpInput): StartUp[] {
  const horizonMin = input.loadKgPerH.length;
  const burning = input.boilers.flatMap(({ fires }) => fires.map((f) => ({ from: f.litMin, to: f.outMin })));
  const outages = subtractIntervals([{ from: -LOOK_BACK_MIN, to: horizonMin }], burning);
  const starts = outages.flatMap((outage, i): StartUp[] => {
    const span = { from: outage.from, to: outages[i + 1]?.from ?? horizonMin };
    const needs = headerNeeds(input.headerId, input.headers, within(input.draws, span));
    return needs.length > 0 ? [startUpOf(input, span, needs)] : [];
  });
  return starts;
}

const within = (draws: readonly StartUpDraw[], { from, to }: Interval): StartUpDraw[] =>
  draws.filter((draw) => draw.fromMin >= from && draw.fromMin < to);

function startUpOf(input: StartUpInput, span: Interval, needs: readonly HeaderNeed[]): StartUp {
  const openMin = Math.min(...needs.map((need) => need.openMin));
  const lightings = lightingsOf(input, span, openMin);
  const steps = [...lightings.flatMap(boilerSteps), ...needs.flatMap(headerSteps)];
  const draws = needs.flatMap(({ firsts }) => firsts.map((draw) => draw.fromMin));
  return {
    outSinceMin: span.from,
    firstDrawMin: Math.min(...draws),
    steps: steps
      .map((step, i) => ({ step, i }))
      .sort((a, b) => a.step.atMin - b.step.atMin || a.i - b.i)
      .map((s) => s.step),
    late: lightings.flatMap(lateFiring),
  };
}

/** When a boiler must be at pressure, and so be lit. */
interface Lighting {
  readonly boiler: StartUpBoiler;
  readonly pressureMin: number;
  /** The load that the boilers before it do not carry; null for the first. [kg/h] */
  readonly forLoadKgPerH: number | null;
  readonly start: FireStart;
  readonly litMin: number;
  /** The firing that is set for this start. */
  readonly set: Fire | undefined;
}

function lightingsOf(input: StartUpInput, span: Interval, openMin: number): Lighting[] {
  const ordered = input.boilers
    .map((boiler) => ({ boiler, set: boiler.fires.find((f) => f.litMin >= span.from && f.litMin < span.to) }))
    .sort((a, b) => (a.set?.litMin ?? Infinity) - (b.set?.litMin ?? Infinity) || 0);
  const lightings: Lighting[] = [];
  let carriedKgPerH = 0;
  for (const { boiler, set } of ordered) {
    const atMin = lightings.length === 0 ? openMin : firstOver(input, span, carriedKgPerH);
    if (atMin === null) break;
    const forLoadKgPerH = lightings.length === 0 ? null : (input.loadKgPerH[atMin] ?? null);
    lightings.push(lightingOf({ boiler, set, pressureMin: atMin, forLoadKgPerH }, span));
    carriedKgPerH += boiler.netKgPerH * (1 - input.reserveFraction);
  }
  return lightings;
}

function lightingOf(wanted: Omit<Lighting, 'start' | 'litMin'>, span: Interval): Lighting {
  const { boiler, pressureMin } = wanted;
  const before = boiler.fires.filter((f) => f.outMin <= span.from && f.readyMin < f.outMin).at(-1)?.outMin ?? null;
  const warmLitMin = pressureMin - minutesToReady(boiler.times, 'warm');
  const start = startOf(warmLitMin, before);
  return { ...wanted, start, litMin: pressureMin - minutesToReady(boiler.times, start) };
}

/** The first minute of a span at which the load passes a rate; null: never. */
function firstOver({ loadKgPerH }: StartUpInput, span: Interval, kgPerH: number): number | null {
  for (let t = Math.max(0, span.from); t < span.to; t++) if ((loadKgPerH[t] as number) > kgPerH) return t;
  return null;
}

function boilerSteps({ boiler, pressureMin, start, litMin, forLoadKgPerH }: Lighting): StartUpStep[] {
  const { id: boilerId, times } = boiler;
  const minutes = minutesToReady(times, start);
  return [
    { kind: 'light', atMin: litMin, boilerId, start, minutes },
    { kind: 'purged', atMin: litMin + times.purgeMinutes, boilerId, minutes: times.purgeMinutes },
    { kind: 'pressure', atMin: pressureMin, boilerId, forLoadKgPerH },
  ];
}

function headerSteps({ header, openMin, readyMin, firsts }: HeaderNeed): StartUpStep[] {
  const { id: headerId, warmUpMinutes: minutes, warmUpKg: kg } = header;
  return [
    { kind: 'openMains', atMin: openMin, headerId, minutes, kg },
    { kind: 'mainsReady', atMin: readyMin, headerId },
    ...firsts.map((draw): StartUpStep => ({ kind: draw.kind, atMin: draw.fromMin, draw })),
  ];
}

function lateFiring({ boiler, set, litMin, pressureMin }: Lighting): LateFiring[] {
  const missing = { boilerId: boiler.id, neededLitMin: litMin };
  if (!set) return [{ ...missing, setLitMin: null, lateMin: null }];
  if (set.readyMin <= pressureMin) return [];
  const lateMin = set.readyMin < set.outMin ? set.readyMin - pressureMin : null;
  return [{ ...missing, setLitMin: set.litMin, lateMin }];
}
