import type { BoilerDto, CapacityDto } from '@/contracts/capacity';
import type { HeaderJudgement } from '@/core/header/judgement';
import { minutesToReady, readyShare } from '@/core/house/readiness';
import { startUpSequence, type StartUp } from '@/core/house/startUp';
import { startUpDraws } from '@/core/house/startUpDraws';
import { belowTurndown, type TurndownSpan } from '@/core/house/turndown';
import { weekFuel, type WeekFuel } from '@/core/house/weekFuel';
import type { Activity } from '@/core/plant/activity';
import type { PlantModel } from '@/core/plant/plant';
import type { Result } from '@/core/result';

/** The boilers that feed a header. */
export function boilersOf(dto: CapacityDto, headerId: string): BoilerDto[] {
  return dto.boilers.filter((boiler) => boiler.headerId === headerId);
}

const readyOf = (boiler: BoilerDto) => readyShare(boiler.share, boiler.fires);

/** Spans in which the boilers of a header can't turn down to its load. */
export function turndownOf(dto: CapacityDto, judged: HeaderJudgement): TurndownSpan[] {
  const boilers = boilersOf(dto, judged.headerId).map((boiler) => ({
    ...boiler,
    readyShare: readyOf(boiler),
    minutesBack: minutesToReady(boiler, 'warm'),
  }));
  return belowTurndown(judged.loadKgPerH, boilers, dto.reserveFraction);
}

/** Fuel of a header's week. */
export function fuelOf(dto: CapacityDto, judged: HeaderJudgement): Result<WeekFuel> {
  const boilers = boilersOf(dto, judged.headerId).map((boiler) => ({ ...boiler, readyShare: readyOf(boiler) }));
  return weekFuel(judged.loadKgPerH, boilers, dto.fuelPricePerKWh);
}

/** What starting the boiler house up takes, for a header that boilers feed; `drawn` is all that draws in the week. */
export function startUpsOf(
  dto: CapacityDto,
  plant: PlantModel,
  drawn: readonly Activity[],
  judged: HeaderJudgement,
): StartUp[] {
  const boilers = boilersOf(dto, judged.headerId).map(({ id, netKgPerH, fires, ...times }) => {
    return { id, netKgPerH, fires, times };
  });
  if (boilers.length === 0) return [];
  return startUpSequence({
    headerId: judged.headerId,
    headers: dto.headers,
    boilers,
    draws: startUpDraws(plant, drawn),
    loadKgPerH: judged.loadKgPerH,
    reserveFraction: dto.reserveFraction,
  });
}
