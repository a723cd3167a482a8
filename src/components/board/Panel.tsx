import { BreachList } from './BreachList';
import { SelectedDetail } from './SelectedDetail';
import { Unplaced } from './Unplaced';
import type { BoardModel } from './useBoard';
import type { BoardActions } from './useBoardActions';

interface Props {
  readonly model: BoardModel;
  readonly actions: BoardActions;
}

/** What is to put right, what is selected, and what waits for a place. */
export function Panel({ model, actions }: Props) {
  const { selected } = actions;
  return (
    <div className="flex flex-col divide-y divide-rule">
      {selected ? (
        <div className="px-5 py-4">
          <SelectedDetail
            activity={selected}
            week={model.week}
            clock={model.clock}
            mayEdit={model.mayEdit}
            moved={model.dto.moved[selected.id]}
            onFix={actions.toggleFix}
            onTakeOff={actions.takeOff}
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
        />
      </div>
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
        />
      </div>
    </div>
  );
}
