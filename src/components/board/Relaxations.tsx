import type { LevellingProposal, Relaxation } from '../../core/levelling/proposal';
import type { PlantModel } from '../../core/plant/plant';
import { spanText, type Clock } from '../time';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import type { BoardModel } from './useBoard';

interface Props {
  readonly proposal: LevellingProposal;
  readonly model: BoardModel;
}

/** How little more would take away what stays over the limit, as levelling has tried it. */
export function Relaxations({ proposal, model }: Props) {
  const units = useUnits();
  const { relaxations = [] } = proposal;
  if (relaxations.length === 0) return null;
  return (
    <section aria-label="What would do it">
      <h3 className="label">What would do it</h3>
      <ul className="mt-1 flex list-disc flex-col gap-1 pl-4 text-xs marker:text-ink-muted">
        {relaxations.map((relaxation) => (
          <li key={JSON.stringify(relaxation)}>{relaxationText(relaxation, model, units)}</li>
        ))}
      </ul>
    </section>
  );
}

/** What the words need of the board. */
interface RelaxationWords {
  readonly clock: Clock;
  readonly names: { readonly activity: (id: string) => string };
  readonly week: { readonly plant: PlantModel };
}

/** One of them in words, such as "205 kg/h more on Main header, Tue 06:40 to 06:46". */
export function relaxationText(relaxation: Relaxation, { clock, names, week }: RelaxationWords, units: Units): string {
  switch (relaxation.kind) {
    case 'moreSteam': {
      const header = week.plant.headers.find(({ id }) => id === relaxation.headerId)?.name ?? 'the header';
      return `${units.rate(relaxation.kgPerH)} more on ${header}, ${spell(clock, relaxation)}`;
    }
    case 'unfix':
      return `${names.activity(relaxation.activityId)} not fixed: ${left(relaxation.leavesKg, units)}`;
    case 'furtherMoves':
      return `Starts moved by up to ${spanText(relaxation.minutes)}: ${left(relaxation.leavesKg, units)}`;
    case 'otherUnits':
      return `Batches moved to other units too: ${left(relaxation.leavesKg, units)}`;
  }
}

const left = (kg: number, units: Units): string => (kg === 0 ? 'nothing stays over' : `${units.mass(kg)} stay over`);

function spell(clock: Clock, { from, to }: { readonly from: number; readonly to: number }): string {
  const sameDay = clock.day(from) === clock.day(Math.max(from, to - 1));
  return `${clock.dayTime(from)} to ${sameDay ? clock.time(to) : clock.dayTime(to)}`;
}
