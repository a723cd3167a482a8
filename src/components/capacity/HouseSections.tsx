import { useMemo, type ReactNode } from 'react';
import type { CapacityDto } from '@/contracts/capacity';
import type { HeaderJudgement } from '@/core/header/judgement';
import type { Activity } from '@/core/plant/activity';
import type { PlantModel } from '@/core/plant/plant';
import type { Clock } from '../time';
import { BaseLoadPanel } from './BaseLoadPanel';
import { Duration } from './Duration';
import { FuelPanel } from './FuelPanel';
import { boilersOf, fuelOf, startUpsOf, turndownOf } from './houseInputs';
import { startUpNames } from './startUpNames';
import { StartUpPanel } from './StartUpPanel';
import { TurndownPanel } from './TurndownPanel';
import type { DayOfWeek } from './wallTime';

interface Props {
  readonly dto: CapacityDto;
  readonly plant: PlantModel;
  /** All that draws in the week. */
  readonly drawn: readonly Activity[];
  readonly judged: HeaderJudgement;
  readonly days: readonly DayOfWeek[];
  readonly clock: Clock;
  /** Stands last. */
  readonly children: ReactNode;
}

/** What follows for the boiler house from a header's week: starting up, turndown, fuel, users outside the plan. */
export function HouseSections({ dto, plant, drawn, judged, days, clock, children }: Props) {
  const starts = useMemo(() => startUpsOf(dto, plant, drawn, judged), [dto, plant, drawn, judged]);
  const names = useMemo(() => startUpNames(dto, plant, drawn), [dto, plant, drawn]);
  const spans = useMemo(() => turndownOf(dto, judged), [dto, judged]);
  const fuel = useMemo(() => fuelOf(dto, judged), [dto, judged]);
  const loads = dto.baseLoads.filter((load) => load.headerId === judged.headerId);
  const isFired = boilersOf(dto, judged.headerId).length > 0;
  return (
    <>
      <div className="min-w-0 space-y-10">
        {isFired ? <StartUpPanel {...{ starts, names, clock }} href={`/capacity/${dto.weekStart}/start-up`} /> : null}
        <Duration loadKgPerH={judged.loadKgPerH} limitKgPerH={judged.limitKgPerH} />
      </div>
      <div className="min-w-0 space-y-10">
        {isFired ? <TurndownPanel {...{ spans, dto, clock }} /> : null}
        {isFired ? <FuelPanel {...{ fuel, dto }} /> : null}
        <BaseLoadPanel {...{ loads, days }} />
        {children}
      </div>
    </>
  );
}
