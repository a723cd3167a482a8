import type { CapacityDto } from '@/contracts/capacity';
import type { WeekDto } from '@/contracts/week';
import { evaluateWeek } from '@/core/pipeline';
import type { UnitSystem } from '@/core/quantity/display';
import { makeClock } from '../time';
import { UnitsProvider } from '../ui/units';
import { startUpsOf } from './houseInputs';
import { StartUpList } from './StartUpList';
import { startUpNames } from './startUpNames';

interface Props {
  readonly capacity: CapacityDto;
  readonly week: WeekDto;
  readonly units: UnitSystem;
}

/** Every sequence of the week that starts the boiler house up, for print. */
export function StartUpSheet({ capacity, week, units }: Props) {
  const clock = makeClock(capacity);
  const evaluation = evaluateWeek({ ...week.week, capacities: capacity.capacities });
  const names = startUpNames(capacity, week.week.plant, evaluation.drawn);
  const sheets = evaluation.headers.flatMap((judged) =>
    startUpsOf(capacity, week.week.plant, evaluation.drawn, judged).map((start) => ({ judged, start })),
  );
  return (
    <UnitsProvider system={units}>
      {sheets.length === 0 ? (
        <p className="mt-6 text-md">Nothing starts from cold this week.</p>
      ) : (
        sheets.map(({ judged, start }) => (
          <section key={`${judged.headerId} ${start.outSinceMin}`} className="keep-together mt-6">
            <h2 className="mb-1 text-lg">
              {names.header(judged.headerId)}, first draw {clock.dayTime(start.firstDrawMin)}
            </h2>
            <StartUpList {...{ start, names, clock }} />
          </section>
        ))
      )}
    </UnitsProvider>
  );
}
