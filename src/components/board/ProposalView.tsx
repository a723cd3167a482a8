import { useMemo } from 'react';
import { reasonSentence } from '../../core/levelling/reasons';
import type { LevelFigures, LevellingProposal, ProposedMove } from '../../core/levelling/proposal';
import { Button } from '../ui/Button';
import { groupDigits, spanText, type Clock } from '../time';
import { useUnits } from '../ui/units';
import { Relaxations } from './Relaxations';
import type { BoardModel } from './useBoard';
import type { BoardActions } from './useBoardActions';
import { activityName, moveText } from './words';

interface Props {
  readonly proposal: LevellingProposal;
  readonly model: BoardModel;
  readonly actions: BoardActions;
}

/** What is proposed: before and after, each move with its reason, and what is made of it. */
export function ProposalView({ proposal, model, actions }: Props) {
  const { levelling, mayPlan } = model;
  const { moves } = proposal;
  const all = levelling.chosen.length === moves.length;
  return (
    <>
      <Summary proposal={proposal} model={model} />
      <Unresolved proposal={proposal} model={model} />
      <Relaxations proposal={proposal} model={model} />
      {moves.length === 0 ? (
        <p className="text-sm">No move makes it better. The plan stays as it is.</p>
      ) : (
        <Moves moves={moves} {...{ model, actions }} />
      )}
      <div className="sticky bottom-0 -mx-5 mt-auto flex flex-wrap gap-2 border-t border-rule bg-surface px-5 py-3">
        {moves.length > 0 && mayPlan ? (
          <Button look="main" busy={levelling.busy} disabled={levelling.chosen.length === 0} onClick={levelling.accept}>
            {all ? `Accept all ${moves.length}` : `Accept chosen ${levelling.chosen.length}`}
          </Button>
        ) : null}
        <Button busy={levelling.busy} onClick={levelling.discard}>
          Discard
        </Button>
      </div>
    </>
  );
}

function Summary({ proposal, model }: Omit<Props, 'actions'>) {
  const units = useUnits();
  const { before, after, movedBatches, meanMoveMin } = proposal;
  const header = model.week.plant.headers.find((h) => h.feed.kind === 'boilers');
  const peak = (figures: LevelFigures): string => (header ? units.rate(figures.peakKgPerH[header.id] ?? 0) : '–');
  const rows: readonly (readonly [string, string, string])[] = [
    ['Over the limit', units.mass(before.overKg), units.mass(after.overKg)],
    ['', spanText(before.overMinutes), spanText(after.overMinutes)],
    ['Peak', peak(before), peak(after)],
    ['Late', spanText(before.lateMinutes), spanText(after.lateMinutes)],
  ];
  return (
    <div data-testid="level-summary">
      <table className="w-full text-sm">
        <thead>
          <tr className="text-left text-xs text-ink-muted [&>th]:pb-1 [&>th]:font-medium">
            <th scope="col">
              <span className="sr-only">Figure</span>
            </th>
            <th scope="col">before</th>
            <th scope="col">after</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(([name, was, is], i) => (
            <tr key={i} className={name === '' ? '' : 'border-t border-rule'}>
              <th scope="row" className="py-0.5 text-left font-normal text-ink-muted">
                {name || <span className="sr-only">Minutes over</span>}
              </th>
              <td className="py-0.5">{was}</td>
              <td className="py-0.5 font-semibold">{is}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-2 text-xs text-ink-muted">
        {movedBatches} batches moved by {groupDigits(meanMoveMin)} min on average. The thin line above the rows is the
        steam load before.
      </p>
    </div>
  );
}

function Unresolved({ proposal, model }: Omit<Props, 'actions'>) {
  const units = useUnits();
  if (proposal.unresolved.length === 0) return null;
  const { clock, view } = model;
  return (
    <section aria-label="Still over the limit">
      <h3 className="label">Still over the limit</h3>
      <ul className="mt-1 flex flex-col gap-1.5">
        {proposal.unresolved.map((rest) => (
          <li key={`${rest.headerId} ${rest.from}`}>
            <button
              type="button"
              className="flex w-full gap-2.5 rounded-sm text-left hover:bg-sunken"
              onClick={() => view.reveal(rest, null)}
            >
              <span className="hatch-over w-1 shrink-0 rounded-sm" aria-hidden="true" />
              <span className="text-xs">
                <span className="block font-medium">
                  {clock.dayTime(rest.from)} to {endText(clock, rest.from, rest.to)}, {units.mass(rest.kg)}
                </span>
                <span className="text-ink-muted">{units.message(rest.why)}</span>
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** The end of a span, with its day where that is another than the day it begins on. */
function endText(clock: Clock, from: number, to: number): string {
  return clock.day(from) === clock.day(Math.max(from, to - 1)) ? clock.time(to) : clock.dayTime(to);
}

function Moves({
  moves,
  model,
  actions,
}: Pick<Props, 'model' | 'actions'> & { readonly moves: readonly ProposedMove[] }) {
  const { clock, names, dto, levelling } = model;
  const byId = useMemo(() => new Map(dto.week.activities.map((a) => [a.id, a])), [dto.week.activities]);
  const sorted = useMemo(() => [...moves].sort((a, b) => a.to.start - b.to.start), [moves]);
  const words = { activity: names.activity, time: clock.dayTime };
  return (
    <section aria-label="Moves">
      <h3 className="label flex justify-between">
        <span>Moves</span>
        <span>
          {levelling.chosen.length} of {moves.length}
        </span>
      </h3>
      <ul className="mt-1">
        {sorted.map((move) => {
          const activity = byId.get(move.activityId);
          const name = activity ? activityName(activity) : move.activityId;
          return (
            <li key={move.activityId} className="-mx-2 flex gap-2 rounded-sm px-2 py-1.5 hover:bg-sunken">
              <input
                type="checkbox"
                className="mt-0.5 size-4 shrink-0 accent-room"
                aria-label={`Take: ${name}, ${moveText(move, dto.week.plant)}`}
                checked={levelling.isChosen(move.activityId)}
                onChange={() => levelling.toggle(move.activityId)}
              />
              <button
                type="button"
                className="min-w-0 flex-1 text-left"
                onClick={() => actions.selectAndShow(move.activityId)}
              >
                <span className="flex justify-between gap-2 text-xs">
                  <span className="min-w-0 truncate font-medium">{name}</span>
                  <span className="shrink-0 text-ink-muted">{clock.dayTime(move.to.start)}</span>
                </span>
                <span className="block text-xs">{moveText(move, dto.week.plant)}</span>
                <span className="block text-xs text-ink-muted">{reasonSentence(move.reason, words)}</span>
              </button>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
