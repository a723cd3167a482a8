import { BreachList } from './BreachList';
import { LimitTable } from './LimitTable';
import type { PointedAt } from './Pointed';
import { ReworkNotice } from './ReworkNotice';
import { SelectedDetail } from './SelectedDetail';
import type { Store } from './store';
import { Unplaced } from './Unplaced';
import type { BoardModel } from './useBoard';
import type { BoardActions } from './useBoardActions';
import type { Cleans } from './useCleans';

interface Props {
  readonly model: BoardModel;
  readonly actions: BoardActions;
  readonly pointed: Store<PointedAt | null>;
  readonly limitsOpen: boolean;
  readonly cleans: Cleans;
}

/**
 * What is to put right and what waits for a place; docked below them what is selected, so that a line that is clicked stays
 * where it was.
 */
export function Panel({ model, actions, pointed, limitsOpen, cleans }: Props) {
  const { selected } = actions;
  const { view } = model;
  return (
    <>
      <div className="min-h-0 flex-1 divide-y divide-rule overflow-y-auto">
        {limitsOpen ? (
          <div className="px-5 py-4">
            <LimitTable
              week={model.week}
              evaluation={model.evaluation}
              clock={model.clock}
              pointed={pointed}
              onGo={(minute) => view.reveal({ from: minute - 30, to: minute + 30 }, null)}
            />
          </div>
        ) : null}
        <div className="px-5 py-4">
          <BreachList
            breaches={model.evaluation.breaches}
            names={model.names}
            clock={model.clock}
            nowMin={model.nowMin}
            onGo={actions.goTo}
            wantedClean={cleans.wantedFor}
            onClean={cleans.ask}
          />
        </div>
        <ReworkNotice weekStart={model.dto.weekStart} readAt={model.dto.now} mayEdit={model.mayEdit} />
        <div className="px-5 py-4">
          <Unplaced
            groups={model.waiting}
            nothingPlanned={model.week.activities.length === 0}
            peak={model.peak}
            clock={model.clock}
            mayEdit={model.mayEdit}
            selectedId={actions.selectedId}
            onSelect={actions.setSelectedId}
            onLift={actions.lift}
            onPlaceAll={actions.placeAll}
            onAddClean={cleans.mayAdd ? () => cleans.ask('any') : null}
          />
        </div>
      </div>
      {selected ? (
        <div className="max-h-1/2 shrink-0 overflow-y-auto border-t border-edge px-5 py-4 max-md:sticky max-md:bottom-0 max-md:bg-surface">
          <SelectedDetail
            activity={selected}
            week={model.week}
            evaluation={model.evaluation}
            clock={model.clock}
            mayEdit={model.mayEdit}
            moved={model.dto.moved[selected.id]}
            onFix={actions.toggleFix}
            onTakeOff={actions.takeOff}
            onRemove={cleans.remove}
            isRemoving={cleans.isRemoving}
          />
        </div>
      ) : null}
    </>
  );
}
