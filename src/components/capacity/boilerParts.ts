import type { BoilerDto } from '@/contracts/capacity';
import { comingUpSpans, readyShare } from '@/core/house/readiness';
import { segments } from './scale';

export interface BoilerPart {
  readonly from: number;
  readonly to: number;
  readonly value: number;
  readonly isComingUp: boolean;
}

/** A boiler's bar: what it can send by span, and where it is lit and nothing can leave yet. */
export function partsOf({ share, fires }: Pick<BoilerDto, 'share' | 'fires'>, from: number, to: number): BoilerPart[] {
  const coming = comingUpSpans(fires);
  return segments(readyShare(share, fires), from, to).flatMap((part) => {
    const cuts = [part.from, ...coming.flatMap((span) => [span.from, span.to]), part.to]
      .filter((minute) => minute >= part.from && minute <= part.to)
      .sort((a, b) => a - b);
    return cuts.slice(0, -1).flatMap((start, i): BoilerPart[] => {
      const end = cuts[i + 1] ?? part.to;
      const isComingUp = coming.some((span) => span.from <= start && end <= span.to);
      return start < end ? [{ from: start, to: end, value: part.value, isComingUp }] : [];
    });
  });
}
