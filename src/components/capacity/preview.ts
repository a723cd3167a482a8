import type { BoilerDto, CapacityDto } from '@/contracts/capacity';
import { capacityMinutes } from '@/core/header/capacityMinutes';
import { overLimit, type OverSummary } from '@/core/header/over';
import { firesOf, readyShare, type Fire } from '@/core/house/readiness';
import type { HeaderCapacity } from '@/core/plant/plant';
import { stepsFromSpans } from '@/core/time/stepMath';
import { toMinutes, type StepFunction } from '@/core/time/stepFunction';
import type { Draft } from './draft';

interface PreviewInput {
  readonly capacity: HeaderCapacity;
  readonly reserveFraction: number;
  readonly boilers: readonly BoilerDto[];
  readonly loadKgPerH: Float64Array;
}

const sameRate = (a: number, b: number): boolean => Math.abs(a - b) < 0.5;

/** The limit per minute as it would stand with the draft; null: not judged. The server has the last word. [kg/h] */
export function limitWith(draft: Draft, input: PreviewInput): Float64Array | null {
  const horizonMin = input.loadKgPerH.length;
  const { limitKgPerH, exportKgPerH } = capacityMinutes(input.capacity, horizonMin);
  if (draft.subject.kind === 'firing') return limitWithFiring(draft, input, limitKgPerH, exportKgPerH);
  const limit = limitKgPerH?.slice() ?? new Float64Array(horizonMin).fill(Number.POSITIVE_INFINITY);
  for (let t = draft.fromMin; t < draft.toMin; t++) {
    const kept = exportKgPerH ? (exportKgPerH[t] ?? 0) * (1 - input.reserveFraction) : Number.POSITIVE_INFINITY;
    limit[t] = Math.min(kept, draft.value ?? Number.POSITIVE_INFINITY);
  }
  return limit;
}

function limitWithFiring(
  draft: Draft,
  input: PreviewInput,
  limitNow: Float64Array | null,
  exportNow: Float64Array | null,
): Float64Array | null {
  const { subject } = draft;
  const boiler = subject.kind === 'firing' ? input.boilers.find((b) => b.id === subject.boilerId) : undefined;
  if (!boiler || !limitNow || !exportNow) return limitNow;
  const before = toMinutes(readyShare(boiler.share, boiler.fires), limitNow.length);
  const after = toMinutes(readyWith(draft, boiler, limitNow.length), limitNow.length);
  const limit = limitNow.slice();
  for (let t = 0; t < limit.length; t++) {
    const change = (after[t] ?? 0) - (before[t] ?? 0);
    if (change === 0) continue;
    const now = exportNow[t] ?? 0;
    const kept = now * (1 - input.reserveFraction);
    const then = (now + boiler.netKgPerH * change) * (1 - input.reserveFraction);
    const set = limitNow[t] ?? 0;
    limit[t] = sameRate(set, kept) ? then : Math.min(set, then);
  }
  return limit;
}

/** A boiler's share with the draft in force. */
function shareWith(draft: Draft, boiler: BoilerDto, horizonMin: number): StepFunction {
  return stepsFromSpans(
    [
      ...boiler.share.map((step, i) => ({ ...step, to: boiler.share[i + 1]?.from ?? horizonMin })),
      { from: draft.fromMin, to: draft.toMin, value: draft.value ?? 0 },
    ],
    0,
  );
}

/** What of its export can leave with the draft in force: where it is lit anew, once it is at pressure. */
function readyWith(draft: Draft, boiler: BoilerDto, horizonMin: number): StepFunction {
  const share = shareWith(draft, boiler, horizonMin);
  return readyShare(share, firesOf(share, boiler, horizonMin));
}

/** The fire that the draft lights, at its begin or, where it shuts the boiler, at its end; null: none is lit anew. */
export function fireLitBy(draft: Draft, boiler: BoilerDto, horizonMin: number): Fire | null {
  const fires = firesOf(shareWith(draft, boiler, horizonMin), boiler, horizonMin);
  const moments = [draft.fromMin, draft.toMin];
  return fires.find((fire) => fire.start !== null && moments.includes(fire.litMin)) ?? null;
}

/** What the plan would be over with the draft in force. */
export function overWith(draft: Draft, input: PreviewInput): OverSummary | null {
  const limit = limitWith(draft, input);
  return limit && overLimit(input.loadKgPerH, limit, null);
}

/** The header's capacity and the boilers that feed it. */
export function capacityOf(dto: CapacityDto, headerId: string): HeaderCapacity | undefined {
  return dto.capacities.find((capacity) => capacity.headerId === headerId);
}
