import { memo } from 'react';
import type { FloorEventDto } from '../../contracts/week';
import type { Unit } from '../../core/plant/plant';
import type { Breach } from '../../core/schedule/breach';
import { Block } from './Block';
import type { Drawn } from './drawn';

export interface RowShare {
  readonly pxPerMin: number;
  readonly peak: number;
  readonly breaches: ReadonlyMap<string, readonly Breach[]>;
  readonly events: ReadonlyMap<string, readonly FloorEventDto[]>;
  readonly labelOf: (drawn: Drawn) => string;
  readonly selectedId: string | null;
  readonly kin: ReadonlySet<string>;
  readonly focusId: string | null;
  readonly carriedId: string | null;
  readonly readOnly: boolean;
}

interface Props {
  readonly unit: Unit;
  readonly top: number;
  readonly height: number;
  readonly drawn: readonly Drawn[];
  readonly widthPx: number;
  readonly share: RowShare;
}

/** A unit and what it does, one block after the other. */
export const UnitRow = memo(function UnitRow({ unit, top, height, drawn, widthPx, share }: Props) {
  return (
    <div className="absolute left-0 flex" style={{ top, height }} role="group" aria-label={unit.name}>
      <div className="board-label flex items-center border-b border-b-rule pr-2 pl-7 text-sm max-sm:pl-3 max-sm:text-2xs">
        <span className="line-clamp-2">{unit.name}</span>
      </div>
      <div className="board-track border-b border-rule" style={{ width: widthPx }} data-unit={unit.id}>
        {drawn.map((one) => {
          const id = one.activity.id;
          return (
            <Block
              key={id}
              drawn={one}
              activity={one.activity}
              peak={share.peak}
              pxPerMin={share.pxPerMin}
              label={share.labelOf(one)}
              breaches={share.breaches.get(id)}
              events={share.events.get(id)}
              selected={share.selectedId === id}
              kin={share.kin.has(id)}
              tabbable={share.focusId === id}
              carried={share.carriedId === id}
              readOnly={share.readOnly}
            />
          );
        })}
      </div>
    </div>
  );
});
